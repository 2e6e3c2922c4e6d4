using Redshift.Simulation.Light;
using Redshift.Simulation.Random;

namespace Redshift.Simulation.Atoms;

/// <summary>An absorption line of cool stars.</summary>
/// <param name="Species">Element and stage; of a blended pair the first.</param>
/// <param name="Vacuum">Vacuum wavelength, Å.</param>
/// <param name="SolarWidth">Equivalent width in the Sun, Å.</param>
internal sealed record MetalLine(string Species, double Vacuum, double SolarWidth)
{
    private const int Unlisted = 700;

    /// <summary>The listed lines with nature's own departures from the table, and weak lines that no list holds.</summary>
    public static IReadOnlyList<MetalLine> All { get; } = [.. Listed(new(20260131)), .. Invented(new(20260207))];

    private static IEnumerable<MetalLine> Listed(RandomSource nature) =>
        from row in Table.Rows("photosphere.csv")
        let scatter = nature.Scatter(0.25)
        select new MetalLine(row[0], Air.ToVacuum(Table.Number(row[1])), Table.Number(row[2]) / 1000 * scatter);

    // Weak lines crowd towards the blue; without them a synthetic spectrum is too smooth between its lines.
    private static IEnumerable<MetalLine> Invented(RandomSource nature)
    {
        for (var i = 0; i < Unlisted; i++)
        {
            var wavelength = 2000 + (5000 * Math.Pow(nature.Uniform(), 1.3));
            var species = nature.Chance(0.7) ? "Fe I" : nature.Chance(0.5) ? "Fe II" : "Ti I";
            yield return new(species, wavelength, nature.Exponential(wavelength < 3000 ? 0.35 : wavelength < 4500 ? 0.06 : 0.03));
        }
    }
}
