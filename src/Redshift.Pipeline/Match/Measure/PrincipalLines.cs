using Redshift.Pipeline.Results;

namespace Redshift.Pipeline.Match.Measure;

/// <summary>The lines by which an observer recognises a kind of object.</summary>
internal static class PrincipalLines
{
    private static readonly HashSet<string> Star =
    [
        "H alpha", "H beta", "H gamma", "H delta", "Ca II K", "Ca I 4227", "G band", "Mg I b1", "Fe I 5270", "Na I D2",
        "Ca II 8498", "Ca II 8542", "Ca II 8662", "Pa beta", "Br gamma", "He I 4471", "He I 5876", "He II 4686",
    ];

    private static readonly HashSet<string> Galaxy =
    [
        "Ly alpha", "Si II 1260", "C II 1334", "Si IV 1394", "Si II 1527", "C IV 1548", "Al II 1671", "C III] 1909", "Fe II 2383",
        "Fe II 2600", "Mg II 2796", "[O II] 3729", "Ca II K", "Ca II H", "H delta", "G band", "H gamma", "H beta", "[O III] 4959",
        "[O III] 5007", "Mg I b1", "Na I D2", "H alpha", "[N II] 6583", "[S II] 6716", "[S III] 9531", "He I 10830", "Pa beta", "Pa alpha",
    ];

    private static readonly HashSet<string> Quasar =
    [
        "Ly alpha", "N V 1240", "Si IV+O IV] 1400", "C IV 1549", "C III] 1909", "Mg II 2799", "H gamma", "H beta", "[O III] 5007",
        "H alpha", "He I 10830", "Pa beta", "Pa alpha",
    ];

    private static readonly HashSet<string> Nebula =
    [
        "[O II] 3729", "H gamma", "H beta", "[O III] 4959", "[O III] 5007", "He I 5876", "H alpha", "[N II] 6583", "[S II] 6716",
        "[Ar III] 7136", "[S III] 9531", "Pa beta",
    ];

    /// <summary>Their names.</summary>
    public static IReadOnlySet<string> Of(ObjectKind kind) => kind switch
    {
        ObjectKind.Star => Star,
        ObjectKind.Quasar => Quasar,
        ObjectKind.Nebula => Nebula,
        _ => Galaxy,
    };
}
