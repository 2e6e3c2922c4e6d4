using System.Globalization;
using Redshift.Pipeline.Observations;
using Redshift.Pipeline.Results;
using ScottPlot;
using ScottPlot.TickGenerators;
using SkiaSharp;

namespace Redshift.Pipeline.Report.Plots;

/// <summary>The spectrum itself: data as ink steps, the model as a translucent band, continuum and noise as thin lines.</summary>
internal sealed class TraceChart : IDisposable
{
    private const float PaddingLeft = 78;
    private const float PaddingRight = 14;
    private const float PaddingBottom = 46;
    private const float PaddingTop = 58;
    private const float LeastStepPixels = 1.5f;

    private readonly Plot _plot;
    private readonly PixelRect _place;
    private readonly ObservationResult _result;
    private readonly List<List<Bin>> _runs;
    private readonly int _exponent;

    /// <summary>Prepares the chart for a place on the canvas.</summary>
    public TraceChart(ObservationResult result, PixelRect place)
    {
        PlotFont.Register();
        _plot = new();
        _place = place;
        _result = result;
        var spectra = result.Observation.Spectra;
        (Blue, Red) = (spectra.Min(spectrum => spectrum.Wavelength[0]), spectra.Max(spectrum => spectrum.Wavelength[^1]));
        if (Red <= Blue)
            (Blue, Red) = (Blue - 1, Red + 1);
        var width = (Red - Blue) / (Right - Left) * LeastStepPixels;
        _runs = [.. spectra.SelectMany((spectrum, i) => Bin.Runs(spectrum, result.Curves.ElementAtOrDefault(i), width))];
        (Bottom, Top) = Heights();
        _exponent = ChooseExponent(Math.Max(Top, -Bottom));
    }

    /// <summary>Shortest wavelength, Å.</summary>
    public double Blue { get; }

    /// <summary>Longest wavelength, Å.</summary>
    public double Red { get; }

    /// <summary>Left edge of the drawn spectrum in pixels.</summary>
    public float Left => _place.Left + PaddingLeft;

    /// <summary>Right edge of the drawn spectrum in pixels.</summary>
    public float Right => _place.Right - PaddingRight;

    /// <summary>Lower edge of the drawn spectrum in pixels.</summary>
    public float Foot => _place.Bottom - PaddingBottom;

    private double Bottom { get; }

    private double Top { get; }

    /// <summary>Where a wavelength lies on the canvas.</summary>
    public float X(double wavelength) => Left + (float)((wavelength - Blue) / (Red - Blue)) * (Right - Left);

    /// <summary>Draws the chart, with a thread at each of the wavelengths.</summary>
    public void Draw(SKCanvas canvas, IEnumerable<double> threads)
    {
        var scale = Math.Pow(10, -_exponent);
        foreach (var wavelength in threads)
            _plot.Add.VerticalLine(wavelength, 1, Ink.Faint.ForChart());
        foreach (var run in _runs)
            AddRun(run, scale);
        DressAxes();
        _plot.Layout.Fixed(new PixelPadding(PaddingLeft, PaddingRight, PaddingBottom, PaddingTop));
        _plot.Axes.SetLimits(Blue, Red, Bottom * scale, Top * scale);
        // The library clears what it draws on, which must not be the whole page.
        canvas.Save();
        canvas.ClipRect(_place.ToSKRect());
        _plot.Render(canvas, _place);
        canvas.Restore();
    }

    /// <inheritdoc/>
    public void Dispose() => _plot.Dispose();

    private void AddRun(List<Bin> run, double scale)
    {
        AddSteps(run, bin => bin.PixelSigma * scale, Ink.Noise, 1);
        if (!double.IsNaN(run[0].Model))
            AddBand(run, scale);
        AddSteps(run, bin => bin.Flux * scale, Ink.Dark, 1.1f);
        if (!double.IsNaN(run[0].Continuum))
            AddSmooth(run, bin => bin.Continuum * scale);
    }

    private void AddSteps(List<Bin> run, Func<Bin, double> height, SKColor color, float width)
    {
        if (double.IsNaN(height(run[0])))
            return;
        var steps = run.SelectMany(bin => new Coordinates[] { new(bin.Left, height(bin)), new(bin.Right, height(bin)) }).ToArray();
        var line = _plot.Add.ScatterLine(steps, color.ForChart());
        line.LineWidth = width;
    }

    private void AddSmooth(List<Bin> run, Func<Bin, double> height)
    {
        var line = _plot.Add.ScatterLine(run.Select(bin => new Coordinates(bin.Middle, height(bin))).ToArray(), Ink.Continuum.ForChart());
        line.LineWidth = 1.2f;
        line.LinePattern = LinePattern.DenselyDashed;
    }

    // The band is as wide as the data should scatter about the model, and never too thin to be seen.
    private void AddBand(List<Bin> run, double scale)
    {
        var least = 0.008 * (Top - Bottom);
        var band = run.Select(bin => (bin.Middle, Half: Math.Max(least, bin.Sigma), bin.Model))
            .Select(b => (b.Middle, (b.Model - b.Half) * scale, (b.Model + b.Half) * scale)).ToArray();
        var fill = _plot.Add.FillY(band);
        fill.FillColor = Ink.Model.ForChart(110);
        fill.LineWidth = 0;
        fill.MarkerStyle.IsVisible = false;
    }

    private void DressAxes()
    {
        _plot.FigureBackground.Color = Ink.Paper.ForChart();
        _plot.DataBackground.Color = Ink.Paper.ForChart();
        _plot.Axes.Color(Ink.Soft.ForChart());
        _plot.Axes.Right.FrameLineStyle.IsVisible = false;
        _plot.Grid.MajorLineColor = Ink.Faint.ForChart(120);
        _plot.Axes.Bottom.TickGenerator = PlainTicks();
        _plot.Axes.Left.TickGenerator = PlainTicks();
        _plot.Axes.Bottom.Label.Text = "wavelength in vacuum (Å)";
        _plot.Axes.Left.Label.Text = FluxLabel();
        foreach (var label in new[] { _plot.Axes.Bottom.Label, _plot.Axes.Left.Label, _plot.Axes.Top.Label })
            (label.Bold, label.FontSize, label.ForeColor) = (false, 13, Ink.Dark.ForChart());
        if (_result.ZFile is { } z)
            DressRestAxis(z);
    }

    private void DressRestAxis(double z)
    {
        _plot.Axes.Top.Range.Set(Blue / (1 + z), Red / (1 + z));
        _plot.Axes.Top.TickGenerator = PlainTicks();
        _plot.Axes.Top.Label.Text = "at rest (Å)";
    }

    private static NumericAutomatic PlainTicks() =>
        new() { LabelFormatter = value => value.ToString("0.######", CultureInfo.InvariantCulture) };

    private string FluxLabel()
    {
        var unit = HarmlessText.Printable(_result.Observation.Spectra[0].FluxUnit.Trim());
        var power = _exponent == 0 ? "" : "10" + Superscript(_exponent);
        var inside = string.Join(' ', new[] { power, unit }.Where(part => part.Length > 0));
        return inside.Length == 0 ? "flux" : $"flux ({inside})";
    }

    private static string Superscript(int number) => string.Concat(
        number.ToString(CultureInfo.InvariantCulture)
            .Select(sign => sign == '-' ? '⁻' : "⁰¹²³⁴⁵⁶⁷⁸⁹"[sign - '0']));

    // From zero, where the noise runs, to above nearly all data and all of the model.
    private (double Bottom, double Top) Heights()
    {
        var heights = _runs.SelectMany(run => run).Select(bin => bin.Flux).Order().ToArray();
        if (heights.Length == 0)
            return (0, 1);
        var models = _runs.SelectMany(run => run).Select(bin => bin.Model).Where(double.IsFinite).DefaultIfEmpty(0).ToArray();
        var low = Math.Min(0, Math.Min(heights[heights.Length / 200], models.Min()));
        var high = Math.Max(heights[(heights.Length - 1) * 199 / 200], models.Max());
        var margin = Math.Max(high - low, 1e-300) * 0.05;
        return (low < 0 ? low - margin : 0, high + margin);
    }

    private static int ChooseExponent(double height)
    {
        var exponent = height > 0 ? (int)Math.Floor(Math.Log10(height)) : 0;
        return Math.Abs(exponent) > 3 ? exponent : 0;
    }
}
