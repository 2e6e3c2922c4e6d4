using Redshift.Fits;
using Redshift.Pipeline.Load.Assembly;
using Redshift.Pipeline.Observations;
using Redshift.Pipeline.Settings;

namespace Redshift.Pipeline.Load.Metadata;

/// <summary>The resolution that applies to all pixels: the pipeline file's, else a plausible keyword's.</summary>
internal static class ResolutionFinder
{
    private static readonly string[] PowerKeywords =
        ["SPEC_RES", "SPEC_RP", "SPECRP", "SPECRES", "SPE_RPOW", "BSS_ESRP", "BSS_ITRP", "RESOLPOW", "RES_POW", "RESOLVIN", "RESPOWER", "R_POWER",
            "SPECTRES", "RESOLUTN", "RESOLUT", "RESOLUTI", "SPRES", "RESOL", "R"];

    private static readonly string[] WidthKeywords = ["FWHM_A", "SPECFWHM", "RESFWHM", "RESOL-SP", "LSFFWHM", "SPEC_FWH", "DISPRES"];

    /// <summary>The resolution, or null where nobody states one.</summary>
    public static StatedResolution? Find(HeaderScope header, LoadSettings settings) =>
        StatedResolution.FromPipeline(settings.Resolution, settings.FwhmA) ?? FromPower(header) ?? FromWidth(header);

    private static StatedResolution? FromPower(HeaderScope header)
    {
        foreach (var keyword in PowerKeywords)
            if (header.Find(keyword) is { } card && card.Value.AsDouble() is { } power && IsPower(power, card))
                return new(power, null, ResolutionSource.Keyword, keyword);
        return null;
    }

    // One-letter keywords mean anything, and a "resolution" in Å or pixels is no power.
    private static bool IsPower(double power, Card card) =>
        power is >= 30 and <= 400_000
        && (card.Keyword != "R" || card.Comment.ContainsAny("resol"))
        && !card.Comment.ContainsAny("[nm]")
        && !card.Comment.ContainsAny("m/s");

    private static StatedResolution? FromWidth(HeaderScope header)
    {
        foreach (var keyword in WidthKeywords)
            if (header.Number(keyword) is { } width and > 0 and < 200) return new(null, width, ResolutionSource.Keyword, keyword);
        return null;
    }
}
