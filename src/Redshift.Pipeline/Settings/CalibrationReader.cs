using Redshift.Pipeline.Match.Posterior;

namespace Redshift.Pipeline.Settings;

/// <summary>Reads the table <c>[calibration]</c>: a table of numbers for each kind of answer.</summary>
internal static class CalibrationReader
{
    // Far beyond what any sample has given; a negative slope would make better evidence worse.
    private const double GreatestOffset = 20;
    private const double GreatestSlope = 5;

    /// <summary>A sample without any wrong answer supports no less.</summary>
    private const double LowestCap = 0.5;

    /// <summary>Reads all kinds; those that are not stated keep the numbers of the program.</summary>
    /// <exception cref="SettingsException">A value is out of range, or a key unknown.</exception>
    public static ConfidenceMaps Read(SectionReader section)
    {
        var usual = new ConfidenceMaps();
        var maps = new ConfidenceMaps
        {
            Galaxy = ReadMap(section, "galaxy", usual.Galaxy),
            Quasar = ReadMap(section, "quasar", usual.Quasar),
            Other = ReadMap(section, "other", usual.Other),
        };
        section.RejectOthers();
        return maps;
    }

    private static ConfidenceMap ReadMap(SectionReader kinds, string kind, ConfidenceMap usual)
    {
        if (kinds.Section(kind) is not { } section)
            return usual;
        var map = new ConfidenceMap(
            section.Number("offset", -GreatestOffset, GreatestOffset) ?? usual.Offset,
            section.Number("near", 0, GreatestSlope) ?? usual.Near,
            section.Number("far", 0, GreatestSlope) ?? usual.Far,
            section.Number("misfit", 0, GreatestSlope) ?? usual.Misfit,
            section.Number("greatest", LowestCap, Calibration.Greatest) ?? usual.Greatest);
        section.RejectOthers();
        return map;
    }
}
