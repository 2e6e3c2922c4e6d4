using SkiaSharp;

namespace Redshift.Pipeline.Report.Plots;

/// <summary>The colours of the pictures: ink on paper, one warm colour for the model, nothing that means good or bad.</summary>
internal static class Ink
{
    /// <summary>Background.</summary>
    public static SKColor Paper { get; } = new(0xFB, 0xFA, 0xF6);

    /// <summary>Data, letters and marks.</summary>
    public static SKColor Dark { get; } = new(0x1F, 0x2D, 0x3D);

    /// <summary>Secondary letters and axes.</summary>
    public static SKColor Soft { get; } = new(0x6B, 0x74, 0x7D);

    /// <summary>Threads and grid.</summary>
    public static SKColor Faint { get; } = new(0xD9, 0xD6, 0xCC);

    /// <summary>The model.</summary>
    public static SKColor Model { get; } = new(0xC2, 0x6A, 0x1B);

    /// <summary>The continuum.</summary>
    public static SKColor Continuum { get; } = new(0x2A, 0x6F, 0x8F);

    /// <summary>The noise.</summary>
    public static SKColor Noise { get; } = new(0xA2, 0x9A, 0xAE);

    /// <summary>The same colour for the charting library.</summary>
    public static ScottPlot.Color ForChart(this SKColor color, byte alpha = 255) => new(color.Red, color.Green, color.Blue, alpha);

    /// <summary>A pen.</summary>
    public static SKPaint Pen(SKColor color, float width = 1) =>
        new() { Color = color, StrokeWidth = width, Style = SKPaintStyle.Stroke, IsAntialias = true };

    /// <summary>A fill.</summary>
    public static SKPaint Fill(SKColor color) => new() { Color = color, Style = SKPaintStyle.Fill, IsAntialias = true };
}
