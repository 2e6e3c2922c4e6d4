using Redshift.Simulation.Sources.Galaxies;
using Redshift.Simulation.Sources.Others;
using Redshift.Simulation.Sources.Quasars;
using Redshift.Simulation.Sources.Stars;

namespace Redshift.Simulation.Sources;

/// <summary>All classes of objects by name.</summary>
internal static class ObjectCatalog
{
    public static IReadOnlyDictionary<string, ObjectClass> All { get; } = new ObjectClass[]
    {
        new("star-hot", TruthKind.Star, StarPainter.Hot),
        new("star-a", TruthKind.Star, StarPainter.A),
        new("star-fg", TruthKind.Star, StarPainter.FG),
        new("star-k", TruthKind.Star, StarPainter.K),
        new("star-m", TruthKind.Star, StarPainter.M),
        new("star-giant", TruthKind.Star, StarPainter.Giant),
        new("star-metal-poor", TruthKind.Star, StarPainter.MetalPoor),
        new("star-da", TruthKind.Star, OddStars.HydrogenWhiteDwarf),
        new("star-db", TruthKind.Star, OddStars.HeliumWhiteDwarf),
        new("star-be", TruthKind.Star, OddStars.Disc),
        new("star-dme", TruthKind.Star, OddStars.Flaring),
        new("star-carbon", TruthKind.Star, OddStars.Carbon),
        new("galaxy-passive", TruthKind.Galaxy, GalaxyPainter.Passive),
        new("galaxy-star-forming", TruthKind.Galaxy, GalaxyPainter.StarForming),
        new("galaxy-starburst", TruthKind.Galaxy, GalaxyPainter.Starburst),
        new("galaxy-post-starburst", TruthKind.Galaxy, GalaxyPainter.PostStarburst),
        new("galaxy-active", TruthKind.Galaxy, GalaxyPainter.Active),
        new("galaxy-ultraviolet", TruthKind.Galaxy, UltravioletPainter.Draw),
        new("galaxy-quiescent", TruthKind.Galaxy, GalaxyPainter.DistantQuiescent),
        new("quasar", TruthKind.Quasar, QuasarPainter.Common),
        new("quasar-red", TruthKind.Quasar, QuasarPainter.Red),
        new("quasar-bal", TruthKind.Quasar, QuasarPainter.Outflowing),
        new("nebula-planetary", TruthKind.Nebula, NebulaPainter.Planetary),
        new("nebula-hii", TruthKind.Nebula, NebulaPainter.HII),
        new("comet", TruthKind.Oddity, OddityPainter.Comet) { HasRedshift = true },
        new("supernova", TruthKind.Oddity, OddityPainter.Supernova),
        new("blazar", TruthKind.Oddity, OddityPainter.Blazar),
    }.ToDictionary(entry => entry.Name);
}
