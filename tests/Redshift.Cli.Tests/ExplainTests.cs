using System.Text.Json;
using Xunit;

namespace Redshift.Cli.Tests;

public sealed class ExplainTests : IDisposable
{
    private readonly SpectraFolder _folder = new();

    public void Dispose() => _folder.Dispose();

    [Fact]
    public void Explain_agrees_with_the_catalogue_and_draws()
    {
        var picture = _folder.Out("picture.png");
        Zladder.Run("run", _folder.At("a.txt"), "--out", _folder.Out());
        var rows = File.ReadAllLines(Path.Combine(_folder.Out(), "catalogue.csv"));
        using var json = JsonDocument.Parse(Zladder.Run("explain", _folder.At("a.txt"), "--json", "--plot", picture).Output);
        var answer = json.RootElement.GetProperty("answer").EnumerateObject().ToList();

        Assert.Equal(rows[0], string.Join(',', answer.Select(property => property.Name)));
        Assert.Equal(rows[1], string.Join(',', answer.Select(property => property.Value.ToString())));
        Assert.Equal([0x89, (byte)'P', (byte)'N', (byte)'G'], File.ReadAllBytes(picture).Take(4));
    }

    [Fact]
    public void Layout_shows_how_the_file_was_read()
    {
        var outcome = Zladder.Run("explain", _folder.At("a.txt"), "--layout");

        Assert.Equal(0, outcome.Status);
        Assert.StartsWith("How a.txt was read\n", outcome.Output, StringComparison.Ordinal);
        Assert.Contains("400 pixels, 400 usable", outcome.Output, StringComparison.Ordinal);
    }

    [Fact]
    public void Rule_that_the_layout_prints_can_be_pasted()
    {
        _folder.WriteFits("odd.fits", "INSTRUME= 'Prism 3'");
        var first = Zladder.Run("explain", _folder.At("odd.fits"), "--layout").Output;
        var pipeline = _folder.Out("pasted.toml");
        File.WriteAllText(pipeline, first[first.IndexOf("[[load]]", StringComparison.Ordinal)..]);
        var again = Zladder.Run("explain", _folder.At("odd.fits"), "--layout", "--pipeline", pipeline).Output;

        Assert.Contains("when = { INSTRUME = \"Prism 3\" }\nwavelength = \"HDU 0 axis\"\nflux = \"HDU 0\"\n", first, StringComparison.Ordinal);
        Assert.Equal(first[first.IndexOf("[[load]]", StringComparison.Ordinal)..], again[again.IndexOf("[[load]]", StringComparison.Ordinal)..]);
    }

    [Fact]
    public void Layout_of_a_file_that_is_refused_shows_what_it_holds()
    {
        _folder.WriteFits("sky.fits", "BUNIT   = 'mag'");
        var outcome = Zladder.Run("explain", _folder.At("sky.fits"), "--layout");

        Assert.Equal(4, outcome.Status);
        Assert.StartsWith("What the file holds\n  HDU 0  image of ", outcome.Output, StringComparison.Ordinal);
        Assert.StartsWith("rejected: sky.fits: HDU 0: found values in mag; expected a flux", outcome.Errors, StringComparison.Ordinal);
    }

    [Fact]
    public void A_file_that_is_no_spectrum_is_status_4_with_the_reason()
    {
        var outcome = Zladder.Run("explain", _folder.At("notes.md"));

        Assert.Equal((4, ""), (outcome.Status, outcome.Output));
        Assert.StartsWith("rejected: notes.md: ", outcome.Errors, StringComparison.Ordinal);
    }

    [Fact]
    public void A_row_that_is_not_there_is_status_2()
    {
        var outcome = Zladder.Run("explain", _folder.At("a.txt"), "--row", "3");

        Assert.Equal(2, outcome.Status);
        Assert.Equal("zladder: there is no row 3: the file holds 1 spectrum, counted from 0\n", outcome.Errors);
    }
}
