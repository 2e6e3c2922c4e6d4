using Redshift.Physics.Units;
using Redshift.Pipeline.Observations;
using Redshift.Pipeline.Results;

namespace Redshift.Pipeline.Report;

/// <summary>The words that stand for our own states in pipeline files, options and catalogues: one spelling everywhere.</summary>
public static class Words
{
    /// <summary>Kinds that can be asked for.</summary>
    public static IReadOnlyDictionary<string, ObjectKind> Kinds { get; } = new Dictionary<string, ObjectKind>
    {
        ["star"] = ObjectKind.Star,
        ["galaxy"] = ObjectKind.Galaxy,
        ["quasar"] = ObjectKind.Quasar,
        ["nebula"] = ObjectKind.Nebula,
    };

    /// <summary>Frames of velocity.</summary>
    public static IReadOnlyDictionary<string, VelocityFrame> Frames { get; } = new Dictionary<string, VelocityFrame>
    {
        ["barycentric"] = VelocityFrame.Barycentric,
        ["heliocentric"] = VelocityFrame.Heliocentric,
        ["topocentric"] = VelocityFrame.Topocentric,
        ["lsrk"] = VelocityFrame.LocalStandardOfRest,
        ["rest"] = VelocityFrame.Rest,
        ["unknown"] = VelocityFrame.Unknown,
    };

    /// <summary>Media of the wavelengths.</summary>
    public static IReadOnlyDictionary<string, WavelengthMedium> Media { get; } = new Dictionary<string, WavelengthMedium>
    {
        ["vacuum"] = WavelengthMedium.Vacuum,
        ["air"] = WavelengthMedium.Air,
    };

    /// <summary>The word of a kind.</summary>
    public static string Of(ObjectKind kind) => kind switch
    {
        ObjectKind.Star => "star",
        ObjectKind.Galaxy => "galaxy",
        ObjectKind.Quasar => "quasar",
        ObjectKind.Nebula => "nebula",
        _ => "unknown",
    };

    /// <summary>The word of a frame.</summary>
    public static string Of(VelocityFrame frame) => frame switch
    {
        VelocityFrame.Barycentric => "barycentric",
        VelocityFrame.Heliocentric => "heliocentric",
        VelocityFrame.Topocentric => "topocentric",
        VelocityFrame.LocalStandardOfRest => "lsrk",
        VelocityFrame.Rest => "rest",
        _ => "unknown",
    };

    /// <summary>The word of a medium.</summary>
    public static string Of(WavelengthMedium medium) => medium == WavelengthMedium.Air ? "air" : "vacuum";

    /// <summary>The word of a verdict.</summary>
    public static string Of(Verdict verdict) => verdict switch
    {
        Verdict.Firm => "firm",
        Verdict.Likely => "likely",
        Verdict.Unsettled => "unsettled",
        _ => "nothing",
    };

    /// <summary>The word of a line's state.</summary>
    public static string Of(LineState state) => state switch
    {
        LineState.Matched => "matched",
        LineState.ExpectedMissing => "expected-missing",
        LineState.Blended => "blended",
        LineState.Masked => "masked",
        _ => "unexplained",
    };

    /// <summary>The word of where a resolution comes from.</summary>
    public static string Of(ResolutionSource source) => source switch
    {
        ResolutionSource.Pipeline => "pipeline",
        ResolutionSource.File => "file",
        ResolutionSource.Keyword => "keyword",
        _ => "estimate",
    };
}
