using System.Globalization;

namespace Redshift.Simulation.Atoms;

/// <summary>Reads the embedded tables of lines and bands.</summary>
internal static class Table
{
    /// <summary>The rows below the heading, split at commas.</summary>
    public static string[][] Rows(string name)
    {
        using var stream = typeof(Table).Assembly.GetManifestResourceStream(name) ?? throw new InvalidOperationException($"no table {name}");
        using var reader = new StreamReader(stream);
        return [.. reader.ReadToEnd().Split('\n', StringSplitOptions.RemoveEmptyEntries).Skip(1).Select(line => line.Split(','))];
    }

    /// <summary>A number as the tables write it.</summary>
    public static double Number(string text) => double.Parse(text, CultureInfo.InvariantCulture);
}
