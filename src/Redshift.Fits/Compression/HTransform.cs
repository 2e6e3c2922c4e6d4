using System.Numerics;

namespace Redshift.Fits;

/// <summary>The inverse H-transform in place, with the rounding that makes it lossless, and optional smoothing of the blocks.</summary>
/// <param name="coefficients">Coefficients, row by row; pixels afterwards.</param>
/// <param name="rows">Length of the slow axis.</param>
/// <param name="columns">Length of the fast axis.</param>
/// <param name="smoothingScale">Scale the coefficients were divided by, when the result is to be smooth; otherwise 0.</param>
internal sealed class HTransform(long[] coefficients, int rows, int columns, int smoothingScale)
{
    private readonly long[] _line = new long[Math.Max(rows, columns)];

    /// <summary>Undoes the transform, level by level from the coarsest.</summary>
    public void Invert()
    {
        var levels = Math.Max(rows, columns) <= 1 ? 0 : BitOperations.Log2((uint)Math.Max(rows, columns) - 1) + 1;
        if (levels == 0) return;
        coefficients[0] = Round(coefficients[0], levels + 1);
        for (var level = levels - 1; level >= 0; level--)
        {
            var height = CeilingShift(rows, level);
            var width = CeilingShift(columns, level);
            Interleave(height, width);
            if (smoothingScale > 1) new BlockSmoother(coefficients, columns, height, width, smoothingScale >> 1).Smooth();
            for (var row = 0; row < height; row += 2) InvertRows(row, row + 1 < height, width, level);
        }
    }

    private static int CeilingShift(int length, int shift) => (int)(((long)length + (1L << shift) - 1) >> shift);

    // The sums lie in the first half of each row and column, the differences in the second; they become neighbours.
    private void Interleave(int height, int width)
    {
        for (var row = 0; row < height; row++) Interleave(row * columns, 1, width);
        for (var column = 0; column < width; column++) Interleave(column, columns, height);
    }

    private void Interleave(int start, int step, int count)
    {
        var half = (count + 1) / 2;
        for (var i = 0; i < count; i++) _line[i < half ? 2 * i : 2 * (i - half) + 1] = coefficients[start + i * step];
        for (var i = 0; i < count; i++) coefficients[start + i * step] = _line[i];
    }

    private void InvertRows(int row, bool hasPair, int width, int level)
    {
        var at = row * columns;
        for (var column = 0; column < width; column += 2, at += 2)
        {
            var hasNext = column + 1 < width;
            if (hasPair && hasNext) InvertSquare(at, level);
            else if (hasPair) InvertPair(at, at + columns, level);
            else if (hasNext) InvertPair(at, at + 1, level);
            else coefficients[at] >>= Shift(level);
        }
    }

    // Sums of four were halved at each level but the first.
    private static int Shift(int level) => level == 0 ? 2 : 1;

    // Known low bits of the finer coefficients restore those that the coarser ones lost by halving.
    private void InvertSquare(int at, int level)
    {
        var below = at + columns;
        var curvature = Round(coefficients[below + 1], level);
        var low = curvature & (1L << level);
        var alongRows = TowardsZero(Round(coefficients[below], level + 1), low);
        var alongColumns = TowardsZero(Round(coefficients[at + 1], level + 1), low);
        var middle = (curvature ^ alongRows ^ alongColumns) & (2L << level);
        var sum = WithLowBits(coefficients[at], low, middle);
        var shift = Shift(level);
        coefficients[below + 1] = (sum + alongRows + alongColumns + curvature) >> shift;
        coefficients[below] = (sum + alongRows - alongColumns - curvature) >> shift;
        coefficients[at + 1] = (sum - alongRows + alongColumns - curvature) >> shift;
        coefficients[at] = (sum - alongRows - alongColumns + curvature) >> shift;
    }

    private void InvertPair(int first, int second, int level)
    {
        var difference = Round(coefficients[second], level + 1);
        var low = difference & (2L << level);
        var sum = coefficients[first];
        sum = sum >= 0 ? sum - low : sum + low;
        coefficients[second] = (sum + difference) >> Shift(level);
        coefficients[first] = (sum - difference) >> Shift(level);
    }

    private static long TowardsZero(long value, long amount) => value >= 0 ? value - amount : value + amount;

    private static long WithLowBits(long sum, long low, long middle)
    {
        if (sum >= 0) return sum + low - middle;
        return sum + (low == 0 ? middle : low - middle);
    }

    // To the nearest multiple of 2^bits, halves away from zero.
    private static long Round(long value, int bits)
    {
        if (bits == 0) return value;
        var half = 1L << (bits - 1);
        return (value + (value >= 0 ? half : half - 1)) & -(1L << bits);
    }
}
