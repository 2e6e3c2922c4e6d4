namespace Redshift.Pipeline.Report.Conditions;

/// <summary>What a token is.</summary>
internal enum TokenKind
{
    /// <summary>A column, or a word of the language.</summary>
    Word,

    /// <summary>The name of a column between double quotes.</summary>
    QuotedColumn,

    /// <summary>A number.</summary>
    Number,

    /// <summary>A text between single quotes.</summary>
    Text,

    /// <summary>A comparison or a parenthesis.</summary>
    Sign,

    /// <summary>The end of the condition.</summary>
    End,
}

/// <summary>A piece of a condition.</summary>
/// <param name="Kind">What it is.</param>
/// <param name="Text">What it says, without quotes.</param>
/// <param name="Position">1-based position of its first letter.</param>
internal readonly record struct Token(TokenKind Kind, string Text, int Position)
{
    /// <summary>The piece in the words of an error.</summary>
    public override string ToString() => Kind switch
    {
        TokenKind.End => "the end",
        TokenKind.Text => $"the text '{Text}'",
        TokenKind.QuotedColumn => $"\"{Text}\"",
        _ => $"'{Text}'",
    };

    /// <summary>Whether it is a word of the language, in capitals or not.</summary>
    public bool Is(string word) => Kind is TokenKind.Word or TokenKind.Sign && string.Equals(Text, word, StringComparison.OrdinalIgnoreCase);
}
