using Redshift.Physics.Profiles;
using Redshift.Pipeline.Normalize;

namespace Redshift.Pipeline.Match.Measure;

/// <summary>Measures lines at the answer: each in the spectrum that says most about it, first in the model, then in the data.</summary>
internal sealed class LineMeasurer(NormalizedObservation observation, NativeModel native)
{
    /// <summary>Steps of the search for the width of the model's own line.</summary>
    private const double WidthStep = 1.5;

    /// <summary>A line can be that much narrower than the stated line spread before something is wrong with one of the two.</summary>
    private const double NarrowestShare = 0.7;

    /// <summary>Lines nearer than so many FWHM shift and widen together.</summary>
    private const double TiedFwhm = 2;

    /// <summary>Signal to noise from which the model's other lines are fitted along.</summary>
    private const double NeighbourSignal = 2;

    /// <summary>Signal to noise in the model from which a line is fitted whatever the data show.</summary>
    private const double Foreseen = 1;

    /// <summary>Signal to noise in a quick look from which an unforeseen line is fitted.</summary>
    private const double Noticed = 2;

    /// <summary>Signal to noise of a line that is clearly there.</summary>
    private const double Clear = 4;

    /// <summary>Measures all lines that fall into a spectrum.</summary>
    /// <param name="targets">Lines by rising centre, none of them blended with another.</param>
    public List<MeasuredLine> Measure(IReadOnlyList<LineTarget> targets)
    {
        var predicted = targets.Select(t => Predict(t, targets)).OfType<Prediction>().ToList();
        return predicted.ConvertAll(p => Measure(p, predicted));
    }

    /// <summary>σ of the line spread at a place, or null outside all spectra.</summary>
    public double? InstrumentSigma(double lnWavelength) =>
        Place(lnWavelength) is var (spectrum, pixel) ? observation.Spectra[spectrum].SigmaLn[pixel] : null;

    /// <summary>Whether the answer's model stands above the smooth spectrum at a place.</summary>
    public bool IsEmission(double lnWavelength) =>
        Place(lnWavelength) is var (spectrum, pixel) && native.ModelOf(spectrum)[pixel] > native.SmoothOf(spectrum)[pixel];

    /// <summary>Measures a feature that the answer does not explain.</summary>
    public (FittedLine Line, double Instrument, int Spectrum)? MeasureFeature(double lnWavelength, double sigma)
    {
        if (Place(lnWavelength) is not var (spectrum, pixel)) return null;
        double instrument = observation.Spectra[spectrum].SigmaLn[pixel];
        var shape = new LineShape(lnWavelength, Math.Max(sigma, NarrowestShare * instrument), 0.5 * sigma, 0.3 * instrument);
        var line = GaussianFit.Fit(observation.Spectra[spectrum], observation.Spectra[spectrum].Flux, shape, []);
        return line is null ? null : (line, instrument, spectrum);
    }

    /// <summary>A line that the model shows wide and the data do not show so may be narrow: emission on top of absorption.</summary>
    private MeasuredLine Measure(Prediction wide, List<Prediction> all)
    {
        var neighbours = Neighbours(wide.Shape, all);
        var narrow = wide with { Own = wide.Target.Sigma, Shape = Shape(wide.Target, wide.Target.Sigma, wide.Instrument) };
        if (wide.Signal < Foreseen && Look(wide, neighbours) < Noticed && (wide.IsNarrow || Look(narrow, neighbours) < Noticed)) return Glance(wide, neighbours);
        var measured = Measure(wide, neighbours);
        if (measured.Data is null || Math.Abs(measured.Data.Significance) > Clear || wide.IsNarrow) return measured;
        var other = Measure(narrow, Neighbours(narrow.Shape, all));
        return other.Data?.Significance > Clear ? other : measured;
    }

    /// <summary>Signal to noise that a quick look finds in the data.</summary>
    private double Look(Prediction prediction, Neighbour[] neighbours) => Math.Abs(Glance(prediction, neighbours).Data?.Significance ?? 0);

    private MeasuredLine Glance(Prediction prediction, Neighbour[] neighbours)
    {
        var spectrum = observation.Spectra[prediction.Spectrum];
        var data = GaussianFit.FitHeight(spectrum, spectrum.Flux, prediction.Shape, neighbours);
        return new(prediction.Target, prediction.Spectrum, prediction.Instrument, prediction.Line, data);
    }

    private MeasuredLine Measure(Prediction prediction, Neighbour[] neighbours)
    {
        var spectrum = observation.Spectra[prediction.Spectrum];
        var model = GaussianFit.Fit(spectrum, native.ModelOf(prediction.Spectrum), prediction.Shape, neighbours);
        var data = GaussianFit.Fit(spectrum, spectrum.Flux, prediction.Shape, neighbours);
        return new(prediction.Target, prediction.Spectrum, prediction.Instrument, model, data);
    }

    private static Neighbour[] Neighbours(LineShape shape, List<Prediction> all)
    {
        var reach = GaussianFit.Reach(shape);
        return
        [
            .. all.Where(p => p.Strong && p.Shape.Centre != shape.Centre && Math.Abs(p.Shape.Centre - shape.Centre) < reach + 2 * p.Shape.Sigma)
                .OrderBy(p => Math.Abs(p.Shape.Centre - shape.Centre)).Take(GaussianFit.MostNeighbours)
                .Select(p => new Neighbour(p.Shape.Centre, p.Shape.Sigma, IsTied(shape, p.Shape))),
        ];
    }

    private static bool IsTied(LineShape a, LineShape b) =>
        Math.Abs(a.Centre - b.Centre) < TiedFwhm * LineWidth.FwhmPerSigma * Math.Min(a.Sigma, b.Sigma) && Math.Max(a.Sigma, b.Sigma) < 1.3 * Math.Min(a.Sigma, b.Sigma);

    /// <summary>A quick look at the model, at several widths where the line has any.</summary>
    private Prediction? Predict(LineTarget target, IReadOnlyList<LineTarget> targets)
    {
        if (Place(target.Centre) is not var (s, pixel)) return null;
        double instrument = observation.Spectra[s].SigmaLn[pixel];
        var best = Predict(target, targets, s, instrument, target.Sigma);
        if (target.WidestSigma <= 0 || best.Line is null) return best;
        for (var own = Math.Max(target.Sigma, instrument) * WidthStep; own < target.WidestSigma; own *= WidthStep)
        {
            var wider = Predict(target, targets, s, instrument, own);
            if (wider.Signal > best.Signal) best = wider;
        }

        return best;
    }

    private Prediction Predict(LineTarget target, IReadOnlyList<LineTarget> targets, int spectrum, double instrument, double own)
    {
        var shape = Shape(target, own, instrument);
        var reach = GaussianFit.Reach(shape);
        Neighbour[] neighbours =
        [
            .. targets.Where(t => t != target && Math.Abs(t.Centre - target.Centre) < reach)
                .OrderBy(t => Math.Abs(t.Centre - target.Centre)).Take(GaussianFit.MostNeighbours)
                .Select(t => new Neighbour(t.Centre, Math.Sqrt(t.Sigma * t.Sigma + instrument * instrument), false)),
        ];
        return new(target, spectrum, instrument, own, shape, GaussianFit.FitHeight(observation.Spectra[spectrum], native.ModelOf(spectrum), shape, neighbours));
    }

    private static LineShape Shape(LineTarget target, double own, double instrument)
    {
        var sigma = Math.Sqrt(own * own + instrument * instrument);
        var shift = Math.Sqrt(target.ShiftSpread * target.ShiftSpread + 0.16 * sigma * sigma);
        return new(target.Centre, sigma, shift, NarrowestShare * instrument);
    }

    /// <summary>The spectrum and pixel that say most about a wavelength.</summary>
    private (int Spectrum, int Pixel)? Place(double lnWavelength)
    {
        (int Spectrum, int Pixel)? best = null;
        var most = -1.0;
        for (var s = 0; s < observation.Spectra.Count; s++)
        {
            var spectrum = observation.Spectra[s];
            if (lnWavelength < spectrum.LnWavelength[0] || lnWavelength > spectrum.LnWavelength[^1]) continue;
            var found = Array.BinarySearch(spectrum.LnWavelength, lnWavelength);
            var pixel = Math.Min(found >= 0 ? found : ~found, spectrum.Count - 1);
            double information = 0;
            for (var i = Math.Max(0, pixel - 3); i < Math.Min(spectrum.Count, pixel + 3); i++) information += spectrum.Weight[i] / spectrum.PixelWidth[i];
            if (information <= most) continue;
            (best, most) = ((s, pixel), information);
        }

        return best;
    }

    private sealed record Prediction(LineTarget Target, int Spectrum, double Instrument, double Own, LineShape Shape, FittedLine? Line)
    {
        public double Signal => Line is null ? 0 : Math.Abs(Line.Significance);

        public bool IsNarrow => Own <= Target.Sigma;

        public bool Strong => Signal > NeighbourSignal;
    }
}
