using Redshift.Pipeline.Observations;
using Redshift.Pipeline.Results;

namespace Redshift.Pipeline.Report.Plots;

/// <summary>Neighbouring pixels of a spectrum drawn as one step, because a picture has fewer columns than a spectrum has pixels.</summary>
/// <param name="Left">Lower edge, Å.</param>
/// <param name="Right">Upper edge, Å.</param>
/// <param name="Flux">Mean flux weighted by inverse variance.</param>
/// <param name="Sigma">1σ of that mean, or NaN where the noise is not known.</param>
/// <param name="PixelSigma">Mean 1σ of one pixel, or NaN.</param>
/// <param name="Continuum">Mean continuum, or NaN.</param>
/// <param name="Model">Mean model, or NaN.</param>
internal readonly record struct Bin(
    double Left, double Right, double Flux, double Sigma, double PixelSigma, double Continuum, double Model)
{
    /// <summary>Middle, Å.</summary>
    public double Middle => (Left + Right) / 2;

    /// <summary>Bins a spectrum into runs without gaps; pixels that are not to be used end a run.</summary>
    /// <param name="spectrum">The data.</param>
    /// <param name="curve">The fit, or null.</param>
    /// <param name="width">Least width of a bin, Å.</param>
    public static List<List<Bin>> Runs(Spectrum spectrum, ModelCurve? curve, double width)
    {
        var runs = new List<List<Bin>>();
        for (var first = 0; first < spectrum.Count;)
        {
            var last = first;
            while (last < spectrum.Count && IsUsable(spectrum, curve, last))
                last++;
            if (last > first)
                runs.Add(Split(spectrum, curve, first, last, width));
            first = last + 1;
        }

        return runs;
    }

    private static List<Bin> Split(Spectrum spectrum, ModelCurve? curve, int first, int last, double width)
    {
        var bins = new List<Bin>();
        for (var start = first; start < last;)
        {
            var end = start + 1;
            while (end < last && Edge(spectrum, end) - Edge(spectrum, start) < width)
                end++;
            bins.Add(Mean(spectrum, curve, start, end));
            start = end;
        }

        return bins;
    }

    private static Bin Mean(Spectrum spectrum, ModelCurve? curve, int start, int end)
    {
        double sum = 0, weights = 0, sigma = 0, continuum = 0, model = 0;
        for (var i = start; i < end; i++)
        {
            var weight = curve is null ? spectrum.InverseVariance[i] : 1 / (curve.Sigma[i] * curve.Sigma[i]);
            sum += weight * spectrum.Flux[i];
            weights += weight;
            sigma += 1 / Math.Sqrt(weight);
            continuum += weight * (curve?.Continuum[i] ?? double.NaN);
            model += weight * (curve?.Model[i] ?? double.NaN);
        }

        var isNoiseKnown = curve is not null || spectrum.HasErrors;
        return new(
            Edge(spectrum, start), Edge(spectrum, end), sum / weights,
            isNoiseKnown ? 1 / Math.Sqrt(weights) : double.NaN, isNoiseKnown ? sigma / (end - start) : double.NaN,
            continuum / weights, model / weights);
    }

    private static bool IsUsable(Spectrum spectrum, ModelCurve? curve, int pixel) =>
        spectrum.InverseVariance[pixel] > 0 && (curve is null || (double.IsFinite(curve.Sigma[pixel]) && curve.Sigma[pixel] > 0));

    // The edge between a pixel and the one before it; at the ends half a pixel out.
    private static double Edge(Spectrum spectrum, int pixel)
    {
        var wavelength = spectrum.Wavelength;
        if (wavelength.Length == 1)
            return wavelength[0] + (pixel == 0 ? -0.5 : 0.5);
        if (pixel == 0)
            return 1.5 * wavelength[0] - 0.5 * wavelength[1];
        return pixel == wavelength.Length
            ? 1.5 * wavelength[^1] - 0.5 * wavelength[^2]
            : 0.5 * (wavelength[pixel - 1] + wavelength[pixel]);
    }
}
