namespace Redshift.Pipeline.Report.Formats;

/// <summary>
/// Names of columns for formats that are read by more than eyes. Header cards that are kept can have blanks in their names, and can be
/// named like a column of ours: many readers want letters, digits and underscores, and do not tell <c>Z</c> from <c>z</c>.
/// </summary>
internal static class ColumnNames
{
    /// <summary>The names: underscores for what is no letter or digit, and a number behind those that another column has already.</summary>
    public static IReadOnlyList<string> Of<TRow>(IEnumerable<Column<TRow>> columns)
    {
        var taken = new HashSet<string>(StringComparer.OrdinalIgnoreCase);
        return [.. columns.Select(column => Candidates(Plain(column.Name)).First(taken.Add))];
    }

    private static string Plain(string name) => string.Concat(name.Select(letter => char.IsAsciiLetterOrDigit(letter) ? letter : '_'));

    private static IEnumerable<string> Candidates(string name)
    {
        yield return name;
        for (var number = 2; ; number++)
            yield return FormattableString.Invariant($"{name}_{number}");
    }
}
