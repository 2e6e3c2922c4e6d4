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

    /// <summary>Clouds at so many drops of the flux are tried, with these optical depths.</summary>
    private const int MostDrops = 2;

    private static readonly double[] Depths = [1, 20];

    private readonly FitPixels _pixels;
    private readonly IReadOnlyList<double> _drops;
    private readonly float[] _alpha;
    private readonly float[] _beta;

    public ForestPixels(FitPixels pixels)
    {
        _pixels = pixels;
        _drops = FluxDrops.Find(pixels);
        _alpha = new float[pixels.LnWavelength.Length];
        _beta = new float[_alpha.Length];
        for (var p = 0; p < pixels.Count; p++)
        {
            _alpha[p] = (float)Forest.AlphaTransmission(pixels.LnWavelength[p]);
            _beta[p] = (float)(_alpha[p] * Forest.BetaTransmission(pixels.LnWavelength[p]));
        }
    }

    /// <summary>
    /// Where the light of a quasar may end: nowhere, at its own limit, or at the plainest drops of the flux below that, opaque or half opaque.
    /// </summary>
    /// <param name="lnShift">ln(1+z) of the quasar.</param>
    public IEnumerable<LymanLimit> Limits(double lnShift)
    {
        var own = LymanLimit.Own(lnShift);
        yield return own;
        if (own.LnEdge < _pixels.LnWavelength[_pixels.Starts[0]] + FluxDrops.Window) yield break;
        if (own.Depth > 0) yield return LymanLimit.None;
        foreach (var drop in _drops.Where(d => d < own.LnEdge).Take(MostDrops))
            foreach (var depth in Depths) yield return new(drop, depth);
    }

    /// <summary>Transmission at each pixel as the instrument sees it.</summary>
    /// <param name="lnShift">ln(1+z) of the object.</param>
    /// <param name="limit">Where light ends.</param>
    /// <param name="into">Value of each pixel, 1 redward of Lyman alpha.</param>
    public void Transmit(double lnShift, LymanLimit limit, float[] into)
    {
        var edge = Forest.LnLymanAlpha + lnShift;
        for (var s = 0; s + 1 < _pixels.Starts.Length; s++)
        {
            var (beta, alpha) = Edges(s, lnShift);
            Sharp(s, limit, beta, alpha, into);
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
    /// <param name="limit">Where light ends.</param>
    /// <param name="weight">Weight of each pixel, changed in place.</param>
    /// <param name="sharp">Room for the transmission without the instrument.</param>
    public double Scatter(double lnShift, LymanLimit limit, float[] weight, float[] sharp)
    {
        double change = 0;
        for (var s = 0; s + 1 < _pixels.Starts.Length; s++)
        {
            var (beta, alpha) = Edges(s, lnShift);
            if (alpha == _pixels.Starts[s]) continue;
            Sharp(s, limit, beta, alpha, sharp);
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

    /// <summary>First pixels of a spectrum above Lyman beta and Lyman alpha.</summary>
    private (int Beta, int Alpha) Edges(int spectrum, double lnShift) => (
        _pixels.Find(spectrum, lnShift + Forest.LnLymanBeta),
        _pixels.Find(spectrum, lnShift + Forest.LnLymanAlpha));

    private void Sharp(int spectrum, LymanLimit limit, int beta, int alpha, float[] into)
    {
        var start = _pixels.Starts[spectrum];
        var edge = Math.Min(beta, _pixels.Find(spectrum, limit.LnEdge));
        for (var p = start; p < edge; p++) into[p] = _beta[p] * (float)limit.Transmission(_pixels.LnWavelength[p]);
        _beta.AsSpan(edge, beta - edge).CopyTo(into.AsSpan(edge));
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
