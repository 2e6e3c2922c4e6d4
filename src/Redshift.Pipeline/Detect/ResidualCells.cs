using Redshift.Pipeline.Normalize;

namespace Redshift.Pipeline.Detect;

/// <summary>
/// Flux minus continuum of all spectra, weighted and summed on one even grid in ln λ. Sums of weights and of weighted residuals lose nothing
/// when cells are merged, so that each wider filter works on half as many cells.
/// </summary>
internal sealed class ResidualCells
{
    private ResidualCells(double start, double step, int count)
    {
        Start = start;
        Step = step;
        Gradient = new float[count];
        Weight = new float[count];
    }

    /// <summary>ln λ of the centre of the first cell.</summary>
    public double Start { get; }

    /// <summary>Cell width in ln λ.</summary>
    public double Step { get; }

    /// <summary>Σ w (f − c).</summary>
    public float[] Gradient { get; }

    /// <summary>Σ w.</summary>
    public float[] Weight { get; }

    public int Count => Weight.Length;

    /// <summary>ln λ at a fractional cell.</summary>
    public double LnWavelength(double cell) => Start + cell * Step;

    /// <summary>Sums the pixels of the spectra into cells.</summary>
    /// <param name="spectra">At least one spectrum.</param>
    /// <param name="step">Cell width in ln λ.</param>
    public static ResidualCells Build(IReadOnlyList<NormalizedSpectrum> spectra, double step)
    {
        double start = spectra.Min(s => s.LnWavelength[0]), end = spectra.Max(s => s.LnWavelength[^1]);
        var cells = new ResidualCells(start, step, (int)((end - start) / step) + 2);
        foreach (var spectrum in spectra)
            for (var i = 0; i < spectrum.Count; i++)
            {
                var cell = (int)Math.Round((spectrum.LnWavelength[i] - start) / step);
                cells.Gradient[cell] += spectrum.Weight[i] * (spectrum.Flux[i] - spectrum.Continuum[i]);
                cells.Weight[cell] += spectrum.Weight[i];
            }

        return cells;
    }

    /// <summary>The same residuals in cells of twice the width.</summary>
    public ResidualCells Halved()
    {
        var half = new ResidualCells(Start + 0.5 * Step, 2 * Step, (Count + 1) / 2);
        for (var i = 0; i < Count; i++)
        {
            half.Gradient[i / 2] += Gradient[i];
            half.Weight[i / 2] += Weight[i];
        }

        return half;
    }
}
