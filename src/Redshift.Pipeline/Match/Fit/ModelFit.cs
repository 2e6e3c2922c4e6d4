using Redshift.Pipeline.Match.Models;
using Redshift.Pipeline.Normalize;
using Redshift.Pipeline.Numerics;
using Redshift.Pipeline.Results;

namespace Redshift.Pipeline.Match.Fit;

/// <summary>
/// Fits a model at a trial redshift: flux = (smooth spline) × (computed spectrum) + Σ amplitude × group, weighted least squares in flux.
/// The spline is projected out exactly; the groups follow one by one, strongest first, each paying for its freedom.
/// One instance serves one worker; its arrays are its workspace.
/// </summary>
internal sealed class ModelFit
{
    /// <summary>Prior σ of the share of a partner in the mixture with the template.</summary>
    private const double PartnerSpread = 0.5;

    /// <summary>Prior σ of a change of all lines' depth together: veiling, metallicity.</summary>
    private const double ContrastSpread = 0.3;

    /// <summary>Prior σ of the strength of gas in front, in units of what star-forming galaxies show.</summary>
    private const double GasSpread = 1;

    /// <summary>The smooth spectrum that all others are compared with, seen through the same air.</summary>
    private static readonly FitModel Featureless = new() { Kind = ObjectKind.Unknown, Name = "smooth" };

    private readonly FitPixels _pixels;
    private readonly SplineFit _spline;
    private readonly FitColumns _columns;
    private readonly ColumnSelection _selection;
    private readonly GroupProfiles _profiles;
    private readonly TemplateRenderer _renderer;
    private readonly float[] _ones;
    private readonly float[] _template;
    private readonly float[] _transmission;
    private readonly float[] _weight;
    private readonly float[] _work;
    private readonly double _null;
    private readonly Dictionary<(FitModel Model, double LnShift, bool Mixed), double> _known = [];

    public ModelFit(FitPixels pixels)
    {
        _pixels = pixels;
        _spline = new(pixels.Basis, pixels.Flux);
        _columns = new(pixels, _spline);
        _selection = new(_columns);
        _profiles = new(pixels);
        _renderer = new(pixels);
        var length = pixels.Flux.Length;
        (_template, _transmission, _work) = (new float[length], new float[length], new float[length]);
        _weight = (float[])pixels.Weight.Clone();
        _ones = new float[length];
        Array.Fill(_ones, 1f);
        _ones.CopyTo(_template, 0);
        _null = Fit(Featureless, 0);
    }

    /// <summary>Amplitudes of the groups of the last fit, rest equivalent width × continuum; 0 where left out.</summary>
    public IReadOnlyList<(EmissionGroup Group, double Amplitude)> Amplitudes =>
        [.. Enumerable.Range(0, _columns.Count).Where(c => _columns[c].Group is not null).Select(c => (_columns[c].Group!, _columns[c].Amplitude))];

    /// <summary>ln evidence of the model at a redshift, as <see cref="Fit"/> finds it; what was asked before is remembered.</summary>
    /// <param name="model">The model.</param>
    /// <param name="lnShift">ln(1+z).</param>
    /// <param name="mixed">Whether partners may be mixed in; a first look does without.</param>
    public double LnEvidence(FitModel model, double lnShift, bool mixed = true)
    {
        if (_known.TryGetValue((model, lnShift, mixed), out var known)) return known;
        return _known[(model, lnShift, mixed)] = Fit(model, lnShift, mixed);
    }

    /// <summary>Fits the model at a redshift.</summary>
    /// <param name="model">The model.</param>
    /// <param name="lnShift">ln(1+z).</param>
    /// <param name="mixed">Whether partners may be mixed in; a first look does without.</param>
    /// <returns>ln evidence over that of the smooth continuum alone.</returns>
    public double Fit(FitModel model, double lnShift, bool mixed = true)
    {
        if (lnShift > model.GreatestLnShift) return double.NegativeInfinity;
        var evidence = Smooth(model, lnShift) - _null;
        _columns.Clear();
        _pixels.Air.AddTo(_columns);
        if (mixed) AddMixtures(model, lnShift);
        foreach (var group in model.Groups)
            _profiles.AddColumn(_columns, group, lnShift, group.Broad ? model.BroadKmS : model.NarrowKmS, model.Forest ? _pixels.Forest : null, model.Forest && group.Broad ? _transmission : null);
        _columns.Project();
        return evidence + _selection.Take() + model.LnPrior;
    }

    /// <summary>Variance that the forest of the last fit adds at a pixel.</summary>
    public double ForestVariance(int pixel) => _weight[pixel] < _pixels.Weight[pixel] ? 1 / _weight[pixel] - 1 / _pixels.Weight[pixel] : 0;

    /// <summary>The model of the last fit, and its smooth part, at the pixels.</summary>
    public (float[] Model, float[] Smooth) Curves()
    {
        var right = _spline.Right.ToArray();
        for (var c = 0; c < _columns.Count; c++)
        {
            var projected = _columns.Projected(c);
            for (var k = 0; k < right.Length; k++) right[k] -= _columns[c].Amplitude * projected[k];
        }

        _spline.Smooth(right, _work);
        var smooth = _work[.._pixels.Count];
        var model = new float[_pixels.Count];
        Kernels.Multiply(smooth, _template, model);
        for (var c = 0; c < _columns.Count; c++) _columns.AddTo(model, c);
        return (model, smooth);
    }

    /// <summary>How much too sharp the likelihood is, see <see cref="ResidualExcess"/>, by what a model leaves over.</summary>
    public double Excess(Refined best)
    {
        Fit(best.Model, best.LnShift);
        return ResidualExcess.Measure(_pixels, Curves().Model);
    }

    /// <summary>Solves for the smooth part times the template; of a quasar where its light ends, too.</summary>
    private double Smooth(FitModel model, double lnShift)
    {
        if (!model.Forest) return Smooth(model, lnShift, LymanLimit.None);
        if (model.Kind != ObjectKind.Quasar) return Smooth(model, lnShift, LymanLimit.Own(lnShift));
        var limits = _pixels.Forest.Limits(lnShift).ToList();
        if (limits.Count == 1) return Smooth(model, lnShift, limits[0]);
        var best = limits.MaxBy(l => Smooth(model, lnShift, l));
        return Smooth(model, lnShift, best) - Math.Log(limits.Count);
    }

    private double Smooth(FitModel model, double lnShift, LymanLimit limit)
    {
        _pixels.Weight.CopyTo(_weight, 0);
        var scatter = model.Forest ? _pixels.Forest.Scatter(lnShift, limit, _weight, _work) : 0;
        Render(model, lnShift, limit);
        return scatter + _spline.Solve(_weight, _template);
    }

    private void Render(FitModel model, double lnShift, LymanLimit limit)
    {
        if (model.Template is null) _ones.CopyTo(_template, 0);
        else _renderer.Render(model.Template, lnShift, _template);
        if (!model.Forest) return;
        _pixels.Forest.Transmit(lnShift, limit, _transmission);
        Kernels.Multiply(_template, _transmission, _template);
    }

    /// <summary>Columns of what may be mixed in, with the smooth part just found.</summary>
    private void AddMixtures(FitModel model, double lnShift)
    {
        if (model.Template is null && model.Gas is null) return;
        _spline.Smooth(_spline.Right, _work);
        if (model.Template is not null) AddPartners(model, lnShift);
        if (model.Gas is not null) AddGas(model.Gas);
    }

    /// <summary>Columns smooth × (partner − template), and smooth × (template − 1) for the contrast, all through the forest.</summary>
    private void AddPartners(FitModel model, double lnShift)
    {
        foreach (var partner in model.Partners)
        {
            var values = AddMixture(PartnerSpread);
            _renderer.Render(partner, lnShift, values);
            if (model.Forest) Kernels.Multiply(values, _transmission, values);
            Kernels.MultiplyDifference(_work, values, _template, values);
        }

        Kernels.MultiplyDifference(_work, _template, model.Forest ? _transmission : _ones, AddMixture(ContrastSpread));
    }

    /// <summary>Column smooth × template × (what the gas lets pass − 1).</summary>
    private void AddGas(InterveningGas gas)
    {
        var values = AddMixture(GasSpread);
        _renderer.Render(InterveningGas.Transmission, gas.LnShift, values);
        Kernels.MultiplyDifference(_work, values, _ones, values);
        Kernels.Multiply(values, _template, values);
    }

    private Span<float> AddMixture(double spread)
    {
        _columns.Add().Spread = spread;
        return _columns.AddSegment(0, _pixels.Count)[.._pixels.Count];
    }
}
