using Redshift.Pipeline.Observations;
using Redshift.Pipeline.Results;
using Redshift.Pipeline.Settings;

namespace Redshift.Pipeline;

/// <summary>The stages between reading and reporting: normalize, detect, match. One instance serves one worker thread.</summary>
public sealed class ObservationPipeline(PipelineSettings settings)
{
    /// <summary>Analyses one observation; the result depends on nothing but the observation and the settings.</summary>
    /// <param name="observation">The observation as read.</param>
    /// <returns>The answer, or the verdict that there is nothing.</returns>
    public ObservationResult Analyze(Observation observation)
    {
        _ = settings;
        return new() { Observation = observation, Verdict = Verdict.Nothing, Kind = ObjectKind.Unknown };
    }
}
