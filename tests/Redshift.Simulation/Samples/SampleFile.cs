namespace Redshift.Simulation.Samples;

/// <summary>One file of the sample night.</summary>
/// <param name="Path">Where it belongs, below the folder of samples, with <c>/</c>.</param>
/// <param name="Write">Writes its bytes.</param>
/// <param name="Truths">What its rows hold; empty where no reader should accept it.</param>
internal sealed record SampleFile(string Path, Action<Stream> Write, IReadOnlyList<SampleTruth> Truths);

/// <summary>What one spectrum of a file really shows.</summary>
/// <param name="Kind">The catalogue's word: star, galaxy, quasar, nebula, unknown, nothing.</param>
/// <param name="Z">Redshift as the file's wavelengths stand, or null.</param>
/// <param name="Note">For people.</param>
internal sealed record SampleTruth(string Kind, double? Z, string Note)
{
    /// <summary>The truth of a simulation.</summary>
    public static SampleTruth Of(SimulatedObservation observation, string note) => new(Word(observation.Kind), observation.Z, note);

    private static string Word(TruthKind kind) => kind switch
    {
        TruthKind.Star => "star",
        TruthKind.Galaxy => "galaxy",
        TruthKind.Quasar => "quasar",
        TruthKind.Nebula => "nebula",
        TruthKind.Oddity => "unknown",
        _ => "nothing",
    };
}
