namespace Redshift.Pipeline.Settings;

/// <summary>Finds the name that a mistyped one was meant to be.</summary>
internal static class NearestName
{
    /// <summary>The known name with the fewest edits, if they are at most a third of its letters (and one at least).</summary>
    public static string? Find(string typed, IEnumerable<string> known)
    {
        var (name, edits) = known.Select(candidate => (Name: candidate, Edits: Edits(typed, candidate)))
            .OrderBy(pair => pair.Edits).FirstOrDefault();
        return name is not null && edits <= Math.Max(1, name.Length / 3) ? name : null;
    }

    // The distance of Levenshtein (1966): insertions, deletions and substitutions, row by row.
    private static int Edits(string from, string to)
    {
        var row = Enumerable.Range(0, to.Length + 1).ToArray();
        for (var i = 1; i <= from.Length; i++)
        {
            var diagonal = row[0];
            row[0] = i;
            for (var j = 1; j <= to.Length; j++)
            {
                var substitution = diagonal + (from[i - 1] == to[j - 1] ? 0 : 1);
                diagonal = row[j];
                row[j] = Math.Min(substitution, Math.Min(row[j], row[j - 1]) + 1);
            }
        }

        return row[^1];
    }
}
