namespace Redshift.Simulation.Instruments;

/// <summary>One arm's noiseless counts while an exposure is being reduced; flux in units of the median object.</summary>
internal sealed class Frame(Arm arm, double[] pixels)
{
    public Arm Arm { get; } = arm;

    public double[] Pixels { get; } = pixels;

    public required double[] Light { get; init; }

    public required double[] Sky { get; init; }

    public required double[] Remains { get; init; }

    public required double[] Transmission { get; init; }

    public double[] Sigma { get; } = new double[pixels.Length];

    public int Count => Pixels.Length;

    /// <summary>Puts the light into units of the median object and sets the relative noise: photons of object and sky, read noise.</summary>
    public void Normalise(double unit, Setup setup)
    {
        for (var i = 0; i < Count; i++)
        {
            Light[i] /= unit;
            var transmission = Math.Max(0.02, Transmission[i]);
            var efficiency = Efficiency((double)i / Count);
            var counts = efficiency * ((Math.Max(0, Light[i]) * transmission) + (setup.Sky * Sky[i]));
            Sigma[i] = Math.Sqrt(counts + setup.ReadNoise) / efficiency / (setup.TelluricCorrected ? transmission : 1);
        }
    }

    public void ScaleNoise(double factor)
    {
        for (var i = 0; i < Count; i++)
            Sigma[i] *= factor;
    }

    public void ScaleRemains(double factor)
    {
        for (var i = 0; i < Count; i++)
            Remains[i] *= factor;
    }

    /// <summary>Light and sky remains as they stand in the reduced spectrum, before noise.</summary>
    public double Received(int i, Setup setup)
    {
        var transmission = Math.Max(0.02, Transmission[i]);
        // Division by a telluric standard of another airmass leaves a small power of the transmission.
        var light = Light[i] * (setup.TelluricCorrected ? Math.Pow(transmission, 0.06) : transmission);
        return light + Remains[i];
    }

    // Gratings and detectors lose light towards the ends of an arm, more in the blue.
    private static double Efficiency(double x) => 0.05 + (0.95 * Math.Pow(4 * x * (1 - x), 0.6) * (1 - (0.6 * Math.Exp(-x / 0.06))));
}
