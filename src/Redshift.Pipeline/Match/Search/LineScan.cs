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
    private readonly Cells _cells;
    private readonly float[] _gradient;
    private readonly float[] _curvature;

    /// <summary>Filters the data.</summary>
    /// <param name="cells">The data.</param>
    /// <param name="sigmaLn">σ of the line in ln λ, instrument and cell included.</param>
    public LineScan(Cells cells, double sigmaLn)
    {
        _cells = cells;
        var sigma = sigmaLn / Cells.Step;
        _gradient = GaussianFilter.Convolve(cells.LineGradient, sigma);
        _curvature = GaussianFilter.Convolve(cells.LineCurvature, sigma / Math.Sqrt(2));
        var peak = 1 / (2 * Math.Sqrt(Math.PI) * Math.Max(sigma, 0.4));
        var kept = KeptByHighPass(sigmaLn);
        for (var k = 0; k < _gradient.Length; k++)
        {
            _gradient[k] /= (float)Cells.Step;
            _curvature[k] *= (float)(peak * kept / (Cells.Step * Cells.Step));
        }
    }

    /// <summary>Adds the ln evidence of a group at every <paramref name="stride"/>-th shift.</summary>
    /// <param name="group">The group.</param>
    /// <param name="firstShift">Shift in cells of element 0.</param>
    /// <param name="stride">Cells from one element to the next.</param>
    /// <param name="total">ln evidence at each shift.</param>
    public void Add(EmissionGroup group, int firstShift, int stride, Span<float> total)
    {
        var lines = Array.ConvertAll(group.Lines, l => new Slice(l, firstShift, _cells));
        var evidence = group.Evidence;
        int from = Math.Max(0, lines.Min(l => -l.Offset) / stride), to = Math.Min(total.Length, lines.Max(l => (_cells.Count - l.Offset) / stride + 1));
        for (var s = from; s < to; s++)
        {
            float gradient = 0, curvature = 0, level = 0, share = 0;
            foreach (ref readonly var line in lines.AsSpan())
            {
                var k = s * stride + line.Offset;
                if ((uint)k >= (uint)_gradient.Length) continue;
                gradient += line.Scale * _gradient[k];
                curvature += line.Scale * line.Scale * _curvature[k];
                level += line.Share * _cells.Continuum[k];
                share += line.Share;
            }

            if (curvature > 0) total[s] += evidence.LnMixture(gradient, curvature, level / share);
        }
    }

    /// <summary>Share of a line's information that the smooth continuum leaves: Gaussian filters in quadrature.</summary>
    private static double KeptByHighPass(double sigmaLn)
    {
        const double Smooth = 0.75 * SmoothFit.KnotSpacing;
        return Math.Max(0.1, 1 - sigmaLn / Math.Sqrt(sigmaLn * sigmaLn + Smooth * Smooth));
    }

    private readonly struct Slice(GroupLine line, int firstShift, Cells cells)
    {
        public readonly int Offset = (int)Math.Floor((Math.Log(line.RestA) - Cells.LnOrigin) / Cells.Step) + firstShift - cells.First;
        public readonly float Scale = (float)(line.Share / line.RestA);
        public readonly float Share = (float)line.Share;
    }
}
