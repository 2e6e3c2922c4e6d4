using System.Runtime.Intrinsics;
using Redshift.Pipeline.Match.Models;
using Redshift.Pipeline.Normalize;
using Redshift.Pipeline.Numerics;

namespace Redshift.Pipeline.Match.Search;

/// <summary>
/// The spectrum matched-filtered at one line width. The evidence of a group over all redshifts is then a sum of slices of two arrays,
/// one slice a line: no template is shifted, no fit is made.
/// </summary>
internal sealed class LineScan
{
    /// <summary>Shifts that are summed together, few enough to stay near the processor.</summary>
    private const int Chunk = 512;

    private readonly Cells _cells;
    private readonly int _stride;
    private readonly int _perPhase;
    private readonly float[] _gradient;
    private readonly float[] _curvature;
    private readonly float[] _continuum;

    /// <summary>Filters the data.</summary>
    /// <param name="cells">The data.</param>
    /// <param name="sigmaLn">σ of the line in ln λ, instrument and cell included.</param>
    /// <param name="stride">Cells from one trial shift to the next.</param>
    public LineScan(Cells cells, double sigmaLn, int stride = 1)
    {
        (_cells, _stride, _perPhase) = (cells, stride, (cells.Count + stride - 1) / stride);
        var sigma = sigmaLn / Cells.Step;
        var peak = 1 / (2 * Math.Sqrt(Math.PI) * Math.Max(sigma, 0.4));
        var kept = KeptByHighPass(sigmaLn);
        _gradient = InPhases(GaussianFilter.Convolve(cells.LineGradient, sigma), (float)(1 / Cells.Step));
        _curvature = InPhases(GaussianFilter.Convolve(cells.LineCurvature, sigma / Math.Sqrt(2)), (float)(peak * kept / (Cells.Step * Cells.Step)));
        _continuum = InPhases(cells.Continuum, 1);
    }

    /// <summary>Adds the ln evidence of a group at every shift.</summary>
    /// <param name="group">The group.</param>
    /// <param name="firstShift">Shift in cells of element 0.</param>
    /// <param name="total">ln evidence at each shift.</param>
    public void Add(EmissionGroup group, int firstShift, Span<float> total)
    {
        Span<Slice> lines = stackalloc Slice[group.Lines.Length];
        for (var i = 0; i < lines.Length; i++) lines[i] = SliceOf(group.Lines[i], firstShift);
        int from = total.Length, to = 0;
        foreach (var line in lines) (from, to) = (Math.Min(from, line.From), Math.Max(to, line.To));
        var sums = new Sums(stackalloc float[4 * Chunk]);
        for (var start = Math.Max(0, from); start < Math.Min(to, total.Length); start += Chunk)
        {
            sums.Clear();
            foreach (var line in lines) Add(line, start, sums);
            Evaluate(group.Evidence, sums, total[start..Math.Min(total.Length, start + Chunk)]);
        }
    }

    /// <summary>Every stride-th element, then every stride-th from the second on, and so on: trial shifts become neighbours.</summary>
    private float[] InPhases(float[] values, float factor)
    {
        var phases = new float[_stride * _perPhase];
        for (var phase = 0; phase < _stride; phase++)
            for (int k = phase, at = phase * _perPhase; k < values.Length; k += _stride, at++) phases[at] = factor * values[k];
        return phases;
    }

    private Slice SliceOf(GroupLine line, int firstShift)
    {
        var offset = (int)Math.Floor((line.LnRest - Cells.LnOrigin) / Cells.Step) + firstShift - _cells.First;
        var whole = (int)Math.Floor((double)offset / _stride);
        var phase = offset - whole * _stride;
        var length = (_cells.Count - phase + _stride - 1) / _stride;
        return new(-whole, length - whole, phase * _perPhase, (float)(line.Share / line.RestA), (float)line.Share);
    }

    private void Add(in Slice line, int start, in Sums sums)
    {
        int from = Math.Max(start, line.From), to = Math.Min(start + Chunk, line.To);
        if (to <= from) return;
        int at = line.At + from - line.From, into = from - start, length = to - from;
        AddScaled(_gradient.AsSpan(at, length), line.Scale, sums.Gradient[into..]);
        AddScaled(_curvature.AsSpan(at, length), line.Scale * line.Scale, sums.Curvature[into..]);
        AddScaled(_continuum.AsSpan(at, length), line.Share, sums.Level[into..]);
        foreach (ref var share in sums.Share.Slice(into, length)) share += line.Share;
    }

    private static void AddScaled(ReadOnlySpan<float> values, float factor, Span<float> sums)
    {
        var i = 0;
        for (; i <= values.Length - Kernels.Lanes; i += Kernels.Lanes) (Vector256.Create(sums[i..]) + factor * Vector256.Create(values[i..])).CopyTo(sums[i..]);
        for (; i < values.Length; i++) sums[i] += factor * values[i];
    }

    private static void Evaluate(GroupEvidence evidence, in Sums sums, Span<float> total)
    {
        for (var i = 0; i < total.Length; i += Kernels.Lanes)
        {
            var curvature = Vector256.Create(sums.Curvature[i..]);
            var level = Vector256.Create(sums.Level[i..]) / Vector256.Create(sums.Share[i..]);
            var found = evidence.LnMixture(Vector256.Create(sums.Gradient[i..]), curvature, level) & Vector256.GreaterThan(curvature, Vector256<float>.Zero);
            if (i + Kernels.Lanes <= total.Length) (Vector256.Create(total[i..]) + found).CopyTo(total[i..]);
            else
                for (var j = 0; i + j < total.Length; j++) total[i + j] += found[j];
        }
    }

    /// <summary>Share of a line's information that the smooth continuum leaves: Gaussian filters in quadrature.</summary>
    private static double KeptByHighPass(double sigmaLn)
    {
        const double Smooth = 0.75 * SmoothFit.KnotSpacing;
        return Math.Max(0.1, 1 - sigmaLn / Math.Sqrt(sigmaLn * sigmaLn + Smooth * Smooth));
    }

    /// <summary>The shifts at which a line is on the data, and where the first of them lies in the arrays.</summary>
    private readonly record struct Slice(int From, int To, int At, float Scale, float Share);

    /// <summary>Sums over the lines of a group at the shifts of a chunk.</summary>
    private readonly ref struct Sums(Span<float> room)
    {
        public readonly Span<float> Gradient = room[..Chunk];
        public readonly Span<float> Curvature = room[Chunk..(2 * Chunk)];
        public readonly Span<float> Level = room[(2 * Chunk)..(3 * Chunk)];
        public readonly Span<float> Share = room[(3 * Chunk)..];

        public void Clear()
        {
            Gradient.Clear();
            Curvature.Clear();
            Level.Clear();
            Share.Clear();
        }
    }
}
