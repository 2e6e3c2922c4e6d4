using System.Globalization;
using Redshift.Physics.Units;
using Redshift.Pipeline.Results;
using ScottPlot;
using SkiaSharp;

namespace Redshift.Pipeline.Report.Plots;

/// <summary>One observation on one page: the answer, the spectrum with its model, the lines by family, the rivals.</summary>
public static class SpectrumPicture
{
    private const int Width = 1500;
    private const int TraceHeight = 470;
    private const int Head = 62;
    private const int Side = 176;
    private const int Margin = 18;

    /// <summary>Draws a result and saves it as PNG, making the folders on the way.</summary>
    /// <exception cref="IOException">The file cannot be written.</exception>
    public static void Save(ObservationResult result, string path)
    {
        using var image = Draw(result);
        PictureFile.Save(image, path);
    }

    private static SKImage Draw(ObservationResult result)
    {
        var rails = new LineRails(result);
        var height = Head + TraceHeight + (int)rails.Height + Margin + 20;
        using var surface = SKSurface.Create(new SKImageInfo(Width, height));
        var canvas = surface.Canvas;
        canvas.Clear(Ink.Paper);
        using var chart = new TraceChart(result, new PixelRect(Side + Margin, Width - Margin, Head + TraceHeight, Head));
        chart.Draw(canvas, rails.Threads);
        rails.Draw(canvas, chart, Head + TraceHeight);
        new CandidateRail(result, new SKRect(Margin + 10, Head + 34, Side, Head + TraceHeight - 20)).Draw(canvas);
        DrawHead(canvas, result);
        DrawKey(canvas, chart.Left, height - 12);
        return surface.Snapshot();
    }

    private static void DrawHead(SKCanvas canvas, ObservationResult result)
    {
        using var large = PlotFont.Sized(22);
        using var small = PlotFont.Sized(13);
        using var ink = Ink.Fill(Ink.Dark);
        using var soft = Ink.Fill(Ink.Soft);
        if (result.Verdict != Verdict.Nothing)
            Mark.Draw(canvas, Margin + 10, 26, 8, Sureness(result.Verdict));
        canvas.DrawText(Answer(result), Margin + 30, 34, SKTextAlign.Left, large, ink);
        canvas.DrawText(Details(result), Margin + 30, 56, SKTextAlign.Left, small, soft);
    }

    private static void DrawKey(SKCanvas canvas, float x, float y)
    {
        using var font = PlotFont.Sized(11);
        using var soft = Ink.Fill(Ink.Soft);
        (SKColor Color, string Meaning)[] entries =
            [(Ink.Dark, "data"), (Ink.Model, "model"), (Ink.Continuum, "continuum"), (Ink.Noise, "noise of a pixel")];
        foreach (var (color, meaning) in entries)
        {
            using var pen = Ink.Pen(color, 3);
            canvas.DrawLine(x, y - 4, x + 22, y - 4, pen);
            canvas.DrawText(meaning, x + 28, y, SKTextAlign.Left, font, soft);
            x += 48 + font.MeasureText(meaning);
        }

        foreach (var (filling, meaning) in new[] { (Filling.Full, "measured"), (Filling.Half, "blended"), (Filling.Open, "expected, not found") })
        {
            Mark.Draw(canvas, x + 8, y - 4, 3.4f, filling);
            canvas.DrawText(meaning, x + 18, y, SKTextAlign.Left, font, soft);
            x += 38 + font.MeasureText(meaning);
        }

        canvas.DrawText("emission above its rail, absorption below", x + 8, y, SKTextAlign.Left, font, soft);
    }

    private static Filling Sureness(Verdict verdict) => verdict switch
    {
        Verdict.Firm => Filling.Full,
        Verdict.Likely => Filling.Half,
        _ => Filling.Open,
    };

    private static string Answer(ObservationResult result)
    {
        var name = HarmlessText.Printable(result.Observation.Target.Trim());
        var who = name.Length == 0 ? "" : name + "   ";
        if (result.Z is not { } z)
            return who + "no evidence of an object";
        var error = Velocity.SpeedOfLightKmS * (result.ZErr ?? double.NaN);
        var velocity = Velocity.SpeedOfLightKmS * z;
        return who + (result.Kind == ObjectKind.Star
            ? string.Create(CultureInfo.InvariantCulture, $"star {result.SpectralType}   {velocity:+0.0;-0.0} ± {error:F1} km/s")
            : string.Create(CultureInfo.InvariantCulture, $"{Words.Of(result.Kind)}   z = {z:F5} ± {result.ZErr ?? double.NaN:F5}"));
    }

    private static string Details(ObservationResult result)
    {
        var observation = result.Observation;
        var parts = new List<string>
        {
            $"{Words.Of(result.Verdict)}, confidence {Cell.Fixed(result.Confidence, 4).Text}",
            $"frame {Words.Of(observation.Frame)}",
            $"S/N {Cell.Fixed(result.SnrPixel, 1).Text} a pixel",
            observation.Row == 0 ? observation.Source : $"{observation.Source} row {observation.Row}",
        };
        parts.AddRange(CatalogueColumns.Cautions(result));
        return HarmlessText.Printable(string.Join("  |  ", parts));
    }
}
