using System.Globalization;
using Redshift.Physics.Air;

namespace Redshift.Physics.Lines;

/// <summary>The lines whose wavelengths are taken from publications.</summary>
internal static class PublishedLines
{
    // Each row holds the wavelength as published, in air or in vacuum; the other one follows by the refraction of air.
    public static IEnumerable<SpectralLine> Read(string fileName) => EmbeddedTable.Rows(fileName).Select(Parse);

    private static SpectralLine Parse(string[] row)
    {
        double wavelength = Number(row[2]);
        return new SpectralLine(
            row[0],
            Enum.Parse<LineFamily>(row[1], ignoreCase: true),
            row[3] == "air" ? AirRefraction.ToVacuum(wavelength) : wavelength,
            Enum.Parse<LineKind>(row[4], ignoreCase: true),
            Uses(row[5]),
            row[6].Length == 0 ? null : Number(row[6]),
            row[7]);
    }

    private static LineUses Uses(string field)
        => field.Split('/').Aggregate(LineUses.None, (uses, use) => uses | Enum.Parse<LineUses>(use, ignoreCase: true));

    private static double Number(string field) => double.Parse(field, CultureInfo.InvariantCulture);
}
