using System.Numerics;
using System.Runtime.Intrinsics;
using Redshift.Pipeline.Numerics;

namespace Redshift.Pipeline.Match.Search;

/// <summary>ln evidence of a template's strength over all redshifts at once, by FFT, or over a few shifts directly.</summary>
internal sealed class TemplateScan
{
    /// <summary>A computed spectrum should appear at its own strength; its prior σ allows for mixtures, veiling and wrong metallicity.</summary>
    private const double StrengthSpread = 0.35;

    private const int Rounding = 256;

    private readonly int _first;
    private readonly int _used;
    private readonly FourierTransform _transform;
    private readonly float[] _dataRe;
    private readonly float[] _dataIm;
    private readonly float[] _squareRe;
    private readonly float[] _squareIm;
    private readonly float[] _workRe;
    private readonly float[] _workIm;

    public TemplateScan(Cells cells, int templateLength)
    {
        // Both lengths are rounded up, so that observations alike share the templates' transforms.
        _first = cells.First + Cells.Margin;
        var count = cells.Count - 2 * Cells.Margin;
        _used = Math.Min((templateLength + Rounding - 1) / Rounding * Rounding, CellTemplate.Length);
        _transform = FourierTransform.OfLength((int)BitOperations.RoundUpToPowerOf2((uint)(count + _used)));
        var n = _transform.Length;
        (_dataRe, _dataIm, _squareRe, _squareIm) = (new float[n], new float[n], new float[n], new float[n]);
        (_workRe, _workIm) = (new float[n], new float[n]);
        cells.TemplateGradient.AsSpan(Cells.Margin, count).CopyTo(_dataRe);
        cells.TemplateCurvature.AsSpan(Cells.Margin, count).CopyTo(_squareRe);
        _transform.Forward(_dataRe, _dataIm);
        _transform.Forward(_squareRe, _squareIm);
    }

    /// <summary>Takes the larger of what is there and this template's ln evidence at each shift, noting which template it was.</summary>
    /// <param name="template">The template.</param>
    /// <param name="index">Its number.</param>
    /// <param name="firstShift">Shift in cells of element 0.</param>
    /// <param name="best">ln evidence at each shift.</param>
    /// <param name="which">Number of the best template.</param>
    public void Take(CellTemplate template, int index, int firstShift, Span<float> best, Span<short> which)
    {
        var t = template.Transform(_used, _transform.Length);
        Correlate(t);
        _transform.Inverse(_workRe, _workIm);
        var n = _transform.Length;
        for (var s = 0; s < best.Length; s++)
        {
            var at = (firstShift + s - _first) & (n - 1);
            float gradient = _workRe[at] / n, curvature = Math.Max(0, _workIm[at] / n);
            // Without its logarithm the evidence can only be larger: most shifts need none.
            if (Bound(gradient, curvature) <= best[s]) continue;
            var evidence = LnEvidence(gradient, curvature);
            if (evidence <= best[s]) continue;
            best[s] = evidence;
            which[s] = (short)index;
        }
    }

    /// <summary>num = D·conj(T) and den = S·conj(Q), both of real sequences, packed as num + i·den.</summary>
    private void Correlate(CellTemplate.Transforms t)
    {
        for (var i = 0; i <= _workRe.Length - 8; i += 8)
        {
            Vector256<float> dr = Vector256.Create(_dataRe, i), di = Vector256.Create(_dataIm, i), tr = Vector256.Create(t.Re, i), ti = Vector256.Create(t.Im, i);
            Vector256<float> sr = Vector256.Create(_squareRe, i), si = Vector256.Create(_squareIm, i);
            Vector256<float> qr = Vector256.Create(t.SquareRe, i), qi = Vector256.Create(t.SquareIm, i);
            (dr * tr + di * ti - (si * qr - sr * qi)).CopyTo(_workRe, i);
            (di * tr - dr * ti + (sr * qr + si * qi)).CopyTo(_workIm, i);
        }
    }

    /// <summary>ln evidence at one shift, summed directly.</summary>
    public static float Direct(Cells cells, CellTemplate template, int shift)
    {
        var relative = template.Relative;
        int from = Math.Max(0, shift - cells.First), to = Math.Min(cells.Count, relative.Length + shift - cells.First);
        var length = to - from;
        if (length <= 0) return 0;
        var t = relative.AsSpan(from + cells.First - shift, length);
        var gradient = cells.TemplateGradient.AsSpan(from, length);
        var curvature = cells.TemplateCurvature.AsSpan(from, length);
        Vector256<float> numerator = default, denominator = default;
        var i = 0;
        for (; i <= length - 8; i += 8)
        {
            var v = Vector256.Create(t[i..]);
            numerator += v * Vector256.Create(gradient[i..]);
            denominator += v * v * Vector256.Create(curvature[i..]);
        }

        float num = Vector256.Sum(numerator), den = Vector256.Sum(denominator);
        for (; i < length; i++)
        {
            num += t[i] * gradient[i];
            den += t[i] * t[i] * curvature[i];
        }

        return LnEvidence(num, den);
    }

    private static float Bound(float gradient, float curvature)
    {
        const float Precision = (float)(1 / (StrengthSpread * StrengthSpread));
        var v = gradient + Precision;
        return 0.5f * v * v / (curvature + Precision) - 0.5f * Precision + 1e-3f;
    }

    /// <summary>Marginal likelihood of a strength with the prior N(1, <see cref="StrengthSpread"/>²), over that of strength zero.</summary>
    private static float LnEvidence(double gradient, double curvature)
    {
        const double Precision = 1 / (StrengthSpread * StrengthSpread);
        double m = curvature + Precision, v = gradient + Precision;
        return (float)(0.5 * v * v / m - 0.5 * Precision - 0.5 * Math.Log(m / Precision));
    }
}
