using Redshift.Physics.Statistics;
using Redshift.Simulation.Light;
using Redshift.Simulation.Sources.Galaxies;

namespace Redshift.Simulation.Sources.Quasars;

/// <summary>Draws random quasars.</summary>
internal static class QuasarPainter
{
    /// <summary>Any unobscured quasar.</summary>
    public static Canvas Common(LogGrid grid, double z, RandomSource random) => Draw(grid, z, random.Exponential(0.025), random);

    /// <summary>Dust-reddened quasar.</summary>
    public static Canvas Red(LogGrid grid, double z, RandomSource random) => Draw(grid, z, random.Uniform(0.1, 0.45), random);

    /// <summary>Broad absorption lines of an outflow, one in eight also in Mg II.</summary>
    public static Canvas Outflowing(LogGrid grid, double z, RandomSource random)
    {
        var canvas = Draw(grid, z, random.Exponential(0.05), random);
        var low = random.Chance(0.12);
        for (var trough = 1 + random.Index(3); trough > 0; trough--)
        {
            var (velocity, width, depth) = (random.Uniform(2500, 17000), random.LogUniform(600, 3000), random.Uniform(0.3, 0.95));
            foreach (var (vacuum, share) in Outflow(low))
                canvas.Absorb(vacuum * (1 - (velocity / LogGrid.C)), width, share * depth * 2.5066 * width * vacuum / LogGrid.C, share * depth);
        }
        return canvas;
    }

    private static Canvas Draw(LogGrid grid, double z, double dust, RandomSource random)
    {
        var width = FullWidth(random);
        var canvas = new Canvas(grid).Fill(Power(random));
        var lines = DrawBroadLines(canvas, width, random);
        var iron = random.LogUniform(0.3, 2.2);
        IronBlend.Emit(canvas, 85 * iron, 60 * iron * random.Scatter(0.4), width / 2.355);
        BalmerContinuum(canvas, random.Uniform(0.03, 0.25));
        canvas.Add(lines, 1);
        canvas.FilterSlowly(wavelength => Dust.Transmission(Dust.Steep(wavelength), dust));
        DrawNarrowLines(canvas, random);
        if (z < 1)
            AddHost(canvas, random);
        DrawAbsorbers(canvas, z, random);
        return canvas;
    }

    private static double FullWidth(RandomSource random) =>
        random.Chance(0.1) ? random.Uniform(1100, 2200) : Math.Clamp(4200 * random.Scatter(0.45), 1500, 13000);

    // Mean slopes of the composite: −1.55 below 5000 Å, −0.45 above, where the host and hot dust come in.
    private static Func<double, double> Power(RandomSource random)
    {
        var (blue, red) = (random.Normal(-1.55, 0.3), random.Normal(-0.6, 0.35));
        var far = random.Normal(-0.4, 0.6);
        return wavelength => wavelength > 5000 ? Math.Pow(wavelength / 5000, red)
            : wavelength > 1100 ? Math.Pow(wavelength / 5000, blue)
            : Math.Pow(1100.0 / 5000, blue) * Math.Pow(wavelength / 1100, far);
    }

    private static Canvas DrawBroadLines(Canvas continuum, double fullWidth, RandomSource random)
    {
        var lines = new Canvas(continuum.Grid);
        var (overall, blueshift, core) = (random.Scatter(0.4), Math.Max(0, random.Normal(600, 550)), random.Uniform(0.4, 0.85));
        var systemic = random.Normal(0, 120);
        foreach (var line in BroadLine.All.Where(line => continuum.Grid.Reaches(line.Vacuum, 20000)))
        {
            var area = line.Width * overall * random.Scatter(0.35) * Nearby(continuum, line.Vacuum);
            var shift = systemic - (line.Ionisation * blueshift) + random.Normal(0, 150);
            var sigma = fullWidth * line.Breadth * random.Scatter(0.12) / 2.355;
            var centre = line.Vacuum * (1 + (shift / LogGrid.C));
            lines.Emit(centre, sigma, area * core);
            var wings = random.Chance(0.5) ? Profile.Gaussian : Profile.Lorentzian;
            lines.Emit(centre * (1 + (random.Normal(0, 400) / LogGrid.C)), (wings == Profile.Gaussian ? 2.3 : 0.9) * sigma, area * (1 - core), wings);
        }
        return lines;
    }

    // Lines just outside the grid still reach into it.
    private static double Nearby(Canvas canvas, double wavelength) =>
        canvas.At(wavelength) ?? canvas.Flux[wavelength < canvas.Grid.Wavelength[0] ? 0 : ^1];

    private static void BalmerContinuum(Canvas canvas, double strength)
    {
        var edge = canvas.At(3600) ?? 0;
        for (var i = 0; i < canvas.Flux.Length; i++)
        {
            var wavelength = canvas.Grid.Wavelength[i];
            if (wavelength is > 1500 and < 3900)
                canvas.Flux[i] += strength * edge * Math.Exp(-(3646 - wavelength) / 900) / (1 + Math.Exp((wavelength - 3680) / 40));
        }
    }

    private static void DrawNarrowLines(Canvas canvas, RandomSource random)
    {
        var gas = NebularGas.Active(random);
        gas.Oxygen3 = random.LogUniform(5, 14);
        gas.Reddening *= 0.5;
        var oxygen = random.Chance(0.15) ? 0.5 : 13 * random.Scatter(0.9);
        var level = canvas.At(5008) ?? canvas.At(3728) * 0.6 ?? canvas.At(8000) ?? 0;
        gas.Emit(canvas, oxygen * level / gas.Oxygen3, random);
    }

    private static void AddHost(Canvas canvas, RandomSource random)
    {
        var share = Math.Max(0, random.Normal(0.1, 0.25));
        if (share == 0)
            return;
        var level = canvas.At(5500) ?? canvas.At(4000) ?? canvas.Flux[^1];
        var host = random.Chance(0.5) ? Population.Old(canvas.Grid, random) : Population.WithYoung(canvas.Grid, 0.4, 14000, random);
        canvas.Add(host.Broaden(random.Uniform(120, 260)), share * level);
    }

    // Gas of galaxies in front: Mg II, Fe II and C IV doublets, their number after surveys of about one strong system in two sightlines.
    private static void DrawAbsorbers(Canvas canvas, double z, RandomSource random)
    {
        for (var system = (int)random.Exponential(0.8); system > 0; system--)
        {
            var frame = (1 + (z * Math.Pow(random.Uniform(), 0.5))) / (1 + z);
            var (strength, width) = (random.Exponential(0.8), random.Uniform(40, 120));
            foreach (var (vacuum, share) in ((double, double)[])[(2796.35, 1), (2803.53, 0.8), (2600.17, 0.6), (2382.76, 0.6), (2344.21, 0.4), (1548.2, 0.8), (1550.78, 0.55)])
                canvas.Absorb(vacuum * frame, width, strength * share * frame, 0.95);
        }
    }

    private static IEnumerable<(double Vacuum, double Share)> Outflow(bool low)
    {
        (double, double)[] high = [(1549.5, 1), (1398, 0.7), (1240.8, 0.9), (1215.67, 0.5), (1033.6, 0.8)];
        return low ? high.Concat([(2799.1, 0.7), (1858.5, 0.8), (2600, 0.2)]) : high;
    }
}
