using System.Numerics;
using System.Text;

namespace Redshift.Fits;

/// <summary>The value of a header card: its kind, and its literal.</summary>
/// <param name="Kind">What the literal is.</param>
/// <param name="Literal">
/// For text the string itself, without quotes and trailing blanks, continued cards joined; for all else the characters as they stand.
/// </param>
public readonly record struct CardValue(CardValueKind Kind, string Literal)
{
    /// <summary>The string, or null when the value is not text.</summary>
    public string? AsText() => Kind == CardValueKind.Text ? Literal : null;

    /// <summary>The integer, or null when the value is not one.</summary>
    public long? AsInteger() =>
        Kind == CardValueKind.Integer && FitsNumber.TryInteger(Ascii(), out var integer) ? integer : null;

    /// <summary>The number, also one that stands in quotes; null when the value is not a number.</summary>
    public double? AsDouble() =>
        Kind is CardValueKind.Integer or CardValueKind.Real or CardValueKind.Text && FitsNumber.TryDouble(Ascii(), out var number)
            ? number
            : null;

    /// <summary>The logical value, or null when the value is not one.</summary>
    public bool? AsLogical() => Kind == CardValueKind.Logical ? Literal == "T" : null;

    /// <summary>The complex number, or null when the value is not one.</summary>
    public Complex? AsComplex()
    {
        if (Kind != CardValueKind.Complex) return null;
        var literal = Ascii().AsSpan();
        var comma = literal.IndexOf((byte)',');
        return FitsNumber.TryDouble(literal[1..comma], out var real) && FitsNumber.TryDouble(literal[(comma + 1)..^1], out var imaginary)
            ? new Complex(real, imaginary)
            : null;
    }

    private byte[] Ascii() => Encoding.Latin1.GetBytes(Literal);
}
