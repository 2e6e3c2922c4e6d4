using System.Globalization;
using Redshift.Pipeline.Load.Metadata;

namespace Redshift.Pipeline.Load.Images;

/// <summary>The names of the rows or bands of an image, from the cards by which writers number them.</summary>
internal static class BandNames
{
    private static readonly string[] Stems = ["BANDID", "ARRAY", "ROW", "BAND", "PLANE", "ROWNAME", "NAME"];

    /// <summary>One name a band, or null where the header does not name them all.</summary>
    public static IReadOnlyList<string>? Read(HeaderScope header, int count) => Numbered(header, count) ?? Listed(header, count);

    private static List<string>? Numbered(HeaderScope header, int count)
    {
        foreach (var stem in Stems)
        {
            var names = Enumerable.Range(1, count)
                .Select(i => header.Text(string.Create(CultureInfo.InvariantCulture, $"{stem}{i}")) is { } text ? Head(text) : null)
                .OfType<string>().ToList();
            if (names.Count == count) return names;
        }
        return null;
    }

    // "spectrum: background fit, weights variance" names the band before the colon and describes it behind.
    private static string Head(string text) => text.Split([":", ",", " - "], 2, StringSplitOptions.None)[0].Trim();

    private static List<string>? Listed(HeaderScope header, int count)
    {
        foreach (var keyword in (ReadOnlySpan<string>)["EXTEN0", "BANDS", "ROWS", "ROWNAMES"])
            if (header.Text(keyword)?.Split([' ', ','], StringSplitOptions.RemoveEmptyEntries) is { } words && words.Length == count)
                return [.. words];
        return null;
    }
}
