using System.Numerics;
using Redshift.Testing;
using Xunit;

namespace Redshift.Fits.Tests;

public sealed class HeaderTests
{
    // Forms of values: FITS Standard 4.0, section 4.2.
    private static readonly Header Cards = Read(
        "LOGICAL =                    T / a comment",
        "INTEGER =                  -42",
        "FREE    = +7 / free format",
        "REAL    =             1.25E-03",
        "DEXP    =             1.25D+03",
        "HUGE    =  9223372036854775808",
        "TEXT    = 'it''s    '          / quoted",
        "BLANKS  = '  lead  '",
        "NULLSTR = ''",
        "NUMTEXT = '5000.0 '",
        "UNDEF   =                      / nothing",
        "COMPLEX = (1.5, -2.0)",
        "INFINITE=             1.0E+999",
        "NOTNUM  =                  NaN",
        "OPEN    = 'no closing quote",
        "lower   =                    3",
        "HISTORY = this is text",
        "DOUBLE  =                    1",
        "DOUBLE  =                    2",
        "NOVALUE ='text'",
        "LONG    = 'one &'  / first",
        "CONTINUE  'two&'   / second",
        "CONTINUE  ' three' / third",
        "AMP     = 'really &'",
        "HIERARCH ESO DET  CHIP1 = 'eso' / chip",
        "COMMENT a = 1");

    [Fact]
    public void GetLogical_Logical_IsRead() => Assert.True(Cards.GetLogical("LOGICAL"));

    [Theory]
    [InlineData("INTEGER", -42)]
    [InlineData("FREE", 7)]
    [InlineData("LOWER", 3)]
    [InlineData("lower", 3)]
    [InlineData("DOUBLE", 1)]
    public void GetInteger_Integer_IsRead(string keyword, long expected) => Assert.Equal(expected, Cards.GetInteger(keyword));

    [Theory]
    [InlineData("REAL")]
    [InlineData("HUGE")]
    [InlineData("TEXT")]
    [InlineData("NUMTEXT")]
    [InlineData("ABSENT")]
    [InlineData("UNDEF")]
    public void GetInteger_SomethingElse_IsNull(string keyword) => Assert.Null(Cards.GetInteger(keyword));

    [Theory]
    [InlineData("REAL", 1.25e-3)]
    [InlineData("DEXP", 1250)]
    [InlineData("HUGE", 9223372036854775808.0)]
    [InlineData("INTEGER", -42)]
    [InlineData("NUMTEXT", 5000)]
    public void GetDouble_Number_IsRead(string keyword, double expected) => Assert.Equal(expected, Cards.GetDouble(keyword));

    [Theory]
    [InlineData("INFINITE")]
    [InlineData("NOTNUM")]
    [InlineData("TEXT")]
    [InlineData("NULLSTR")]
    [InlineData("LOGICAL")]
    [InlineData("COMPLEX")]
    public void GetDouble_NoFiniteNumber_IsNull(string keyword) => Assert.Null(Cards.GetDouble(keyword));

    [Theory]
    [InlineData("TEXT", "it's")]
    [InlineData("BLANKS", "  lead")]
    [InlineData("NULLSTR", "")]
    [InlineData("OPEN", "no closing quote")]
    [InlineData("LONG", "one two three")]
    [InlineData("AMP", "really &")]
    [InlineData("ESO DET CHIP1", "eso")]
    [InlineData("hierarch eso det chip1", "eso")]
    public void GetString_Text_IsRead(string keyword, string expected) => Assert.Equal(expected, Cards.GetString(keyword));

    [Fact]
    public void GetString_CardWithoutValueIndicator_IsNull() => Assert.Null(Cards.GetString("NOVALUE"));

    [Theory]
    [InlineData("UNDEF", CardValueKind.Undefined, "nothing")]
    [InlineData("NOTNUM", CardValueKind.Malformed, "")]
    [InlineData("HISTORY", CardValueKind.None, "= this is text")]
    [InlineData("LONG", CardValueKind.Text, "first second third")]
    [InlineData("TEXT", CardValueKind.Text, "quoted")]
    public void Find_Card_HasKindAndComment(string keyword, CardValueKind kind, string comment)
    {
        var card = Cards.Find(keyword)!;
        Assert.Equal((kind, comment), (card.Value.Kind, card.Comment));
    }

    [Fact]
    public void AsComplex_Pair_IsRead() => Assert.Equal(new Complex(1.5, -2), Cards.Find("COMPLEX")!.Value.AsComplex());

    [Fact]
    public void Enumeration_ContinuedCards_CountOnce()
    {
        Assert.Equal(Cards.Count, Cards.ToList().Count);
        Assert.DoesNotContain(Cards, card => card.Keyword == "CONTINUE");
        Assert.Equal(["SIMPLE", "BITPIX", "NAXIS", "LOGICAL"], Cards.Take(4).Select(card => card.Keyword));
    }

    [Fact]
    public void Header_AfterDisposal_StaysReadable() => Assert.Equal(8, Cards.GetInteger("BITPIX"));

    private static Header Read(params string[] lines)
    {
        string[] mandatory = ["SIMPLE  =                    T", "BITPIX  =                    8", "NAXIS   =                    0"];
        using var file = FitsFile.Open(new FitsText().Header([.. mandatory, .. lines]).ToStream(), "cards");
        return file.Hdus[0].Header;
    }
}
