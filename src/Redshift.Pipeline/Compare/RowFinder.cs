using System.Globalization;

namespace Redshift.Pipeline.Compare;

/// <summary>Finds the row of the old table that a row of the new one belongs to.</summary>
internal abstract class RowFinder
{
    /// <summary>Number of old rows that an earlier one hides, so that they are never found.</summary>
    public int Hidden { get; private protected init; }

    /// <summary>Number of the old row, or -1 where there is none.</summary>
    public abstract int Find(ComparedRow row);

    /// <summary>Makes the finder.</summary>
    public static RowFinder Create(Pairing pairing, IReadOnlyList<ComparedRow> rows, double radiusArcsec) => pairing switch
    {
        Pairing.Source => new KeyFinder(rows, row => string.Create(CultureInfo.InvariantCulture, $"{row.Source}\0{row.Row}")),
        Pairing.Target => new KeyFinder(rows, row => row.Target.Replace(" ", "", StringComparison.Ordinal).ToUpperInvariant()),
        _ => new PositionFinder(rows, radiusArcsec),
    };

    /// <summary>By a text; of several rows with the same one the first counts.</summary>
    private sealed class KeyFinder : RowFinder
    {
        private readonly Dictionary<string, int> _rows = new(StringComparer.Ordinal);
        private readonly Func<ComparedRow, string> _key;

        public KeyFinder(IReadOnlyList<ComparedRow> rows, Func<ComparedRow, string> key)
        {
            _key = key;
            for (var i = 0; i < rows.Count; i++)
            {
                if (key(rows[i]) is { Length: > 0 } text && !_rows.TryAdd(text, i))
                    Hidden++;
            }
        }

        public override int Find(ComparedRow row) => _rows.GetValueOrDefault(_key(row), -1);
    }
}
