using Redshift.Pipeline.Results;
using SkiaSharp;

namespace Redshift.Pipeline.Report.Plots;

/// <summary>
/// Line names on rails under the trace, one rail a family. Emission stands above its rail, absorption hangs below; a full mark is a
/// measured line, a half one a blend, an open one a line that should be there and is not.
/// </summary>
internal sealed class LineRails
{
    private const float RowHeight = 13;
    private const float MarkHeight = 10;
    private const float MarkRadius = 3.4f;
    private const float EmptySide = 12;
    private const int MostRows = 2;
    private const int MostThreads = 30;

    private readonly ObservationResult _result;
    private readonly List<Rail> _rails;

    /// <summary>Sorts the lines of a result to rails.</summary>
    public LineRails(ObservationResult result)
    {
        _result = result;
        _rails = [.. result.Lines.Where(line => Position(line) is not null).GroupBy(line => line.Family)
            .OrderBy(family => Rank(family.Key)).ThenBy(family => family.Key, StringComparer.Ordinal)
            .Select(family => new Rail(family.Key, [.. family.Where(line => !IsAbsorption(line))], [.. family.Where(IsAbsorption)]))];
    }

    /// <summary>Height of all rails in pixels.</summary>
    public float Height => _rails.Sum(RailHeight);

    /// <summary>Wavelengths of the lines that carry the answer, strongest first, for threads between trace and rails.</summary>
    public IEnumerable<double> Threads => _result.Lines.Where(line => line.State == LineState.Matched)
        .OrderByDescending(line => line.LnLikelihoodGain ?? 0).Take(MostThreads).Select(line => Position(line)).OfType<double>();

    /// <summary>Draws the rails under a chart.</summary>
    public void Draw(SKCanvas canvas, TraceChart chart, float top)
    {
        DrawThreads(canvas, chart, top);
        foreach (var rail in _rails)
        {
            var y = top + (rail.Emission.Count > 0 ? SideHeight : EmptySide);
            DrawRail(canvas, chart, rail, y);
            top += RailHeight(rail);
        }
    }

    private static float SideHeight => MostRows * RowHeight + MarkHeight;

    private static float RailHeight(Rail rail) =>
        (rail.Emission.Count > 0 ? SideHeight : EmptySide) + (rail.Absorption.Count > 0 ? SideHeight : EmptySide) + 6;

    private void DrawThreads(SKCanvas canvas, TraceChart chart, float top)
    {
        using var pen = Ink.Pen(Ink.Faint);
        foreach (var x in Threads.Select(chart.X))
            canvas.DrawLine(x, top, x, top + Height, pen);
    }

    private void DrawRail(SKCanvas canvas, TraceChart chart, Rail rail, float y)
    {
        using var font = PlotFont.Sized(11);
        using var pen = Ink.Pen(Ink.Soft);
        using var fill = Ink.Fill(Ink.Soft);
        canvas.DrawText(rail.Family, chart.Left - 10, y + 4, SKTextAlign.Right, font, fill);
        canvas.DrawLine(chart.Left, y, chart.Right, y, pen);
        DrawSide(canvas, chart, rail.Emission, y, -1);
        DrawSide(canvas, chart, rail.Absorption, y, 1);
    }

    // The strongest lines take their places first; a name that finds none is left out, its mark stays.
    private void DrawSide(SKCanvas canvas, TraceChart chart, List<LineMeasurement> lines, float y, int side)
    {
        using var font = PlotFont.Sized(10.5f);
        using var ink = Ink.Fill(Ink.Dark);
        var taken = new List<(float Left, float Right, int Row)>();
        foreach (var line in lines.OrderByDescending(line => line.LnLikelihoodGain ?? 0))
        {
            if (Position(line) is not { } wavelength || wavelength < chart.Blue || wavelength > chart.Red)
                continue;
            var x = chart.X(wavelength);
            DrawMark(canvas, line.State, x, y + side * MarkHeight / 2);
            var name = HarmlessText.Printable(line.Line);
            var half = font.MeasureText(name) / 2 + 3;
            var middle = Math.Clamp(x, chart.Left + half, Math.Max(chart.Left + half, chart.Right - half));
            var row = Enumerable.Range(0, MostRows).FirstOrDefault(
                r => !taken.Exists(t => t.Row == r && t.Left < middle + half && middle - half < t.Right), -1);
            if (row < 0)
                continue;
            taken.Add((middle - half, middle + half, row));
            var offset = MarkHeight + row * RowHeight + (side > 0 ? RowHeight - 3 : 3);
            canvas.DrawText(name, middle, y + side * offset, SKTextAlign.Center, font, ink);
        }
    }

    private static void DrawMark(SKCanvas canvas, LineState state, float x, float y)
    {
        using var pen = Ink.Pen(Ink.Dark, 1.2f);
        using var fill = Ink.Fill(Ink.Dark);
        if (state == LineState.Masked)
        {
            canvas.DrawLine(x - MarkRadius, y, x + MarkRadius, y, pen);
            return;
        }

        Mark.Draw(canvas, x, y, MarkRadius, state switch
        {
            LineState.Matched => Filling.Full,
            LineState.Blended => Filling.Half,
            _ => Filling.Open,
        });
    }

    private double? Position(LineMeasurement line) =>
        line.ObservedVacuumA ?? (line.RestVacuumA is { } rest && _result.ZFile is { } z ? rest * (1 + z) : null);

    private bool IsAbsorption(LineMeasurement line)
    {
        if (line.EquivalentWidthRestA is { } width && line.State != LineState.ExpectedMissing)
            return width > 0;
        return Position(line) is { } wavelength && ModelExcess(wavelength) is { } excess ? excess < 0 : line.Flux < 0;
    }

    private double? ModelExcess(double wavelength)
    {
        for (var i = 0; i < _result.Curves.Count; i++)
        {
            var axis = _result.Observation.Spectra[i].Wavelength;
            var pixel = Array.BinarySearch(axis, wavelength);
            pixel = pixel < 0 ? ~pixel : pixel;
            if (pixel > 0 && pixel < axis.Length)
                return _result.Curves[i].Model[pixel] - _result.Curves[i].Continuum[pixel];
        }

        return null;
    }

    private static int Rank(string family) => family switch
    {
        "hydrogen" => 0,
        "helium" => 1,
        "metals" => 2,
        "forbidden" => 3,
        _ => 4,
    };

    private sealed record Rail(string Family, List<LineMeasurement> Emission, List<LineMeasurement> Absorption);
}
