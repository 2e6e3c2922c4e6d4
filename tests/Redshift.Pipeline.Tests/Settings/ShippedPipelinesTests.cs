using Redshift.Physics.Units;
using Redshift.Pipeline.Match.Posterior;
using Redshift.Pipeline.Results;
using Redshift.Pipeline.Settings;
using Redshift.Testing;
using Xunit;

namespace Redshift.Pipeline.Tests.Settings;

public sealed class ShippedPipelinesTests
{
    [Fact]
    public void General_equals_the_defaults() =>
        PipelineFileTests.AssertSame(new PipelineSettings(), Load("general.toml"));

    [Fact]
    public void General_shows_only_keys_that_exist()
    {
        // Its examples are commented out; taking the comment marks away must leave a file that loads, bar alternatives.
        var lines = File.ReadLines(Repository.PathOf("pipelines", "general.toml"))
            .Select(line => line.StartsWith("# ", StringComparison.Ordinal) && (line.Contains('=') || line.StartsWith("# [", StringComparison.Ordinal)) ? line[2..] : line)
            .Where(line => !line.StartsWith("fwhm_a", StringComparison.Ordinal));
        var settings = PipelineFile.Parse(string.Join('\n', lines), "general.toml");

        Assert.Equal(2000, settings.Load.Resolution);
        Assert.Equal(VelocityFrame.Topocentric, settings.Load.Frame);
        var rule = Assert.Single(settings.Load.Rules);
        Assert.Equal(("SIGMA", "blue"), (rule.Error, Assert.Single(rule.Arms).Name));
        Assert.Equal(ObjectKind.Galaxy, settings.Match.Expect);
        Assert.Equal(new ConfidenceMaps(), settings.Match.Confidence);
    }

    [Fact]
    public void Stars_are_searched_within_the_speeds_of_the_galaxy()
    {
        foreach (var file in new[] { "fibre-stars.toml", "slit-stars.toml" })
        {
            var match = Load(file).Match;
            Assert.Equal((ObjectKind.Star, -0.004, 0.004), (match.Expect, match.ZMin, match.ZMax));
        }

        Assert.Equal(WavelengthMedium.Air, Load("slit-stars.toml").Load.Medium);
    }

    [Fact]
    public void Every_shipped_file_loads_and_is_listed()
    {
        var readme = File.ReadAllText(Repository.PathOf("pipelines", "README.md"));
        var files = Directory.GetFiles(Repository.PathOf("pipelines"), "*.toml");

        Assert.True(files.Length >= 5);
        foreach (var file in files)
        {
            var match = PipelineFile.Load(file).Match;
            Assert.True(match.PriorStar + match.PriorGalaxy + match.PriorQuasar + match.PriorNebula > 0, file);
            Assert.Contains($"`{Path.GetFileName(file)}`", readme, StringComparison.Ordinal);
        }
    }

    private static PipelineSettings Load(string name) => PipelineFile.Load(Repository.PathOf("pipelines", name));
}
