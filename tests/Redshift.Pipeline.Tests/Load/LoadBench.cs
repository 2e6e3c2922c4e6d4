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

    public IReadOnlyList<LoadOutcome> Path(string path) => [.. SpectrumLoader.Load(path, "night/spectrum.fits", Settings)];

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
