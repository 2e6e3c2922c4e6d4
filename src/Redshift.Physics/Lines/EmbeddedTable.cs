namespace Redshift.Physics.Lines;

/// <summary>Reads the comma-separated tables of this folder: a header, then rows of plain fields without quotes.</summary>
internal static class EmbeddedTable
{
    public static IEnumerable<string[]> Rows(string fileName)
    {
        using Stream stream = typeof(EmbeddedTable).Assembly.GetManifestResourceStream($"Redshift.Physics.Lines.{fileName}")
            ?? throw new InvalidOperationException($"The table {fileName} is missing from the assembly.");
        using var reader = new StreamReader(stream);
        reader.ReadLine();
        while (reader.ReadLine() is { } row)
            yield return row.Split(',');
    }
}
