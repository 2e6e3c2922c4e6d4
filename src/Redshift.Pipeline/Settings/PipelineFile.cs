using System.Text;
using Redshift.Pipeline.Report;

namespace Redshift.Pipeline.Settings;

/// <summary>Reads a pipeline file: TOML with the tables <c>[read]</c>, <c>[[load]]</c>, <c>[match]</c> and <c>[calibration]</c>.</summary>
public static class PipelineFile
{
    // Limits beyond which a value is a slip of the pen: prisms have R = 30, the finest spectrographs 200,000.
    internal const double LowestResolution = 10;
    internal const double HighestResolution = 1e6;
    internal const double LowestFwhmA = 1e-3;
    internal const double HighestFwhmA = 1000;

    /// <summary>Reads a file.</summary>
    /// <exception cref="SettingsException">The file cannot be read, or says something that cannot be used.</exception>
    public static PipelineSettings Load(string path)
    {
        try
        {
            return Parse(File.ReadAllText(path, new UTF8Encoding(false, throwOnInvalidBytes: true)), path);
        }
        catch (Exception problem) when (problem is IOException or UnauthorizedAccessException)
        {
            throw new SettingsException(path, 0, 0, "no file that can be opened", "a pipeline file in TOML");
        }
        catch (DecoderFallbackException)
        {
            throw new SettingsException(path, 0, 0, "bytes that are not UTF-8", "a pipeline file in TOML");
        }
    }

    /// <summary>Reads the text of a pipeline file; <paramref name="file"/> is its name in messages.</summary>
    /// <exception cref="SettingsException">The text says something that cannot be used.</exception>
    public static PipelineSettings Parse(string text, string file)
    {
        var root = new SectionReader(TomlNode.Parse(text, file));
        var read = root.Section("read");
        var rules = root.Sections("load").Select(LoadRuleReader.Read).ToList();
        var match = root.Section("match");
        var calibration = root.Section("calibration");
        root.RejectOthers();
        return new()
        {
            Load = (read is null ? new LoadSettings() : ReadDefaults(read)) with { Rules = rules },
            Match = (match is null ? new MatchSettings() : ReadMatch(match)) with { Confidence = calibration is null ? new() : CalibrationReader.Read(calibration) },
        };
    }

    private static LoadSettings ReadDefaults(SectionReader section)
    {
        var settings = new LoadSettings
        {
            Resolution = section.Number("resolution", LowestResolution, HighestResolution),
            FwhmA = section.Number("fwhm_a", LowestFwhmA, HighestFwhmA),
            Medium = section.Choice("medium", Words.Media),
            Frame = section.Choice("frame", Words.Frames),
            Keep = section.Texts("keep"),
        };
        section.NotBoth("resolution", "fwhm_a");
        section.RejectOthers();
        return settings;
    }

    private static MatchSettings ReadMatch(SectionReader section)
    {
        var defaults = new MatchSettings();
        var range = section.Range("z_range", RedshiftRange.Lowest, RedshiftRange.Highest) ?? (defaults.ZMin, defaults.ZMax);
        var settings = defaults with
        {
            Expect = section.Choice("expect", Words.Kinds),
            ZMin = range.Item1,
            ZMax = range.Item2,
        };
        if (section.Section("priors") is { } priors)
            settings = ReadPriors(priors, settings);
        section.RejectOthers();
        return settings;
    }

    private static MatchSettings ReadPriors(SectionReader section, MatchSettings settings)
    {
        double Weight(string kind, double fallback) => section.Number(kind, 0, 1e6) ?? fallback;
        settings = settings with
        {
            PriorStar = Weight("star", settings.PriorStar),
            PriorGalaxy = Weight("galaxy", settings.PriorGalaxy),
            PriorQuasar = Weight("quasar", settings.PriorQuasar),
            PriorNebula = Weight("nebula", settings.PriorNebula),
        };
        section.RejectOthers();
        return settings;
    }
}
