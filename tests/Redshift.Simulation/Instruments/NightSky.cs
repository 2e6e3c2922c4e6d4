using Redshift.Physics.Statistics;
using Redshift.Simulation.Atoms;
using Redshift.Simulation.Light;

namespace Redshift.Simulation.Instruments;

/// <summary>Light of the night sky and what its subtraction leaves.</summary>
internal sealed class NightSky
{
    private static readonly (double Vacuum, double Area)[] Lines = [.. Listed(new(777)), .. NearInfrared(new(778))];

    private NightSky(Canvas light, Canvas remains) => (Light, Remains) = (light, remains);

    /// <summary>Sky brightness, 1 in the optical continuum.</summary>
    public Canvas Light { get; }

    /// <summary>Shape of what subtraction leaves at the lines: too much or too little, and shifted.</summary>
    public Canvas Remains { get; }

    /// <summary>The even background of a telescope in space.</summary>
    public static NightSky None(LogGrid grid) => new(new Canvas(grid).Fill(_ => 1), new(grid));

    /// <summary>Draws one night.</summary>
    /// <param name="grid">Observed wavelengths.</param>
    /// <param name="town">Strength of lamp light, 0 on a mountain.</param>
    /// <param name="random">The night.</param>
    public static NightSky Draw(LogGrid grid, double town, RandomSource random)
    {
        var sky = new NightSky(new(grid), new(grid));
        sky.Light.Fill(Continuum);
        var common = random.Normal();
        foreach (var (vacuum, area) in Lines.Where(line => grid.Reaches(line.Vacuum)))
            sky.DrawLine(vacuum, Strength(area, town) * random.Scatter(0.25), common + (0.5 * random.Normal()), random.Normal());
        return sky;
    }

    // Blue-sky to red-sky rise, thermal light of telescope and air beyond 2.1 µm.
    private static double Continuum(double wavelength)
    {
        var x = wavelength / 10000;
        return 0.8 + (0.5 * Math.Min(x, 1.2)) + (wavelength > 20500 ? Math.Exp((wavelength - 21500) / 700) : 0);
    }

    private void DrawLine(double vacuum, double area, double left, double shifted)
    {
        const double Width = 6;
        Light.Emit(vacuum, Width, area);
        Remains.Emit(vacuum, Width, area * left);
        var offset = vacuum * Grid.StepKmS * 3 / LogGrid.C;
        Remains.Emit(vacuum + offset, Width, area * shifted);
        Remains.Emit(vacuum - offset, Width, -area * shifted);
    }

    private LogGrid Grid => Light.Grid;

    private static double Strength(double area, double town) => area < 0 ? -area * town : area;

    // Areas in Å of sky continuum (1 rayleigh is near 1 Å in the visible); lamps are kept negative and scale with the town.
    private static IEnumerable<(double Vacuum, double Area)> Listed(RandomSource nature)
    {
        foreach (var row in Table.Rows("sky.csv"))
        {
            var vacuum = Air.ToVacuum(Table.Number(row[1]));
            yield return (vacuum, Area(row[0], vacuum) * nature.Scatter(0.5));
        }
    }

    private static double Area(string species, double vacuum) => species switch
    {
        "[O I]" => vacuum < 6000 ? 190 : vacuum < 6310 ? 80 : 27,
        "Na I" => vacuum is > 5885 and < 5900 ? 30 : -8,
        "OH" => vacuum < 7000 ? 4 : vacuum < 7700 ? 22 : 60,
        "Hg I" => -25,
        _ => 1,
    };

    // Between 0.97 and 2.3 µm the hydroxyl bands are denser than any list we carry: lines at random, fixed places.
    private static IEnumerable<(double Vacuum, double Area)> NearInfrared(RandomSource nature)
    {
        for (var wavelength = 9700.0; wavelength < 22800; wavelength += nature.Exponential(38))
            yield return (wavelength, nature.Exponential(wavelength < 14500 ? 120 : 250));
    }
}
