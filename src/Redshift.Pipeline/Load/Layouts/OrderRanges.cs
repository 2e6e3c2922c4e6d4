namespace Redshift.Pipeline.Load.Layouts;

/// <summary>Tells echelle orders of one object from spectra of several, by the ranges of their wavelengths.</summary>
internal static class OrderRanges
{
    // Neighbouring orders share little; fibres all see the same range.
    private const double MostShared = 0.8;

    /// <summary>Whether ranges follow each other like orders: each beyond the last, in one direction, with little in common.</summary>
    public static bool AreOrders(IReadOnlyList<(double Low, double High)> ranges)
    {
        var direction = ranges.Count < 2 ? 0 : Math.Sign(Centre(ranges[1]) - Centre(ranges[0]));
        if (direction == 0) return false;
        for (var i = 1; i < ranges.Count; i++)
        {
            var (before, here) = (ranges[i - 1], ranges[i]);
            var shared = Math.Min(before.High, here.High) - Math.Max(before.Low, here.Low);
            var follows = Math.Sign(Centre(here) - Centre(before)) == direction;
            if (!follows || shared > MostShared * Math.Min(before.High - before.Low, here.High - here.Low)) return false;
        }
        return true;
    }

    /// <summary>Whether the rows of an array of wavelengths are those of orders.</summary>
    public static bool AreOrders(NumberArray wavelengths) =>
        wavelengths.Rows is > 1 and <= 1000 && AreOrders([.. Enumerable.Range(0, wavelengths.Rows).Select(row => RangeOf(wavelengths.Read(row)))]);

    private static (double Low, double High) RangeOf(double[] values)
    {
        var sound = values.Where(static value => double.IsFinite(value) && value > 0).DefaultIfEmpty(double.NaN).ToList();
        return (sound.Min(), sound.Max());
    }

    private static double Centre((double Low, double High) range) => double.IsFinite(range.Low) ? range.Low + range.High : 0;
}
