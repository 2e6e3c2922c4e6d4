using Redshift.Simulation.Light;

namespace Redshift.Simulation.Instruments;

/// <summary>How the pixels of an arm follow each other.</summary>
internal enum Sampling
{
    /// <summary>Constant step in ln λ.</summary>
    Logarithmic,

    /// <summary>Constant step in λ.</summary>
    Linear,
}

/// <summary>One arm of a spectrograph: range, pixels, resolution.</summary>
/// <param name="Label">Its name.</param>
/// <param name="From">First wavelength, Å.</param>
/// <param name="To">Last wavelength, Å.</param>
/// <param name="Sampling">How pixels follow each other.</param>
/// <param name="PixelA">Pixel size in Å at the middle of the range.</param>
/// <param name="FwhmA">Instrumental width in Å at the middle of the range.</param>
/// <param name="ConstantR">Whether the width grows with λ (constant R) or stays (constant Å).</param>
internal sealed record Arm(string Label, double From, double To, Sampling Sampling, double PixelA, double FwhmA, bool ConstantR)
{
    private double Middle => 0.5 * (From + To);

    /// <summary>Instrumental width at a wavelength, km/s.</summary>
    public double FwhmKmS(double wavelength) => LogGrid.C * FwhmA / (ConstantR ? Middle : wavelength);

    /// <summary>The narrowest instrumental width, km/s.</summary>
    public double NarrowestKmS => FwhmKmS(To);

    /// <summary>Wavelengths of the pixel centres.</summary>
    public double[] Pixels()
    {
        var step = Sampling == Sampling.Linear ? PixelA : PixelA / Middle;
        var span = Sampling == Sampling.Linear ? To - From : Math.Log(To / From);
        var pixels = new double[(int)(span / step) + 1];
        for (var i = 0; i < pixels.Length; i++)
            pixels[i] = Sampling == Sampling.Linear ? From + (i * step) : From * Math.Exp(i * step);
        return pixels;
    }
}
