namespace Redshift.Evaluation;

/// <summary>A row of a CSV file by column name; absent columns and empty fields are null.</summary>
internal sealed class CsvRow(IReadOnlyDictionary<string, int> columns, string[] fields)
{
    public string? this[string column] =>
        columns.TryGetValue(column, out var i) && i < fields.Length && fields[i].Length > 0 ? fields[i] : null;
}

/// <summary>Reads CSV files with quoted fields.</summary>
internal static class CsvTable
{
    public static IEnumerable<CsvRow> Read(string path)
    {
        using var reader = new StreamReader(path);
        var heading = Split(reader.ReadLine() ?? "");
        var columns = heading.Select((name, i) => (name, i)).ToDictionary(pair => pair.name.Trim(), pair => pair.i);
        while (reader.ReadLine() is { } line)
            yield return new(columns, Split(line));
    }

    private static string[] Split(string line)
    {
        var fields = new List<string>();
        var (field, quoted) = (new System.Text.StringBuilder(), false);
        foreach (var c in line)
        {
            if (c == '"')
                quoted = !quoted;
            else if (c == ',' && !quoted)
                Next();
            else
                field.Append(c);
        }
        Next();
        return [.. fields];

        void Next()
        {
            fields.Add(field.ToString());
            field.Clear();
        }
    }
}
