namespace Redshift.Pipeline.Compare;

/// <summary>The nearest position within a radius: the old rows lie sorted by declination, so that a narrow belt is looked through.</summary>
internal sealed class PositionFinder : RowFinder
{
    private readonly IReadOnlyList<ComparedRow> _rows;
    private readonly int[] _order;
    private readonly double[] _declinations;
    private readonly double _radiusDeg;

    /// <summary>Sorts the rows that have a position.</summary>
    public PositionFinder(IReadOnlyList<ComparedRow> rows, double radiusArcsec)
    {
        _rows = rows;
        _radiusDeg = radiusArcsec / 3600;
        _order = [.. Enumerable.Range(0, rows.Count).Where(i => rows[i] is { RaDeg: not null, DecDeg: not null }).OrderBy(i => rows[i].DecDeg)];
        _declinations = Array.ConvertAll(_order, i => rows[i].DecDeg!.Value);
    }

    /// <inheritdoc/>
    public override int Find(ComparedRow row)
    {
        if (row is not { RaDeg: { } ra, DecDeg: { } dec })
            return -1;
        var (best, nearest) = (-1, _radiusDeg);
        for (var i = First(dec - _radiusDeg); i < _order.Length && _declinations[i] <= dec + _radiusDeg; i++)
        {
            var distance = Distance(ra, dec, _rows[_order[i]].RaDeg!.Value, _declinations[i]);
            if (distance < nearest || (distance == nearest && best < 0))
                (best, nearest) = (_order[i], distance);
        }

        return best;
    }

    private int First(double declination)
    {
        var found = Array.BinarySearch(_declinations, declination);
        if (found < 0)
            return ~found;
        while (found > 0 && _declinations[found - 1] == declination)
            found--;
        return found;
    }

    // The haversine form, which small angles do not spoil (R. W. Sinnott, Sky and Telescope 68, 159, 1984).
    private static double Distance(double ra1, double dec1, double ra2, double dec2)
    {
        var (d1, d2) = (double.DegreesToRadians(dec1), double.DegreesToRadians(dec2));
        var a = Math.Sin((d1 - d2) / 2);
        var b = Math.Sin(double.DegreesToRadians(ra1 - ra2) / 2);
        return double.RadiansToDegrees(2 * Math.Asin(Math.Min(1, Math.Sqrt(a * a + Math.Cos(d1) * Math.Cos(d2) * b * b))));
    }
}
