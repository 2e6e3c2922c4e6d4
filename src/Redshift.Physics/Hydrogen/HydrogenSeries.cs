namespace Redshift.Physics.Hydrogen;

/// <summary>A series of hydrogen: all lines that end on one shell.</summary>
public sealed class HydrogenSeries
{
    private HydrogenSeries(string name, int lower) => (Name, Lower) = (name, lower);

    /// <summary>Lines to n = 1, from 1216 A.</summary>
    public static HydrogenSeries Lyman { get; } = new("Lyman", 1);

    /// <summary>Lines to n = 2, from 6565 A.</summary>
    public static HydrogenSeries Balmer { get; } = new("Balmer", 2);

    /// <summary>Lines to n = 3, from 18756 A.</summary>
    public static HydrogenSeries Paschen { get; } = new("Paschen", 3);

    /// <summary>Lines to n = 4, from 40523 A.</summary>
    public static HydrogenSeries Brackett { get; } = new("Brackett", 4);

    /// <summary>Lines to n = 5, from 74600 A.</summary>
    public static HydrogenSeries Pfund { get; } = new("Pfund", 5);

    /// <summary>Lines to n = 6, from 123700 A.</summary>
    public static HydrogenSeries Humphreys { get; } = new("Humphreys", 6);

    /// <summary>The named series, from the ultraviolet to the infrared.</summary>
    public static IReadOnlyList<HydrogenSeries> All { get; } = [Lyman, Balmer, Paschen, Brackett, Pfund, Humphreys];

    /// <summary>The name, after its discoverer.</summary>
    public string Name { get; }

    /// <summary>Principal quantum number of the shell the lines end on.</summary>
    public int Lower { get; }

    /// <summary>Vacuum wavelength of the limit, in angstrom.</summary>
    public double Limit => HydrogenicAtom.Hydrogen.SeriesLimit(Lower);

    /// <summary>The line from a shell.</summary>
    /// <param name="upper">Principal quantum number of the upper shell.</param>
    /// <returns>The line.</returns>
    /// <exception cref="ArgumentOutOfRangeException"><paramref name="upper"/> is not above <see cref="Lower"/>.</exception>
    public HydrogenicLine Line(int upper) => HydrogenicAtom.Hydrogen.Line(upper, Lower);

    /// <summary>The lines of the series from its first on.</summary>
    /// <param name="highestUpper">Principal quantum number of the last upper shell.</param>
    /// <returns>The lines by falling wavelength; none if <paramref name="highestUpper"/> is not above <see cref="Lower"/>.</returns>
    public IEnumerable<HydrogenicLine> Lines(int highestUpper)
    {
        for (int upper = Lower + 1; upper <= highestUpper; upper++)
            yield return Line(upper);
    }
}
