using Redshift.Physics.Constants;

namespace Redshift.Physics.Hydrogen;

/// <summary>
/// Energies of the fine-structure levels of a one-electron atom: Dirac energy with reduced mass and recoil, and the
/// leading radiative shift. Hyperfine structure is averaged out.
/// </summary>
/// <remarks>
/// Reference: E. Tiesinga, P. J. Mohr, D. B. Newell and B. N. Taylor, Rev. Mod. Phys. 93, 025010 (2021), section III:
/// equations 25-28 (Dirac, recoil), and the terms A40, A41, A50, V40, V50 of the one-photon self energy and vacuum
/// polarization. What is left out is below 1e-4 cm^-1 in hydrogen.
/// </remarks>
internal static class LevelEnergy
{
    private static readonly double Alpha = Codata2022.FineStructure.Value;

    // m_e c^2 / hc in cm^-1.
    private static readonly double ElectronRestEnergy = 2 * Codata2022.Rydberg.Value / (100 * Alpha * Alpha);

    /// <summary>The energy relative to the ionization limit, in cm^-1 (negative).</summary>
    public static double Of(HydrogenicLevel level, int charge, double electronNucleusMassRatio)
    {
        double coupling = charge * Alpha;
        return ElectronRestEnergy
            * (Structure(level, coupling, electronNucleusMassRatio) + RadiativeShift(level, coupling, electronNucleusMassRatio));
    }

    private static double Structure(HydrogenicLevel level, double coupling, double massRatio)
    {
        double reducedMass = 1 / (1 + massRatio);
        double dirac = DiracMinusOne(level, coupling);
        double recoil = -dirac * dirac * reducedMass * reducedMass * massRatio * reducedMass / 2;
        double nuclearMotion = level.L == 0
            ? 0
            : Math.Pow(coupling, 4) * Cube(reducedMass) * massRatio * massRatio / (2 * Cube(level.N) * level.Kappa * (2 * level.L + 1));
        return reducedMass * dirac + recoil + nuclearMotion;
    }

    // f(n, kappa) - 1, written without the difference of nearly equal numbers.
    private static double DiracMinusOne(HydrogenicLevel level, double coupling)
    {
        double kappa = Math.Abs(level.Kappa);
        double defect = coupling * coupling / (kappa + Math.Sqrt(kappa * kappa - coupling * coupling));
        double square = Math.Pow(coupling / (level.N - defect), 2);
        double root = Math.Sqrt(1 + square);
        return -square / (root * (1 + root));
    }

    private static double RadiativeShift(HydrogenicLevel level, double coupling, double massRatio)
    {
        double reducedMass = 1 / (1 + massRatio);
        double shape = -4.0 / 3 * BetheLogarithm.Of(level.N, level.L) * Cube(reducedMass);
        shape += level.L == 0
            ? Cube(reducedMass) * ContactTerms(coupling, reducedMass)
            : -reducedMass * reducedMass / (2.0 * level.Kappa * (2 * level.L + 1));
        return Alpha * Math.Pow(coupling, 4) / (Math.PI * Cube(level.N)) * shape;
    }

    // What only an s electron feels, because it reaches the nucleus.
    private static double ContactTerms(double coupling, double reducedMass)
    {
        double logarithm = 4.0 / 3 * Math.Log(1 / (coupling * coupling * reducedMass));
        double vacuumPolarization = -4.0 / 15;
        double binding = Math.PI * coupling * (139.0 / 32 - 2 * Math.Log(2) + 5.0 / 48);
        return logarithm + 10.0 / 9 + vacuumPolarization + binding;
    }

    private static double Cube(double value) => value * value * value;
}
