using Redshift.Physics.Statistics;
using Redshift.Simulation.Light;

namespace Redshift.Simulation.Sources.Galaxies;

/// <summary>Draws star-forming galaxies as seen in their far ultraviolet light, after the mean properties of z ≈ 3 samples (Shapley et al. 2003, ApJ 588, 65).</summary>
internal static class UltravioletPainter
{
    /// <summary>Low-ionisation interstellar lines with typical rest equivalent widths, Å.</summary>
    public static IReadOnlyList<(double Vacuum, double Width)> LowIons { get; } =
        [(1260.42, 1.7), (1302.17, 1.3), (1304.37, 0.9), (1334.53, 1.6), (1526.71, 1.6), (1608.45, 0.8), (1670.79, 1.4), (1808.01, 0.2), (1190.42, 0.7), (1193.29, 0.8)];

    /// <summary>The same beyond 2000 Å.</summary>
    public static IReadOnlyList<(double Vacuum, double Width)> NearUltravioletIons { get; } =
        [(2344.21, 1.7), (2374.46, 1.3), (2382.76, 1.9), (2586.65, 1.7), (2600.17, 2.1), (2796.35, 2.2), (2803.53, 1.9), (2852.96, 0.8)];

    private static readonly (double Vacuum, double Width)[] HighIons = [(1393.76, 1), (1402.77, 0.7), (1548.2, 0.9), (1550.78, 0.6), (1854.72, 0.5), (1862.79, 0.4)];

    private static readonly (double Vacuum, double Width)[] PhotosphericLines = [(1294.5, 0.4), (1343.4, 0.4), (1371.3, 0.3), (1417.2, 0.4), (1501.8, 0.5), (1718.6, 0.5), (1425, 0.4), (1184, 0.7), (1176, 1.2)];

    private static readonly (double Vacuum, double Width)[] Excited = [(1264.74, 0.3), (1309.28, 0.4), (1533.43, 0.3), (1197.39, 0.2)];

    /// <summary>Draws one.</summary>
    public static Canvas Draw(LogGrid grid, double z, RandomSource random)
    {
        var slope = random.Normal(-1.6, 0.45);
        var canvas = new Canvas(grid).Fill(wavelength => Law(wavelength, slope));
        var emission = LymanAlphaWidth(random);
        var covering = Math.Clamp(1.15 - (0.22 * Math.Log(Math.Max(1, emission + 12) / 12)), 0.35, 1.4) * random.Scatter(0.25);
        var outflow = random.Normal(-150, 110);
        AbsorbAll(canvas, PhotosphericLines, 0, 90, random.Scatter(0.3), random);
        AbsorbAll(canvas, LowIons, outflow, random.Uniform(150, 290), covering, random);
        AbsorbAll(canvas, NearUltravioletIons, outflow, random.Uniform(130, 240), covering, random);
        AbsorbAll(canvas, HighIons, outflow - 40, random.Uniform(150, 290), random.Scatter(0.3), random);
        Winds(canvas, random.Uniform(0.3, 1.4));
        DrawLymanAlpha(canvas, emission, random);
        EmitWeakLines(canvas, Math.Max(0, emission), random);
        return canvas;
    }

    // Below the Balmer limit the light of hot stars is a power law; towards it older stars take over.
    private static double Law(double wavelength, double slope) =>
        Math.Pow(wavelength / 1500, wavelength < 2600 ? slope : slope + 0.5) * Math.Pow(Math.Max(1, wavelength / 2600), -0.2) * (wavelength < 911.75 ? 0.03 : 1);

    // A quarter each: absorption, next to nothing, weak and strong emission.
    private static double LymanAlphaWidth(RandomSource random) => random.Index(4) switch
    {
        0 => random.Uniform(-12, -4),
        1 => random.Uniform(-4, 8),
        2 => random.Uniform(5, 25),
        _ => random.LogUniform(20, 120),
    };

    private static void AbsorbAll(Canvas canvas, IEnumerable<(double Vacuum, double Width)> lines, double shiftKmS, double widthKmS, double strength, RandomSource random)
    {
        foreach (var (vacuum, width) in lines)
            canvas.Absorb(vacuum * (1 + (shiftKmS / LogGrid.C)), widthKmS, strength * width * random.Scatter(0.25), 0.8);
    }

    // P Cygni lines of massive stars: a trough up to −2500 km/s, emission near rest.
    private static void Winds(Canvas canvas, double strength)
    {
        foreach (var (vacuum, trough, peak) in ((double, double, double)[])[(1549.5, 2.2, 0.6), (1240.8, 2.5, 1), (1398, 0.8, 0.2)])
        {
            canvas.Absorb(vacuum * (1 - (1300 / LogGrid.C)), 700, strength * trough, 0.5);
            canvas.Emit(vacuum * (1 + (300 / LogGrid.C)), 500, strength * peak * (canvas.At(vacuum * 1.01) ?? 0));
        }
        canvas.Emit(1640.42, 600, strength * 1.2 * (canvas.At(1650) ?? 0));
    }

    private static void DrawLymanAlpha(Canvas canvas, double emission, RandomSource random)
    {
        const double Rest = 1215.67;
        var depth = emission < 0 ? random.Uniform(8, 22) : emission < 20 ? random.Uniform(2, 9) : random.Uniform(0, 3);
        canvas.Absorb(Rest, 600, depth, 0.92, Profile.Lorentzian);
        var continuum = canvas.At(1230) ?? canvas.At(1240) ?? 0;
        var area = Math.Max(emission < 0 ? 0 : emission, random.Uniform(0, 2)) * continuum;
        // Resonant scattering in the outflow leaves a red peak with a red tail.
        var shift = Math.Max(60, random.Normal(emission > 30 ? 230 : 380, 120));
        canvas.Emit(Rest * (1 + (shift / LogGrid.C)), random.Uniform(90, 170), 0.6 * area);
        canvas.Emit(Rest * (1 + ((shift + 180) / LogGrid.C)), random.Uniform(180, 320), 0.4 * area);
    }

    private static void EmitWeakLines(Canvas canvas, double lyman, RandomSource random)
    {
        foreach (var (vacuum, width) in Excited)
            canvas.Emit(vacuum, 150, width * random.Scatter(0.4) * (canvas.At(vacuum * 1.01) ?? 0));
        var carbon = (0.8 + (0.05 * lyman)) * random.Scatter(0.5);
        foreach (var (vacuum, share) in ((double, double)[])[(1906.68, 0.6), (1908.73, 0.4), (1660.81, 0.06), (1666.15, 0.16), (1640.42, 0.12), (1549.5, 0.03)])
            canvas.Emit(vacuum, random.Uniform(50, 110), carbon * share * (canvas.At(vacuum * 1.01) ?? 0));
    }
}
