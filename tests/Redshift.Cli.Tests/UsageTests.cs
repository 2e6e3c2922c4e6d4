using Xunit;

namespace Redshift.Cli.Tests;

public sealed class UsageTests
{
    [Theory]
    [InlineData("zladder: no command given; see zladder --help")]
    [InlineData("zladder: Unrecognized command or argument 'measur'.", "measur")]
    [InlineData("zladder: Option '--out' is required.", "run", "x")]
    [InlineData("zladder: no paths given: name files or folders, or a list with --from", "run", "--out", "/tmp/never-made")]
    [InlineData("zladder: there is no option --ot", "run", "--out", "/tmp/never-made", "--ot")]
    [InlineData("zladder: --jobs: found 'two'; expected a whole number, 1 or more", "run", "x", "--out", "/tmp/never-made", "--jobs", "two")]
    [InlineData("zladder: --jobs: found '0'; expected a whole number, 1 or more", "run", "x", "--out", "/tmp/never-made", "--jobs", "0")]
    [InlineData("zladder: --expect: found 'comet'; expected one of star, galaxy, quasar, nebula, any", "run", "x", "--out", "/tmp/never-made", "--expect", "comet")]
    [InlineData(
        "zladder: --z-range: found '1,0'; expected two numbers from -0.01 to 7.5, the lower first, with a comma between, such as 0,1.5",
        "run", "x", "--out", "/tmp/never-made", "--z-range", "1,0")]
    [InlineData("zladder: --shard: found '0/3'; expected a part and the number of parts, such as 3/7; the first part is 1, the last one here 7", "run", "x", "--out", "/tmp/never-made", "--shard", "0/3")]
    [InlineData("zladder: --shard: found '4/3'; expected a part and the number of parts, such as 3/7; the first part is 1, the last one here 7", "run", "x", "--out", "/tmp/never-made", "--shard", "4/3")]
    [InlineData("zladder: --from: found no list that can be opened at /no/list; expected a file with one path a line, or - for standard input", "run", "--from", "/no/list", "--out", "/tmp/never-made")]
    [InlineData("zladder: /no/p.toml: found no file that can be opened; expected a pipeline file in TOML", "run", "x", "--out", "/tmp/never-made", "--pipeline", "/no/p.toml")]
    [InlineData("zladder: there is no file /no/file", "explain", "/no/file")]
    [InlineData("zladder: --z: found 'nan'; expected a redshift greater than -1, such as 0.158", "lines", "--z", "nan")]
    [InlineData("zladder: --air and --vacuum exclude each other", "lines", "--air", "--vacuum")]
    public void Wrong_usage_is_said_in_one_line_with_status_2(string message, params string[] arguments)
    {
        var outcome = Zladder.Run(arguments);

        Assert.Equal((2, ""), (outcome.Status, outcome.Output));
        Assert.Equal(message, outcome.Errors.Split('\n')[0]);
        Assert.False(Directory.Exists("/tmp/never-made"));
    }

    [Theory]
    [InlineData("[match]\nz_rnage = [0, 1]\n", ":2:11: found the unknown key \"z_rnage\"; expected one of z_range, expect, priors (did you mean z_range?)")]
    [InlineData("[match]\nz_range = [0, 1\n\u001bexpect\n", ":3:1: found the line \"\\u001bexpect\"; expected TOML: [section], key = number, key = \"text\", or # and a remark")]
    public void A_fault_in_a_pipeline_file_is_placed(string text, string message)
    {
        using var folder = new SpectraFolder();
        var file = folder.Out("mine.toml");
        File.WriteAllText(file, text);
        var outcome = Zladder.Run("run", folder.Spectra, "--out", folder.Out(), "--pipeline", file);

        Assert.Equal(2, outcome.Status);
        Assert.Equal($"zladder: {file}{message}\n", outcome.Errors);
    }
}
