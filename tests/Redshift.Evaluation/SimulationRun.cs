using System.Diagnostics;
using Redshift.Physics.Units;
using Redshift.Pipeline;
using Redshift.Pipeline.Observations;
using Redshift.Pipeline.Results;
using Redshift.Pipeline.Settings;
using Redshift.Simulation;

namespace Redshift.Evaluation;

/// <summary>Lets the pipeline loose on simulated observations.</summary>
internal static class SimulationRun
{
    /// <summary>Judges <paramref name="count"/> observations of a seed, in their order.</summary>
    public static IReadOnlyList<Judgement> Judge(ulong seed, int count, SurveyMix mix, int jobs, Action<ObservationResult, Judgement>? each = null)
    {
        using var pipelines = new ThreadLocal<ObservationPipeline>(() => new(new PipelineSettings()));
        var outcomes = Enumerable.Range(0, count).AsParallel().AsOrdered().WithDegreeOfParallelism(jobs)
            .Select(index => Judge(SimulatedSurvey.Observe(seed, index, mix), pipelines.Value!));
        var judgements = new List<Judgement>(count);
        foreach (var (result, judgement) in outcomes)
        {
            each?.Invoke(result, judgement);
            judgements.Add(judgement);
        }
        return judgements;
    }

    private static (ObservationResult Result, Judgement Judgement) Judge(SimulatedObservation simulated, ObservationPipeline pipeline)
    {
        var observation = ToObservation(simulated);
        var started = Stopwatch.GetTimestamp();
        var result = pipeline.Analyze(observation);
        var milliseconds = Stopwatch.GetElapsedTime(started).TotalMilliseconds;
        var truth = new Truth(simulated.Kind, simulated.Z, simulated.ObjectClass, simulated.Setup, simulated.MedianSnr);
        return (result, new(simulated.Name, 0, truth, Answer.From(result, milliseconds)));
    }

    private static Observation ToObservation(SimulatedObservation simulated) => new()
    {
        Source = simulated.Name,
        Row = 0,
        Medium = simulated.Spectra[0].AirSampled ? WavelengthMedium.Air : WavelengthMedium.Vacuum,
        Spectra = [.. simulated.Spectra.Select(ToSpectrum)],
    };

    private static Spectrum ToSpectrum(SimulatedSpectrum simulated) => new()
    {
        Label = simulated.Label,
        Wavelength = simulated.Wavelength,
        Flux = simulated.Flux,
        InverseVariance = simulated.InverseVariance ?? [.. simulated.Flux.Select(_ => 1.0)],
        HasErrors = simulated.InverseVariance is not null,
        FwhmKmS = simulated.FwhmKmS,
        ResolutionFrom = simulated.FwhmKmS is null ? ResolutionSource.Estimate : ResolutionSource.Keyword,
    };
}
