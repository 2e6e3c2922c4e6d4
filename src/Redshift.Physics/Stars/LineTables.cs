using Redshift.Physics.Air;

namespace Redshift.Physics.Stars;

/// <summary>The published line tables, with the strengths that they imply.</summary>
internal static class LineTables
{
    /// <summary>The Sun, whose line widths calibrate the strengths.</summary>
    public static readonly StellarParameters Sun = new(5772, 4.44, 0);

    private static readonly string[] Numerals = ["I", "II", "III", "IV", "V", "VI"];
    private static readonly List<(Element Element, int Stage)> IonList = [];

    /// <summary>Lines of the solar spectrum, of hot stars and of the ultraviolet.</summary>
    public static readonly AtomicLine[] All = [.. SolarLines(), .. HotLines(), .. UltravioletLines()];

    /// <summary>Ions that the lines belong to.</summary>
    public static IReadOnlyList<(Element Element, int Stage)> Ions => IonList;

    private static IEnumerable<AtomicLine> SolarLines()
    {
        var sun = new Photosphere(Sun);
        return StarTables.Rows("solar-lines.csv").Select(r => Calibrated(r, sun, 1e-3 * StarTables.Number(r[2]), StarTables.Number(r[3])));
    }

    private static IEnumerable<AtomicLine> HotLines()
    {
        var stars = new Dictionary<double, Photosphere>();
        foreach (var row in StarTables.Rows("hot-lines.csv"))
        {
            var kelvin = StarTables.Number(row[3]);
            if (!stars.TryGetValue(kelvin, out var star))
                stars[kelvin] = star = new Photosphere(new StellarParameters(kelvin, 4, 0));
            yield return Calibrated(row, star, StarTables.Number(row[2]), StarTables.Number(row[4]));
        }
    }

    private static IEnumerable<AtomicLine> UltravioletLines()
    {
        foreach (var row in StarTables.Rows("ultraviolet-lines.csv"))
        {
            var weight = Math.Pow(10, StarTables.Number(row[2]));
            yield return new AtomicLine(Ion(row[0]), StarTables.Number(row[1]), StarTables.Number(row[3]), weight);
        }
    }

    // The g f that gives the published width in the star in which it was measured.
    private static AtomicLine Calibrated(string[] row, Photosphere star, double widthAngstrom, double excitation)
    {
        var ion = Ion(row[0]);
        var wavelength = AirRefraction.ToVacuum(StarTables.Number(row[1]));
        var absorbers = new Absorbers(star.Lines, IonList[ion].Element, IonList[ion].Stage);
        var place = Nodes.Place(Math.Log(wavelength));
        var width = widthAngstrom / (wavelength * absorbers.Doppler * star.StrongestDepth(place));
        var central = CurveOfGrowth.Invert(width, absorbers.Damping(wavelength)) * star.HalfDepthRatio(place);
        var opacity = central * star.Lines.ContinuousOpacityAt(place);
        return new AtomicLine(ion, wavelength, excitation, opacity / absorbers.CentralOpacity(wavelength, excitation));
    }

    private static int Ion(string name)
    {
        var parts = name.Split(' ');
        var species = (Element.Find(parts[0]), Array.IndexOf(Numerals, parts[1]));
        var known = IonList.IndexOf(species);
        if (known >= 0)
            return known;
        IonList.Add(species);
        return IonList.Count - 1;
    }
}
