using System.Globalization;

namespace Redshift.Fits;

/// <summary>One header card: keyword, value and comment; continued records count as one card.</summary>
/// <param name="keyword">Keyword.</param>
/// <param name="value">Value.</param>
/// <param name="comment">Comment, or the text of a commentary card.</param>
public sealed class Card(string keyword, CardValue value, string comment)
{
    /// <summary>Keyword; for a HIERARCH card the words behind HIERARCH, one blank between them. Empty for a blank card.</summary>
    public string Keyword { get; } = keyword;

    /// <summary>Value, with its kind.</summary>
    public CardValue Value { get; } = value;

    /// <summary>Comment behind the slash, or the text of a commentary card; never null.</summary>
    public string Comment { get; } = comment;

    /// <summary>A card that holds a string.</summary>
    public static Card Of(string keyword, string value, string comment = "") =>
        new(keyword, new CardValue(CardValueKind.Text, value.TrimEnd(' ')), comment);

    /// <summary>A card that holds a finite number, written so that reading it gives the same bits.</summary>
    /// <exception cref="ArgumentOutOfRangeException">The number is infinite or not a number, which no card can say.</exception>
    public static Card Of(string keyword, double value, string comment = "")
    {
        if (!double.IsFinite(value)) throw new ArgumentOutOfRangeException(nameof(value), value, "a header card holds finite numbers");
        var literal = value.ToString("R", CultureInfo.InvariantCulture);
        return new(keyword, new CardValue(CardValueKind.Real, literal.AsSpan().ContainsAny('.', 'E') ? literal : literal + ".0"), comment);
    }

    /// <summary>A card that holds an integer.</summary>
    public static Card Of(string keyword, long value, string comment = "") =>
        new(keyword, new CardValue(CardValueKind.Integer, value.ToString(CultureInfo.InvariantCulture)), comment);

    /// <summary>A card that holds a logical value.</summary>
    public static Card Of(string keyword, bool value, string comment = "") =>
        new(keyword, new CardValue(CardValueKind.Logical, value ? "T" : "F"), comment);

    /// <summary>A card without a value: COMMENT, HISTORY or, with an empty keyword, a blank one.</summary>
    public static Card Commentary(string keyword, string text) => new(keyword, new CardValue(CardValueKind.None, ""), text);

    /// <summary>Keyword, value and comment, for people.</summary>
    public override string ToString() =>
        Value.Kind == CardValueKind.None ? $"{Keyword} {Comment}" : $"{Keyword} = {Value.Literal} / {Comment}";
}
