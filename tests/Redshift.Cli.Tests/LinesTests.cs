using System.Text.Json;
using Xunit;

namespace Redshift.Cli.Tests;

public sealed class LinesTests
{
    [Fact]
    public void Lines_fall_where_the_redshift_puts_them()
    {
        var outcome = Zladder.Run("lines", "--z", "0.158", "--kind", "quasar", "--range", "5600,5850", "--json");
        using var json = JsonDocument.Parse(outcome.Output);
        var lines = json.RootElement.EnumerateArray().ToDictionary(line => line.GetProperty("line").GetString()!);

        // H beta of 3C 273 at z = 0.158: 4862.683 A in vacuum (CODATA 2022 levels) times 1.158.
        Assert.Equal(5630.987, lines["H beta"].GetProperty("observed_vacuum_a").GetDouble(), 0.002);
        Assert.All(lines.Values, line => Assert.InRange(line.GetProperty("observed_vacuum_a").GetDouble(), 5600, 5850));
        Assert.DoesNotContain("H alpha", lines.Keys);
    }

    [Fact]
    public void Air_wavelengths_are_those_of_standard_air()
    {
        var text = Zladder.Run("lines", "--air", "--range", "5889,5897").Output;

        // The sodium doublet in air, 5889.951 and 5895.924 A (NIST ASD).
        Assert.Contains("5889.951", text, StringComparison.Ordinal);
        Assert.Contains("5895.924", text, StringComparison.Ordinal);
        Assert.Contains("observed_air_a", text, StringComparison.Ordinal);
    }

    [Fact]
    public void An_empty_range_prints_the_heading_only() =>
        Assert.Single(Zladder.Run("lines", "--range", "1,2").Output.Split('\n'), line => line.Length > 0);
}
