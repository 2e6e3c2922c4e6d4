using Redshift.Physics.Statistics;
using Redshift.Simulation.Light;

namespace Redshift.Simulation.Instruments;

/// <summary>The factor between true and written flux: unit, slow waves, the response of an uncalibrated instrument, normalisation.</summary>
internal sealed class FluxCalibration
{
    public FluxCalibration(Setup setup, Frame frame, RandomSource random)
    {
        Factor = new double[frame.Count];
        var unit = setup.FluxUnit * random.Scatter(setup.Waves);
        var waves = Enumerable.Range(0, 4).Select(_ => (Turns: random.LogUniform(0.4, 7), Phase: random.Uniform(0, 6.2831853))).ToArray();
        var (peak, width) = (random.Uniform(0.3, 0.6), random.Uniform(0.25, 0.5));
        for (var i = 0; i < Factor.Length; i++)
        {
            var x = (double)i / Factor.Length;
            var wave = waves.Sum(w => setup.Waves / (0.5 + (0.5 * w.Turns)) * Math.Sin((6.2831853 * w.Turns * x) + w.Phase));
            Factor[i] = unit * (1 + wave) * (setup.Uncalibrated ? Response(x, peak, width) : 1);
        }
        if (setup.Normalised)
            DivideByContinuum(frame.Light, unit);
    }

    /// <summary>The factor of each pixel.</summary>
    public double[] Factor { get; }

    private static double Response(double x, double peak, double width) =>
        0.04 + Math.Exp(-(x - peak) * (x - peak) / (2 * width * width));

    private void DivideByContinuum(double[] light, double unit)
    {
        var continuum = light.Select(value => Math.Max(value, 1e-3)).ToArray();
        Smoothing.Gaussian(continuum, continuum.Length / 14.0);
        for (var i = 0; i < Factor.Length; i++)
            Factor[i] *= 1 / continuum[i] / unit;
    }
}
