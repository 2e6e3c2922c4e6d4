namespace Redshift.Fits;

/// <summary>What the value field of a header card holds (FITS Standard 4.0, section 4.2).</summary>
public enum CardValueKind
{
    /// <summary>The card has no value: COMMENT, HISTORY, blank and other commentary.</summary>
    None,

    /// <summary>The card has a value indicator and nothing behind it.</summary>
    Undefined,

    /// <summary>T or F.</summary>
    Logical,

    /// <summary>An integer that fits 64 bits.</summary>
    Integer,

    /// <summary>A floating-point number, or an integer too large for 64 bits.</summary>
    Real,

    /// <summary>A pair of numbers in parentheses.</summary>
    Complex,

    /// <summary>A quoted character string.</summary>
    Text,

    /// <summary>Something the standard does not know.</summary>
    Malformed,
}
