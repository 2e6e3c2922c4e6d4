using Redshift.Physics.Statistics;
using Redshift.Simulation.Light;
using Redshift.Simulation.Sources.Stars;

namespace Redshift.Simulation.Sources.Others;

/// <summary>Objects that no stellar, galaxy or quasar model explains.</summary>
internal static class OddityPainter
{
    /// <summary>Comet: molecular bands in emission over reflected sunlight.</summary>
    public static Canvas Comet(LogGrid grid, double z, RandomSource random)
    {
        var canvas = new Canvas(grid).Add(Photosphere.Draw(grid, new(5777, 4.44, 0, 2), random), random.LogUniform(0.05, 1));
        foreach (var band in OddStars.SwanBands())
            Molecules.Emit(canvas, band, band.Strength * random.Scatter(0.2));
        foreach (var (head, tail, height) in ((double, double, double)[])[(3883.4, 30, 2.5), (4215.9, 35, 0.4), (4052, 40, 0.7), (5700, 40, 0.15), (6020, 50, 0.15), (6335, 60, 0.15)])
            Molecules.Emit(canvas, new("CN", Air.ToVacuum(head), tail, 1, false), height * random.Scatter(0.3));
        return canvas;
    }

    /// <summary>Supernova of type Ia near maximum: P Cygni features 10 000 km/s wide.</summary>
    public static Canvas Supernova(LogGrid grid, double z, RandomSource random)
    {
        var temperature = random.Uniform(8000, 13000);
        var canvas = new Canvas(grid).Fill(Continuum.Law(new(Math.Max(12500, temperature), 4, 0, 0)));
        var (velocity, width) = (random.Uniform(8000, 13000), random.Uniform(2500, 4500));
        foreach (var (vacuum, depth) in ((double, double)[])[(3955, 0.6), (4132, 0.2), (4482, 0.45), (4925, 0.35), (5171, 0.3), (5500, 0.35), (5640, 0.3), (5973, 0.2), (6357, 0.5), (7776, 0.35), (8600, 0.5)])
        {
            var strength = depth * random.Scatter(0.25);
            canvas.Absorb(vacuum * (1 - (velocity / LogGrid.C)), width, strength * 2.5066 * width * vacuum / LogGrid.C, strength);
            canvas.Emit(vacuum, 1.3 * width, 0.5 * strength * 2.5066 * width * vacuum / LogGrid.C * (canvas.At(vacuum) ?? 0));
        }
        return canvas;
    }

    /// <summary>Blazar: a power law and nothing else.</summary>
    public static Canvas Blazar(LogGrid grid, double z, RandomSource random)
    {
        var slope = random.Normal(-1, 0.5);
        return new Canvas(grid).Fill(wavelength => Math.Pow(wavelength / 5500, slope));
    }
}
