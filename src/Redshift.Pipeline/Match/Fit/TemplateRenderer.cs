using System.Runtime.Intrinsics;
using Redshift.Pipeline.Match.Models;
using Redshift.Pipeline.Numerics;

namespace Redshift.Pipeline.Match.Fit;

/// <summary>Draws computed spectra at the pixels, by linear interpolation; beyond the ends of the template grid the last value holds.</summary>
internal sealed class TemplateRenderer(FitPixels pixels)
{
    /// <summary>Draws a template.</summary>
    /// <param name="template">The template.</param>
    /// <param name="lnShift">ln(1+z).</param>
    /// <param name="into">Receives one value a pixel.</param>
    public void Render(Template template, double lnShift, Span<float> into)
    {
        var shift = lnShift / TemplateGrid.Step;
        var whole = (int)Math.Floor(shift);
        foreach (var (start, end, level) in pixels.Levels)
        {
            // The pixels of a level rise in wavelength; between neighbours on the grid may mean the one below.
            var stretch = Stretch.Around(pixels.TemplateIndex[start] - whole - 1, pixels.TemplateIndex[end - 1] - whole + 2);
            Render(template.Broadened(level, stretch), whole + stretch.Start, (float)(shift - whole), start, into[start..end]);
        }
    }

    private void Render(ReadOnlySpan<float> values, int origin, float part, int start, Span<float> into)
    {
        Span<float> drawn = stackalloc float[Kernels.Lanes];
        for (var p = 0; p < into.Length; p += Kernels.Lanes)
        {
            Interpolate(values, Vector256.Create(pixels.TemplateIndex, start + p) - Vector256.Create(origin), Vector256.Create(pixels.TemplateFraction, start + p) - Vector256.Create(part), drawn);
            if (p + Kernels.Lanes <= into.Length) drawn.CopyTo(into[p..]);
            else drawn[..(into.Length - p)].CopyTo(into[p..]);
        }
    }

    /// <summary>Eight values between neighbours at <paramref name="index"/>, at fractions from −1 to 1.</summary>
    private static void Interpolate(ReadOnlySpan<float> values, Vector256<int> index, Vector256<float> fraction, Span<float> drawn)
    {
        var below = Vector256.LessThan(fraction, Vector256<float>.Zero);
        index += below.AsInt32();
        fraction += below & Vector256<float>.One;
        var last = Vector256.Create(values.Length - 2);
        var inside = Vector256.Max(Vector256<int>.Zero, Vector256.Min(last, index));
        fraction = Vector256.ConditionalSelect(Vector256.LessThan(index, Vector256<int>.Zero).AsSingle(), Vector256<float>.Zero, fraction);
        fraction = Vector256.ConditionalSelect(Vector256.GreaterThan(index, last).AsSingle(), Vector256<float>.One, fraction);
        var left = Vector256.Create(
            values[inside[0]], values[inside[1]], values[inside[2]], values[inside[3]], values[inside[4]], values[inside[5]], values[inside[6]], values[inside[7]]);
        values = values[1..];
        var right = Vector256.Create(
            values[inside[0]], values[inside[1]], values[inside[2]], values[inside[3]], values[inside[4]], values[inside[5]], values[inside[6]], values[inside[7]]);
        (left + fraction * (right - left)).CopyTo(drawn);
    }
}
