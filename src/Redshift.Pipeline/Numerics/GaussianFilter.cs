using System.Runtime.Intrinsics;

namespace Redshift.Pipeline.Numerics;

/// <summary>Convolution with a normalised Gaussian on an even grid; the ends are continued by their last value.</summary>
internal static class GaussianFilter
{
    /// <summary>Convolves.</summary>
    /// <param name="input">Values on an even grid.</param>
    /// <param name="sigma">Standard deviation in grid steps; below 0.3 the input is copied.</param>
    public static float[] Convolve(ReadOnlySpan<float> input, double sigma)
    {
        if (sigma < 0.3) return input.ToArray();
        return sigma > 12 ? ConvolveByBoxes(input, sigma) : ConvolveDirectly(input, sigma);
    }

    private static float[] ConvolveDirectly(ReadOnlySpan<float> input, double sigma)
    {
        var reach = (int)Math.Ceiling(4 * sigma);
        var kernel = Kernel(sigma, reach);
        var padded = Pad(input, reach + Kernels.Lanes);
        var output = new float[input.Length];
        var i = 0;
        for (; i <= output.Length - Kernels.Lanes; i += Kernels.Lanes) Sum(kernel, padded.AsSpan(i + Kernels.Lanes)).CopyTo(output, i);
        for (; i < output.Length; i++) output[i] = Sum(kernel, padded.AsSpan(i + Kernels.Lanes))[0];
        return output;
    }

    private static Vector256<float> Sum(ReadOnlySpan<float> kernel, ReadOnlySpan<float> values)
    {
        Vector256<float> sum = default;
        for (var j = 0; j < kernel.Length; j++) sum += kernel[j] * Vector256.Create(values[j..]);
        return sum;
    }

    /// <summary>Four running means in a row come within a percent of a Gaussian of the same variance (central limit theorem).</summary>
    private static float[] ConvolveByBoxes(ReadOnlySpan<float> input, double sigma)
    {
        const int Passes = 4;
        var half = (int)Math.Round((Math.Sqrt(12 * sigma * sigma / Passes + 1) - 1) / 2);
        var reach = Passes * half;
        var values = Pad(input, reach);
        for (var pass = 0; pass < Passes; pass++) values = RunningMean(values, half);
        return values;
    }

    private static float[] RunningMean(float[] values, int half)
    {
        var output = new float[values.Length - 2 * half];
        double sum = 0, share = 1.0 / (2 * half + 1);
        for (var i = 0; i <= 2 * half; i++) sum += values[i];
        output[0] = (float)(sum * share);
        for (var i = 1; i < output.Length; i++)
        {
            sum += (double)values[i + 2 * half] - values[i - 1];
            output[i] = (float)(sum * share);
        }

        return output;
    }

    private static float[] Kernel(double sigma, int reach)
    {
        var kernel = new float[2 * reach + 1];
        var total = 0.0;
        for (var j = -reach; j <= reach; j++) total += Math.Exp(-0.5 * j * j / (sigma * sigma));
        for (var j = -reach; j <= reach; j++) kernel[j + reach] = (float)(Math.Exp(-0.5 * j * j / (sigma * sigma)) / total);
        return kernel;
    }

    private static float[] Pad(ReadOnlySpan<float> input, int reach)
    {
        var padded = new float[input.Length + 2 * reach];
        input.CopyTo(padded.AsSpan(reach));
        padded.AsSpan(0, reach).Fill(input[0]);
        padded.AsSpan(reach + input.Length).Fill(input[^1]);
        return padded;
    }
}
