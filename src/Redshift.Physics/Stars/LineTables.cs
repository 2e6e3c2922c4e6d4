using System.Globalization;
using System.Reflection;

namespace Redshift.Physics.Stars;

/// <summary>The published line tables, with the strengths that they imply.</summary>
internal static class LineTables
{
    private static readonly string[] Numerals = ["I", "II", "III", "IV", "V", "VI"];
    private static readonly StellarParameters Sun = new(5772, 4.44, 0);

    /// <summary>Lines of the solar spectrum and of hot stars.</summary>
    public static readonly SpectralLine[] All = [.. SolarLines(), .. HotLines(), .. UltravioletLines()];

    private static IEnumerable<SpectralLine> SolarLines()
    {
        var sun = new Photosphere(Sun);
        return Rows("solar-lines.csv").Select(r => Calibrated(r, sun, 1e-3 * Number(r[2]), Number(r[3])));
    }

    private static IEnumerable<SpectralLine> HotLines()
    {
        var stars = new Dictionary<double, Photosphere>();
        foreach (var row in Rows("hot-lines.csv"))
        {
            var kelvin = Number(row[3]);
            if (!stars.TryGetValue(kelvin, out var star))
                stars[kelvin] = star = new Photosphere(new StellarParameters(kelvin, 4, 0));
            yield return Calibrated(row, star, Number(row[2]), Number(row[4]));
        }
    }

    private static IEnumerable<SpectralLine> UltravioletLines() => Rows("ultraviolet-lines.csv").Select(row =>
    {
        var (element, stage) = Species(row[0]);
        return new SpectralLine(element, stage, Number(row[1]), Number(row[3]), Math.Pow(10, Number(row[2])));
    });

    // The g f that gives the published width in the star in which it was measured.
    private static SpectralLine Calibrated(string[] row, Photosphere star, double widthAngstrom, double excitation)
    {
        var (element, stage) = Species(row[0]);
        var wavelength = AirWavelength.ToVacuum(Number(row[1]));
        var unit = new SpectralLine(element, stage, wavelength, excitation, 1);
        var doppler = wavelength * star.Lines.DopplerCm(element) / Constants.LightSpeedCm;
        var width = widthAngstrom / (doppler * star.StrongestDepth(wavelength));
        return unit with { Weight = CurveOfGrowth.Invert(width, star.Lines.Damping(unit)) * star.HalfDepthRatio(wavelength) / unit.CentralRatio(star.Lines) };
    }

    private static (Element Element, int Stage) Species(string name)
    {
        var parts = name.Split(' ');
        return (Element.Find(parts[0]), Array.IndexOf(Numerals, parts[1]));
    }

    private static double Number(string text) => double.Parse(text, CultureInfo.InvariantCulture);

    private static IEnumerable<string[]> Rows(string table)
    {
        using var stream = Assembly.GetExecutingAssembly().GetManifestResourceStream("Redshift.Physics.Stars." + table)
            ?? throw new InvalidOperationException($"table {table} is missing from the assembly");
        using var reader = new StreamReader(stream);
        var lines = new List<string>();
        while (reader.ReadLine() is { } line)
        {
            if (line.Length > 0 && line[0] != '#')
                lines.Add(line);
        }

        return lines.Skip(1).Select(l => l.Split(','));
    }
}
