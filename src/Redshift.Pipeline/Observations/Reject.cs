namespace Redshift.Pipeline.Observations;

/// <summary>Something that could not be used, in the words an observer needs to mend it.</summary>
/// <param name="Source">The file, as in <see cref="Observation.Source"/>.</param>
/// <param name="Row">0-based spectrum, or null where the whole file is meant.</param>
/// <param name="Place">Where in the file: HDU, column, keyword, line or byte.</param>
/// <param name="Found">What stands there.</param>
/// <param name="Expected">What was expected.</param>
public sealed record Reject(string Source, int? Row, string Place, string Found, string Expected)
{
    /// <summary>The whole message on one line.</summary>
    public override string ToString() =>
        $"{Source}{(Row is { } row ? $" row {row}" : "")}: {Place}: found {Found}; expected {Expected}";
}

/// <summary>What reading yields for one spectrum: exactly one of the two is set.</summary>
/// <param name="Observation">The observation, ready for use.</param>
/// <param name="Reject">Why there is none.</param>
public readonly record struct LoadOutcome(Observation? Observation, Reject? Reject);
