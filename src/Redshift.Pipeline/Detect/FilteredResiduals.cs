using System.Numerics;

namespace Redshift.Pipeline.Detect;

/// <summary>
/// The matched filter of one width: signal to noise Σwrg / √(Σwg²) of a Gaussian bump at every cell, and how large it gets by chance.
/// </summary>
internal sealed class FilteredResiduals
{
    /// <summary>σ of the filter in cells.</summary>
    public const double SigmaCells = 1.25;

    private const int Reach = 4;

    private static readonly float[] Kernel = [.. Enumerable.Range(-Reach, 2 * Reach + 1).Select(j => (float)Math.Exp(-0.5 * j * j / (SigmaCells * SigmaCells)))];
    private static readonly float[] KernelSquared = Array.ConvertAll(Kernel, g => g * g);

    private readonly ResidualCells _cells;
    private readonly ChanceScale _chance;

    private readonly FilteredResiduals? _finer;

    /// <summary>Filters residuals.</summary>
    /// <param name="cells">The residuals, in cells that suit the filter.</param>
    /// <param name="finer">The next narrower filter, on twice as many cells; null for the first.</param>
    public FilteredResiduals(ResidualCells cells, FilteredResiduals? finer)
    {
        _finer = finer;
        _cells = cells;
        SignalToNoise = Convolve(cells.Gradient, Kernel);
        var curvature = Convolve(cells.Weight, KernelSquared);
        for (var i = 0; i < curvature.Length; i++)
            SignalToNoise[i] = curvature[i] > 0 ? SignalToNoise[i] / MathF.Sqrt(curvature[i]) : 0;
        // The spectrum turned upside down shows what chance, bad sky and a wavy continuum do to the side that is tested.
        _chance = new(SignalToNoise);
    }

    public float[] SignalToNoise { get; }

    /// <summary>σ of the filter in ln λ.</summary>
    public double SigmaLn => SigmaCells * _cells.Step;

    /// <summary>ln λ at a fractional cell.</summary>
    public double LnWavelength(double cell) => _cells.LnWavelength(cell);

    /// <summary>Signal to noise at the cell nearest to a wavelength, 0 outside.</summary>
    public double At(double lnWavelength)
    {
        var cell = (int)Math.Round((lnWavelength - _cells.Start) / _cells.Step);
        return cell >= 0 && cell < SignalToNoise.Length ? SignalToNoise[cell] : 0;
    }

    /// <summary>
    /// What chance makes of the signal to noise on one side of the continuum: at least 1, and at least what it makes of narrower filters,
    /// which tell better where along the spectrum it does.
    /// </summary>
    public double Scale(int cell, bool emission) =>
        Math.Max(_chance.At(cell, emission), _finer?.Scale(2 * cell, emission) ?? 1);

    private static float[] Convolve(float[] values, float[] kernel)
    {
        var padded = new float[values.Length + 2 * Reach];
        values.CopyTo(padded.AsSpan(Reach));
        var sums = new float[values.Length];
        for (var j = 0; j < kernel.Length; j++) AddScaled(padded.AsSpan(j, values.Length), kernel[j], sums);
        return sums;
    }

    private static void AddScaled(ReadOnlySpan<float> values, float factor, Span<float> sums)
    {
        var i = 0;
        for (; i <= sums.Length - Vector<float>.Count; i += Vector<float>.Count)
            (new Vector<float>(sums[i..]) + factor * new Vector<float>(values[i..])).CopyTo(sums[i..]);
        for (; i < sums.Length; i++) sums[i] += factor * values[i];
    }
}
