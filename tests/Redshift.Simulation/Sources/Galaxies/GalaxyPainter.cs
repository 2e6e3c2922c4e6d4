using Redshift.Physics.Statistics;
using Redshift.Simulation.Light;
using Redshift.Simulation.Sources.Stars;

namespace Redshift.Simulation.Sources.Galaxies;

/// <summary>Draws random galaxies of the classes seen in their own optical light.</summary>
internal static class GalaxyPainter
{
    /// <summary>Old galaxy, a third of them with a little low-ionisation gas.</summary>
    public static Canvas Passive(LogGrid grid, double z, RandomSource random)
    {
        var canvas = Population.Old(grid, random).Broaden(random.LogUniform(110, 340));
        if (random.Chance(0.35))
        {
            var gas = NebularGas.Active(random);
            (gas.Oxygen3, gas.Helium2, gas.Neon5) = (random.LogUniform(0.8, 3), 0, 0);
            gas.Emit(canvas, random.LogUniform(0.15, 0.9), random);
        }
        return Dimmed(canvas, random.Exponential(0.05));
    }

    /// <summary>Star-forming disc: Hα some 5 to 100 Å.</summary>
    public static Canvas StarForming(LogGrid grid, double z, RandomSource random)
    {
        var alpha = Math.Clamp(28 * random.Scatter(0.8), 3, 300) * (1 + (0.5 * z));
        var youth = Math.Clamp(0.15 + (0.25 * Math.Log10(alpha)) + random.Normal(0, 0.1), 0.1, 0.9);
        return WithGas(Population.WithYoung(grid, youth, random.Uniform(11000, 25000), random), NebularGas.StarForming(random), alpha, random);
    }

    /// <summary>Starburst or H II galaxy: lines of hundreds of Å over blue light.</summary>
    public static Canvas Starburst(LogGrid grid, double z, RandomSource random)
    {
        var gas = NebularGas.StarForming(random);
        gas.Reddening *= 0.5;
        return WithGas(Population.WithYoung(grid, random.Uniform(0.75, 0.98), random.Uniform(22000, 38000), random), gas, random.LogUniform(100, 1200), random);
    }

    /// <summary>Burst ended within a billion years: strong Balmer absorption, no gas.</summary>
    public static Canvas PostStarburst(LogGrid grid, double z, RandomSource random)
    {
        var canvas = Population.Old(grid, random);
        var burst = Population.Mix(grid, random, (0.8, new(random.Uniform(8000, 10500), 4, 0, 80)), (0.2, new(6800, 4.1, 0, 40)));
        var share = random.Uniform(0.3, 0.85);
        var mix = new Canvas(grid).Add(canvas, 1 - share).Add(burst, share).Broaden(random.LogUniform(90, 260));
        return Dimmed(mix, random.Exponential(0.1));
    }

    /// <summary>Massive galaxy soon after it stopped forming stars, with hardly any gas.</summary>
    public static Canvas DistantQuiescent(LogGrid grid, double z, RandomSource random) =>
        random.Chance(0.6) ? PostStarburst(grid, z, random) : Passive(grid, z, random);

    /// <summary>Hidden nucleus: narrow high-ionisation lines on old or mixed stars.</summary>
    public static Canvas Active(LogGrid grid, double z, RandomSource random) =>
        WithGas(Population.WithYoung(grid, random.Uniform(0, 0.5), 14000, random), NebularGas.Active(random), random.LogUniform(8, 250), random);

    private static Canvas WithGas(Canvas stars, NebularGas gas, double alphaWidth, RandomSource random)
    {
        var canvas = Interstellar(stars.Broaden(random.LogUniform(60, 180)), random);
        Dimmed(canvas, 0.44 * gas.Reddening);
        // Old and young mixes have some 0.75 of their 5500 A flux at H alpha; H beta is then a known share of it.
        gas.Emit(canvas, alphaWidth * 0.75 / 2.86 / Math.Max(0.2, Dust.Transmission(Dust.Galactic(6565), 0.56 * gas.Reddening)), random);
        return canvas;
    }

    // Gas in front of the young stars, seen once the near ultraviolet moves into the optical.
    private static Canvas Interstellar(Canvas canvas, RandomSource random)
    {
        var (strength, shift, width) = (random.Uniform(0.4, 1.6), random.Normal(-120, 90), random.Uniform(90, 180));
        foreach (var (vacuum, angstroms) in UltravioletPainter.LowIons.Concat(UltravioletPainter.NearUltravioletIons).Where(line => canvas.Grid.Reaches(line.Vacuum)))
            canvas.Absorb(vacuum * (1 + (shift / LogGrid.C)), width, strength * angstroms * random.Scatter(0.25), 0.8);
        return canvas;
    }

    private static Canvas Dimmed(Canvas canvas, double excess) =>
        canvas.FilterSlowly(wavelength => Dust.Transmission(Dust.Steep(wavelength), excess));
}
