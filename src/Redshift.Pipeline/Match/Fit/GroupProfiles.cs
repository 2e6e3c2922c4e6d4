using System.Runtime.Intrinsics;
using Redshift.Physics.Units;
using Redshift.Pipeline.Match.Models;
using Redshift.Pipeline.Numerics;

namespace Redshift.Pipeline.Match.Fit;

/// <summary>Draws the lines of emission groups at the pixels, as columns of a fit.</summary>
internal sealed class GroupProfiles(FitPixels pixels)
{
    private const double KmSPerLn = Velocity.SpeedOfLightKmS;
    private const double InverseRootTwoPi = 0.3989422804014327;

    /// <summary>Lines are cut so many σ from their centres.</summary>
    private const double Reach = 4;

    private readonly float[] _canvas = new float[pixels.Flux.Length];
    private readonly List<(int Start, int End)> _drawn = [];

    /// <summary>Adds the column of a group, if any of its lines is in range.</summary>
    /// <param name="columns">The columns.</param>
    /// <param name="group">The group.</param>
    /// <param name="lnShift">ln(1+z).</param>
    /// <param name="widthKmS">σ of the group's lines.</param>
    /// <param name="forest">The forest below Lyman alpha, null where there is none.</param>
    /// <param name="transmission">What the lines shine through, a value a pixel; null for nothing.</param>
    public void AddColumn(FitColumns columns, EmissionGroup group, double lnShift, double widthKmS, ForestPixels? forest, float[]? transmission)
    {
        double width = widthKmS / KmSPerLn, level = 0, share = 0;
        _drawn.Clear();
        foreach (var line in group.Lines)
        {
            var own = line.WidthKmS / KmSPerLn;
            for (var s = 0; s + 1 < pixels.Starts.Length; s++)
            {
                if (!Draw(line, line.LnRest + lnShift, Math.Sqrt(width * width + own * own), s)) continue;
                var (start, end) = _drawn[^1];
                level += line.Share * (forest?.LevelBeside(s, line.LnRest, lnShift) ?? pixels.Continuum[start + (end - start) / 2]);
                share += line.Share;
            }
        }

        if (_drawn.Count == 0) return;
        ref var column = ref columns.Add();
        column.Group = group;
        column.Level = level / share;
        Cut(columns, transmission);
    }

    private bool Draw(GroupLine line, double centre, double sigma, int spectrum)
    {
        int from = pixels.Starts[spectrum], to = pixels.Starts[spectrum + 1];
        if (centre < pixels.LnWavelength[from] || centre > pixels.LnWavelength[to - 1]) return false;
        var near = Math.Min(pixels.Find(spectrum, centre), to - 1);
        double instrument = pixels.SigmaLn[near], total = Math.Sqrt(sigma * sigma + instrument * instrument);
        int start = pixels.Find(spectrum, centre - Reach * total), end = pixels.Find(spectrum, centre + Reach * total);
        if (end <= start) return false;
        Draw(start, end, centre, 1 / total, (float)(line.Share / line.RestA * InverseRootTwoPi / total));
        _drawn.Add((start, end));
        return true;
    }

    private void Draw(int start, int end, double centre, double perSigma, float height)
    {
        Vector256<double> middle = Vector256.Create(centre), scale = Vector256.Create(perSigma);
        for (var p = start; p < end; p += Kernels.Lanes)
        {
            var low = (Vector256.Create(pixels.LnWavelength, p) - middle) * scale;
            var high = (Vector256.Create(pixels.LnWavelength, p + 4) - middle) * scale;
            var profile = VectorMath.Gaussian(Vector256.Narrow(low, high)) * height;
            if (end - p < Kernels.Lanes) profile &= Kernels.Mask(end - p);
            (Vector256.Create(_canvas, p) + profile).CopyTo(_canvas, p);
        }
    }

    /// <summary>Moves what was drawn from the canvas to the column, stretches that touch as one.</summary>
    private void Cut(FitColumns columns, float[]? transmission)
    {
        _drawn.Sort();
        var (start, end) = _drawn[0];
        foreach (var (next, stop) in _drawn)
        {
            if (next > end)
            {
                Cut(columns, start, end, transmission);
                (start, end) = (next, stop);
            }

            end = Math.Max(end, stop);
        }

        Cut(columns, start, end, transmission);
    }

    private void Cut(FitColumns columns, int start, int end, float[]? transmission)
    {
        var values = columns.AddSegment(start, end)[..(end - start)];
        var drawn = _canvas.AsSpan(start, end - start);
        if (transmission is null) drawn.CopyTo(values);
        else Kernels.Multiply(drawn, transmission.AsSpan(start), values);
        drawn.Clear();
    }
}
