using System.Globalization;
using Redshift.Physics.Statistics;
using Redshift.Pipeline.Inject;
using SkiaSharp;

namespace Redshift.Pipeline.Report.Plots;

/// <summary>What was recovered on one page: shares against signal to noise and redshift, and found against stated confidence.</summary>
public static class RecoveryPicture
{
    private const int Width = 1500;
    private const int Height = 520;
    private const float PanelWidth = 400;
    private const float Top = 100;
    private const float Bottom = 420;

    /// <summary>Shares of fewer objects swing by chance: their bins are joined with neighbours.</summary>
    private const int LeastInBin = 15;

    /// <summary>Traces of one bin stand so far apart that their bars can be told from each other.</summary>
    private const float TraceGap = 7;

    /// <summary>Draws the recovery and saves it as PNG, making the folders on the way.</summary>
    /// <exception cref="IOException">The file cannot be written.</exception>
    public static void Save(Recovery recovery, string path)
    {
        using var image = Draw(recovery);
        PictureFile.Save(image, path);
    }

    private static SKImage Draw(Recovery recovery)
    {
        using var surface = SKSurface.Create(new SKImageInfo(Width, Height));
        var canvas = surface.Canvas;
        canvas.Clear(Ink.Paper);
        var all = recovery.All;
        Write(canvas, string.Create(CultureInfo.InvariantCulture, $"{all.Members.Count} computed objects put into the spectra: {100 * all.GoodShare:F0} % right"), 70, 36, 20, Ink.Dark);
        DrawShares(canvas, 70, "share, by signal to noise a pixel", recovery.BySnr);
        DrawShares(canvas, 560, "share, by redshift (galaxies and quasars)", recovery.ByRedshift);
        DrawReliability(canvas, 1050, recovery);
        DrawKey(canvas);
        return surface.Snapshot();
    }

    private static void DrawShares(SKCanvas canvas, float left, string title, IReadOnlyList<RecoveryGroup> all)
    {
        DrawFrame(canvas, left, title);
        if (all.Count == 0)
            Write(canvas, "none was put in", left + PanelWidth / 2, (Top + Bottom) / 2, 12, Ink.Soft, SKTextAlign.Center);
        var groups = RecoveryGroup.Joined(all, LeastInBin);
        float X(int i) => left + PanelWidth * (i + 0.5f) / groups.Count;
        for (var i = 0; i < groups.Count; i++)
        {
            Write(canvas, Label(groups[i].Range), X(i), Bottom + 18, 11, Ink.Soft, SKTextAlign.Center);
            Write(canvas, "n " + groups[i].Members.Count.ToString(CultureInfo.InvariantCulture), X(i), Bottom + 34, 10, Ink.Soft, SKTextAlign.Center);
        }

        DrawTrace(canvas, Ink.Continuum, Filling.Open, [.. groups.Select((g, i) => (X(i) - TraceGap, g.Good, g.Members.Count))]);
        DrawTrace(canvas, Ink.Model, Filling.Half, [.. groups.Select((g, i) => (X(i), g.GoodConfident, g.Members.Count))]);
        DrawTrace(canvas, Ink.Dark, Filling.Full, [.. groups.Select((g, i) => (X(i) + TraceGap, g.GoodConfident, g.Confident))]);
    }

    private static string Label((double From, double To) range) => range switch
    {
        (double.NegativeInfinity, var to) => string.Create(CultureInfo.InvariantCulture, $"< {to}"),
        (var from, double.PositiveInfinity) => string.Create(CultureInfo.InvariantCulture, $"> {from}"),
        var (from, to) when from == to => from.ToString(CultureInfo.InvariantCulture),
        var (from, to) => string.Create(CultureInfo.InvariantCulture, $"{from}–{to}"),
    };

    private static void DrawReliability(SKCanvas canvas, float left, Recovery recovery)
    {
        DrawFrame(canvas, left, "right answers, by stated confidence");
        using var pen = Ink.Pen(Ink.Soft);
        using var band = Ink.Pen(Ink.Noise, 5);
        float X(double share) => left + PanelWidth * (float)share;
        canvas.DrawLine(X(0), Y(0), X(1), Y(1), pen);
        foreach (var edge in new[] { 0, 0.5, 1 })
            Write(canvas, edge.ToString("0.0", CultureInfo.InvariantCulture), X(edge), Bottom + 18, 11, Ink.Soft, SKTextAlign.Center);
        foreach (var bin in recovery.ReliabilityOf(LeastInBin))
        {
            canvas.DrawLine(X(bin.Stated), Y(bin.Low), X(bin.Stated), Y(bin.High), band);
            Mark.Draw(canvas, X(bin.Stated), Y(bin.Found), 4, bin.Off ? Filling.Open : Filling.Full);
        }
    }

    private static void DrawFrame(SKCanvas canvas, float left, string title)
    {
        using var pen = Ink.Pen(Ink.Faint);
        Write(canvas, title, left, Top - 18, 13, Ink.Dark);
        foreach (var share in new[] { 0, 0.25, 0.5, 0.75, 1 })
        {
            canvas.DrawLine(left, Y(share), left + PanelWidth, Y(share), pen);
            Write(canvas, share.ToString("0.00", CultureInfo.InvariantCulture), left - 8, Y(share) + 4, 11, Ink.Soft, SKTextAlign.Right);
        }
    }

    /// <summary>Draws shares with bars of 68 %; groups without a trial interrupt the trace.</summary>
    private static void DrawTrace(SKCanvas canvas, SKColor color, Filling filling, IReadOnlyList<(float X, int Successes, int Trials)> shares)
    {
        using var pen = Ink.Pen(color, 2);
        using var bar = Ink.Pen(color.WithAlpha(0x90), 3);
        SKPoint? before = null;
        foreach (var (x, successes, trials) in shares)
        {
            SKPoint? here = trials == 0 ? null : new(x, Y((double)successes / trials));
            if (before is { } from && here is { } to) canvas.DrawLine(from, to, pen);
            before = here;
            if (trials == 0) continue;
            var (low, high) = BinomialInterval.Wilson(successes, trials);
            canvas.DrawLine(x, Y(low), x, Y(high), bar);
        }

        foreach (var (x, successes, trials) in shares.Where(s => s.Trials > 0))
            Mark.Draw(canvas, x, Y((double)successes / trials), 4, filling);
    }

    private static void DrawKey(SKCanvas canvas)
    {
        float x = 70;
        foreach (var (color, filling, meaning) in new[]
        {
            (Ink.Continuum, Filling.Open, "right redshift"), (Ink.Model, Filling.Half, "right and likely or firm"),
            (Ink.Dark, Filling.Full, "right among the likely and firm"),
        })
        {
            using var pen = Ink.Pen(color, 2);
            canvas.DrawLine(x, Height - 28, x + 26, Height - 28, pen);
            Mark.Draw(canvas, x + 13, Height - 28, 4, filling);
            x += 62 + Write(canvas, meaning, x + 34, Height - 24, 12, Ink.Soft);
        }

        Write(canvas, "bars: 68 % of the share", x + 8, Height - 24, 12, Ink.Soft);
        Write(canvas, "bar: 95 % band if confidences are true; open: outside", 1050, Height - 24, 12, Ink.Soft);
    }

    private static float Y(double share) => Bottom - (Bottom - Top) * (float)share;

    private static float Write(SKCanvas canvas, string text, float x, float y, float size, SKColor color, SKTextAlign align = SKTextAlign.Left)
    {
        using var font = PlotFont.Sized(size);
        using var fill = Ink.Fill(color);
        canvas.DrawText(text, x, y, align, font, fill);
        return font.MeasureText(text);
    }
}
