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
            var ra = SkyAngle.RightAscension(HeaderScope.TextOf(raCard), raCard.Comment);
            var dec = SkyAngle.Declination(HeaderScope.TextOf(decCard), decCard.Comment);
            if (ra is { } alpha && dec is { } delta) return (alpha, delta);
        }
        return null;
    }
}
