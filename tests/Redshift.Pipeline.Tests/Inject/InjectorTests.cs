using Redshift.Physics.Statistics;
using Redshift.Pipeline.Batch;
using Redshift.Pipeline.Inject;
using Redshift.Pipeline.Load;
using Redshift.Pipeline.Observations;
using Redshift.Pipeline.Results;
using Redshift.Pipeline.Settings;
using Redshift.Testing;
using Xunit;

namespace Redshift.Pipeline.Tests.Inject;

public sealed class InjectorTests
{
    private const int Count = 24;

    private static readonly PipelineSettings Settings = new();
    private static readonly string Spectrum = Path.Combine(Repository.Root, "sample-spectra", "text", "visitor-2031c.csv");
    private static readonly Lazy<Giver> Shared = new(() => Giver.From(Load(), new(Settings))!);

    private static readonly Lazy<Injected[]> Made = new(() => Make(1, Settings.Match));

    [Fact]
    public void Nothing_is_put_in_twice()
    {
        Assert.Equal(Count, Made.Value.Select(i => i.Target.Z).Distinct().Count());
        Assert.Equal(Count, Made.Value.Select(i => i.Observation.Spectra[0].Flux[100]).Distinct().Count());
        Assert.Empty(Made.Value.Select(i => i.Target.Z).Intersect(Make(2, Settings.Match).Select(i => i.Target.Z)));
    }

    [Fact]
    public void Injections_keep_the_instrument_of_their_giver()
    {
        var giver = Shared.Value.Observation.Spectra[0];
        foreach (var spectrum in Made.Value.Select(i => i.Observation.Spectra[0]))
        {
            Assert.Same(giver.Wavelength, spectrum.Wavelength);
            Assert.Same(giver.FwhmKmS, spectrum.FwhmKmS);
            Assert.Equal(giver.HasErrors, spectrum.HasErrors);
            Assert.All(spectrum.Flux, flux => Assert.True(double.IsFinite(flux)));
            Assert.All(Enumerable.Range(0, giver.Count).Where(i => giver.InverseVariance[i] == 0), i => Assert.Equal((0, 0), (spectrum.Flux[i], spectrum.InverseVariance[i])));
        }
    }

    [Fact]
    public void Signal_to_noise_is_that_of_the_ladder()
    {
        Assert.Equal(Injector.Ladder, Made.Value.Select(i => i.Snr).Distinct());
        // Noise hardly moves the median of a bright smooth spectrum.
        var sigma = Shared.Value.Noise[0].Sigma;
        foreach (var injected in Made.Value.Where(i => i.Snr >= 6 && i.Target.Kind == ObjectKind.Star))
        {
            var ratios = injected.Observation.Spectra[0].Flux.Select((flux, i) => flux / sigma[i]).Where(ratio => ratio != 0);
            Assert.InRange(Measures.Median(ratios) / injected.Snr, 0.95, 1.05);
        }
    }

    [Theory]
    [InlineData(ObjectKind.Star)]
    [InlineData(ObjectKind.Galaxy)]
    [InlineData(ObjectKind.Quasar)]
    [InlineData(ObjectKind.Nebula)]
    public void Only_what_is_expected_is_put_in_and_where_it_is_searched(ObjectKind kind)
    {
        var settings = Settings.Match with { Expect = kind, ZMin = 0.0001, ZMax = 0.9 };
        Assert.All(Make(1, settings), i => Assert.Equal(kind, i.Target.Kind));
        Assert.All(Make(1, settings), i => Assert.InRange(i.Target.Z, 0.0001, 0.9));
    }

    [Fact]
    public void Kinds_are_put_in_as_often_as_they_are_expected()
    {
        Assert.All(Make(1, Settings.Match with { PriorStar = 0, PriorQuasar = 0 }), i => Assert.Equal(ObjectKind.Galaxy, i.Target.Kind));
        Assert.All(Make(1, Settings.Match with { PriorStar = 0, PriorGalaxy = 0 }), i => Assert.Equal(ObjectKind.Quasar, i.Target.Kind));
        Assert.Equal(3, Made.Value.Select(i => i.Target.Kind).Distinct().Count());
    }

    [Fact]
    public void An_interrupt_ends_the_work_between_two_objects()
    {
        using var interrupt = new CancellationTokenSource();
        using var run = new InjectionRun(Settings, 1);
        run.Read(InputFiles.Find([Spectrum], null), 1, reject => Assert.Fail(reject.ToString()), _ => { }, CancellationToken.None);
        var steps = 0;
        void Step(int all)
        {
            if (++steps == 2) interrupt.Cancel();
        }

        Assert.ThrowsAny<OperationCanceledException>(() => run.Inject(100, 1, Step, interrupt.Token));
        Assert.Equal(2, steps);
    }

    [Fact]
    public void The_number_of_workers_makes_no_difference()
    {
        var one = Inject(1);
        Assert.Equal(one, Inject(3));
        Assert.Equal(12, one.Count);
        Assert.All(one.Where(i => i.Snr >= 12), i => Assert.True(i.IsGood, $"{i.Description} at {i.Z} was found at {i.FoundZ}"));
    }

    private static IReadOnlyList<Injection> Inject(int jobs)
    {
        using var run = new InjectionRun(Settings, jobs);
        var steps = 0;
        run.Read(InputFiles.Find([Spectrum], null), 1, reject => Assert.Fail(reject.ToString()), count => Assert.Equal(1, count), CancellationToken.None);
        var injections = run.Inject(12, 1, count => Interlocked.Add(ref steps, count), CancellationToken.None);
        Assert.Equal(12 * 12, steps);
        return injections;
    }

    private static Injected[] Make(ulong seed, MatchSettings settings)
    {
        var injector = new Injector([Shared.Value], settings, seed);
        return [.. Enumerable.Range(0, Count).Select(injector.Make)];
    }

    private static Observation Load() => SpectrumLoader.Load(Spectrum, "visitor", new LoadSettings()).First().Observation!;
}
