using System.Numerics;
using Redshift.Pipeline.Numerics;

namespace Redshift.Pipeline.Match.Search;

/// <summary>ln evidence of a template's strength over all redshifts at once, by FFT, or over a few shifts directly.</summary>
internal sealed class TemplateScan
{
    /// <summary>A computed spectrum should appear at its own strength; its prior σ allows for mixtures, veiling and wrong metallicity.</summary>
    private const double StrengthSpread = 0.35;

    private readonly Cells _cells;
    private readonly FourierTransform _transform;
    private readonly float[] _dataRe;
    private readonly float[] _dataIm;
    private readonly float[] _squareRe;
    private readonly float[] _squareIm;
    private readonly float[] _workRe;
    private readonly float[] _workIm;

    public TemplateScan(Cells cells, int templateLength)
    {
        _cells = cells;
        var needed = cells.Count + templateLength;
        _transform = new FourierTransform((int)BitOperations.RoundUpToPowerOf2((uint)needed));
        var n = _transform.Length;
        (_dataRe, _dataIm, _squareRe, _squareIm) = (new float[n], new float[n], new float[n], new float[n]);
        (_workRe, _workIm) = (new float[n], new float[n]);
        cells.TemplateGradient.CopyTo(_dataRe, 0);
        cells.TemplateCurvature.CopyTo(_squareRe, 0);
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
        var t = template.Transform(_transform.Length);
        for (var i = 0; i < _workRe.Length; i++)
        {
            // num = D·conj(T) and den = S·conj(Q), both of real sequences, packed as num + i·den.
            float nr = _dataRe[i] * t.Re[i] + _dataIm[i] * t.Im[i], ni = _dataIm[i] * t.Re[i] - _dataRe[i] * t.Im[i];
            float dr = _squareRe[i] * t.SquareRe[i] + _squareIm[i] * t.SquareIm[i], di = _squareIm[i] * t.SquareRe[i] - _squareRe[i] * t.SquareIm[i];
            _workRe[i] = nr - di;
            _workIm[i] = ni + dr;
        }

        _transform.Inverse(_workRe, _workIm);
        var n = _transform.Length;
        for (var s = 0; s < best.Length; s++)
        {
            var at = (firstShift + s - _cells.First) & (n - 1);
            var evidence = LnEvidence(_workRe[at] / n, Math.Max(0, _workIm[at] / n));
            if (evidence <= best[s]) continue;
            best[s] = evidence;
            which[s] = (short)index;
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
        Vector<float> numerator = default, denominator = default;
        var i = 0;
        for (; i <= length - Vector<float>.Count; i += Vector<float>.Count)
        {
            var v = new Vector<float>(t[i..]);
            numerator += v * new Vector<float>(gradient[i..]);
            denominator += v * v * new Vector<float>(curvature[i..]);
        }

        float num = Vector.Sum(numerator), den = Vector.Sum(denominator);
        for (; i < length; i++)
        {
            num += t[i] * gradient[i];
            den += t[i] * t[i] * curvature[i];
        }

        return LnEvidence(num, den);
    }

    /// <summary>Marginal likelihood of a strength with the prior N(1, <see cref="StrengthSpread"/>²), over that of strength zero.</summary>
    private static float LnEvidence(double gradient, double curvature)
    {
        const double Precision = 1 / (StrengthSpread * StrengthSpread);
        double m = curvature + Precision, v = gradient + Precision;
        return (float)(0.5 * v * v / m - 0.5 * Precision - 0.5 * Math.Log(m / Precision));
    }
}
