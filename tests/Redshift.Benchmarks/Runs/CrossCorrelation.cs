using System.Diagnostics;
using System.Runtime.Intrinsics;
using Redshift.Pipeline.Match.Models;
using Redshift.Pipeline.Numerics;

namespace Redshift.Benchmarks.Runs;

/// <summary>
/// The textbook's way to a redshift (J. Tonry and M. Davis, AJ 84, 1511, 1979): the cross-correlation of a spectrum without its continuum
/// with each template, by Fourier transforms on a logarithmic axis with room for all redshifts. Its cost does not depend on what is in
/// the arrays, so that their content is made up.
/// </summary>
internal sealed class CrossCorrelation
{
    // Pixels of the spectrum, and of the range of redshifts ln(1 + 7.5) at the same 69 km/s, up to a power of two.
    private const int Length = 16384;

    private readonly FourierTransform _transform = FourierTransform.OfLength(Length);
    private readonly (Vector256<float>[] Re, Vector256<float>[] Im)[] _octets;
    private readonly Vector256<float>[] _re = new Vector256<float>[Length];
    private readonly Vector256<float>[] _im = new Vector256<float>[Length];

    private CrossCorrelation(int templates) => _octets = [.. Enumerable.Range(0, (templates + 7) / 8).Select(octet => Transforms(8 * octet, 1))];

    /// <summary>As many templates as the pipeline has models.</summary>
    public static int TemplateCount { get; } = Count(ModelLibrary.Instance);

    /// <summary>Processor time of one spectrum against all templates, without reading and without preparing the templates.</summary>
    public static TimeSpan TimePerSpectrum(int spectra)
    {
        var correlation = new CrossCorrelation(TemplateCount);
        correlation.BestPeak(0);
        var before = Process.GetCurrentProcess().TotalProcessorTime;
        for (var i = 0; i < spectra; i++)
            correlation.BestPeak(i);
        return (Process.GetCurrentProcess().TotalProcessorTime - before) / spectra;
    }

    private static int Count(ModelLibrary library) => library.Stars.Count + library.Galaxies.Count + library.Quasars.Count + library.Nebulae.Count;

    private float BestPeak(int spectrum)
    {
        var (re, im) = Transforms(spectrum, 0);
        var best = Vector256.Create(float.MinValue);
        foreach (var (templateRe, templateIm) in _octets)
        {
            // The inverse transform is the forward one of the conjugate product, but for the scale.
            for (var k = 0; k < Length; k++)
            {
                _re[k] = re[k] * templateRe[k] + im[k] * templateIm[k];
                _im[k] = re[k] * templateIm[k] - im[k] * templateRe[k];
            }

            _transform.Forward(_re, _im);
            foreach (var value in _re) best = Vector256.Max(best, value);
        }

        return Enumerable.Range(0, 8).Max(lane => best[lane]);
    }

    /// <summary>Transforms of eight made-up spectra whose numbers are <paramref name="step"/> apart.</summary>
    private (Vector256<float>[] Re, Vector256<float>[] Im) Transforms(int first, int step)
    {
        Vector256<float>[] re = new Vector256<float>[Length], im = new Vector256<float>[Length];
        for (var i = 0; i < BenchmarkInputs.Pixels; i++)
            for (var lane = 0; lane < 8; lane++) re[i] = re[i].WithElement(lane, MadeUp(first + lane * step, i));
        _transform.Forward(re, im);
        return (re, im);
    }

    private static float MadeUp(int number, int pixel) => MathF.Sin(0.37f * pixel * (number + 1)) * MathF.Sin(MathF.PI * pixel / BenchmarkInputs.Pixels);
}
