using Redshift.Simulation;

namespace Redshift.Evaluation;

/// <summary>Writes simulated spectra as text, one file each, to be looked at.</summary>
internal static class SpectrumDump
{
    public static void Write(SimulatedObservation observation, string folder)
    {
        Directory.CreateDirectory(folder);
        using var writer = new StreamWriter(Path.Combine(folder, $"{observation.Name}_{observation.ObjectClass}_{observation.Setup}.txt"));
        writer.WriteLine(FormattableString.Invariant($"# {observation.Kind} z {observation.Z:0.000000} S/N {observation.MedianSnr:0.00}"));
        var errors = observation.Spectra.All(s => s.InverseVariance is not null);
        writer.WriteLine(errors ? "# wavelength flux error" : "# wavelength flux");
        foreach (var spectrum in observation.Spectra)
        {
            for (var i = 0; i < spectrum.Wavelength.Length; i++)
            {
                var error = errors ? FormattableString.Invariant($" {1 / Math.Sqrt(spectrum.InverseVariance![i]):G7}") : "";
                writer.WriteLine(FormattableString.Invariant($"{spectrum.Wavelength[i]:0.0000} {spectrum.Flux[i]:G7}{error}"));
            }
        }
    }
}
