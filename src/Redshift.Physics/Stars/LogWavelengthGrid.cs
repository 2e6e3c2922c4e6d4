using Redshift.Physics.Constants;

namespace Redshift.Physics.Stars;

/// <summary>
/// Vacuum wavelengths with equal steps in ln λ, so that a redshift is a shift by a whole spectrum:
/// ln λ_k = <see cref="LnStart"/> + k · <see cref="LnStep"/>, λ in Å.
/// </summary>
public sealed class LogWavelengthGrid
{
    private double[]? _edges;

    /// <summary>Creates a grid.</summary>
    /// <param name="lnStart">Natural logarithm of the first vacuum wavelength in Å.</param>
    /// <param name="lnStep">Step in ln λ, above zero; times c it is the step in velocity.</param>
    /// <param name="count">Number of points, at least 2.</param>
    /// <exception cref="ArgumentOutOfRangeException">A step or count that is too small.</exception>
    public LogWavelengthGrid(double lnStart, double lnStep, int count)
    {
        ArgumentOutOfRangeException.ThrowIfNegativeOrZero(lnStep);
        ArgumentOutOfRangeException.ThrowIfLessThan(count, 2);
        LnStart = lnStart;
        LnStep = lnStep;
        Count = count;
    }

    /// <summary>Natural logarithm of the first vacuum wavelength in Å.</summary>
    public double LnStart { get; }

    /// <summary>Step in ln λ.</summary>
    public double LnStep { get; }

    /// <summary>Number of points.</summary>
    public int Count { get; }

    /// <summary>Grid over a range of vacuum wavelengths with a given step in velocity.</summary>
    /// <param name="firstAngstrom">First vacuum wavelength in Å.</param>
    /// <param name="lastAngstrom">The grid ends at the last point that does not exceed this vacuum wavelength in Å.</param>
    /// <param name="stepKmPerSecond">Step as a velocity in km/s.</param>
    /// <returns>The grid.</returns>
    public static LogWavelengthGrid Covering(double firstAngstrom, double lastAngstrom, double stepKmPerSecond)
    {
        var step = stepKmPerSecond / Codata2022.SpeedOfLightKmS;
        return new LogWavelengthGrid(Math.Log(firstAngstrom), step, 1 + (int)(Math.Log(lastAngstrom / firstAngstrom) / step));
    }

    /// <summary>Vacuum wavelength of a point.</summary>
    /// <param name="index">Index of the point, may lie between points.</param>
    /// <returns>The wavelength in Å.</returns>
    public double Wavelength(double index) => Math.Exp(LnStart + (index * LnStep));

    /// <summary>Place of a vacuum wavelength in units of grid points.</summary>
    /// <param name="angstrom">Vacuum wavelength in Å.</param>
    /// <returns>The index, between points and outside the grid as well.</returns>
    public double Position(double angstrom) => (Math.Log(angstrom) - LnStart) / LnStep;

    /// <summary>Vacuum wavenumbers in cm⁻¹ of the borders between points; border i lies half a step before point i.</summary>
    internal double[] EdgeWavenumbers => _edges ??= [.. Enumerable.Range(0, Count + 1).Select(i => 1e8 / Wavelength(i - 0.5))];
}
