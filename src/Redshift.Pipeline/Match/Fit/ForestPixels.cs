using System.Runtime.Intrinsics;
using Redshift.Pipeline.Match.Models;
using Redshift.Pipeline.Numerics;

namespace Redshift.Pipeline.Match.Fit;

/// <summary>
/// What the intergalactic medium does to the pixels. The optical depth at a pixel belongs to the gas whose Lyman line falls there,
/// whatever the object behind it: it is computed once, and a trial redshift only says where each part begins.
/// </summary>
internal sealed class ForestPixels
{
    /// <summary>So far redward of Lyman alpha, in ln λ, the line itself (and N V) leaves no clear continuum.</summary>
    private const double Beside = 0.025;

    private readonly FitPixels _pixels;
    private readonly float[] _alpha;
    private readonly float[] _beta;

    public ForestPixels(FitPixels pixels)
    {
        _pixels = pixels;
        _alpha = new float[pixels.LnWavelength.Length];
        _beta = new float[_alpha.Length];
        for (var p = 0; p < pixels.Count; p++)
        {
            _alpha[p] = (float)Forest.AlphaTransmission(pixels.LnWavelength[p]);
            _beta[p] = (float)(_alpha[p] * Forest.BetaTransmission(pixels.LnWavelength[p]));
        }
    }

    /// <summary>Transmission at each pixel as the instrument sees it.</summary>
    /// <param name="lnShift">ln(1+z) of the object.</param>
    /// <param name="into">Value of each pixel, 1 redward of Lyman alpha.</param>
    public void Transmit(double lnShift, float[] into)
    {
        var edge = Forest.LnLymanAlpha + lnShift;
        for (var s = 0; s + 1 < _pixels.Starts.Length; s++)
        {
            var (limit, beta, alpha) = Edges(s, lnShift);
            Sharp(s, limit, beta, alpha, lnShift, into);
            into.AsSpan(alpha, _pixels.Starts[s + 1] - alpha).Fill(1);
            for (var p = alpha; p < _pixels.Starts[s + 1] && Near(p, edge); p++) into[p] = Rounded(p, lnShift);
            for (var p = alpha - 1; p >= _pixels.Starts[s] && Near(p, edge); p--) into[p] = Rounded(p, lnShift);
        }
    }

    /// <summary>
    /// Lowers the weights in the forest by its own scatter; returns what that changes in the ln likelihood of the data,
    /// so that models with different variances stay comparable.
    /// </summary>
    /// <param name="lnShift">ln(1+z) of the object.</param>
    /// <param name="weight">Weight of each pixel, changed in place.</param>
    /// <param name="sharp">Room for the transmission without the instrument.</param>
    public double Scatter(double lnShift, float[] weight, float[] sharp)
    {
        double change = 0;
        for (var s = 0; s + 1 < _pixels.Starts.Length; s++)
        {
            var (limit, beta, alpha) = Edges(s, lnShift);
            if (alpha == _pixels.Starts[s]) continue;
            Sharp(s, limit, beta, alpha, lnShift, sharp);
            var level = LevelRedward(s, Forest.LnLymanAlpha + lnShift);
            change += Scatter(_pixels.Starts[s], alpha, (float)(level * level), weight, sharp);
        }

        return change;
    }

    private double Scatter(int start, int end, float levelSquared, float[] weight, float[] sharp)
    {
        const float Share = (float)(Forest.ScatterShare * Forest.ScatterShare);
        Vector256<float> squares = default;
        Vector256<double> product = Vector256<double>.One;
        double logs = 0;
        for (int p = start, n = 1; p < end; p += Kernels.Lanes, n++)
        {
            Vector256<float> w = Vector256.Create(weight, p), t = Vector256.Create(sharp, p), f = Vector256.Create(_pixels.Flux, p);
            var variance = Kernels.Mask(end - p) & (levelSquared * Share * (t * (Vector256<float>.One - t)));
            var factor = Vector256<float>.One + w * variance;
            var lowered = w / factor;
            squares += (w - lowered) * f * f;
            lowered.CopyTo(weight, p);
            var (low, high) = Vector256.Widen(factor);
            product *= low * high;
            // Sixteen factors of at most 1e13 are far from overflowing.
            if (n % 8 != 0 && p + Kernels.Lanes < end) continue;
            logs += Math.Log(product[0]) + Math.Log(product[1]) + Math.Log(product[2]) + Math.Log(product[3]);
            product = Vector256<double>.One;
        }

        return 0.5 * Vector256.Sum(squares) - 0.5 * logs;
    }

    /// <summary>First pixels of a spectrum above the Lyman limit, Lyman beta and Lyman alpha.</summary>
    private (int Limit, int Beta, int Alpha) Edges(int spectrum, double lnShift) => (
        _pixels.Find(spectrum, lnShift + Forest.LnLymanLimit),
        _pixels.Find(spectrum, lnShift + Forest.LnLymanBeta),
        _pixels.Find(spectrum, lnShift + Forest.LnLymanAlpha));

    private void Sharp(int spectrum, int limit, int beta, int alpha, double lnShift, float[] into)
    {
        var beyondLimit = (float)Forest.LimitTransmission(lnShift);
        for (var p = _pixels.Starts[spectrum]; p < limit; p++) into[p] = _beta[p] * beyondLimit;
        _beta.AsSpan(limit, beta - limit).CopyTo(into.AsSpan(limit));
        _alpha.AsSpan(beta, alpha - beta).CopyTo(into.AsSpan(beta));
    }

    private bool Near(int p, double edge) => Math.Abs(_pixels.LnWavelength[p] - edge) <= 3 * _pixels.SigmaLn[p];

    private float Rounded(int p, double lnShift) => (float)Forest.Transmission(_pixels.LnWavelength[p], lnShift, _pixels.SigmaLn[p]);

    /// <summary>The light that a line at or below Lyman alpha is judged against, that redward of it; null for lines beyond.</summary>
    /// <param name="spectrum">Number of the spectrum.</param>
    /// <param name="lnRest">ln of the line's rest wavelength in Å.</param>
    /// <param name="lnShift">ln(1+z) of the object.</param>
    public double? LevelBeside(int spectrum, double lnRest, double lnShift) =>
        lnRest < Forest.LnLymanAlpha + Beside ? LevelRedward(spectrum, Forest.LnLymanAlpha + lnShift) : null;

    /// <summary>The continuum just redward of Lyman alpha: what the forest is seen against.</summary>
    private double LevelRedward(int spectrum, double edge)
    {
        double sum = 0;
        var count = 0;
        for (var p = _pixels.Find(spectrum, edge + Beside); p < _pixels.Starts[^1] && _pixels.LnWavelength[p] < edge + 0.09; p++)
        {
            if (_pixels.LnWavelength[p] < edge + Beside) continue;
            sum += _pixels.Continuum[p];
            count++;
        }

        return count > 0 ? sum / count : _pixels.Continuum[_pixels.Starts[spectrum + 1] - 1];
    }
}
