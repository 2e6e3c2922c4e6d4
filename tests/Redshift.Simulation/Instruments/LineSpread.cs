using Redshift.Simulation.Light;

namespace Redshift.Simulation.Instruments;

/// <summary>Integrates light over pixels, blurred by an instrumental profile with weak wings.</summary>
internal sealed class LineSpread
{
    private const double Reach = 4.5;
    private const int PerUnit = 256;
    private readonly double[] _cumulative = new double[(int)(2 * Reach * PerUnit) + 2];

    private readonly LogGrid _grid;

    /// <summary>A profile on a grid of observed wavelengths.</summary>
    /// <param name="grid">Where the light to be sampled is given.</param>
    /// <param name="wings">Share of the light in a component 2.2 times as wide.</param>
    public LineSpread(LogGrid grid, double wings)
    {
        _grid = grid;
        for (var i = 1; i < _cumulative.Length; i++)
            _cumulative[i] = _cumulative[i - 1] + Density(((i - 0.5) / PerUnit) - Reach, wings);
        var total = _cumulative[^1];
        for (var i = 0; i < _cumulative.Length; i++)
            _cumulative[i] /= total;
    }

    /// <summary>Mean of several lights in each pixel; the weights, which cost most, are shared.</summary>
    /// <returns>One array a light.</returns>
    public double[][] Sample(double[][] lights, double[] pixels, Arm arm)
    {
        var result = Array.ConvertAll(lights, _ => new double[pixels.Length]);
        var weights = new double[256];
        for (var i = 0; i < pixels.Length; i++)
        {
            var (from, count) = Weigh(pixels, i, arm, ref weights);
            for (var k = 0; k < lights.Length; k++)
                result[k][i] = Mean(lights[k].AsSpan(from, count), weights);
        }
        return result;
    }

    private (int From, int Count) Weigh(double[] pixels, int i, Arm arm, ref double[] weights)
    {
        var below = i > 0 ? pixels[i - 1] : (2 * pixels[0]) - pixels[1];
        var above = i < pixels.Length - 1 ? pixels[i + 1] : (2 * pixels[i]) - pixels[i - 1];
        var (low, high) = (_grid.Position(0.5 * (below + pixels[i])), _grid.Position(0.5 * (above + pixels[i])));
        var scale = 2.3548200450309493 * _grid.StepKmS / arm.FwhmKmS(pixels[i]);
        var from = Math.Clamp((int)(low - (Reach / scale)) + 1, 0, _grid.Count - 1);
        var count = Math.Clamp((int)(high + (Reach / scale)), from, _grid.Count - 1) - from + 1;
        if (weights.Length < count)
            weights = new double[count];
        var sum = 0.0;
        for (var j = 0; j < count; j++)
            sum += weights[j] = Cumulative((high - from - j) * scale) - Cumulative((low - from - j) * scale);
        for (var j = 0; j < count; j++)
            weights[j] /= sum;
        return (from, count);
    }

    private static double Mean(ReadOnlySpan<double> light, double[] weights)
    {
        var sum = 0.0;
        for (var j = 0; j < light.Length; j++)
            sum += weights[j] * light[j];
        return sum;
    }

    private double Cumulative(double x)
    {
        var position = (x + Reach) * PerUnit;
        if (position <= 0)
            return 0;
        var i = (int)position;
        return i + 1 >= _cumulative.Length ? 1 : _cumulative[i] + ((position - i) * (_cumulative[i + 1] - _cumulative[i]));
    }

    private static double Density(double x, double wings) =>
        ((1 - wings) * Math.Exp(-x * x / 2)) + (wings / 2.2 * Math.Exp(-x * x / (2 * 2.2 * 2.2)));
}
