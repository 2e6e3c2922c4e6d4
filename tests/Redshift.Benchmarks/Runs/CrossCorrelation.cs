using System.Diagnostics;
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
    private readonly (float[] Re, float[] Im)[] _templates;
    private readonly float[] _re = new float[Length];
    private readonly float[] _im = new float[Length];

    private CrossCorrelation(int templates) => _templates = [.. Enumerable.Range(0, templates).Select(Template)];

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
        var (re, im) = Template(spectrum);
        var best = float.MinValue;
        foreach (var (templateRe, templateIm) in _templates)
        {
            // The inverse transform is the forward one of the conjugate product, but for the scale.
            for (var k = 0; k < Length; k++)
            {
                _re[k] = re[k] * templateRe[k] + im[k] * templateIm[k];
                _im[k] = re[k] * templateIm[k] - im[k] * templateRe[k];
            }

            _transform.Forward(_re, _im);
            best = Math.Max(best, _re.Max());
        }

        return best;
    }

    private (float[] Re, float[] Im) Template(int number)
    {
        float[] re = new float[Length], im = new float[Length];
        for (var i = 0; i < BenchmarkInputs.Pixels; i++)
            re[i] = MathF.Sin(0.37f * i * (number + 1)) * MathF.Sin(MathF.PI * i / BenchmarkInputs.Pixels);
        _transform.Forward(re, im);
        return (re, im);
    }
}
