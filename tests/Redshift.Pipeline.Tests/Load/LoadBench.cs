using System.Text;
using Redshift.Fits;
using Redshift.Pipeline.Load;
using Redshift.Pipeline.Observations;
using Redshift.Pipeline.Settings;
using Redshift.Testing;
using Xunit;

namespace Redshift.Pipeline.Tests.Load;

/// <summary>Writes invented spectra into files and loads them.</summary>
internal sealed class LoadBench : IDisposable
{
    public const int Pixels = 64;

    private readonly TemporaryFolder _folder = new();

    public LoadSettings Settings { get; init; } = new();

    /// <summary>A flux with one emission line, so that no two neighbouring pixels are alike.</summary>
    public static double[] Flux(int count = Pixels, double level = 10) =>
        [.. Enumerable.Range(0, count).Select(i => level + i % 7 * 0.1 + (i == count / 2 ? 5 : 0))];

    public static double[] Linear(double first, double step, int count = Pixels) =>
        [.. Enumerable.Range(0, count).Select(i => first + step * i)];

    public static double[] Constant(double value, int count = Pixels) => [.. Enumerable.Repeat(value, count)];

    public static IReadOnlyList<Card> Axis(double crval, double cdelt, params Card[] more) =>
        [Card.Of("CRVAL1", crval), Card.Of("CDELT1", cdelt), Card.Of("CRPIX1", 1L), .. more];

    public IReadOnlyList<LoadOutcome> Fits(Action<FitsWriter> write)
    {
        using var stream = new MemoryStream();
        write(new FitsWriter(stream));
        return Bytes("spectrum.fits", stream.ToArray());
    }

    public IReadOnlyList<LoadOutcome> Text(string text, string name = "spectrum.txt") => Bytes(name, Encoding.UTF8.GetBytes(text));

    public IReadOnlyList<LoadOutcome> Bytes(string name, byte[] bytes)
    {
        var path = _folder.File(name);
        File.WriteAllBytes(path, bytes);
        return Path(path);
    }

    /// <summary>Loads and describes a file of hostile bytes.</summary>
    public IReadOnlyList<LoadOutcome> Damaged(byte[] bytes)
    {
        var path = _folder.File("damaged.fits");
        File.WriteAllBytes(path, bytes);
        _ = SpectrumLoader.Describe(path, 0, Settings);
        return Load(path, Settings);
    }

    /// <summary>Loads a file, and again by the rule that describes how it was read: both readings must be the same.</summary>
    public IReadOnlyList<LoadOutcome> Path(string path)
    {
        var outcomes = Load(path, Settings);
        if (SpectrumLoader.Describe(path, 0, Settings).Rule is not { } rule) return outcomes;
        var pasted = Settings with { Rules = PipelineFile.Parse(rule, "pasted.toml").Load.Rules };
        AssertSame(outcomes, Load(path, pasted), rule);
        return outcomes;
    }

    private static IReadOnlyList<LoadOutcome> Load(string path, LoadSettings settings) => [.. SpectrumLoader.Load(path, "night/spectrum.fits", settings)];

    private static void AssertSame(IReadOnlyList<LoadOutcome> expected, IReadOnlyList<LoadOutcome> actual, string rule)
    {
        Assert.True(expected.Count == actual.Count, $"{actual.Count} outcomes instead of {expected.Count} by\n{rule}{actual[0].Reject}");
        foreach (var (one, other) in expected.Zip(actual))
        {
            Assert.Equal(one.Reject?.Row, other.Reject?.Row);
            Assert.True(one.Reject is null == other.Reject is null, $"{other.Reject} by\n{rule}");
            if (one.Observation is { } before) AssertSame(before, other.Observation!, rule);
        }
    }

    private static void AssertSame(Observation before, Observation after, string rule)
    {
        var (facts, again) = (before with { Spectra = [], Notes = [], Kept = [], Cautions = [] }, after with { Spectra = [], Notes = [], Kept = [], Cautions = [] });
        Assert.True(facts == again, $"{again}\ninstead of\n{facts}\nby\n{rule}");
        Assert.Equal(before.Cautions, after.Cautions);
        Assert.Equal(before.Kept, after.Kept);
        Assert.Equal(before.Spectra.Select(static one => one.Label), after.Spectra.Select(static one => one.Label));
        foreach (var (one, other) in before.Spectra.Zip(after.Spectra))
        {
            Assert.True(one.Wavelength.SequenceEqual(other.Wavelength), $"other wavelengths by\n{rule}");
            Assert.True(one.Flux.SequenceEqual(other.Flux), $"another flux by\n{rule}");
            Assert.True(one.InverseVariance.SequenceEqual(other.InverseVariance), $"other errors by\n{rule}");
            Assert.Equal(one.FwhmKmS, other.FwhmKmS);
            Assert.Equal((one.HasErrors, one.FluxUnit, one.ResolutionFrom), (other.HasErrors, other.FluxUnit, other.ResolutionFrom));
        }
    }

    public Observation One(Action<FitsWriter> write) => One(Fits(write));

    public static Observation One(IReadOnlyList<LoadOutcome> outcomes)
    {
        var outcome = Assert.Single(outcomes);
        Assert.True(outcome.Observation is not null, outcome.Reject?.ToString());
        return outcome.Observation;
    }

    public static Reject Refused(IReadOnlyList<LoadOutcome> outcomes)
    {
        var outcome = Assert.Single(outcomes);
        Assert.Null(outcome.Observation);
        return Assert.IsType<Reject>(outcome.Reject);
    }

    public string FileIn(string name) => _folder.File(name);

    public string Folder => _folder.Path;

    public void Dispose() => _folder.Dispose();
}
