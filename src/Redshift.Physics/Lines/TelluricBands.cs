using System.Globalization;
using Redshift.Physics.Air;

namespace Redshift.Physics.Lines;

/// <summary>The absorption bands of the Earth's atmosphere from the visible to 2 micron.</summary>
public static class TelluricBands
{
    /// <summary>The bands, by rising wavelength.</summary>
    public static IReadOnlyList<TelluricBand> All { get; } = [.. EmbeddedTable.Rows("telluric-bands.csv").Select(Parse)];

    private static TelluricBand Parse(string[] row)
        => new(row[0], row[1], Vacuum(row[2]), Vacuum(row[3]), Enum.Parse<TelluricStrength>(row[4], ignoreCase: true), row[5]);

    private static double Vacuum(string airAngstrom)
        => AirRefraction.ToVacuum(double.Parse(airAngstrom, CultureInfo.InvariantCulture));
}
