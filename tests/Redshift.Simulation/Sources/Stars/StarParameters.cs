namespace Redshift.Simulation.Sources.Stars;

/// <summary>What makes one star's spectrum.</summary>
/// <param name="Temperature">Effective temperature, K.</param>
/// <param name="LogGravity">log g in cgs: 4.4 a dwarf, 2 a giant.</param>
/// <param name="Metallicity">[M/H], dex.</param>
/// <param name="RotationKmS">Projected rotation, km/s.</param>
internal readonly record struct StarParameters(double Temperature, double LogGravity, double Metallicity, double RotationKmS)
{
    /// <summary>0 for a dwarf, 1 for a giant.</summary>
    public double Giantness => Math.Clamp((4.4 - LogGravity) / 2.2, 0, 1.4);
}
