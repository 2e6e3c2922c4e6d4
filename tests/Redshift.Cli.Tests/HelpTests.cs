using Redshift.Testing;
using Xunit;

namespace Redshift.Cli.Tests;

public sealed class HelpTests
{
    [Theory]
    [InlineData]
    [InlineData("run")]
    [InlineData("explain")]
    [InlineData("lines")]
    [InlineData("merge")]
    [InlineData("watch")]
    [InlineData("export")]
    [InlineData("compare")]
    [InlineData("inject")]
    public void Help_is_as_approved(params string[] command)
    {
        var outcome = Zladder.Run([.. command, "--help"]);

        Assert.Equal(0, outcome.Status);
        ApprovedText.Check(outcome.Output, "tests", "Redshift.Cli.Tests", "Approved", $"help-{string.Join('-', command)}.txt");
    }

    [Fact]
    public void Version_is_a_number() => Assert.Matches(@"^\d+\.\d+\.\d+\n$", Zladder.Run("--version").Output);
}
