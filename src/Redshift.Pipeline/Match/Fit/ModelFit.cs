using Redshift.Physics.Units;
using Redshift.Pipeline.Match.Models;
using Redshift.Pipeline.Numerics;

namespace Redshift.Pipeline.Match.Fit;

/// <summary>
/// Fits a model at a trial redshift: flux = (smooth spline) × (computed spectrum) + Σ amplitude × group, weighted least squares in flux.
/// The spline is projected out exactly; the groups follow one by one, strongest first, each paying for its freedom.
/// One instance serves one worker; its arrays are its workspace.
/// </summary>
internal sealed class ModelFit
{
    private const int Row = BandedCholesky.Band + 1;

    /// <summary>Prior σ of the share of a partner in the mixture with the template.</summary>
    private const double PartnerSpread = 0.5;

    /// <summary>Prior σ of a change of all lines' depth together: veiling, metallicity.</summary>
    private const double ContrastSpread = 0.3;

    private const double KmSPerLn = Velocity.SpeedOfLightKmS;
    private const double InverseRootTwoPi = 0.3989422804014327;

    private readonly FitPixels _pixels;
    private readonly float[] _template;
    private readonly float[] _weight;
    private readonly float[] _weighted;
    private readonly float[] _product;
    private readonly double[] _matrix;
    private readonly double[] _right;
    private readonly BandedCholesky _cholesky = new();
    private readonly List<Column> _columns = [];
    private readonly List<int> _chosen = [];
    private readonly double _null;

    public ModelFit(FitPixels pixels)
    {
        _pixels = pixels;
        _template = new float[pixels.Count];
        _weight = (float[])pixels.Weight.Clone();
        _weighted = new float[pixels.Count];
        _product = new float[pixels.Count];
        _matrix = new double[pixels.PriorMatrix.Length];
        _right = new double[pixels.Coefficients];
        Array.Fill(_template, 1f);
        _null = FitSpline();
    }

    /// <summary>Amplitudes of the groups of the last fit, rest equivalent width × continuum; 0 where left out.</summary>
    public IReadOnlyList<(EmissionGroup Group, double Amplitude)> Amplitudes =>
        _columns.FindAll(c => c.Group is not null).ConvertAll(c => (c.Group!, c.Amplitude));

    /// <summary>ln evidence of the model at a redshift over that of the smooth continuum alone.</summary>
    /// <param name="model">The model.</param>
    /// <param name="lnShift">ln(1+z).</param>
    /// <param name="mixed">Whether partners may be mixed in; a first look does without.</param>
    public double LnEvidence(FitModel model, double lnShift, bool mixed = true)
    {
        if (lnShift > model.GreatestLnShift) return double.NegativeInfinity;
        Render(model, lnShift);
        if (!model.Forest) _pixels.Weight.CopyTo(_weight, 0);
        var evidence = (model.Forest ? ScatterForest(lnShift) : 0) + FitSpline() - _null;
        _columns.Clear();
        _chosen.Clear();
        if (mixed) AddMixtures(model, lnShift);
        foreach (var group in model.Groups) AddColumn(model, group, lnShift);
        Project();
        return evidence + TakeMixtures() + SelectGroups() + model.LnPrior;
    }

    /// <summary>The model of the last fit, and its smooth part, at the pixels.</summary>
    public (float[] Model, float[] Smooth) Curves()
    {
        var smooth = Smooth(SplineCoefficients());
        var model = new float[_pixels.Count];
        for (var p = 0; p < smooth.Length; p++) model[p] = smooth[p] * _template[p];

        foreach (var column in _columns)
            foreach (var segment in column.Segments)
                for (var i = 0; i < segment.Values.Length; i++) model[segment.Start + i] += (float)(column.Amplitude * segment.Values[i]);
        return (model, smooth);
    }

    private double[] SplineCoefficients()
    {
        var coefficients = (double[])_right.Clone();
        foreach (var column in _columns)
            for (var k = 0; k < coefficients.Length; k++) coefficients[k] -= column.Amplitude * column.Projected[k];
        _cholesky.Backward(coefficients);
        return coefficients;
    }

    private void Render(FitModel model, double lnShift)
    {
        if (model.Template is null) Array.Fill(_template, 1f);
        else RenderTemplate(model.Template, lnShift, _template);
        if (!model.Forest) return;
        for (var p = 0; p < _template.Length; p++)
        {
            if (_pixels.LnWavelength[p] > lnShift + Forest.LnLymanAlpha + 4 * _pixels.SigmaLn[p]) continue;
            _template[p] *= (float)Forest.Transmission(_pixels.LnWavelength[p], lnShift, _pixels.SigmaLn[p]);
        }
    }

    /// <summary>
    /// Lowers the weights in the forest by its own scatter; returns what that changes in the ln likelihood of the data,
    /// so that models with different variances stay comparable.
    /// </summary>
    private double ScatterForest(double lnShift)
    {
        double change = 0;
        var edge = Forest.LnLymanAlpha + lnShift;
        for (var s = 0; s + 1 < _pixels.Starts.Length; s++)
        {
            var level = LevelRedward(s, edge);
            for (var p = _pixels.Starts[s]; p < _pixels.Starts[s + 1]; p++)
            {
                var weight = _pixels.Weight[p];
                _weight[p] = weight;
                if (_pixels.LnWavelength[p] >= edge || weight <= 0) continue;
                var scatter = level * Forest.Scatter(Forest.Transmission(_pixels.LnWavelength[p], lnShift));
                _weight[p] = (float)(weight / (1 + weight * scatter * scatter));
                change += 0.5 * Math.Log(_weight[p] / weight) + 0.5 * (weight - _weight[p]) * _pixels.Flux[p] * _pixels.Flux[p];
            }
        }

        return change;
    }

    /// <summary>The continuum just redward of Lyman alpha: what the forest is seen against.</summary>
    private double LevelRedward(int spectrum, double edge)
    {
        double sum = 0;
        var count = 0;
        for (var p = _pixels.Starts[spectrum]; p < _pixels.Starts[^1] && _pixels.LnWavelength[p] < edge + 0.09; p++)
        {
            if (_pixels.LnWavelength[p] < edge + 0.025) continue;
            sum += _pixels.Continuum[p];
            count++;
        }

        return count > 0 ? sum / count : _pixels.Continuum[_pixels.Starts[spectrum + 1] - 1];
    }

    private void RenderTemplate(Template template, double lnShift, float[] into)
    {
        var level = -1;
        float[] values = [];
        for (var p = 0; p < into.Length; p++)
        {
            if (_pixels.Level[p] != level)
            {
                level = _pixels.Level[p];
                values = template.Broadened(level);
            }

            var x = Math.Clamp((_pixels.LnWavelength[p] - lnShift - TemplateGrid.LnStart) / TemplateGrid.Step, 0, values.Length - 1.001);
            var i = (int)x;
            var t = (float)(x - i);
            into[p] = values[i] + t * (values[i + 1] - values[i]);
        }
    }

    /// <summary>Solves for the spline with the current template; returns its part of the ln evidence.</summary>
    private double FitSpline()
    {
        _pixels.PriorMatrix.CopyTo(_matrix, 0);
        Array.Clear(_right);
        Kernels.Multiply(_weight, _template, _weighted);
        Kernels.Multiply(_weighted, _pixels.Flux, _product);
        AddBasisProducts(_product, _right);
        Kernels.Multiply(_weighted, _template, _product);
        foreach (var (start, end) in _pixels.Intervals)
        {
            var first = _pixels.SplineFirst[start];
            var values = _product.AsSpan(start, end - start);
            for (var j = 0; j < 4; j++)
                for (var k = 0; k <= j; k++)
                    _matrix[(first + j) * Row + (j - k)] += Kernels.Dot(values, _pixels.SplinePairs[j * (j + 1) / 2 + k].AsSpan(start, end - start));
        }

        _cholesky.Factor(_matrix, _pixels.Coefficients);
        _cholesky.Forward(_right);
        return 0.5 * Kernels.Dot(_right, _right) - _cholesky.HalfLogDeterminant;
    }

    /// <summary>Columns smooth × (partner − template), and smooth × (template − 1) for the contrast, with the smooth part just found.</summary>
    private void AddMixtures(FitModel model, double lnShift)
    {
        if (model.Template is null) return;
        var smooth = Smooth();
        foreach (var partner in model.Partners)
        {
            var values = new float[_pixels.Count];
            RenderTemplate(partner, lnShift, values);
            for (var p = 0; p < values.Length; p++) values[p] = smooth[p] * (values[p] - _template[p]);
            AddMixture(values, PartnerSpread);
        }

        var contrast = new float[_pixels.Count];
        for (var p = 0; p < contrast.Length; p++) contrast[p] = smooth[p] * (_template[p] - 1);
        AddMixture(contrast, ContrastSpread);
    }

    private void AddMixture(float[] values, double spread)
    {
        var column = new Column(null) { Spread = spread };
        column.Segments.Add(new(0, values));
        _columns.Add(column);
    }

    private float[] Smooth()
    {
        var coefficients = (double[])_right.Clone();
        _cholesky.Backward(coefficients);
        return Smooth(coefficients);
    }

    private float[] Smooth(double[] coefficients)
    {
        var smooth = new float[_pixels.Count];
        for (var p = 0; p < smooth.Length; p++)
        {
            var first = _pixels.SplineFirst[p];
            double sum = 0;
            for (var j = 0; j < 4; j++) sum += _pixels.Spline[j][p] * coefficients[first + j];
            smooth[p] = (float)sum;
        }

        return smooth;
    }

    /// <summary>Adds Σ values·basis to each coefficient.</summary>
    private void AddBasisProducts(float[] values, double[] sums)
    {
        foreach (var (start, end) in _pixels.Intervals)
        {
            var first = _pixels.SplineFirst[start];
            for (var j = 0; j < 4; j++)
                sums[first + j] += Kernels.Dot(values.AsSpan(start, end - start), _pixels.Spline[j].AsSpan(start, end - start));
        }
    }

    private void AddColumn(FitModel model, EmissionGroup group, double lnShift)
    {
        var width = (group.Broad ? model.BroadKmS : model.NarrowKmS) / KmSPerLn;
        Column? column = null;
        double level = 0, share = 0;
        foreach (var line in group.Lines)
        {
            var own = line.WidthKmS / KmSPerLn;
            var centre = Math.Log(line.RestA) + lnShift;
            var sigma = Math.Sqrt(width * width + own * own);
            for (var s = 0; s + 1 < _pixels.Starts.Length; s++)
            {
                if (RenderLine(line, centre, sigma, s, model.Forest && group.Broad ? lnShift : double.NaN) is not { } segment) continue;
                column ??= new Column(group);
                column.Segments.Add(segment);
                level += line.Share * _pixels.Continuum[segment.Start + segment.Values.Length / 2];
                share += line.Share;
            }
        }

        if (column is null) return;
        column.Level = level / share;
        _columns.Add(column);
    }

    private Segment? RenderLine(GroupLine line, double centre, double sigma, int spectrum, double forestShift)
    {
        int from = _pixels.Starts[spectrum], to = _pixels.Starts[spectrum + 1];
        var ln = _pixels.LnWavelength.AsSpan(from, to - from);
        if (centre < ln[0] || centre > ln[^1]) return null;
        var near = Math.Clamp(Search(ln, centre), 0, ln.Length - 1);
        var instrument = _pixels.SigmaLn[from + near];
        var total = Math.Sqrt(sigma * sigma + instrument * instrument);
        int start = Search(ln, centre - 4 * total), end = Search(ln, centre + 4 * total);
        if (end - start < 1) return null;
        var values = new float[end - start];
        var scale = line.Share / line.RestA * InverseRootTwoPi / total;
        for (var i = start; i < end; i++)
        {
            values[i - start] = (float)scale * GaussianTable.At((ln[i] - centre) / total);
            if (!double.IsNaN(forestShift)) values[i - start] *= (float)Forest.Transmission(ln[i], forestShift, instrument);
        }

        return new(from + start, values);
    }

    private void Project()
    {
        foreach (var column in _columns) Project(column);
        for (var g = 0; g < _columns.Count; g++)
        {
            var column = _columns[g];
            column.Index = g;
            column.Gradient -= Kernels.Dot(column.Projected, _right);
            column.Products = new double[_columns.Count];
            for (var h = 0; h <= g; h++) column.Products[h] = Overlap(column, _columns[h]) - Kernels.Dot(column.Projected, _columns[h].Projected);
        }

        for (var g = 0; g < _columns.Count; g++)
            for (var h = g + 1; h < _columns.Count; h++) _columns[g].Products[h] = _columns[h].Products[g];
    }

    private void Project(Column column)
    {
        column.Projected = new double[_pixels.Coefficients];
        if (column.Group is null) ProjectDense(column);
        else ProjectSegments(column);
        _cholesky.Forward(column.Projected);
    }

    private void ProjectDense(Column column)
    {
        column.Weighted = new float[_pixels.Count];
        Kernels.Multiply(_weight, column.Segments[0].Values, column.Weighted);
        column.Gradient = Kernels.Dot(column.Weighted, _pixels.Flux);
        Kernels.Multiply(column.Weighted, _template, _product);
        AddBasisProducts(_product, column.Projected);
    }

    private void ProjectSegments(Column column)
    {
        foreach (var segment in column.Segments)
        {
            for (var i = 0; i < segment.Values.Length; i++)
            {
                var p = segment.Start + i;
                double we = _weight[p] * segment.Values[i];
                column.Gradient += we * _pixels.Flux[p];
                var wet = we * _template[p];
                var first = _pixels.SplineFirst[p];
                for (var j = 0; j < 4; j++) column.Projected[first + j] += wet * _pixels.Spline[j][p];
            }
        }
    }

    private double Overlap(Column a, Column b)
    {
        double sum = 0;
        if (b.Group is null)
        {
            foreach (var s in a.Segments) sum += Kernels.Dot(s.Values, b.Weighted.AsSpan(s.Start, s.Values.Length));
            return sum;
        }

        foreach (var s in a.Segments)
            foreach (var t in b.Segments)
                for (int p = Math.Max(s.Start, t.Start), end = Math.Min(s.End, t.End); p < end; p++)
                    sum += _weight[p] * s.Values[p - s.Start] * t.Values[p - t.Start];
        return sum;
    }

    /// <summary>Integrates the mixtures out one by one (normal priors of both signs: exact); returns their part of the ln evidence.</summary>
    private double TakeMixtures()
    {
        double total = 0;
        var left = new List<int>(Enumerable.Range(0, _columns.Count));
        foreach (var column in _columns.FindAll(c => c.Group is null))
        {
            left.Remove(column.Index);
            Condition(column.Index, left, 0, column.Spread);
            total += 0.5 * column.PivotGradient * column.PivotGradient / column.Pivot - 0.5 * Math.Log(column.Pivot * column.Spread * column.Spread);
            _chosen.Add(column.Index);
        }

        return total;
    }

    /// <summary>Takes the groups in the order of what they gain, conditioning the rest on each; returns their part of the ln evidence.</summary>
    private double SelectGroups()
    {
        double total = 0;
        var left = _columns.FindAll(c => c.Group is not null).ConvertAll(c => c.Index);
        while (left.Count > 0)
        {
            var best = left.MaxBy(g => _columns[g].Gain);
            left.Remove(best);
            var column = _columns[best];
            var group = column.Group!;
            double spread = group.Spread * column.Level, mean = group.Mean * column.Level;
            total += HalfNormalEvidence.LnMixture(column.Gradient, column.Curvature, mean, spread, group.Absent);
            if (HalfNormalEvidence.LnBayesFactor(column.Gradient, column.Curvature, mean, spread) < Math.Log(group.Absent + 1e-9)) continue;
            Condition(best, left, mean, spread);
            _chosen.Add(best);
        }

        BackSubstitute();
        return total;
    }

    private void Condition(int best, List<int> left, double mean, double spread)
    {
        var column = _columns[best];
        var precision = 1 / (spread * spread);
        column.Pivot = column.Curvature + precision;
        column.PivotGradient = column.Gradient + mean * precision;
        foreach (var g in left)
        {
            var factor = _columns[g].Products[best] / column.Pivot;
            _columns[g].Gradient -= factor * column.PivotGradient;
            foreach (var h in left) _columns[g].Products[h] -= factor * column.Products[h];
        }
    }

    private void BackSubstitute()
    {
        for (var i = _chosen.Count - 1; i >= 0; i--)
        {
            var column = _columns[_chosen[i]];
            var value = column.PivotGradient;
            for (var j = i + 1; j < _chosen.Count; j++) value -= column.Products[_chosen[j]] * _columns[_chosen[j]].Amplitude;
            column.Amplitude = column.Group is null ? value / column.Pivot : Math.Max(0, value / column.Pivot);
        }
    }

    private static int Search(ReadOnlySpan<double> sorted, double value)
    {
        var found = sorted.BinarySearch(value);
        return found >= 0 ? found : ~found;
    }

    private sealed record Segment(int Start, float[] Values)
    {
        public int End => Start + Values.Length;
    }

    private sealed class Column(EmissionGroup? group)
    {
        /// <summary>The group; null for a mixture.</summary>
        public EmissionGroup? Group { get; } = group;

        /// <summary>Weight times value, of a mixture.</summary>
        public float[] Weighted { get; set; } = [];

        /// <summary>Prior σ of a mixture.</summary>
        public double Spread { get; init; }

        public List<Segment> Segments { get; } = [];

        public double Level { get; set; }

        public double Gradient { get; set; }

        public double[] Projected { get; set; } = [];

        public double[] Products { get; set; } = [];

        public double Pivot { get; set; }

        public double PivotGradient { get; set; }

        public double Amplitude { get; set; }

        public int Index { get; set; }

        public double Curvature => Products[Index];

        public double Gain => Gradient <= 0 ? Gradient : Gradient * Gradient / Math.Max(Curvature, 1e-30);
    }
}
