using System.Buffers.Binary;
using System.Globalization;
using Redshift.Testing;

namespace Redshift.Cli.Tests;

/// <summary>A temporary folder with a few small spectra in it and room for reports.</summary>
public sealed class SpectraFolder : IDisposable
{
    private readonly TemporaryFolder _folder = new();

    /// <summary>Makes the folder with two spectra and one file that is none.</summary>
    public SpectraFolder()
    {
        WriteText("a.txt", seed: 1);
        WriteText("sub/b.txt", seed: 2);
        File.WriteAllText(At("notes.md"), "# a night with clouds\n");
    }

    /// <summary>Where the spectra are.</summary>
    public string Spectra => Path.Combine(_folder.Path, "spectra");

    /// <summary>A path among the spectra.</summary>
    public string At(string name)
    {
        var path = Path.Combine(Spectra, name);
        Directory.CreateDirectory(Path.GetDirectoryName(path)!);
        return path;
    }

    /// <summary>A path for reports.</summary>
    public string Out(string name = "out") => Path.Combine(_folder.Path, name);

    /// <summary>Adds a text table of wavelength, flux and error: an emission line on a noisy continuum.</summary>
    public void WriteText(string name, int seed) =>
        File.WriteAllLines(At(name), Enumerable.Range(0, 400).Select(i =>
        {
            var wavelength = 6000 + 2.0 * i;
            var flux = 10 + 30 * Math.Exp(-0.5 * Math.Pow((wavelength - 6600) / 4, 2)) + Math.Sin(seed * i * 12.9898);
            return string.Create(CultureInfo.InvariantCulture, $"{wavelength:F2} {flux:F4} 0.7");
        }));

    /// <summary>Adds a one-dimensional FITS image with further cards.</summary>
    public void WriteFits(string name, params string[] cards)
    {
        var pixels = new byte[4 * 400];
        for (var i = 0; i < 400; i++)
            BinaryPrimitives.WriteSingleBigEndian(pixels.AsSpan(4 * i), 10 + i % 7);
        var file = new FitsText().Header(
        [
            "SIMPLE  =                    T", "BITPIX  =                  -32", "NAXIS   =                    1",
            "NAXIS1  =                  400", "CRVAL1  =               6000.0", "CDELT1  =                  2.0",
            "CRPIX1  =                  1.0", "CTYPE1  = 'WAVE    '", "CUNIT1  = 'Angstrom'", .. cards,
        ]).Data(pixels);
        File.WriteAllBytes(At(name), file.ToBytes());
    }

    /// <inheritdoc/>
    public void Dispose() => _folder.Dispose();
}
