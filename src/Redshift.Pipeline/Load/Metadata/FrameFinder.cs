using System.Text.RegularExpressions;
using Redshift.Fits;
using Redshift.Physics.Units;

namespace Redshift.Pipeline.Load.Metadata;

/// <summary>The frame of the wavelengths, from cards that say it was applied; a mere value of the correction says nothing.</summary>
internal static partial class FrameFinder
{
    /// <summary>The frame and where it is stated; null where it is not.</summary>
    public static (VelocityFrame Frame, string Where)? Find(HeaderScope header)
    {
        foreach (var keyword in (ReadOnlySpan<string>)["SPECSYS", "SPECSYSA", "VELFRAME"])
            if (header.Text(keyword) is { } system && FromName(system) is { } frame) return (frame, $"keyword {keyword}");
        if (FromFlags(header) is { } flagged) return flagged;
        return FromRemarks(header.Cards);
    }

    /// <summary>A frame by the names of the FITS Standard 4.0, table 27, also when written out.</summary>
    public static VelocityFrame? FromName(string name)
    {
        if (name.BeginsWithAny("TOPO", "GEOC", "OBSERVATORY"))
            return VelocityFrame.Topocentric;
        if (name.BeginsWithAny("BARY")) return VelocityFrame.Barycentric;
        if (name.BeginsWithAny("HELIO")) return VelocityFrame.Heliocentric;
        if (name.BeginsWithAny("LSR")) return VelocityFrame.LocalStandardOfRest;
        return name.BeginsWithAny("SOURCE") ? VelocityFrame.Rest : null;
    }

    private static (VelocityFrame, string)? FromFlags(HeaderScope header)
    {
        if (header.Flag("HELIO") is { } helio) return (helio ? VelocityFrame.Heliocentric : VelocityFrame.Topocentric, "keyword HELIO");
        // Written by survey pipelines beside the coefficients of an axis that contains the correction.
        if (header.Number("HELIO_RV") is not null && header.Has("VACUUM")) return (VelocityFrame.Heliocentric, "keyword HELIO_RV");
        // Amateur archives define it as the correction that has been applied, 0 where none was.
        if (header.Number("BSS_VHEL") is { } applied)
            return (applied == 0 ? VelocityFrame.Topocentric : VelocityFrame.Heliocentric, "keyword BSS_VHEL");
        if (header.Text("DOPCOR01") is not null && header.Number("VHELIO") is not null)
            return (VelocityFrame.Heliocentric, "keywords DOPCOR01 and VHELIO");
        foreach (var keyword in (ReadOnlySpan<string>)["BARYCORR", "HELCORR", "BERVCORR", "HELIOCOR", "BARY_COR"])
            if (header.Text(keyword)?.ToUpperInvariant() is "T" or "PERFORM" or "COMPLETE" or "DONE" or "APPLIED")
                return (keyword.BeginsWithAny("HEL") ? VelocityFrame.Heliocentric : VelocityFrame.Barycentric, $"keyword {keyword}");
        return null;
    }

    private static (VelocityFrame, string)? FromRemarks(IEnumerable<Card> cards)
    {
        foreach (var card in cards)
        {
            if (card.Value.Kind is not (CardValueKind.None or CardValueKind.Text)) continue;
            var text = card.Value.Kind == CardValueKind.Text ? card.Value.Literal + " " + card.Comment : card.Comment;
            if (FromText(text) is { } frame) return (frame, $"card {card.Keyword}: {text.Trim()}");
        }
        return null;
    }

    /// <summary>What a line of free text says of the frame.</summary>
    public static VelocityFrame? FromText(string text)
    {
        if (!text.ContainsAny("centric", "center", "centre"))
            return null;
        if (AppliedPattern().Match(text) is not { Success: true } match || DeniedPattern().IsMatch(text)) return null;
        return match.Value.ContainsAny("helio") ? VelocityFrame.Heliocentric : VelocityFrame.Barycentric;
    }

    [GeneratedRegex(@"(corrected (to|for)|in|converted to|shifted to|wavelengths? (are|is)?)[^.;]{0,30}\b(helio|bary)cent|\b(helio|bary)centric (wavelength|correction (was |is |has been )?applied|corrected|frame|vacuum)|(vacuum|air)[ -](helio|bary)centric",
        RegexOptions.IgnoreCase | RegexOptions.CultureInvariant)]
    private static partial Regex AppliedPattern();

    [GeneratedRegex(@"\b(no|not|without|none|uncorrected|date|time|jd|julian)\b", RegexOptions.IgnoreCase | RegexOptions.CultureInvariant)]
    private static partial Regex DeniedPattern();
}
