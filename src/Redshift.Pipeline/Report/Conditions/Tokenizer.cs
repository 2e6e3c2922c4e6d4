using System.Globalization;
using System.Text.RegularExpressions;

namespace Redshift.Pipeline.Report.Conditions;

/// <summary>Cuts a condition into its pieces.</summary>
internal static partial class Tokenizer
{
    /// <summary>The pieces, closed by <see cref="TokenKind.End"/>.</summary>
    /// <exception cref="ConditionException">Something is no piece of a condition.</exception>
    public static IReadOnlyList<Token> Split(string text)
    {
        var tokens = new List<Token>();
        for (var at = 0; at < text.Length;)
        {
            var match = Piece().Match(text, at);
            if (!match.Success)
                throw Unknown(text, at);
            if (Classify(match) is { } token)
                tokens.Add(token);
            at += match.Length;
        }

        tokens.Add(new(TokenKind.End, "", text.Length + 1));
        return tokens;
    }

    private static Token? Classify(System.Text.RegularExpressions.Match match)
    {
        var position = match.Index + 1;
        if (match.Groups["text"] is { Success: true } text)
            return new(TokenKind.Text, text.Value.Replace("''", "'", StringComparison.Ordinal), position);
        if (match.Groups["column"] is { Success: true } column)
            return new(TokenKind.QuotedColumn, column.Value.Replace("\"\"", "\"", StringComparison.Ordinal), position);
        if (match.Groups["number"] is { Success: true } number)
            return new(TokenKind.Number, Number(number), position);
        if (match.Groups["word"] is { Success: true } word)
            return new(TokenKind.Word, word.Value, position);
        return match.Groups["sign"] is { Success: true } sign ? new(TokenKind.Sign, sign.Value, position) : null;
    }

    private static string Number(Group number) =>
        double.TryParse(number.Value, NumberStyles.Float, CultureInfo.InvariantCulture, out var value) && double.IsFinite(value)
            ? number.Value
            : throw new ConditionException(number.Index + 1, $"'{number.Value}'", "a number such as 0.5 or 1e-3");

    private static ConditionException Unknown(string text, int at) => text[at] switch
    {
        '\'' => new(at + 1, "a quote that does not end", "a text such as 'galaxy'"),
        '"' => new(at + 1, "a double quote that does not end", "a column such as \"EXP TIME\""),
        var letter => new(at + 1, $"'{HarmlessText.Printable(letter.ToString())}'", "a column, a number, a text in single quotes or a comparison"),
    };

    // Quotes are doubled inside quotes. What starts like a number must be one to its end: 1.2.3 and 5a are mistakes, not two pieces.
    [GeneratedRegex(
        """
        \G(?:\s+|'(?<text>(?:[^']|'')*)'|"(?<column>(?:[^"]|"")*)"|(?<number>[-+]?\.?[0-9](?:[eE][-+]|[A-Za-z0-9._])*)|(?<word>[A-Za-z_][A-Za-z0-9_]*)|(?<sign>!=|<=|>=|[=<>()]))
        """,
        RegexOptions.CultureInvariant)]
    private static partial Regex Piece();
}
