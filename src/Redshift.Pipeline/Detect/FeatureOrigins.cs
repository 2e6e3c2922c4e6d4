using Redshift.Physics.Lines;
using Redshift.Physics.Units;

namespace Redshift.Pipeline.Detect;

/// <summary>Tells features that sky, atmosphere or a particle in the detector may have made.</summary>
internal static class FeatureOrigins
{
    /// <summary>Greatest shift of a spectrum reduced to the Sun against the ground.</summary>
    private const double EarthMotion = 30.5 / Velocity.SpeedOfLightKmS;

    /// <summary>Leavings of the sky are as narrow as the instrument's lines.</summary>
    private const double WidestSky = 2.1;

    private static readonly (double Ln, string Name)[] Sky = [.. SkyLines.All.Select(l => (Math.Log(l.VacuumAngstrom), l.Name))];

    private static readonly (double Start, double End, string Name)[] Bands =
        [.. TelluricBands.All.Select(b => (Math.Log(b.StartVacuumAngstrom) - EarthMotion, Math.Log(b.EndVacuumAngstrom) + EarthMotion, b.Name))];

    /// <summary>What may have made a feature.</summary>
    /// <param name="lnWavelength">ln λ.</param>
    /// <param name="sigma">σ of the best filter in ln λ.</param>
    /// <param name="signalToNoise">Signed signal to noise.</param>
    /// <param name="levels">The filters, the first with half the line spread.</param>
    /// <param name="spread">σ of the line spread in ln λ.</param>
    /// <param name="frame">Spectra in an object's own frame have sky and atmosphere elsewhere.</param>
    public static (FeatureOrigin Origin, string Name) Of(
        double lnWavelength, double sigma, double signalToNoise, List<FilteredResiduals> levels, double spread, VelocityFrame frame)
    {
        if (frame != VelocityFrame.Rest)
        {
            if (sigma < WidestSky * spread && NearSky(lnWavelength, sigma) is { } line) return (FeatureOrigin.Sky, line);
            if (signalToNoise < 0 && InBand(lnWavelength) is { } band) return (FeatureOrigin.Telluric, band);
        }

        return IsSpike(lnWavelength, sigma, signalToNoise, levels) ? (FeatureOrigin.CosmicRay, "") : (FeatureOrigin.Object, "");
    }

    /// <summary>A line as wide as the instrument's is seen best by the second filter; what the first sees clearly better is no line.</summary>
    private static bool IsSpike(double lnWavelength, double sigma, double signalToNoise, List<FilteredResiduals> levels) =>
        sigma == levels[0].SigmaLn && levels.Count > 1 && signalToNoise > 1.1 * levels[1].At(lnWavelength) + 2;

    private static string? NearSky(double lnWavelength, double sigma)
    {
        var reach = sigma + EarthMotion;
        var near = Sky.Where(s => Math.Abs(s.Ln - lnWavelength) < reach).OrderBy(s => Math.Abs(s.Ln - lnWavelength)).FirstOrDefault();
        return near.Name;
    }

    private static string? InBand(double lnWavelength) =>
        Array.Find(Bands, b => lnWavelength >= b.Start && lnWavelength <= b.End).Name;
}
