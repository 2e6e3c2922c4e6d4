using Redshift.Physics.Statistics;
using Redshift.Simulation.Atoms;
using Redshift.Simulation.Light;

namespace Redshift.Simulation.Sources.Stars;

/// <summary>Molecular absorption of cool stars.</summary>
internal static class Molecules
{
    private static readonly Curve TitaniumOxide = new((2600, 0.9), (2850, 0.75), (3200, 0.56), (3350, 0.42), (3550, 0.26), (3850, 0.11), (4100, 0.03), (4300, 0));
    private static readonly Curve VanadiumOxide = new((2600, 1), (2900, 0.5), (3200, 0.1), (3400, 0));
    private static readonly Curve Cyanogen = new((3800, 0.55), (4300, 0.6), (5000, 0.45), (5777, 0.26), (6300, 0.08), (6800, 0));
    private static readonly Curve Methylidyne = new((3500, 0.15), (4300, 0.2), (5000, 0.3), (5777, 0.3), (6300, 0.2), (6800, 0.08), (7200, 0));
    private static readonly Curve Hydrides = new((2800, 0.5), (3300, 0.5), (3800, 0.45), (4500, 0.25), (5200, 0.06), (5777, 0.02), (6200, 0));

    /// <summary>Draws all bands.</summary>
    public static void Absorb(Canvas canvas, StarParameters star, RandomSource random)
    {
        var metals = Math.Pow(10, 0.5 * star.Metallicity);
        foreach (var group in Band.All.GroupBy(band => band.Molecule))
        {
            var strength = metals * random.Scatter(0.15) * Strength(group.Key, star);
            foreach (var band in group.Where(_ => strength > 0.01))
                Absorb(canvas, band, strength * band.Strength * random.Scatter(0.1));
        }
    }

    /// <summary>Draws one band of the given optical depth at its head.</summary>
    public static void Absorb(Canvas canvas, Band band, double depth) =>
        OverBand(canvas, band, (flux, shape) => flux * Math.Exp(-depth * shape));

    /// <summary>Adds one band in emission.</summary>
    public static void Emit(Canvas canvas, Band band, double height) =>
        OverBand(canvas, band, (flux, shape) => flux + (height * shape));

    private static void OverBand(Canvas canvas, Band band, Func<double, double, double> change)
    {
        var (near, far) = band.Redwards ? (band.Head, band.Head + (3 * band.Tail)) : (band.Head - (3 * band.Tail), band.Head);
        var from = Math.Clamp((int)canvas.Grid.Position(near), 0, canvas.Flux.Length);
        var to = Math.Clamp((int)canvas.Grid.Position(far) + 1, from, canvas.Flux.Length);
        for (var i = from; i < to; i++)
            canvas.Flux[i] = change(canvas.Flux[i], band.Shape(canvas.Grid.Wavelength[i]));
    }

    private static double Strength(string molecule, StarParameters star) => molecule switch
    {
        "TiO" => TitaniumOxide.At(star.Temperature) * (1 + (0.8 * star.Giantness)),
        "VO" => VanadiumOxide.At(star.Temperature),
        "CN" => Cyanogen.At(star.Temperature) * (0.7 + (0.9 * star.Giantness)),
        "CH" => Methylidyne.At(star.Temperature),
        _ => Hydrides.At(star.Temperature) * Math.Max(0.1, 1 - (0.8 * star.Giantness)),
    };
}
