using Redshift.Physics.Units;

namespace Redshift.Pipeline.Match.Models;

/// <summary>The rest-frame axis of the computed spectra: vacuum, even in ln λ, 20 km/s a step, 880 Å to 25,000 Å.</summary>
internal static class TemplateGrid
{
    public const double Step = 20 / Velocity.SpeedOfLightKmS;

    public const int Count = 50_160;

    public static readonly double LnStart = Math.Log(880);

    /// <summary>Wavelength in Å of a grid point.</summary>
    public static double Wavelength(int index) => Math.Exp(LnStart + index * Step);
}
