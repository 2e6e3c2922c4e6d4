using System.Runtime.Intrinsics;
using Redshift.Pipeline.Match.Models;
using Redshift.Pipeline.Normalize;
using Redshift.Pipeline.Numerics;

namespace Redshift.Pipeline.Match.Fit;

/// <summary>One column of a fit beside the spline: a mixture over all pixels, or the lines of a group.</summary>
internal struct Column
{
    /// <summary>The group; null for a mixture.</summary>
    public EmissionGroup? Group;

    /// <summary>Prior σ of a mixture.</summary>
    public double Spread;

    /// <summary>Continuum that a group's equivalent widths refer to.</summary>
    public double Level;

    /// <summary>Data against the column, the spline and the columns already taken projected out.</summary>
    public double Gradient;

    /// <summary>Curvature with the prior, when the column was taken.</summary>
    public double Pivot;

    /// <summary>Gradient with the prior, when the column was taken.</summary>
    public double PivotGradient;

    /// <summary>Best amplitude; 0 where left out.</summary>
    public double Amplitude;

    /// <summary>Its stretches of pixels.</summary>
    public int FirstSegment, EndSegment;

    /// <summary>First coefficient of the spline that it touches.</summary>
    public int FirstCoefficient;
}

/// <summary>
/// The columns of a fit, their values on stretches of pixels, and their products when the spline is projected out.
/// Arrays are kept from fit to fit and only grow.
/// </summary>
internal sealed class FitColumns(FitPixels pixels, SplineFit spline)
{
    private readonly List<Segment> _segments = [];
    private Column[] _columns = new Column[32];
    private double[] _projected = new double[32 * pixels.Basis.Coefficients];
    private double[] _products = new double[32 * 32];
    private float[] _values = new float[2 * pixels.Flux.Length];
    private float[] _weighted = new float[2 * pixels.Flux.Length];
    private int _used;

    public int Count { get; private set; }

    public ref Column this[int column] => ref _columns[column];

    /// <summary>Products of the columns, one row each.</summary>
    public Span<double> Products(int column) => _products.AsSpan(column * Count, Count);

    public double Curvature(int column) => _products[column * Count + column];

    /// <summary>L⁻¹ of a column's products with the spline.</summary>
    public ReadOnlySpan<double> Projected(int column) => _projected.AsSpan(column * pixels.Basis.Coefficients, pixels.Basis.Coefficients);

    public void Clear()
    {
        _segments.Clear();
        Count = 0;
        _used = 0;
    }

    /// <summary>Adds a column without values.</summary>
    public ref Column Add()
    {
        if (Count == _columns.Length) Array.Resize(ref _columns, 2 * Count);
        _columns[Count] = new() { FirstSegment = _segments.Count, EndSegment = _segments.Count };
        return ref _columns[Count++];
    }

    /// <summary>Adds a stretch of pixels to the last column.</summary>
    /// <returns>Where to write the values: one a pixel, and a vector that must stay as it is.</returns>
    public Span<float> AddSegment(int start, int end)
    {
        var length = end - start + Kernels.Lanes;
        if (_used + length > _values.Length)
        {
            Array.Resize(ref _values, 2 * (_used + length));
            Array.Resize(ref _weighted, _values.Length);
        }

        _segments.Add(new(start, end, _used));
        _columns[Count - 1].EndSegment = _segments.Count;
        var values = _values.AsSpan(_used, length);
        values[(end - start)..].Clear();
        _used += length;
        return values;
    }

    /// <summary>Projects the spline out of all columns and forms their products.</summary>
    public void Project()
    {
        if (_projected.Length < Count * pixels.Basis.Coefficients) _projected = new double[2 * Count * pixels.Basis.Coefficients];
        if (_products.Length < Count * Count) _products = new double[2 * Count * Count];
        for (var c = 0; c < Count; c++) Project(c);
        for (var g = 0; g < Count; g++)
            for (var h = 0; h <= g; h++)
                _products[g * Count + h] = _products[h * Count + g] = Overlap(g, h) - Explained(g, h);
    }

    /// <summary>Adds amplitude times column to the pixels.</summary>
    public void AddTo(Span<float> model, int column)
    {
        foreach (var (start, end, offset) in Segments(column))
            for (var p = start; p < end; p++) model[p] += (float)(_columns[column].Amplitude * _values[offset + p - start]);
    }

    private ReadOnlySpan<Segment> Segments(int column) =>
        System.Runtime.InteropServices.CollectionsMarshal.AsSpan(_segments)[_columns[column].FirstSegment.._columns[column].EndSegment];

    private void Project(int column)
    {
        var projected = _projected.AsSpan(column * pixels.Basis.Coefficients, pixels.Basis.Coefficients);
        projected.Clear();
        double gradient = 0;
        foreach (var (start, end, offset) in Segments(column)) gradient += spline.AddProducts(start, end, _values.AsSpan(offset), _weighted.AsSpan(offset), projected);
        ref var own = ref _columns[column];
        own.FirstCoefficient = pixels.Basis.First[_segments[own.FirstSegment].Start];
        spline.Project(projected, own.FirstCoefficient);
        own.Gradient = gradient - Kernels.Dot(projected, spline.Right);
    }

    /// <summary>The part of two columns' product that the spline takes out.</summary>
    private double Explained(int a, int b)
    {
        var first = Math.Max(_columns[a].FirstCoefficient, _columns[b].FirstCoefficient);
        return Kernels.Dot(Projected(a)[first..], Projected(b)[first..]);
    }

    private double Overlap(int a, int b)
    {
        if (First(a) >= Last(b) || First(b) >= Last(a)) return 0;
        double sum = 0;
        foreach (var (start, end, offset) in Segments(a))
            foreach (var other in Segments(b))
            {
                int from = Math.Max(start, other.Start), to = Math.Min(end, other.End);
                if (from < to) sum += Kernels.Dot(_weighted.AsSpan(offset + from - start, to - from), _values.AsSpan(other.Offset + from - other.Start, to - from));
            }

        return sum;
    }

    private int First(int column) => _segments[_columns[column].FirstSegment].Start;

    private int Last(int column) => _segments[_columns[column].EndSegment - 1].End;

    private readonly record struct Segment(int Start, int End, int Offset);
}
