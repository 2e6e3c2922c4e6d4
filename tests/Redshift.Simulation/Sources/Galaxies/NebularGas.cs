using Redshift.Physics.Statistics;
using Redshift.Simulation.Light;

namespace Redshift.Simulation.Sources.Galaxies;

/// <summary>Emission lines of ionised gas; intensities are relative to Hβ = 1 before dust.</summary>
internal sealed class NebularGas
{
    private static readonly (double Vacuum, double Ratio)[] Hydrogen =
    [
        (6564.608, 2.86), (4862.683, 1), (4341.684, 0.468), (4102.892, 0.259), (3971.195, 0.159), (3890.151, 0.105), (3836.472, 0.073), (3798.976, 0.053),
        (3771.701, 0.04), (3751.218, 0.0305), (18756.13, 0.339), (12821.59, 0.163), (10941.09, 0.0905), (10052.13, 0.0555), (9548.59, 0.0366), (9231.55, 0.0254),
        (21661.2, 0.0279),
    ];

    /// <summary>[O III] 5007 over Hβ.</summary>
    public double Oxygen3 { get; set; }

    /// <summary>[N II] 6583 over Hα.</summary>
    public double Nitrogen2 { get; set; }

    /// <summary>[O II] 3726+3729 over Hβ.</summary>
    public double Oxygen2 { get; set; }

    /// <summary>[S II] 6716+6731 over Hα.</summary>
    public double Sulphur2 { get; set; }

    /// <summary>[O I] 6300 over Hα.</summary>
    public double Oxygen1 { get; set; }

    /// <summary>He II 4686 over Hβ.</summary>
    public double Helium2 { get; set; }

    /// <summary>[Ne V] 3426 over Hβ.</summary>
    public double Neon5 { get; set; }

    /// <summary>Share of 3726 in the doublet: 0.4 at low density, 0.74 at high density.</summary>
    public double Doublet3726 { get; set; } = 0.42;

    /// <summary>Velocity dispersion, km/s.</summary>
    public double SigmaKmS { get; set; } = 60;

    /// <summary>Colour excess of the gas, magnitudes.</summary>
    public double Reddening { get; set; }

    /// <summary>Gas of star-forming galaxies: metal-poor gas is hot and highly ionised.</summary>
    public static NebularGas StarForming(RandomSource random)
    {
        var metals = Math.Clamp(random.Normal(0.55, 0.3), 0, 1.1);
        return new()
        {
            Oxygen3 = Math.Pow(10, 0.8 - (1.3 * metals * metals) + random.Normal(0, 0.12)),
            Nitrogen2 = Math.Pow(10, -1.6 + (1.2 * metals) + random.Normal(0, 0.12)),
            Oxygen2 = Math.Pow(10, 0.4 - (0.25 * metals) + random.Normal(0, 0.12)),
            Sulphur2 = Math.Pow(10, -0.75 + (0.2 * metals) + random.Normal(0, 0.1)),
            Oxygen1 = Math.Pow(10, -1.6 + random.Normal(0, 0.15)),
            SigmaKmS = random.LogUniform(35, 150),
            Doublet3726 = random.Uniform(0.4, 0.5),
            Reddening = random.Exponential(0.2),
        };
    }

    /// <summary>Gas lit by an active nucleus.</summary>
    public static NebularGas Active(RandomSource random) => new()
    {
        Oxygen3 = random.LogUniform(2, 14),
        Nitrogen2 = random.LogUniform(0.4, 1.8),
        Oxygen2 = random.LogUniform(1.5, 5),
        Sulphur2 = random.LogUniform(0.4, 1),
        Oxygen1 = random.LogUniform(0.06, 0.4),
        Helium2 = random.LogUniform(0.05, 0.4),
        Neon5 = random.Chance(0.5) ? random.LogUniform(0.1, 0.8) : 0,
        SigmaKmS = random.LogUniform(110, 320),
        Doublet3726 = random.Uniform(0.42, 0.62),
        Reddening = random.Exponential(0.25),
    };

    /// <summary>Adds the lines; <paramref name="betaArea"/> is the area of Hβ before dust in flux × Å.</summary>
    public void Emit(Canvas canvas, double betaArea, RandomSource random)
    {
        var (wing, wingShift) = (random.Chance(0.3) ? random.Uniform(0.1, 0.35) : 0, random.Normal(-60, 80));
        foreach (var (vacuum, ratio) in Hydrogen.Concat(Forbidden()).Concat(Weak()))
        {
            var area = betaArea * ratio * random.Scatter(0.04) * Dust.Transmission(Dust.Galactic(vacuum), Reddening);
            canvas.Emit(vacuum, SigmaKmS, area * (1 - wing));
            if (wing > 0)
                canvas.Emit(vacuum * (1 + (wingShift / LogGrid.C)), 2.5 * SigmaKmS, area * wing);
        }
    }

    private IEnumerable<(double Vacuum, double Ratio)> Forbidden()
    {
        yield return (5008.24, Oxygen3);
        yield return (4960.295, Oxygen3 / 2.98);
        yield return (4364.436, 0.012 * Oxygen3);
        yield return (3727.092, Oxygen2 * Doublet3726);
        yield return (3729.875, Oxygen2 * (1 - Doublet3726));
        yield return (3869.86, 0.1 * Oxygen3);
        yield return (3968.59, 0.03 * Oxygen3);
        yield return (6585.27, 2.86 * Nitrogen2);
        yield return (6549.86, 2.86 * Nitrogen2 / 3.05);
        yield return (5756.186, 0.03 * Nitrogen2);
        yield return (6718.294, 2.86 * Sulphur2 * (1 - (0.7 * (Doublet3726 - 0.42)) - 0.42));
        yield return (6732.674, 2.86 * Sulphur2 * (0.42 + (0.7 * (Doublet3726 - 0.42))));
        yield return (6302.046, 2.86 * Oxygen1);
        yield return (6365.536, 2.86 * Oxygen1 / 3.05);
    }

    private IEnumerable<(double Vacuum, double Ratio)> Weak()
    {
        yield return (5877.243, 0.12);
        yield return (6679.996, 0.034);
        yield return (7067.125, 0.022);
        yield return (4472.734, 0.042);
        yield return (3889.75, 0.09);
        yield return (10833.3, 0.25);
        yield return (7137.77, 0.03 + (0.025 * Oxygen3));
        yield return (7753.24, 0.25 * (0.03 + (0.025 * Oxygen3)));
        yield return (9071.1, 0.15 + (0.05 * Oxygen3));
        yield return (9533.2, 2.45 * (0.15 + (0.05 * Oxygen3)));
        yield return (7322, 0.012 * Oxygen2);
        yield return (7332.7, 0.01 * Oxygen2);
        yield return (4687.017, Helium2);
        yield return (3426.852, Neon5);
        yield return (3346.792, Neon5 / 2.73);
        yield return (12570.2, 0.03 + Oxygen1);
        yield return (16440, 0.02 + (0.8 * Oxygen1));
    }
}
