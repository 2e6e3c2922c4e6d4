using CsCheck;
using Redshift.Pipeline.Report;
using Xunit;

namespace Redshift.Pipeline.Tests.Report;

public sealed class HarmlessTextTests
{
    [Theory]
    [InlineData("NGC 4151", "NGC 4151")]
    [InlineData("  padded  ", "padded")]
    [InlineData("\u001b[31mred", "\\u001b[31mred")]
    [InlineData("two\nlines", "two\\u000alines")]
    [InlineData("caf\u00e9", "caf\\u00e9")]
    [InlineData("=HYPERLINK(1)", "'=HYPERLINK(1)")]
    [InlineData("+1", "'+1")]
    [InlineData("-1", "'-1")]
    [InlineData("@x", "'@x")]
    [InlineData("\t=1", "'=1")]
    [InlineData("", "")]
    public void ForTable_makes_text_harmless(string hostile, string expected) =>
        Assert.Equal(expected, HarmlessText.ForTable(hostile));

    [Fact]
    public void ForTable_gives_printable_ascii_and_twice_is_once() =>
        Gen.String.Sample(text =>
        {
            var clean = HarmlessText.ForTable(text);
            return clean.All(letter => letter is >= ' ' and <= '~')
                && (clean.Length == 0 || !"=+-@".Contains(clean[0]))
                && HarmlessText.ForTable(clean) == clean;
        });
}
