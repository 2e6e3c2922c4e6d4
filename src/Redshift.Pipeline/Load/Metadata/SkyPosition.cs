using Redshift.Fits;
using Redshift.Pipeline.Settings;

namespace Redshift.Pipeline.Load.Metadata;

/// <summary>Finds the target's position in a header; the target's own cards win over the telescope's.</summary>
internal static class SkyPosition
{
    private static readonly (string Ra, string Dec)[] Keywords =
    [
        ("RA_TARG", "DEC_TARG"), ("PLUG_RA", "PLUG_DEC"), ("OBJ_RA", "OBJ_DEC"), ("RA_OBJ", "DEC_OBJ"), ("TARGRA", "TARGDEC"),
        ("TARG_RA", "TARG_DEC"), ("OBJCTRA", "OBJCTDEC"), ("OBJRA", "OBJDEC"), ("RAOBJ", "DECOBJ"), ("RA", "DEC"), ("RADEG", "DECDEG"),
        ("RA_DEG", "DEC_DEG"), ("CAT-RA", "CAT-DEC"), ("RA2000", "DEC2000"), ("TELRA", "TELDEC"), ("RA_TEL", "DEC_TEL"), ("ALPHA", "DELTA"),
    ];

    /// <summary>Right ascension and declination in degrees, both or neither.</summary>
    public static (double Ra, double Dec)? Find(HeaderScope header)
    {
        foreach (var (raKeyword, decKeyword) in Keywords)
        {
            if (header.Find(raKeyword) is not { } raCard || header.Find(decKeyword) is not { } decCard) continue;
            if (Read(raCard, decCard, null) is { } position) return position;
        }
        return null;
    }

    /// <summary>The position in two cards, or null where they hold none.</summary>
    /// <param name="ra">Right ascension.</param>
    /// <param name="dec">Declination.</param>
    /// <param name="unit">Unit of plain numbers; null where the comments tell it.</param>
    public static (double Ra, double Dec)? Read(Card ra, Card dec, AngleUnit? unit)
    {
        var alpha = SkyAngle.RightAscension(HeaderScope.TextOf(ra), unit ?? SkyAngle.UnitOf(ra.Comment));
        var delta = SkyAngle.Declination(HeaderScope.TextOf(dec), unit ?? SkyAngle.UnitOf(dec.Comment));
        return alpha is { } rightAscension && delta is { } declination ? (rightAscension, declination) : null;
    }
}
