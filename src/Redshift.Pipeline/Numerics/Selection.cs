using System.Numerics;

namespace Redshift.Pipeline.Numerics;

/// <summary>Order statistics without sorting everything (C. A. R. Hoare 1961, Comm. ACM 4, 321).</summary>
internal static class Selection
{
    /// <summary>The median, the mean of the two middle values of an even number; 0 for none. Reorders the values.</summary>
    public static double Median(Span<double> values)
    {
        if (values.Length == 0) return 0;
        var middle = values.Length / 2;
        var upper = Take(values, middle);
        if (values.Length % 2 == 1) return upper;
        var lower = values[0];
        foreach (var value in values[..middle]) lower = Math.Max(lower, value);
        return 0.5 * (lower + upper);
    }

    /// <summary>The value that would stand at an index if they were sorted. Puts no greater ones before it, no smaller ones behind it.</summary>
    public static T Take<T>(Span<T> values, int index)
        where T : struct, INumber<T>
    {
        int low = 0, high = values.Length - 1;
        while (low < high)
        {
            var (left, right) = Partition(values, low, high);
            if (index <= right) high = right;
            else if (index >= left) low = left;
            else break;
        }

        return values[index];
    }

    private static (int Left, int Right) Partition<T>(Span<T> values, int low, int high)
        where T : struct, INumber<T>
    {
        T a = values[low], b = values[(low + high) / 2], c = values[high];
        var pivot = T.Max(T.Min(a, b), T.Min(T.Max(a, b), c));
        int i = low, j = high;
        while (i <= j)
        {
            while (values[i] < pivot) i++;
            while (values[j] > pivot) j--;
            if (i <= j) (values[i], values[j]) = (values[j--], values[i++]);
        }

        return (i, j);
    }
}
