using System.Text;
using Redshift.Simulation.Light;

namespace Redshift.Simulation.Samples;

/// <summary>Spectra as text.</summary>
internal static class TextLayouts
{
    /// <summary>Comma-separated with a heading; vacuum wavelengths, errors where there are any.</summary>
    public static void Csv(Stream stream, SimulatedSpectrum spectrum)
    {
        using var writer = Writer(stream);
        writer.Write(spectrum.InverseVariance is null ? "wavelength_vacuum_angstrom,flux\n" : "wavelength_vacuum_angstrom,flux,error\n");
        for (var i = 0; i < spectrum.Flux.Length; i++)
            writer.Write(FormattableString.Invariant($"{spectrum.Wavelength[i]:0.000},{spectrum.Flux[i]:0.00000E+0}{Error(spectrum, i)}\n"));
    }

    /// <summary>Two or three columns between blanks, air wavelengths, remarks behind a hash.</summary>
    public static void Columns(Stream stream, SimulatedSpectrum spectrum, params string[] remarks)
    {
        using var writer = Writer(stream);
        foreach (var remark in remarks)
            writer.Write($"# {remark}\n");
        for (var i = 0; i < spectrum.Flux.Length; i++)
            writer.Write(FormattableString.Invariant($"{Air.FromVacuum(spectrum.Wavelength[i]),10:0.000} {spectrum.Flux[i],13:0.00000E+0}\n"));
    }

    private static string Error(SimulatedSpectrum spectrum, int i) => spectrum.InverseVariance is not { } inverse ? ""
        : inverse[i] > 0 ? FormattableString.Invariant($",{1 / Math.Sqrt(inverse[i]):0.000E+0}") : ",nan";

    private static StreamWriter Writer(Stream stream) => new(stream, new UTF8Encoding(false), leaveOpen: true);
}
