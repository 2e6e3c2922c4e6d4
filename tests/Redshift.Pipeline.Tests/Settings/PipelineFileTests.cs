using Redshift.Physics.Units;
using Redshift.Pipeline.Match.Posterior;
using Redshift.Pipeline.Results;
using Redshift.Pipeline.Settings;
using Xunit;

namespace Redshift.Pipeline.Tests.Settings;

public sealed class PipelineFileTests
{
    [Fact]
    public void Parse_empty_text_gives_the_defaults() =>
        AssertSame(new PipelineSettings(), PipelineFile.Parse("", "empty.toml"));

    [Fact]
    public void Parse_reads_every_key()
    {
        const string text = """
            [read]
            resolution = 2000
            medium = "air"
            frame = "lsrk"
            keep = ["AIRMASS", "OBSERVER"]

            [[load]]
            when = { INSTRUME = "Spec 1", CAMERA = 2 }
            hdu = 1
            wavelength = "row 0"
            wavelength_unit = "nm"
            flux = "FLUX"
            error = "SIGMA"
            mask = "BAD"
            medium = "vacuum"
            frame = "rest"
            fwhm_a = 2.5

            [[load.arm]]
            name = "blue"
            resolution = "HDU 4"
            [[load.arm]]
            name = "red"
            resolution = 900

            [[load]]
            inverse_variance = "IVAR"
            ra = "X"
            dec = "Y"
            angle_unit = "radian"

            [match]
            expect = "nebula"
            z_range = [0, 1.5]
            priors.quasar = 3

            [calibration.quasar]
            offset = -1.5
            near = 0.1
            far = 0.8
            misfit = 0.3
            greatest = 0.95
            [calibration.other]
            far = 1
            """;
        var settings = PipelineFile.Parse(text, "all.toml");

        Assert.Equal(2000, settings.Load.Resolution);
        Assert.Equal(WavelengthMedium.Air, settings.Load.Medium);
        Assert.Equal(VelocityFrame.LocalStandardOfRest, settings.Load.Frame);
        Assert.Equal(["AIRMASS", "OBSERVER"], settings.Load.Keep);
        var rule = settings.Load.Rules[0];
        Assert.Equal(("Spec 1", "2"), (rule.When["INSTRUME"], rule.When["CAMERA"]));
        Assert.Equal(("1", "row 0", "nm"), (Assert.Single(rule.Hdus), rule.Wavelength, rule.WavelengthUnit));
        Assert.Equal(("FLUX", "SIGMA", "BAD", 2.5), (rule.Flux, rule.Error, rule.Mask, rule.FwhmA));
        Assert.Equal((WavelengthMedium.Vacuum, VelocityFrame.Rest), (rule.Medium, rule.Frame));
        Assert.Equal([("blue", null, "HDU 4"), ("red", 900, null)], rule.Arms.Select(static arm => (arm.Name, arm.Resolution, arm.ResolutionPlace)));
        Assert.Equal(("IVAR", AngleUnit.Radian), (settings.Load.Rules[1].InverseVariance, settings.Load.Rules[1].AngleUnit));
        Assert.Equal((ObjectKind.Nebula, 0.0, 1.5, 3.0), (settings.Match.Expect, settings.Match.ZMin, settings.Match.ZMax, settings.Match.PriorQuasar));
        var usual = new ConfidenceMaps();
        Assert.Equal(usual with { Quasar = new(-1.5, 0.1, 0.8, 0.3, 0.95), Other = usual.Other with { Far = 1 } }, settings.Match.Confidence);
    }

    [Theory]
    [InlineData("[read]\nresolutoin = 5", 2, 14, "the unknown key \"resolutoin\"", "did you mean resolution?")]
    [InlineData("[red]\nresolution = 5", 1, 1, "the unknown key \"red\"", "did you mean read?")]
    [InlineData("[read]\nzzz = 5", 2, 7, "the unknown key \"zzz\"", "one of resolution, fwhm_a, medium, frame, keep")]
    [InlineData("[read]\nresolution = \"high\"", 2, 14, "the text \"high\"", "a number from 10 to 1000000")]
    [InlineData("[read]\n  resolution = -5.5", 2, 16, "the number -5.5", "a number from 10 to 1000000")]
    [InlineData("[read]\nresolution = nan", 2, 14, "the number NaN", "a number from 10 to 1000000")]
    [InlineData("[read]\nmedium = \"Air\"", 2, 10, "the text \"Air\"", "one of vacuum, air")]
    [InlineData("[read]\nmedium = true", 2, 10, "true", "one of vacuum, air")]
    [InlineData("[read]\nkeep = \"AIRMASS\"", 2, 8, "the text \"AIRMASS\"", "a list of texts")]
    [InlineData("[read]\nkeep = [\"A\", 3]", 2, 14, "the number 3", "a text in quotes")]
    [InlineData("[read]\nkeep = [\"A\", \"A\"]", 2, 8, "A twice", "each card once")]
    [InlineData("[read]\nresolution = 500\nfwhm_a = 2", 3, 10, "both", "only one of resolution and fwhm_a")]
    [InlineData("read = 5", 1, 8, "the number 5", "a table")]
    [InlineData("[load]\nhdu = 1", 1, 1, "a table", "a list of tables, written [[load]]")]
    [InlineData("[[load]]\nwhen = { INSTRUME = 2.5 }", 2, 21, "the number 2.5", "a text in quotes")]
    [InlineData("[[load]]\nerror = \"A\"\nvariance = \"B\"", 3, 12, "both", "only one of error and variance")]
    [InlineData("[[load]]\nmask = \"A\"\ngood = \"B\"", 3, 8, "both", "only one of mask and good")]
    [InlineData("[[load]]\nra = \"A\"", 2, 6, "only one of them", "both ra and dec")]
    [InlineData("[[load]]\nresolution = 5", 2, 14, "the number 5", "a number from 10 to 1000000")]
    [InlineData("[match]\nz_range = [1.5, 0.2]", 2, 11, "[1.5, 0.2]", "the lower number first")]
    [InlineData("[match]\nz_range = [0, 20]", 2, 15, "the number 20", "a number from -0.01 to 7.5")]
    [InlineData("[match]\nz_range = 0.5", 2, 11, "the number 0.5", "two numbers")]
    [InlineData("[match]\nexpect = \"comet\"", 2, 10, "the text \"comet\"", "one of star, galaxy, quasar, nebula")]
    [InlineData("[match.priors]\nstar = -1", 2, 8, "the number -1", "a number from 0 to 1000000")]
    [InlineData("[calibration.star]\noffset = 1", 1, 1, "the unknown key \"star\"", "one of galaxy, quasar, other")]
    [InlineData("[calibration.galaxy]\nofset = 1", 2, 9, "the unknown key \"ofset\"", "did you mean offset?")]
    [InlineData("[calibration.galaxy]\nnear = -0.1", 2, 8, "the number -0.1", "a number from 0 to 5")]
    [InlineData("[calibration.galaxy]\noffset = 21", 2, 10, "the number 21", "a number from -20 to 20")]
    [InlineData("[calibration.quasar]\ngreatest = 1.0", 2, 12, "the number 1", "a number from 0.5 to 0.999")]
    [InlineData("[calibration]\nquasar = 0.5", 2, 10, "the number 0.5", "a table")]
    [InlineData("[match]\nexpect = 1979-05-27", 2, 10, "a date", "one of star")]
    public void Parse_refuses_what_it_cannot_use_and_says_where(string text, int line, int column, string found, string expected)
    {
        var problem = Assert.Throws<SettingsException>(() => PipelineFile.Parse(text, "my.toml"));

        Assert.Equal((line, column), (problem.Line, problem.Column));
        Assert.StartsWith($"my.toml:{line}:{column}: found {found}; expected ", problem.Message, StringComparison.Ordinal);
        Assert.Contains(expected, problem.Message, StringComparison.Ordinal);
    }

    [Theory]
    [InlineData("[read\n", 1, "[read")]
    [InlineData("[read]\nresolution = = 5", 2, "resolution = = 5")]
    [InlineData("[read]\r\n  medium = \"air\r\n", 2, "medium = \"air")]
    [InlineData("[read]\nresolution = 5\nresolution = 6", 3, "resolution = 6")]
    [InlineData("[read]\n[match]\n[read]\n", 3, "[read]")]
    public void Parse_refuses_what_is_not_toml_and_shows_the_line(string text, int line, string shown)
    {
        var problem = Assert.Throws<SettingsException>(() => PipelineFile.Parse(text, "my.toml"));

        Assert.Equal(line, problem.Line);
        Assert.EndsWith(
            $": found the line \"{shown}\"; expected TOML: [section], key = number, key = \"text\", or # and a remark", problem.Message, StringComparison.Ordinal);
    }

    [Fact]
    public void Load_of_a_missing_file_says_so()
    {
        var problem = Assert.Throws<SettingsException>(() => PipelineFile.Load("no-such.toml"));

        Assert.Equal("no-such.toml: found no file that can be opened; expected a pipeline file in TOML", problem.Message);
    }

    [Fact]
    public void Load_of_bytes_that_are_not_text_says_so()
    {
        var path = Path.GetTempFileName();
        File.WriteAllBytes(path, [0x53, 0xFF, 0xFE]);
        try
        {
            var problem = Assert.Throws<SettingsException>(() => PipelineFile.Load(path));
            Assert.Contains("bytes that are not UTF-8", problem.Message, StringComparison.Ordinal);
        }
        finally
        {
            File.Delete(path);
        }
    }

    internal static void AssertSame(PipelineSettings expected, PipelineSettings actual)
    {
        Assert.Equal(expected.Match, actual.Match);
        Assert.Equal(expected.Load.Keep, actual.Load.Keep);
        Assert.Equal(expected.Load.Rules, actual.Load.Rules);
        Assert.Equal(
            (expected.Load.Resolution, expected.Load.FwhmA, expected.Load.Medium, expected.Load.Frame),
            (actual.Load.Resolution, actual.Load.FwhmA, actual.Load.Medium, actual.Load.Frame));
    }
}
