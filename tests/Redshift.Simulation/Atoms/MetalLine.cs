using Redshift.Physics.Statistics;
using Redshift.Simulation.Light;

namespace Redshift.Simulation.Atoms;

/// <summary>An absorption line of cool stars.</summary>
/// <param name="Species">Element and stage; of a blended pair the first.</param>
/// <param name="Vacuum">Vacuum wavelength, Å.</param>
/// <param name="SolarWidth">Equivalent width in the Sun, Å.</param>
internal sealed record MetalLine(string Species, double Vacuum, double SolarWidth)
{
    private const int Unlisted = 700;

    // The listed lines with nature's own departures from the table, and weak lines that no list holds.
    private static readonly MetalLine[] All = [.. Listed(new(20260131)).Concat(Invented(new(20260207))).OrderBy(line => line.Vacuum)];

    /// <summary>The lines in a range of wavelengths, Å.</summary>
    public static ReadOnlySpan<MetalLine> Between(double from, double to)
    {
        var (first, last) = (Array.FindIndex(All, line => line.Vacuum >= from), Array.FindLastIndex(All, line => line.Vacuum <= to));
        return first < 0 || last < first ? [] : All.AsSpan(first, last - first + 1);
    }

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
            var species = nature.Chance(0.75) ? "Fe I" : nature.Chance(0.3) ? "Fe II" : "Ti I";
            yield return new(species, wavelength, nature.Exponential(wavelength < 3000 ? 0.3 : wavelength < 4500 ? 0.045 : 0.02));
        }
    }
}
