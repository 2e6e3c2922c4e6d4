using System.Collections.Concurrent;
using Redshift.Physics.Constants;

namespace Redshift.Physics.Hydrogen;

/// <summary>
/// An atom or ion with one electron, and everything that follows from its charge and mass: levels, lines, strengths.
/// Nothing is taken from a line list.
/// </summary>
/// <remarks>
/// Wavelengths are centroids weighted by line strength, which is what an unresolved, optically thin line with levels
/// populated by statistical weight shows. They differ from the mean of the levels (by up to 0.2 km/s in hydrogen) and
/// from tables that use one energy for a shell (1.1 km/s at H alpha).
/// </remarks>
public sealed class HydrogenicAtom
{
    private readonly double _groundEnergy;
    private readonly DipoleStrengths _strengths;

    // A line costs some microseconds to compute and is asked for again and again.
    private readonly ConcurrentDictionary<(int Upper, int Lower), HydrogenicLine> _lines = new();

    private HydrogenicAtom(string name, int charge, PhysicalConstant electronNucleusMassRatio)
    {
        Name = name;
        Charge = charge;
        ElectronNucleusMassRatio = electronNucleusMassRatio.Value;
        _groundEnergy = LevelEnergy.Of(new(1, 0, 1), charge, ElectronNucleusMassRatio);
        _strengths = new DipoleStrengths(this);
    }

    /// <summary>Neutral hydrogen, mass 1.</summary>
    public static HydrogenicAtom Hydrogen { get; } = new("H I", 1, Codata2022.ElectronProtonMassRatio);

    /// <summary>Neutral deuterium.</summary>
    public static HydrogenicAtom Deuterium { get; } = new("D I", 1, Codata2022.ElectronDeuteronMassRatio);

    /// <summary>Singly ionized helium, mass 4.</summary>
    public static HydrogenicAtom HeliumPlus { get; } = new("He II", 2, Codata2022.ElectronAlphaMassRatio);

    /// <summary>Spectroscopic name, such as "He II".</summary>
    public string Name { get; }

    /// <summary>Nuclear charge in elementary charges.</summary>
    public int Charge { get; }

    /// <summary>Electron mass over nuclear mass.</summary>
    public double ElectronNucleusMassRatio { get; }

    /// <summary>Energy of the ionization limit above the ground level, cm^-1.</summary>
    public double IonizationEnergy => -_groundEnergy;

    /// <summary>Energy of a fine-structure level above the ground level.</summary>
    /// <param name="level">The level.</param>
    /// <returns>Energy in cm^-1.</returns>
    public double Energy(HydrogenicLevel level)
        => LevelEnergy.Of(level, Charge, ElectronNucleusMassRatio) - _groundEnergy;

    /// <summary>Energy of a shell above the ground level, the mean of its levels by statistical weight.</summary>
    /// <param name="n">Principal quantum number, 1 or more.</param>
    /// <returns>Energy in cm^-1.</returns>
    public double TermEnergy(int n)
        => HydrogenicLevel.OfShell(n).Sum(level => level.Weight * Energy(level)) / (2.0 * n * n);

    /// <summary>The vacuum wavelength at which the lines ending on a shell converge.</summary>
    /// <param name="lower">Principal quantum number of the lower shell.</param>
    /// <returns>Wavelength in angstrom.</returns>
    public double SeriesLimit(int lower) => 1e8 / (IonizationEnergy - TermEnergy(lower));

    /// <summary>The vacuum wavelength of the line between two shells.</summary>
    /// <param name="upper">Principal quantum number of the upper shell.</param>
    /// <param name="lower">Principal quantum number of the lower shell.</param>
    /// <returns>Wavelength in angstrom, the centroid weighted by line strength.</returns>
    /// <exception cref="ArgumentOutOfRangeException">Not 1 &lt;= lower &lt; upper.</exception>
    public double Wavelength(int upper, int lower) => Line(upper, lower).VacuumAngstrom;

    /// <summary>The line between two shells.</summary>
    /// <param name="upper">Principal quantum number of the upper shell.</param>
    /// <param name="lower">Principal quantum number of the lower shell.</param>
    /// <returns>The line.</returns>
    /// <exception cref="ArgumentOutOfRangeException">Not 1 &lt;= lower &lt; upper.</exception>
    public HydrogenicLine Line(int upper, int lower)
    {
        RequireTransition(upper, lower);
        return _lines.GetOrAdd((upper, lower), key => ComputeLine(key.Upper, key.Lower));
    }

    /// <summary>The electric dipole transitions of which the line between two shells consists.</summary>
    /// <param name="upper">Principal quantum number of the upper shell.</param>
    /// <param name="lower">Principal quantum number of the lower shell.</param>
    /// <returns>The components, by rising lower l.</returns>
    /// <exception cref="ArgumentOutOfRangeException">Not 1 &lt;= lower &lt; upper.</exception>
    public IReadOnlyList<FineStructureComponent> FineStructure(int upper, int lower)
    {
        RequireTransition(upper, lower);
        return _strengths.Components(upper, lower);
    }

    private HydrogenicLine ComputeLine(int upper, int lower)
    {
        List<FineStructureComponent> components = _strengths.Components(upper, lower);
        double strength = components.Sum(c => c.LineStrength);
        double waveNumber = components.Sum(c => c.LineStrength * c.WaveNumber) / strength;
        double wavelength = 1e8 / waveNumber;
        return new HydrogenicLine(
            Name == "H I" ? HydrogenicNames.OfHydrogen(upper, lower) : HydrogenicNames.ByWavelength(Name, wavelength),
            upper,
            lower,
            wavelength,
            DipoleStrengths.OscillatorStrength(waveNumber, strength, 2 * lower * lower),
            DipoleStrengths.EinsteinA(waveNumber, strength, 2 * upper * upper),
            TermEnergy(upper));
    }

    private static void RequireTransition(int upper, int lower)
    {
        ArgumentOutOfRangeException.ThrowIfLessThan(lower, 1);
        ArgumentOutOfRangeException.ThrowIfLessThanOrEqual(upper, lower);
    }
}
