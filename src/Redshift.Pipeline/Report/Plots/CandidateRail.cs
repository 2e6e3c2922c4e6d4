using System.Globalization;
using Redshift.Pipeline.Results;
using SkiaSharp;

namespace Redshift.Pipeline.Report.Plots;

/// <summary>
/// A narrow upright rail over redshift: each candidate is a bar as long as its share of the posterior, a handle marks the answer.
/// Equal steps of the rail are equal steps of ln(1+z), as everywhere in the search.
/// </summary>
internal sealed class CandidateRail(ObservationResult result, SKRect place)
{
    private const int MostCandidates = 7;
    private const float LabelHeight = 30;

    /// <summary>Draws the rail, or nothing where there is no candidate.</summary>
    public void Draw(SKCanvas canvas)
    {
        var candidates = result.Candidates.Take(MostCandidates).OrderByDescending(candidate => candidate.Z).ToList();
        if (candidates.Count == 0)
            return;
        DrawAxis(canvas, candidates);
        var wanted = candidates.ConvertAll(candidate => Y(candidate.Z, candidates));
        var placed = Spreading.Apart(wanted, LabelHeight, place.Top + 24, place.Bottom - 16);
        for (var i = 0; i < candidates.Count; i++)
            DrawCandidate(canvas, candidates[i], wanted[i], placed[i]);
    }

    private void DrawAxis(SKCanvas canvas, List<Candidate> candidates)
    {
        using var font = PlotFont.Sized(11);
        using var pen = Ink.Pen(Ink.Soft);
        using var fill = Ink.Fill(Ink.Soft);
        canvas.DrawLine(place.Left, place.Top + 14, place.Left, place.Bottom, pen);
        canvas.DrawText("candidates by redshift", place.Left - 4, place.Top, SKTextAlign.Left, font, fill);
        if (result.Candidates[0] is var answer && result.ZFile is not null)
            DrawHandle(canvas, Y(answer.Z, candidates));
    }

    private void DrawHandle(SKCanvas canvas, float y)
    {
        using var fill = Ink.Fill(Ink.Dark);
        using var path = new SKPath();
        path.AddPoly([new(place.Left - 9, y - 5), new(place.Left - 1, y), new(place.Left - 9, y + 5)]);
        canvas.DrawPath(path, fill);
    }

    private void DrawCandidate(SKCanvas canvas, Candidate candidate, float from, float to)
    {
        const float thread = 16;
        using var font = PlotFont.Sized(11);
        using var ink = Ink.Fill(Ink.Dark);
        using var soft = Ink.Fill(Ink.Soft);
        using var bar = Ink.Fill(Ink.Model.WithAlpha(150));
        using var pen = Ink.Pen(Ink.Soft);
        canvas.DrawLine(place.Left, from, place.Left + thread, to, pen);
        var start = place.Left + thread;
        var length = (float)Math.Max(1, (place.Width - thread) * candidate.Probability);
        canvas.DrawRect(start, to - 2, length, 4, bar);
        var z = candidate.Z.ToString("F4", CultureInfo.InvariantCulture);
        canvas.DrawText($"{Words.Of(candidate.Kind)} {z}", start + 2, to - 5, SKTextAlign.Left, font, ink);
        canvas.DrawText(Percent(candidate.Probability), place.Right, to - 5, SKTextAlign.Right, font, soft);
    }

    private static string Percent(double share) =>
        share < 0.01 ? "<1 %" : Math.Floor(100 * share).ToString("F0", CultureInfo.InvariantCulture) + " %";

    // The rail ends a little beyond the outermost candidates; with one candidate it sits in the middle.
    private float Y(double z, List<Candidate> candidates)
    {
        var (low, high) = (Math.Log(1 + candidates[^1].Z), Math.Log(1 + candidates[0].Z));
        var fraction = high > low ? (Math.Log(1 + z) - low) / (high - low) : 0.5;
        return place.Bottom - 30 - (float)fraction * (place.Height - 80);
    }
}
