using System.Runtime.Intrinsics;

namespace Redshift.Pipeline.Numerics;

/// <summary>Convolution with a normalised Gaussian on an even grid; the ends are continued by their last value.</summary>
internal static class GaussianFilter
{
    private const int Passes = 4;

    /// <summary>Convolves.</summary>
    /// <param name="input">Values on an even grid.</param>
    /// <param name="sigma">Standard deviation in grid steps; below 0.3 the input is copied.</param>
    public static float[] Convolve(ReadOnlySpan<float> input, double sigma)
    {
        var output = new float[input.Length];
        Convolve(input, sigma, output);
        return output;
    }

    /// <summary>Convolves into a given place.</summary>
    /// <param name="input">Values on an even grid.</param>
    /// <param name="sigma">Standard deviation in grid steps; below 0.3 the input is copied.</param>
    /// <param name="output">As many values.</param>
    public static void Convolve(ReadOnlySpan<float> input, double sigma, Span<float> output)
    {
        if (sigma < 0.3) input.CopyTo(output);
        else if (sigma > 12) ConvolveByBoxes(input, sigma, output);
        else ConvolveDirectly(input, sigma, output);
    }

    /// <summary>How far, in grid steps, a value can reach others.</summary>
    public static int Reach(double sigma) => sigma < 0.3 ? 0 : sigma > 12 ? Passes * HalfBox(sigma) : DirectReach(sigma);

    private static int DirectReach(double sigma) => (int)Math.Ceiling(4 * sigma);

    // Boxes whose variances add up to σ².
    private static int HalfBox(double sigma) => (int)Math.Round((Math.Sqrt(12 * sigma * sigma / Passes + 1) - 1) / 2);

    private static void ConvolveDirectly(ReadOnlySpan<float> input, double sigma, Span<float> output)
    {
        var reach = DirectReach(sigma);
        var kernel = Kernel(sigma, reach);
        using var lent = new LentArray<float>(input.Length + 2 * (reach + Kernels.Lanes));
        var padded = lent.Span;
        Pad(input, padded, reach + Kernels.Lanes);
        var i = 0;
        for (; i <= output.Length - Kernels.Lanes; i += Kernels.Lanes) Sum(kernel, padded[(i + Kernels.Lanes)..]).CopyTo(output[i..]);
        for (; i < output.Length; i++) output[i] = Sum(kernel, padded[(i + Kernels.Lanes)..])[0];
    }

    private static Vector256<float> Sum(ReadOnlySpan<float> kernel, ReadOnlySpan<float> values)
    {
        Vector256<float> sum = default;
        for (var j = 0; j < kernel.Length; j++) sum += kernel[j] * Vector256.Create(values[j..]);
        return sum;
    }

    /// <summary>Four running means in a row come within a percent of a Gaussian of the same variance (central limit theorem).</summary>
    private static void ConvolveByBoxes(ReadOnlySpan<float> input, double sigma, Span<float> output)
    {
        var half = HalfBox(sigma);
        var reach = Passes * half;
        using var lent = new LentArray<float>(input.Length + 2 * reach);
        var values = lent.Span;
        Pad(input, values, reach);
        for (var pass = 0; pass < Passes; pass++) values = RunningMean(values, half);
        values.CopyTo(output);
    }

    /// <summary>Puts the means over 2·<paramref name="half"/> + 1 values in their place; there are as many fewer as it takes beside the middle.</summary>
    private static Span<float> RunningMean(Span<float> values, int half)
    {
        var means = values[..^(2 * half)];
        double sum = 0, share = 1.0 / (2 * half + 1);
        for (var i = 0; i <= 2 * half; i++) sum += values[i];
        var leaving = values[0];
        means[0] = (float)(sum * share);
        for (var i = 1; i < means.Length; i++)
        {
            sum += (double)values[i + 2 * half] - leaving;
            leaving = values[i];
            means[i] = (float)(sum * share);
        }

        return means;
    }

    private static float[] Kernel(double sigma, int reach)
    {
        var kernel = new float[2 * reach + 1];
        var total = 0.0;
        for (var j = -reach; j <= reach; j++) total += Math.Exp(-0.5 * j * j / (sigma * sigma));
        for (var j = -reach; j <= reach; j++) kernel[j + reach] = (float)(Math.Exp(-0.5 * j * j / (sigma * sigma)) / total);
        return kernel;
    }

    private static void Pad(ReadOnlySpan<float> input, Span<float> padded, int reach)
    {
        input.CopyTo(padded[reach..]);
        padded[..reach].Fill(input[0]);
        padded[(reach + input.Length)..].Fill(input[^1]);
    }
}
