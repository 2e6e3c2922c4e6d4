using Redshift.Physics.Statistics;
using Redshift.Simulation.Light;
using Redshift.Simulation.Sources.Stars;

namespace Redshift.Simulation.Sources.Galaxies;

/// <summary>Light of mixed stellar populations.</summary>
internal static class Population
{
    /// <summary>An old, metal-rich mix of giants and dwarfs with a random share of younger turn-off stars.</summary>
    public static Canvas Old(LogGrid grid, RandomSource random)
    {
        var metals = random.Normal(0.05, 0.15);
        var turnOff = random.Uniform(5500, 6600);
        return Mix(
            grid, random,
            (0.42, new(random.Uniform(4300, 4750), 2.3, metals, 0)),
            (0.25, new(turnOff, 4.2, metals, 0)),
            (0.22, new(5100, 4.5, metals, 0)),
            (0.08, new(random.Uniform(3500, 3800), 1.2, metals, 0)),
            (0.03, new(3600, 4.7, metals, 0)));
    }

    /// <summary>Old light with a share of hot stars.</summary>
    /// <param name="grid">Rest-frame grid.</param>
    /// <param name="youth">Share of young stars in the light at 5500 Å.</param>
    /// <param name="hottest">Temperature of the hottest stars, K.</param>
    /// <param name="random">The dice.</param>
    public static Canvas WithYoung(LogGrid grid, double youth, double hottest, RandomSource random)
    {
        var metals = random.Normal(-0.15, 0.2);
        var old = Mix(grid, random, (0.5, new(4600, 2.4, metals, 0)), (0.4, new(6000, 4.2, metals, 0)), (0.1, new(3700, 1.5, metals, 0)));
        var young = Mix(
            grid, random,
            (random.Uniform(0.3, 0.7), new(hottest, 4, metals, 100)),
            (random.Uniform(0.2, 0.5), new(random.Uniform(8500, 11000), 4, metals, 100)),
            (0.2, new(7200, 4.1, metals, 60)));
        var result = new Canvas(grid);
        return result.Add(old, 1 - youth).Add(young, youth);
    }

    /// <summary>A weighted sum of stars.</summary>
    public static Canvas Mix(LogGrid grid, RandomSource random, params (double Weight, StarParameters Star)[] stars)
    {
        var sum = new Canvas(grid);
        foreach (var (weight, star) in stars)
            sum.Add(Photosphere.Draw(grid, star, random), weight);
        return sum;
    }
}
