using Redshift.Fits;
using Redshift.Simulation;
using Redshift.Simulation.Samples;

namespace Redshift.Benchmarks.Runs;

/// <summary>
/// Simulated survey spectra of mixed kinds as files: stacks of images with a spectrum a row, and tables with a pixel a row.
/// The simulation is slower than the pipeline, so that beyond a few hundred the same spectra come again; nothing is learned from the
/// batch, so each costs as much as the first time.
/// </summary>
internal sealed class BenchmarkInputs
{
    /// <summary>Pixels of a row of a stack.</summary>
    public const int Pixels = 4400;

    private const int MostDrawn = 250;
    private const int StackRows = 1000;

    // The pixel of the simulated spectrograph is 69 km/s wide.
    private const double LnStep = 69 / 299792.458;
    private const double FirstWavelength = 3600;

    // A number that shares no divisor with the step of seven: all come before one comes again.
    private const int Powers = 40;
    private const double GreatestPower = 12000;
    private const double LeastPower = 60;

    private readonly SimulatedObservation[] _drawn;

    /// <summary>Draws the spectra.</summary>
    public BenchmarkInputs(int count, ulong seed = 1) =>
        _drawn = [.. SimulatedSurvey.Draw(seed, Math.Min(count, MostDrawn), SurveyMix.Default.Only(["fibre"], []))];

    /// <summary>Writes stacks into a folder.</summary>
    /// <returns>Their paths.</returns>
    public List<string> WriteStacks(string folder, int spectra)
    {
        Directory.CreateDirectory(folder);
        var paths = new List<string>();
        for (var first = 0; first < spectra; first += StackRows)
        {
            paths.Add(Path.Combine(folder, FormattableString.Invariant($"stack-{first / StackRows:0000}.fits")));
            using var stream = File.Create(paths[^1]);
            WriteStack(stream, first, Math.Min(StackRows, spectra - first));
        }

        return paths;
    }

    /// <summary>Writes one table file a spectrum into a folder.</summary>
    /// <returns>Their paths.</returns>
    public List<string> WriteTables(string folder, int spectra) => WriteTables(folder, spectra, static _ => []);

    /// <summary>
    /// Writes one table file a spectrum into a folder, with headers as if each came from another spectrograph: resolving powers from that
    /// of an echelle to that of a prism, in an order that mixes them. The spectra are as ever; only the cost of a mixture is asked for.
    /// </summary>
    public void WriteMixedTables(string folder, int spectra) =>
        WriteTables(folder, spectra, static i => [Card.Of("SPEC_RES", Math.Round(GreatestPower * Math.Pow(LeastPower / GreatestPower, 7 * i % Powers / (Powers - 1.0))))]);

    private List<string> WriteTables(string folder, int spectra, Func<int, Card[]> more)
    {
        Directory.CreateDirectory(folder);
        return [.. Enumerable.Range(0, spectra).Select(i => WriteTable(Path.Combine(folder, FormattableString.Invariant($"object-{i:00000}.fits")), i, more(i)))];
    }

    private string WriteTable(string path, int number, Card[] more)
    {
        using var stream = File.Create(path);
        TableLayouts.PixelARow(stream, Spectrum(number), [.. Observatory.Cards("object", "LATTICE", 150, 2, "2031-03-02T01:00:00", 3600), .. more]);
        return path;
    }

    private void WriteStack(Stream stream, int first, int rows)
    {
        float[] flux = new float[rows * Pixels], inverseVariance = new float[rows * Pixels];
        for (var row = 0; row < rows; row++)
            FillRow(Spectrum(first + row), flux.AsSpan(row * Pixels, Pixels), inverseVariance.AsSpan(row * Pixels, Pixels));
        Card[] axis =
        [
            Card.Of("CTYPE1", "LINEAR"), Card.Of("DC-FLAG", 1L, "log10 sampling"), Card.Of("CRPIX1", 1L),
            Card.Of("CRVAL1", Math.Log10(FirstWavelength)), Card.Of("CD1_1", LnStep / Math.Log(10)), Card.Of("VACUUM", true),
        ];
        var writer = new FitsWriter(stream);
        writer.WriteImage("FLUX", flux, [Pixels, rows], axis);
        writer.WriteImage("IVAR", inverseVariance, [Pixels, rows], axis);
    }

    // Each spectrograph begins elsewhere; on the common axis a pixel goes to the nearest one of the same width.
    private static void FillRow(SimulatedSpectrum spectrum, Span<float> flux, Span<float> inverseVariance)
    {
        for (var i = 0; i < spectrum.Flux.Length; i++)
        {
            var pixel = (int)Math.Round(Math.Log(spectrum.Wavelength[i] / FirstWavelength) / LnStep);
            if (pixel is < 0 or >= Pixels)
                continue;
            flux[pixel] = (float)spectrum.Flux[i];
            inverseVariance[pixel] = (float)spectrum.InverseVariance![i];
        }
    }

    private SimulatedSpectrum Spectrum(int number) => _drawn[number % _drawn.Length].Spectra[0];
}
