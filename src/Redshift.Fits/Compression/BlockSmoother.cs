namespace Redshift.Fits;

/// <summary>
/// Changes differences, by no more than the quantisation left open, so that neighbouring blocks join smoothly (the SMOOTH
/// parameter of HCOMPRESS_1). Works on one level of the transform, whose coefficients are interleaved.
/// </summary>
internal readonly ref struct BlockSmoother(Span<long> values, int stride, int height, int width, long most)
{
    private readonly Span<long> _values = values;

    public void Smooth()
    {
        for (var row = 2; row < height - 2; row += 2)
            for (var column = 0; column < width; column += 2) Slope(row * stride + column, 2 * stride, stride);
        for (var row = 0; row < height; row += 2)
            for (var column = 2; column < width - 2; column += 2) Slope(row * stride + column, 2, 1);
        for (var row = 2; row < height - 2; row += 2)
            for (var column = 2; column < width - 2; column += 2) Curvature(row * stride + column);
    }

    // The slope between the blocks on both sides, where they rise or fall monotonically.
    private void Slope(int at, int toNext, int toDifference)
    {
        var (before, here, after) = (_values[at - toNext], _values[at], _values[at + toNext]);
        var upper = Math.Max(Math.Min(after - here, here - before), 0) << 2;
        var lower = Math.Min(Math.Max(after - here, here - before), 0) << 2;
        if (lower < upper) Pull(ref _values[at + toDifference], Math.Clamp(after - before, lower, upper), 3);
    }

    private void Curvature(int at)
    {
        var (above, below) = (at - 2 * stride, at + 2 * stride);
        var (here, rows2, columns2) = (_values[at], _values[at + stride] << 1, _values[at + 1] << 1);
        var towards = (_values[below + 2] - here, here - _values[below - 2], here - _values[above + 2], _values[above - 2] - here);
        var upper = Math.Min(
            Math.Min(Math.Max(towards.Item1, 0) - rows2 - columns2, Math.Max(towards.Item2, 0) + rows2 - columns2),
            Math.Min(Math.Max(towards.Item3, 0) - rows2 + columns2, Math.Max(towards.Item4, 0) + rows2 + columns2)) << 4;
        var lower = Math.Max(
            Math.Max(Math.Min(towards.Item1, 0) - rows2 - columns2, Math.Min(towards.Item2, 0) + rows2 - columns2),
            Math.Max(Math.Min(towards.Item3, 0) - rows2 + columns2, Math.Min(towards.Item4, 0) + rows2 + columns2)) << 4;
        var wanted = _values[below + 2] + _values[above - 2] - _values[above + 2] - _values[below - 2];
        if (lower < upper) Pull(ref _values[at + stride + 1], Math.Clamp(wanted, lower, upper), 6);
    }

    // Rounded towards zero, and never beyond what quantisation may have taken away.
    private void Pull(ref long value, long wanted, int bits)
    {
        var step = (wanted - (value << bits)) / (1L << bits);
        value += Math.Clamp(step, -most, most);
    }
}
