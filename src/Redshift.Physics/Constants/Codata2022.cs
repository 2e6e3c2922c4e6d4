namespace Redshift.Physics.Constants;

/// <summary>
/// The constants of the 2022 CODATA adjustment that the line computations need.
/// Reference: P. J. Mohr, D. B. Newell, B. N. Taylor and E. Tiesinga, Rev. Mod. Phys. 97, 025002 (2025).
/// </summary>
public static class Codata2022
{
    /// <summary>The speed of light in vacuum in km/s, exact, as a compile-time constant for velocity formulas.</summary>
    public const double SpeedOfLightKmS = 299792.458;

    private const string Edition = "CODATA 2022";
    private const string Source = "Mohr, Newell, Taylor & Tiesinga 2025, Rev. Mod. Phys. 97, 025002";

    /// <summary>Speed of light in vacuum, m/s.</summary>
    public static PhysicalConstant SpeedOfLight { get; } = Exact("speed of light in vacuum", "c", 299792458, "m s^-1");

    /// <summary>Planck constant, J s.</summary>
    public static PhysicalConstant Planck { get; } = Exact("Planck constant", "h", 6.62607015e-34, "J s");

    /// <summary>Elementary charge, C.</summary>
    public static PhysicalConstant ElementaryCharge { get; } = Exact("elementary charge", "e", 1.602176634e-19, "C");

    /// <summary>Boltzmann constant, J/K.</summary>
    public static PhysicalConstant Boltzmann { get; } = Exact("Boltzmann constant", "k_B", 1.380649e-23, "J K^-1");

    /// <summary>Rydberg constant for an infinitely heavy nucleus, 1/m.</summary>
    public static PhysicalConstant Rydberg { get; } =
        Measured("Rydberg constant", "R_inf", 10973731.568157, 0.000012, "m^-1");

    /// <summary>Fine-structure constant, a pure number.</summary>
    public static PhysicalConstant FineStructure { get; } =
        Measured("fine-structure constant", "alpha", 7.2973525643e-3, 1.1e-12, "1");

    /// <summary>Electron mass, kg.</summary>
    public static PhysicalConstant ElectronMass { get; } =
        Measured("electron mass", "m_e", 9.1093837139e-31, 2.8e-40, "kg");

    /// <summary>Atomic mass constant, kg.</summary>
    public static PhysicalConstant AtomicMass { get; } =
        Measured("atomic mass constant", "u", 1.66053906892e-27, 5.2e-37, "kg");

    /// <summary>Bohr radius, m.</summary>
    public static PhysicalConstant BohrRadius { get; } =
        Measured("Bohr radius", "a_0", 5.29177210544e-11, 8.2e-21, "m");

    /// <summary>Electron to proton mass ratio.</summary>
    public static PhysicalConstant ElectronProtonMassRatio { get; } =
        Measured("electron-proton mass ratio", "m_e/m_p", 5.446170214889e-4, 9.4e-15, "1");

    /// <summary>Electron to deuteron mass ratio.</summary>
    public static PhysicalConstant ElectronDeuteronMassRatio { get; } =
        Measured("electron-deuteron mass ratio", "m_e/m_d", 2.724437107629e-4, 4.7e-15, "1");

    /// <summary>Electron to alpha particle mass ratio.</summary>
    public static PhysicalConstant ElectronAlphaMassRatio { get; } =
        Measured("electron-alpha particle mass ratio", "m_e/m_alpha", 1.370933554733e-4, 3.2e-15, "1");

    /// <summary>Every constant of this table.</summary>
    public static IReadOnlyList<PhysicalConstant> All { get; } =
    [
        SpeedOfLight, Planck, ElementaryCharge, Boltzmann, Rydberg, FineStructure, ElectronMass, AtomicMass, BohrRadius,
        ElectronProtonMassRatio, ElectronDeuteronMassRatio, ElectronAlphaMassRatio,
    ];

    private static PhysicalConstant Exact(string name, string symbol, double value, string unit)
        => new(name, symbol, value, 0, true, unit, Edition, Source);

    private static PhysicalConstant Measured(string name, string symbol, double value, double uncertainty, string unit)
        => new(name, symbol, value, uncertainty, false, unit, Edition, Source);
}
