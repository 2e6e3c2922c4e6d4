using System.Globalization;

namespace Redshift.Fits;

/// <summary>TDIMn: the axes of a cell, first axis fastest (section 7.3.2).</summary>
internal static class Dimensions
{
    /// <summary>The axes, or null when the text is no list of positive lengths.</summary>
    public static long[]? TryParse(string? text)
    {
        text = text?.Trim();
        if (text is not ['(', .. var inside, ')']) return null;
        var parts = inside.Split(',');
        var axes = new long[parts.Length];
        for (var i = 0; i < axes.Length; i++)
            if (!TryAxis(parts[i], out axes[i])) return null;
        return axes;
    }

    private static bool TryAxis(string text, out long axis) =>
        long.TryParse(text.Trim(), NumberStyles.None, CultureInfo.InvariantCulture, out axis) && axis is > 0 and <= int.MaxValue;

    /// <summary>Whether a cell of so many elements has room for the axes.</summary>
    public static bool Fit(long[] axes, long elements)
    {
        Int128 product = 1;
        foreach (var axis in axes)
        {
            product *= axis;
            if (product > elements) return false;
        }

        return true;
    }
}
