using System.Globalization;
using Redshift.Fits;

namespace Redshift.Pipeline.Load.Metadata;

/// <summary>The headers that speak of a spectrum, the closest first: its own unit's, then the primary one.</summary>
internal sealed class HeaderScope(params IReadOnlyList<Header> headers)
{
    /// <summary>Nothing known, as for text files.</summary>
    public static HeaderScope Empty { get; } = new([]);

    /// <summary>The letter behind keywords of an alternate description of the axes (FITS Standard 4.0, section 8.2.1), or empty.</summary>
    private string Version { get; init; } = "";

    /// <summary>The same headers, for keywords of an alternate description of the axes.</summary>
    public HeaderScope Alternate(char version) => new(headers) { Version = version.ToString() };

    /// <summary>All cards, the closest header first.</summary>
    public IEnumerable<Card> Cards => headers.SelectMany(static header => header);

    /// <summary>The first card with a value under one of the keywords; earlier keywords win.</summary>
    public Card? Find(params ReadOnlySpan<string> keywords)
    {
        foreach (var keyword in keywords)
            foreach (var header in headers)
                if (header.Find(keyword + Version) is { Value.Kind: not (CardValueKind.None or CardValueKind.Undefined) } card) return card;
        return null;
    }

    /// <summary>Trimmed text of the first card found, numbers as they are written; null where there is none or it is empty.</summary>
    public string? Text(params ReadOnlySpan<string> keywords)
    {
        foreach (var keyword in keywords)
            if (Find(keyword) is { } card && TextOf(card) is { Length: > 0 } text) return text;
        return null;
    }

    /// <summary>The finite number of the first card that holds one.</summary>
    public double? Number(params ReadOnlySpan<string> keywords)
    {
        foreach (var keyword in keywords)
            foreach (var header in headers)
                if (header.GetDouble(keyword + Version) is { } number && double.IsFinite(number)) return number;
        return null;
    }

    /// <summary>A logical value, also where it is written as text or as 0 and 1.</summary>
    public bool? Flag(string keyword) => Text(keyword)?.ToUpperInvariant() switch
    {
        "T" or "TRUE" or "YES" or "1" => true,
        "F" or "FALSE" or "NO" or "0" => false,
        _ => null,
    };

    /// <summary>Whether a card is there.</summary>
    public bool Has(string keyword) => Find(keyword) is not null;

    /// <summary>The text of a value as a person reads it.</summary>
    public static string TextOf(Card card) => card.Value.Literal.Trim().Trim('\'').Trim();

    /// <summary>A keyword with the number of an axis, a column or a row.</summary>
    public static string Indexed(string keyword, int index) => string.Create(CultureInfo.InvariantCulture, $"{keyword}{index}");
}
