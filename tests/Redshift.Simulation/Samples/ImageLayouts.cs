using Redshift.Fits;
using Redshift.Simulation.Light;

namespace Redshift.Simulation.Samples;

/// <summary>Spectra as FITS images.</summary>
internal static class ImageLayouts
{
    /// <summary>One spectrum, linear in air wavelength.</summary>
    public static void LinearAir(Stream stream, SimulatedSpectrum spectrum, IEnumerable<Card> cards)
    {
        var (first, step) = LinearAxis(spectrum);
        Card[] axis =
        [
            Card.Of("CTYPE1", "AWAV", "air wavelength"), Card.Of("CUNIT1", "Angstrom"), Card.Of("CRPIX1", 1.0), Card.Of("CRVAL1", first), Card.Of("CDELT1", step),
        ];
        Write(stream, Floats(spectrum.Flux), [.. axis, .. cards]);
    }

    /// <summary>One spectrum, linear, with the step in CD1_1 and no word about the medium, as amateur software writes it.</summary>
    public static void LinearUnstated(Stream stream, SimulatedSpectrum spectrum, IEnumerable<Card> cards)
    {
        var (first, step) = LinearAxis(spectrum);
        Card[] axis = [Card.Of("CTYPE1", "Wavelength"), Card.Of("CUNIT1", "Angstrom"), Card.Of("CRPIX1", 1L), Card.Of("CRVAL1", first), Card.Of("CD1_1", step)];
        Write(stream, Floats(spectrum.Flux), [.. axis, .. cards]);
    }

    /// <summary>One spectrum whose axis is the decimal logarithm of the vacuum wavelength.</summary>
    public static void Log10(Stream stream, SimulatedSpectrum spectrum, IEnumerable<Card> cards)
    {
        var wavelength = spectrum.Wavelength;
        Card[] axis =
        [
            Card.Of("CTYPE1", "LINEAR"), Card.Of("DC-FLAG", 1L, "log10 sampling"), Card.Of("CRPIX1", 1L), Card.Of("CRVAL1", Math.Round(Math.Log10(wavelength[0]), 9)),
            Card.Of("CD1_1", Math.Round(Math.Log10(wavelength[1] / wavelength[0]), 9)), Card.Of("VACUUM", true, "wavelengths are in vacuum"),
        ];
        Write(stream, Floats(spectrum.Flux), [.. axis, .. cards]);
    }

    /// <summary>Near infrared: axis in micrometres, errors in an extension of their own.</summary>
    public static void Micrometres(Stream stream, SimulatedSpectrum spectrum, IEnumerable<Card> cards)
    {
        var writer = new FitsWriter(stream);
        var wavelength = spectrum.Wavelength;
        Card[] axis =
        [
            Card.Of("CTYPE1", "WAVE"), Card.Of("CUNIT1", "um"), Card.Of("CRPIX1", 1.0), Card.Of("CRVAL1", wavelength[0] / 1e4), Card.Of("CDELT1", (wavelength[1] - wavelength[0]) / 1e4),
        ];
        writer.WriteHeader("", cards);
        writer.WriteImage("FLUX", Floats(spectrum.Flux), [spectrum.Flux.Length], [.. axis, Card.Of("BUNIT", "erg/s/cm2/Angstrom")]);
        writer.WriteImage("ERROR", Errors(spectrum), [spectrum.Flux.Length], axis);
    }

    /// <summary>One spectrum in the primary unit, its error in a sibling.</summary>
    public static void WithSibling(Stream stream, SimulatedSpectrum spectrum, IEnumerable<Card> cards)
    {
        var (first, step) = LinearAxis(spectrum);
        Card[] axis = [Card.Of("CTYPE1", spectrum.AirSampled ? "AWAV" : "WAVE"), Card.Of("CUNIT1", "Angstrom"), Card.Of("CRPIX1", 1.0), Card.Of("CRVAL1", first), Card.Of("CDELT1", step)];
        var writer = new FitsWriter(stream, checksums: true);
        writer.WriteImage("SCI", Floats(spectrum.Flux), [spectrum.Flux.Length], [.. axis, .. cards, Card.Of("BUNIT", "adu")]);
        writer.WriteImage("ERR", Errors(spectrum), [spectrum.Flux.Length], axis);
    }

    /// <summary>Many objects of one exposure, one a row, with errors and a table of targets.</summary>
    public static void Stack(Stream stream, IReadOnlyList<SimulatedSpectrum> spectra, IReadOnlyList<string> targets, IEnumerable<Card> cards)
    {
        var (first, step) = LinearAxis(spectra[0]);
        long[] shape = [spectra[0].Flux.Length, spectra.Count];
        Card[] axis = [Card.Of("CTYPE1", "WAVE"), Card.Of("CUNIT1", "Angstrom"), Card.Of("CRPIX1", 1.0), Card.Of("CRVAL1", first), Card.Of("CDELT1", step)];
        var writer = new FitsWriter(stream);
        writer.WriteImage("FLUX", [.. spectra.SelectMany(s => Floats(s.Flux))], shape, [.. axis, .. cards]);
        writer.WriteImage("SIGMA", [.. spectra.SelectMany(Errors)], shape, axis);
        writer.WriteTable("TARGETS", spectra.Count, [ColumnDefinition.Int32s("FIBRE", row => (int)row + 1), ColumnDefinition.Strings("TARGET", targets)]);
    }

    /// <summary>1σ errors; NaN where the pixel is unusable, as reductions like to write it.</summary>
    public static float[] Errors(SimulatedSpectrum spectrum) =>
        [.. spectrum.InverseVariance!.Select(value => value > 0 ? (float)(1 / Math.Sqrt(value)) : float.NaN)];

    /// <summary>Values as files hold them.</summary>
    public static float[] Floats(double[] values) => Array.ConvertAll(values, value => (float)value);

    private static void Write(Stream stream, float[] flux, IEnumerable<Card> cards) => new FitsWriter(stream).WriteImage("", flux, [flux.Length], cards);

    private static (double First, double Step) LinearAxis(SimulatedSpectrum spectrum)
    {
        var wavelength = spectrum.AirSampled ? Array.ConvertAll(spectrum.Wavelength, Air.FromVacuum) : spectrum.Wavelength;
        var last = wavelength.Length - 1;
        return (Math.Round(wavelength[0], 6), Math.Round((wavelength[last] - wavelength[0]) / last, 9));
    }
}
