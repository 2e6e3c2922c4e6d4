using Redshift.Physics.Statistics;
using Redshift.Simulation.Light;

namespace Redshift.Simulation.Sources;

/// <summary>Draws an object of a class: flux per Å on its rest-frame grid.</summary>
/// <param name="restGrid">Wavelengths in the object's own frame.</param>
/// <param name="z">Its redshift, for what depends on epoch.</param>
/// <param name="random">Its dice.</param>
internal delegate Canvas Painter(LogGrid restGrid, double z, RandomSource random);

/// <summary>A class of objects.</summary>
/// <param name="Name">E.g. <c>star-m</c>.</param>
/// <param name="Kind">The kind it belongs to.</param>
/// <param name="Paint">Draws one.</param>
internal sealed record ObjectClass(string Name, TruthKind Kind, Painter Paint)
{
    /// <summary>Whether there is a redshift that could be found.</summary>
    public bool HasRedshift { get; init; } = Kind != TruthKind.Oddity;
}
