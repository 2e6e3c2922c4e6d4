using Redshift.Physics.Statistics;
using Redshift.Pipeline.Batch;
using Redshift.Pipeline.Load;
using Redshift.Pipeline.Observations;
using Redshift.Pipeline.Settings;

namespace Redshift.Pipeline.Inject;

/// <summary>Puts computed objects into the user's own spectra and measures them as if they were the user's.</summary>
/// <param name="settings">The parameters of the stages.</param>
/// <param name="jobs">Number of workers; makes no difference to the answers.</param>
public sealed class InjectionRun(PipelineSettings settings, int jobs) : IDisposable
{
    /// <summary>Spectra that give the instrument: enough for its variety, few enough for memory.</summary>
    public const int MostGivers = 100;

    private readonly ThreadLocal<ObservationPipeline> _pipelines = new(() => new(settings));
    private List<Giver> _givers = [];

    /// <summary>Number of spectra that give the instrument.</summary>
    public int Givers => _givers.Count;

    /// <summary>Reads spectra and takes up to <see cref="MostGivers"/> of them at random.</summary>
    /// <param name="files">The files, in their order.</param>
    /// <param name="seed">Seed of the choice.</param>
    /// <param name="onReject">Hears of what cannot be used.</param>
    /// <param name="onStep">Hears, from any thread, of each spectrum that is ready, with the number of all.</param>
    /// <param name="token">Ends the work.</param>
    public void Read(IReadOnlyList<InputFile> files, ulong seed, Action<Reject> onReject, Action<int> onStep, CancellationToken token)
    {
        var chosen = Choose(files, RandomSource.ForMember(seed, ulong.MaxValue), onReject, token);
        _givers = [.. InOrder(chosen.Count, i => Giver.From(chosen[i], _pipelines.Value!), onStep, token).OfType<Giver>()];
    }

    /// <summary>Makes injections and measures them, in their order.</summary>
    /// <param name="count">How many.</param>
    /// <param name="seed">The same seed, the same injections.</param>
    /// <param name="onStep">Hears, from any thread, of each injection that is measured, with the number of all.</param>
    /// <param name="token">Ends the work.</param>
    public IReadOnlyList<Injection> Inject(int count, ulong seed, Action<int> onStep, CancellationToken token)
    {
        var injector = new Injector(_givers, settings.Match, seed);
        return InOrder(count, i => Measure(injector.Make(i)), onStep, token);
    }

    /// <inheritdoc/>
    public void Dispose() => _pipelines.Dispose();

    private Injection Measure(Injected injected) => Injection.Of(injected, _pipelines.Value!.Analyze(injected.Observation));

    private List<T> InOrder<T>(int count, Func<int, T> make, Action<int> onStep, CancellationToken token)
    {
        T MakeAndTell(int index)
        {
            // The query itself looks only now and then.
            token.ThrowIfCancellationRequested();
            var made = make(index);
            onStep(count);
            return made;
        }

        return [.. Enumerable.Range(0, count).AsParallel().AsOrdered().WithCancellation(token).WithDegreeOfParallelism(Math.Min(jobs, 512)).Select(MakeAndTell)];
    }

    // Every spectrum has the same chance, however many there are (Vitter 1985, ACM Trans. Math. Softw. 11, 37, algorithm R).
    private List<Observation> Choose(IReadOnlyList<InputFile> files, RandomSource random, Action<Reject> onReject, CancellationToken token)
    {
        var chosen = new List<Observation>();
        var seen = 0;
        foreach (var (observation, reject) in files.SelectMany(Load))
        {
            token.ThrowIfCancellationRequested();
            if (reject is not null) onReject(reject);
            if (observation is null) continue;
            seen++;
            if (chosen.Count < MostGivers) chosen.Add(observation);
            else if (random.Index(seen) is var place && place < MostGivers) chosen[place] = observation;
        }

        return chosen;
    }

    private IEnumerable<LoadOutcome> Load(InputFile file) =>
        file.Reject is { } reject ? [new(null, reject)] : SpectrumLoader.Load(file.Path, file.Source, settings.Load);
}
