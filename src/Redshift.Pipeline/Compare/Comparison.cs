namespace Redshift.Pipeline.Compare;

/// <summary>
/// Two tables held against each other. The old one is kept in memory, a few hundred bytes a row; the new one passes by.
/// </summary>
public sealed class Comparison
{
    private const int MostExamples = 10;

    private readonly SortedDictionary<string, OffsetStatistics> _kinds = new(StringComparer.Ordinal);
    private readonly SortedDictionary<string, OffsetStatistics> _verdicts = new(StringComparer.Ordinal);
    private readonly Dictionary<string, int> _changes = new(StringComparer.Ordinal);
    private readonly SortedDictionary<(string Old, string New), int> _kindChanges = [];
    private readonly SortedDictionary<(string Old, string New), int> _verdictChanges = [];
    private readonly PriorityQueue<Difference, double> _worst = new();

    private Comparison()
    {
    }

    /// <summary>Rows of the old table.</summary>
    public int OldRows { get; private set; }

    /// <summary>Rows of the old table that are left aside because an earlier one has the same name.</summary>
    public int OldDoubled { get; private set; }

    /// <summary>Rows of the new table.</summary>
    public int NewRows { get; private set; }

    /// <summary>Rows of the new table with a row of the old one.</summary>
    public int Pairs { get; private set; }

    /// <summary>All pairs.</summary>
    public OffsetStatistics All { get; } = new();

    /// <summary>Pairs by the kind of the new table.</summary>
    public IReadOnlyDictionary<string, OffsetStatistics> Kinds => _kinds;

    /// <summary>Pairs by the verdict of the new table.</summary>
    public IReadOnlyDictionary<string, OffsetStatistics> Verdicts => _verdicts;

    /// <summary>Changes of kind, with how often they occur.</summary>
    public IReadOnlyDictionary<(string Old, string New), int> KindChanges => _kindChanges;

    /// <summary>Changes of verdict, with how often they occur.</summary>
    public IReadOnlyDictionary<(string Old, string New), int> VerdictChanges => _verdictChanges;

    /// <summary>The outliers farthest out in units of their tolerance, the farthest first; a few of them.</summary>
    public IReadOnlyList<Difference> WorstOutliers => [.. _worst.UnorderedItems.OrderByDescending(item => item.Priority).Select(item => item.Element)];

    /// <summary>Compares.</summary>
    /// <param name="old">The old catalogue, or known redshifts.</param>
    /// <param name="now">The new catalogue.</param>
    /// <param name="pairing">What makes two rows rows of the same object.</param>
    /// <param name="radiusArcsec">The radius, for positions.</param>
    /// <param name="onDifference">Gets the rows that are not the same in both tables: the new ones in their order, then the missing ones.</param>
    public static Comparison Of(
        IEnumerable<ComparedRow> old, IEnumerable<ComparedRow> now, Pairing pairing, double radiusArcsec, Action<Difference> onDifference)
    {
        ComparedRow[] rows = [.. old];
        var finder = RowFinder.Create(pairing, rows, radiusArcsec);
        var comparison = new Comparison { OldRows = rows.Length, OldDoubled = finder.Hidden };
        var found = new bool[rows.Length];
        foreach (var row in now)
        {
            var at = finder.Find(row);
            if (at >= 0)
                found[at] = true;
            comparison.NewRows++;
            comparison.Count(new(at < 0 ? null : rows[at], row), onDifference);
        }

        for (var i = 0; i < rows.Length; i++)
        {
            if (!found[i])
                comparison.Count(new(rows[i], null), onDifference);
        }

        return comparison;
    }

    /// <summary>Number of rows with a change, by its word in the list of differences.</summary>
    public int Count(string change) => _changes.GetValueOrDefault(change);

    private void Count(Difference difference, Action<Difference> onDifference)
    {
        var changes = difference.Changes;
        foreach (var change in changes)
            _changes[change] = Count(change) + 1;
        if (changes.Count > 0)
            onDifference(difference);
        if (difference is { Old: { } old, New: { } now })
            CountPair(difference, old, now, changes);
    }

    private void CountPair(Difference difference, ComparedRow old, ComparedRow now, IReadOnlyList<string> changes)
    {
        Pairs++;
        if (changes.Contains("kind"))
            _kindChanges[(old.Kind, now.Kind)] = _kindChanges.GetValueOrDefault((old.Kind, now.Kind)) + 1;
        if (changes.Contains("verdict"))
            _verdictChanges[(old.Verdict, now.Verdict)] = _verdictChanges.GetValueOrDefault((old.Verdict, now.Verdict)) + 1;
        if (difference.OffsetKmS is not { } offset)
            return;
        All.Add(offset, difference.IsOutlier);
        Group(_kinds, now.Kind)?.Add(offset, difference.IsOutlier);
        Group(_verdicts, now.Verdict)?.Add(offset, difference.IsOutlier);
        if (difference.IsOutlier)
            Remember(difference, Math.Abs(offset) / difference.ToleranceKmS);
    }

    private void Remember(Difference difference, double excess)
    {
        _worst.Enqueue(difference, excess);
        if (_worst.Count > MostExamples)
            _worst.Dequeue();
    }

    private static OffsetStatistics? Group(SortedDictionary<string, OffsetStatistics> groups, string name)
    {
        if (name.Length == 0)
            return null;
        if (!groups.TryGetValue(name, out var group))
            groups[name] = group = new();
        return group;
    }
}
