using Redshift.Pipeline.Match.Models;
using Redshift.Pipeline.Normalize;
using Redshift.Pipeline.Numerics;

namespace Redshift.Pipeline.Match.Fit;

/// <summary>
/// How wrong models are, as a share of the continuum, along an observation: a stated least value, or what the best model leaves over
/// and noise cannot explain. Stretches where no model is good (ultraviolet, telluric bands, bad calibration) thus count for less,
/// for all kinds alike.
/// </summary>
internal sealed class ModelError
{
    /// <summary>Computed spectra differ from real ones by at least this share, in cells of the search grid.</summary>
    public const double Least = 0.03;

    /// <summary>Emission lines are no Gaussians: their model is wrong by this share of what stands above the continuum.</summary>
    private const double LineShare = 0.08;

    private const double Most = 0.5;
    private const double Block = 0.1;

    /// <summary>The atmosphere may leave so many times what is left after an ordinary correction: nothing was corrected.</summary>
    private const double MostTelluric = 5;

    private readonly double _start;
    private readonly double[] _shares;
    private readonly double _telluric;

    private ModelError(double start, double[] shares, double telluric) => (_start, _shares, _telluric) = (start, shares, telluric);

    /// <summary>The stated least value everywhere.</summary>
    public static ModelError Uniform { get; } = new(0, [Least], 1);

    /// <summary>The greatest share anywhere, the atmosphere aside.</summary>
    public double Greatest => _shares.Max();

    /// <summary>Share of the continuum at a wavelength.</summary>
    public double Share(double lnWavelength)
    {
        var telluric = _telluric * TelluricError.Share(lnWavelength);
        var own = Own(lnWavelength);
        return telluric > 0 ? Math.Sqrt(own * own + telluric * telluric) : own;
    }

    /// <summary>Variance of a pixel for what models are wrong by.</summary>
    /// <param name="lnWavelength">ln λ.</param>
    /// <param name="level">Level of the continuum.</param>
    /// <param name="above">What the flux stands above the continuum, or negative.</param>
    /// <param name="pixels">Pixels, or parts of one, over which a model errs alike: their mean is no better than one of them.</param>
    public double Variance(double lnWavelength, double level, double above, double pixels)
    {
        double share = Share(lnWavelength) * level, line = LineShare * Math.Max(0, above);
        return (share * share + line * line) * Math.Max(1, pixels);
    }

    private double Own(double lnWavelength)
    {
        var x = Math.Clamp((lnWavelength - _start) / Block - 0.5, 0, _shares.Length - 1);
        var b = Math.Min((int)x, Math.Max(0, _shares.Length - 2));
        return _shares.Length == 1 ? _shares[0] : _shares[b] + (x - b) * (_shares[b + 1] - _shares[b]);
    }

    /// <summary>Solves, block by block, for the share that makes the median squared residual what noise and model error together predict.</summary>
    /// <param name="pixels">The pixels as fitted, in cells of the search grid.</param>
    /// <param name="runs">The same pixels with their noise alone.</param>
    /// <param name="fit">The fit of the best model.</param>
    /// <param name="lnShift">ln(1+z) of that fit.</param>
    public static ModelError Measure(FitPixels pixels, IReadOnlyList<PixelRun> runs, ModelFit fit, double lnShift)
    {
        var model = fit.Curves().Model;
        var start = runs.Min(r => r.LnWavelength[0]);
        var blocks = Math.Max(1, (int)Math.Ceiling((runs.Max(r => r.LnWavelength[^1]) - start) / Block));
        var excess = Enumerable.Range(0, blocks).Select(_ => new List<double>()).ToArray();
        var telluric = new List<double>();
        var at = 0;
        foreach (var run in runs)
            for (var i = 0; i < run.Flux.Length; i++, at++)
            {
                if (run.Weight[i] <= 0) continue;
                var level = Math.Max(Math.Abs(run.Continuum[i]), run.Baseline[i]);
                var forest = Forest.IsDark(run.LnWavelength[i], lnShift) ? fit.ForestVariance(at) : 0;
                var residual = pixels.Flux[at] - model[at];
                // The median of χ²₁ is 0.455: what is above that share of the noise, and of the forest's own scatter, is model error.
                var square = (residual * residual - 0.455 * (1 / run.Weight[i] + forest)) / (0.455 * level * level);
                var atmosphere = TelluricError.Share(run.LnWavelength[i]);
                if (atmosphere > Least) telluric.Add(square / (atmosphere * atmosphere));
                else excess[Math.Min(blocks - 1, (int)((run.LnWavelength[i] - start) / Block))].Add(square);
            }

        return new(start, Array.ConvertAll(excess, e => Root(e, Least, Most)), Root(telluric, 1, MostTelluric));
    }

    private static double Root(List<double> squares, double least, double most) =>
        Math.Clamp(Math.Sqrt(Math.Max(0, Selection.Median([.. squares]))), least, most);
}
