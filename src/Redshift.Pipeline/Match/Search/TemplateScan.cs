using System.Numerics;
using System.Runtime.Intrinsics;
using Redshift.Pipeline.Match.Models;
using Redshift.Pipeline.Numerics;

namespace Redshift.Pipeline.Match.Search;

/// <summary>
/// ln evidence of templates' strengths over all redshifts by FFT, eight templates at once, in steps of two cells: populations move with
/// a dispersion that leaves no lines narrower than that. Each stretch of shifts needs a transform little longer than the data alone.
/// </summary>
internal sealed class TemplateScan
{
    /// <summary>Starts of stretches are rounded down to so many double cells, so that observations alike share the templates' transforms.</summary>
    private const int Rounding = 128;

    private readonly int _level;
    private readonly int _first;
    private readonly int _count;
    private readonly FourierTransform _transform;
    private readonly Vector256<float>[] _dataRe;
    private readonly Vector256<float>[] _dataIm;
    private readonly Vector256<float>[] _workRe;
    private readonly Vector256<float>[] _workIm;

    /// <summary>Transforms the data.</summary>
    public TemplateScan(Cells cells)
    {
        _level = LineSpreadLevels.Nearest(cells.SigmaLn);
        var pairs = cells.Pairs;
        (_first, _count) = (pairs.First + DoubleCells.Margin, pairs.Gradient.Length - 2 * DoubleCells.Margin);
        _transform = FourierTransform.OfLength(TransformLength(_count));
        var n = _transform.Length;
        (_dataRe, _dataIm, _workRe, _workIm) = (new Vector256<float>[n], new Vector256<float>[n], new Vector256<float>[n], new Vector256<float>[n]);
        for (var at = 0; at < _count; at++)
        {
            _dataRe[at] = Vector256.Create(pairs.Gradient[at + DoubleCells.Margin]);
            _dataIm[at] = Vector256.Create(pairs.Curvature[at + DoubleCells.Margin]);
        }

        _transform.Forward(_dataRe, _dataIm);
    }

    /// <summary>Takes the larger of what is there and each template's ln evidence at each shift, noting which template it was.</summary>
    /// <param name="range">The templates; the same instance for all calls.</param>
    /// <param name="firstShift">Shift in double cells of element 0.</param>
    /// <param name="best">ln evidence at each shift.</param>
    /// <param name="which">Number of the best template.</param>
    /// <param name="apart">ln evidence of the template that is kept apart.</param>
    public void Take(TemplateRange range, int firstShift, Span<float> best, Span<short> which, Span<float> apart)
    {
        var most = _transform.Length - _count - Rounding;
        for (var from = 0; from < best.Length; from += most)
        {
            var length = Math.Min(most, best.Length - from);
            for (var octet = 0; octet * Vector256<float>.Count < range.Templates.Count; octet++)
                Take(range, octet, firstShift + from, best.Slice(from, length), which.Slice(from, length), apart.Slice(from, length));
        }
    }

    /// <summary>The shortest that leaves room for as many shifts as there are data.</summary>
    private static int TransformLength(int count)
    {
        var length = (int)BitOperations.RoundUpToPowerOf2((uint)(count + Rounding + 1));
        return length - count - Rounding < count / 2 ? 2 * length : length;
    }

    private void Take(TemplateRange range, int octet, int firstShift, Span<float> best, Span<short> which, Span<float> apart)
    {
        // The template's first cell on the data at the greatest shift; smaller shifts begin further on.
        var wanted = _first - (firstShift + best.Length - 1);
        var start = (int)Math.Floor((double)wanted / Rounding) * Rounding;
        Correlate(TemplateTransforms.Of(range, octet, _level, start, _transform.Length));
        _transform.Inverse(_workRe, _workIm);
        var lanes = new Lanes(range.Templates, octet);
        var scale = 1f / _transform.Length;
        for (var s = 0; s < best.Length; s++)
        {
            var at = best.Length - 1 - s + wanted - start;
            var evidence = Strength.LnEvidence(_workRe[at] * scale, Vector256.Max(Vector256<float>.Zero, _workIm[at] * scale), lanes.Precision);
            if (lanes.Apart >= 0) apart[s] = evidence[lanes.Apart];
            evidence = lanes.Allowed(evidence, (firstShift + s) * 2 * Cells.Step);
            if (!Vector256.GreaterThanAny(evidence, Vector256.Create(best[s]))) continue;
            for (var lane = 0; lane < Vector256<float>.Count; lane++)
                if (evidence[lane] > best[s]) (best[s], which[s]) = (evidence[lane], (short)range.Templates[octet * Vector256<float>.Count + lane].Index);
        }
    }

    /// <summary>num = conj(D)·T and den = conj(S)·Q of real sequences, packed as num + i·den; D and S are themselves packed as D + i·S.</summary>
    private void Correlate(TemplateTransforms t)
    {
        var n = _transform.Length;
        for (var f = 0; f <= n / 2; f++)
        {
            var mirror = (n - f) & (n - 1);
            Vector256<float> dr = (_dataRe[f] + _dataRe[mirror]) * 0.5f, di = (_dataIm[f] - _dataIm[mirror]) * 0.5f;
            Vector256<float> sr = (_dataIm[f] + _dataIm[mirror]) * 0.5f, si = (_dataRe[mirror] - _dataRe[f]) * 0.5f;
            Vector256<float> nr = dr * t.Re[f] + di * t.Im[f], ni = dr * t.Im[f] - di * t.Re[f];
            Vector256<float> qr = sr * t.SquareRe[f] + si * t.SquareIm[f], qi = sr * t.SquareIm[f] - si * t.SquareRe[f];
            (_workRe[f], _workIm[f]) = (nr - qi, ni + qr);
            (_workRe[mirror], _workIm[mirror]) = (nr + qi, qr - ni);
        }
    }

    /// <summary>What is known of eight templates.</summary>
    private readonly struct Lanes
    {
        private readonly Vector256<float> _greatest;

        public Lanes(IReadOnlyList<SearchedTemplate> templates, int octet)
        {
            (Apart, Precision) = (-1, Vector256<float>.One);
            _greatest = Vector256.Create(float.NegativeInfinity);
            for (var lane = 0; lane < Vector256<float>.Count && octet * Vector256<float>.Count + lane < templates.Count; lane++)
            {
                var template = templates[octet * Vector256<float>.Count + lane];
                Precision = Precision.WithElement(lane, (float)(1 / (template.Spread * template.Spread)));
                if (template.Index < 0) Apart = lane;
                else _greatest = _greatest.WithElement(lane, (float)Math.Min(template.GreatestLnShift, float.MaxValue));
            }
        }

        /// <summary>The lane that is kept apart; negative for none.</summary>
        public int Apart { get; }

        /// <summary>1/σ² of the prior strengths.</summary>
        public Vector256<float> Precision { get; }

        /// <summary>The evidence of the templates that can exist at a redshift and are not kept apart.</summary>
        public Vector256<float> Allowed(Vector256<float> evidence, double lnShift) => Vector256.ConditionalSelect(
            Vector256.LessThanOrEqual(Vector256.Create((float)lnShift), _greatest), evidence, Vector256.Create(float.NegativeInfinity));
    }
}
