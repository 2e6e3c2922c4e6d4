using Redshift.Physics.Units;
using Redshift.Pipeline.Observations;

namespace Redshift.Pipeline.Load.Assembly;

/// <summary>One resolution for all pixels: a resolving power or a width in Å.</summary>
/// <param name="Power">λ/FWHM, or null.</param>
/// <param name="FwhmA">FWHM in Å, or null.</param>
/// <param name="From">Who states it.</param>
/// <param name="Where">The keyword or setting.</param>
internal sealed record StatedResolution(double? Power, double? FwhmA, ResolutionSource From, string Where)
{
    /// <summary>What the pipeline file states; null where it states nothing.</summary>
    public static StatedResolution? FromPipeline(double? power, double? width) =>
        power is null && width is null ? null : new(power, power is null ? width : null, ResolutionSource.Pipeline, "the pipeline file");

    /// <summary>FWHM in km/s at vacuum wavelengths in Å.</summary>
    public float[] FwhmKmS(double[] vacuum)
    {
        var fwhm = new float[vacuum.Length];
        for (var i = 0; i < fwhm.Length; i++)
            fwhm[i] = (float)(Velocity.SpeedOfLightKmS * (FwhmA is { } width ? width / vacuum[i] : 1 / Power!.Value));
        return fwhm;
    }
}
