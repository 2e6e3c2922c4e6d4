using Redshift.Physics.Statistics;
using Redshift.Simulation.Instruments;
using Redshift.Simulation.Light;
using Redshift.Simulation.Sources;

namespace Redshift.Simulation;

/// <summary>Draws observations; each depends on nothing but the seed and its own number.</summary>
public static class SimulatedSurvey
{
    private const string Blank = "blank";

    /// <summary>Draws the first <paramref name="count"/> observations of a seed.</summary>
    public static IEnumerable<SimulatedObservation> Draw(ulong seed, int count, SurveyMix mix) =>
        Enumerable.Range(0, count).Select(index => Observe(seed, index, mix));

    /// <summary>Draws one observation of a seed.</summary>
    public static SimulatedObservation Observe(ulong seed, int index, SurveyMix mix)
    {
        var random = RandomSource.ForMember(seed, (ulong)index);
        var entry = Choose(mix, random);
        var setup = SetupCatalog.All[entry.Setup](random);
        var snr = Math.Clamp(setup.Snr.Median * random.Scatter(setup.Snr.ScatterLn), setup.Snr.Lowest, setup.Snr.Highest);
        var name = FormattableString.Invariant($"{seed}-{index}");
        if (entry.ObjectClass == Blank)
            return ObserveBlank(name, setup, snr, random);
        var kind = ObjectCatalog.All[entry.ObjectClass];
        return Observe(name, setup, kind, Redshift(kind, entry, random), snr, random);
    }

    /// <summary>Observes a given class of object, or <c>blank</c>, at a given redshift and signal to noise.</summary>
    /// <exception cref="KeyNotFoundException">No such set-up or class.</exception>
    public static SimulatedObservation Observe(ulong seed, string setup, string objectClass, double z, double snr)
    {
        var random = new RandomSource(seed);
        var instrument = SetupCatalog.All[setup](random);
        var name = FormattableString.Invariant($"{setup}-{objectClass}-{seed}");
        return objectClass == Blank
            ? ObserveBlank(name, instrument, snr, random)
            : Observe(name, instrument, ObjectCatalog.All[objectClass], z, snr, random);
    }

    private static SimulatedObservation ObserveBlank(string name, Setup setup, double snr, RandomSource random) =>
        new(name, TruthKind.Blank, null, Blank, setup.Name, 0, new Exposure(setup, random).Record(null, snr));

    private static SimulatedObservation Observe(string name, Setup setup, ObjectClass kind, double z, double snr, RandomSource random)
    {
        var exposure = new Exposure(setup, random);
        var light = Light(exposure.Grid, kind, z, random);
        return new(name, kind.Kind, kind.HasRedshift ? z : null, kind.Name, setup.Name, snr, exposure.Record(light, snr));
    }

    private static Canvas Light(LogGrid grid, ObjectClass kind, double z, RandomSource random)
    {
        var light = kind.Paint(grid.RestFrame(z), z, random);
        if (kind.Kind is TruthKind.Galaxy or TruthKind.Quasar)
            Sightline.Absorb(light, z, random);
        return light;
    }

    private static SurveyEntry Choose(SurveyMix mix, RandomSource random)
    {
        var left = random.Uniform() * mix.Entries.Sum(entry => entry.Weight);
        foreach (var entry in mix.Entries)
        {
            left -= entry.Weight;
            if (left < 0)
                return entry;
        }
        return mix.Entries[^1];
    }

    private static double Redshift(ObjectClass kind, SurveyEntry entry, RandomSource random) => kind.Kind switch
    {
        TruthKind.Star or TruthKind.Nebula => Math.Clamp(random.Normal(0, entry.ZFrom), -550, 550) / LogGrid.C,
        _ => random.LogUniform(1 + entry.ZFrom, 1 + entry.ZTo) - 1,
    };
}
