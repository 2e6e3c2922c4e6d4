using Redshift.Physics.Statistics;
using Redshift.Simulation.Light;
using Redshift.Simulation.Sources.Galaxies;

namespace Redshift.Simulation.Sources.Others;

/// <summary>Ionised gas of our own Galaxy.</summary>
internal static class NebulaPainter
{
    public static Canvas Planetary(LogGrid grid, double z, RandomSource random)
    {
        var gas = new NebularGas
        {
            Oxygen3 = random.LogUniform(3, 18),
            Nitrogen2 = random.LogUniform(0.05, 2),
            Oxygen2 = random.LogUniform(0.1, 2),
            Sulphur2 = random.LogUniform(0.01, 0.2),
            Oxygen1 = random.LogUniform(0.003, 0.1),
            Helium2 = random.Chance(0.6) ? random.LogUniform(0.02, 1) : 0,
            Neon5 = random.Chance(0.2) ? random.LogUniform(0.05, 0.6) : 0,
            Doublet3726 = random.Uniform(0.5, 0.74),
            SigmaKmS = random.Uniform(8, 20),
            Reddening = random.Exponential(0.4),
        };
        return Draw(grid, gas, random);
    }

    public static Canvas HII(LogGrid grid, double z, RandomSource random)
    {
        var gas = new NebularGas
        {
            Oxygen3 = random.LogUniform(0.3, 5),
            Nitrogen2 = random.LogUniform(0.1, 0.5),
            Oxygen2 = random.LogUniform(0.8, 3),
            Sulphur2 = random.LogUniform(0.08, 0.4),
            Oxygen1 = random.LogUniform(0.005, 0.03),
            Doublet3726 = random.Uniform(0.4, 0.5),
            SigmaKmS = random.Uniform(8, 20),
            Reddening = random.Exponential(0.5),
        };
        return Draw(grid, gas, random);
    }

    // The continuum is that of the gas and of starlight scattered by dust: Hβ has hundreds of Å.
    private static Canvas Draw(LogGrid grid, NebularGas gas, RandomSource random)
    {
        var slope = random.Normal(-0.5, 0.8);
        var canvas = new Canvas(grid).Fill(wavelength => Math.Pow(wavelength / 5500, slope) * (wavelength < 3660 ? 1.8 : 1));
        gas.Emit(canvas, random.LogUniform(60, 1500), random);
        return canvas;
    }
}
