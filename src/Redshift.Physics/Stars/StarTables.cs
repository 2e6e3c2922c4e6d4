using System.Globalization;

namespace Redshift.Physics.Stars;

/// <summary>Reads the tables of this folder: comment lines that begin with #, a line of column names, rows of plain fields.</summary>
internal static class StarTables
{
    public static IEnumerable<string[]> Rows(string table)
    {
        using var stream = typeof(StarTables).Assembly.GetManifestResourceStream("Redshift.Physics.Stars." + table)
            ?? throw new InvalidOperationException($"The table {table} is missing from the assembly.");
        using var reader = new StreamReader(stream);
        return [.. Lines(reader).Where(l => l[0] != '#').Skip(1).Select(l => l.Split(','))];
    }

    public static double Number(string text) => double.Parse(text, CultureInfo.InvariantCulture);

    private static IEnumerable<string> Lines(StreamReader reader)
    {
        while (reader.ReadLine() is { } line)
            yield return line;
    }
}
