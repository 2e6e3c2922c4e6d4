using Redshift.Physics.Statistics;
using Redshift.Simulation.Light;

namespace Redshift.Simulation.Sources.Stars;

/// <summary>Draws random stars of each class.</summary>
internal static class StarPainter
{
    public static Canvas Hot(LogGrid grid, double z, RandomSource random) =>
        Reddened(grid, new(random.LogUniform(11000, 42000), random.Uniform(3.2, 4.4), random.Normal(0, 0.2), random.Exponential(120)), 0.15, random);

    public static Canvas A(LogGrid grid, double z, RandomSource random) =>
        Reddened(grid, new(random.Uniform(7400, 11000), random.Uniform(3.5, 4.4), random.Normal(0, 0.25), random.Exponential(90)), 0.08, random);

    public static Canvas FG(LogGrid grid, double z, RandomSource random) =>
        Reddened(grid, new(random.Uniform(5250, 7400), random.Uniform(3.7, 4.6), random.Normal(-0.2, 0.3), random.Exponential(8)), 0.06, random);

    public static Canvas K(LogGrid grid, double z, RandomSource random) =>
        Reddened(grid, new(random.Uniform(3950, 5250), random.Uniform(4.3, 4.7), random.Normal(-0.1, 0.25), random.Exponential(3)), 0.05, random);

    public static Canvas M(LogGrid grid, double z, RandomSource random) =>
        Reddened(grid, new(random.Uniform(2750, 3950), random.Uniform(4.6, 5.1), random.Normal(-0.1, 0.2), random.Exponential(5)), 0.02, random);

    public static Canvas Giant(LogGrid grid, double z, RandomSource random)
    {
        var temperature = random.Uniform(3300, 5200);
        return Reddened(grid, new(temperature, 1 + (2 * (temperature - 3300) / 1900), random.Normal(-0.3, 0.35), random.Exponential(3)), 0.1, random);
    }

    public static Canvas MetalPoor(LogGrid grid, double z, RandomSource random) =>
        Reddened(grid, new(random.Uniform(4500, 6600), random.Uniform(1.5, 4.5), random.Uniform(-3, -1), 3), 0.05, random);

    private static Canvas Reddened(LogGrid grid, StarParameters star, double excess, RandomSource random)
    {
        var reddening = random.Exponential(excess);
        return Photosphere.Draw(grid, star, random).FilterSlowly(wavelength => Dust.Transmission(Dust.Galactic(wavelength), reddening));
    }
}
