using Redshift.Physics.Statistics;
using Redshift.Simulation.Light;

namespace Redshift.Simulation.Instruments;

/// <summary>What a set-up records of light that arrives at the Earth.</summary>
internal sealed class Exposure
{
    private readonly Setup _setup;
    private readonly RandomSource _random;
    private readonly LogGrid _grid;
    private readonly LineSpread _spread;
    private readonly NightSky _sky;
    private readonly Canvas _transmission;

    public Exposure(Setup setup, RandomSource random)
    {
        (_setup, _random) = (setup, random);
        _grid = LogGrid.Cover(setup.Arms[0].From * 0.99, setup.Arms[^1].To * 1.01, setup.Arms.Min(arm => arm.NarrowestKmS) / 5);
        _spread = new(_grid, setup.Wings);
        _sky = setup.OnGround ? NightSky.Draw(_grid, setup.Town, random) : NightSky.None(_grid);
        _transmission = Atmosphere.Transmission(_grid, setup.OnGround ? setup.Water : 0, setup.OnGround ? random.Uniform(1, 1.8) : 0);
    }

    /// <summary>The wavelengths on which light has to be drawn.</summary>
    public LogGrid Grid => _grid;

    /// <summary>Records the light, or nothing but sky, so that the median signal to noise a pixel becomes <paramref name="snr"/>.</summary>
    public IReadOnlyList<SimulatedSpectrum> Record(Canvas? light, double snr)
    {
        var frames = _setup.Arms.Select(arm => Expose(arm, light)).ToArray();
        Scale(frames, snr);
        return [.. frames.Select(Reduce)];
    }

    private Frame Expose(Arm arm, Canvas? light)
    {
        var pixels = FilePixels(arm);
        var nothing = new double[_grid.Count];
        var lights = _spread.Sample(
            [light?.Flux ?? nothing, _sky.Light.Flux, _sky.Remains.Flux, _transmission.Flux], Miscalibrate(pixels), arm);
        return new(arm, pixels) { Light = lights[0], Sky = lights[1], Remains = lights[2], Transmission = lights[3] };
    }

    private double[] FilePixels(Arm arm)
    {
        var pixels = arm.Pixels();
        return _setup.Air ? [.. pixels.Select(Air.ToVacuum)] : pixels;
    }

    // The light that falls on a pixel is not quite of the wavelength which the reduction writes beside it.
    private double[] Miscalibrate(double[] pixels)
    {
        var (shift, bend, curve) = (_random.Normal(0, _setup.ZeroPointKmS), _random.Normal(0, _setup.BendKmS), _random.Normal(0, _setup.BendKmS));
        var result = new double[pixels.Length];
        for (var i = 0; i < pixels.Length; i++)
        {
            var x = (2.0 * i / pixels.Length) - 1;
            result[i] = pixels[i] * (1 + ((shift + (bend * x) + (curve * ((1.5 * x * x) - 0.5))) / LogGrid.C));
        }
        return result;
    }

    private void Scale(Frame[] frames, double snr)
    {
        double[] all = [.. frames.SelectMany(frame => frame.Light)];
        var (median, brightest) = (Median(all), all.Max());
        foreach (var frame in frames)
            frame.Normalise(median > 0 ? median : brightest > 0 ? all.Average() : 1, _setup);
        var signals = frames.SelectMany(frame => frame.Light.Zip(frame.Sigma, (light, sigma) => (brightest > 0 ? light : 1) / sigma));
        var factor = Median([.. signals]) / snr;
        foreach (var frame in frames)
            frame.ScaleNoise(factor);
        ScaleRemains(frames);
    }

    private void ScaleRemains(Frame[] frames)
    {
        double[] ratios = [.. frames.SelectMany(frame => frame.Remains.Zip(frame.Sigma, (left, sigma) => Math.Abs(left) / sigma)).Order()];
        if (ratios[ratios.Length * 199 / 200] is > 0 and var worst)
            Array.ForEach(frames, frame => frame.ScaleRemains(_setup.SkyRemains / worst));
    }

    private SimulatedSpectrum Reduce(Frame frame)
    {
        var noise = new NoiseMaker(_setup, _random);
        var calibration = new FluxCalibration(_setup, frame, _random);
        var flux = new double[frame.Count];
        var inverseVariance = new double[frame.Count];
        var (deviates, variance) = noise.Deviates(frame.Sigma);
        for (var i = 0; i < flux.Length; i++)
        {
            var factor = calibration.Factor[i];
            flux[i] = factor * (frame.Received(i, _setup) + deviates[i]);
            inverseVariance[i] = 1 / (variance[i] * factor * factor * _setup.ErrorScale * _setup.ErrorScale);
        }
        noise.Damage(flux, inverseVariance, frame, calibration.Factor);
        return new(frame.Arm.Label, frame.Pixels, flux, _setup.HasErrors ? inverseVariance : null, StatedWidth(frame), _setup.Air);
    }

    // A reduction knows its resolution to a few per cent.
    private float[]? StatedWidth(Frame frame)
    {
        if (!_setup.StatesResolution)
            return null;
        var error = _random.Scatter(0.04);
        return [.. frame.Pixels.Select(pixel => (float)(error * frame.Arm.FwhmKmS(pixel)))];
    }

    internal static double Median(double[] values)
    {
        var sorted = values.ToArray();
        Array.Sort(sorted);
        return sorted.Length == 0 ? 0 : sorted[sorted.Length / 2];
    }
}
