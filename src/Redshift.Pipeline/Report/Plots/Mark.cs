using SkiaSharp;

namespace Redshift.Pipeline.Report.Plots;

/// <summary>How much of a round mark is filled.</summary>
internal enum Filling
{
    /// <summary>A ring.</summary>
    Open,

    /// <summary>A ring with its left half filled.</summary>
    Half,

    /// <summary>A disc.</summary>
    Full,
}

/// <summary>Round marks that say by their filling how sure something is.</summary>
internal static class Mark
{
    /// <summary>Draws a mark.</summary>
    public static void Draw(SKCanvas canvas, float x, float y, float radius, Filling filling)
    {
        using var pen = Ink.Pen(Ink.Dark, 1.2f);
        using var fill = Ink.Fill(Ink.Dark);
        if (filling == Filling.Full)
            canvas.DrawCircle(x, y, radius, fill);
        else if (filling == Filling.Half)
            canvas.DrawArc(new SKRect(x - radius, y - radius, x + radius, y + radius), 90, 180, true, fill);
        canvas.DrawCircle(x, y, radius, pen);
    }
}
