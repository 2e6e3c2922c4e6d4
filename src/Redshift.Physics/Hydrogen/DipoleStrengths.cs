using Redshift.Physics.Constants;

namespace Redshift.Physics.Hydrogen;

/// <summary>Electric dipole line strengths of a one-electron atom, split over the fine structure.</summary>
internal sealed class DipoleStrengths(HydrogenicAtom atom)
{
    private static readonly double Hartree = 2 * Codata2022.Rydberg.Value / 100;
    private static readonly double RatePerAtomicUnit = 4 * Math.PI * Codata2022.Rydberg.Value * Codata2022.SpeedOfLight.Value
        * Math.Pow(Codata2022.FineStructure.Value, 3);

    // The orbit, and with it the dipole, shrinks with the charge and grows with the reduced mass.
    private readonly double _scale = Math.Pow((1 + atom.ElectronNucleusMassRatio) / atom.Charge, 2);

    /// <summary>Absorption oscillator strength from line strength in e^2 a_0^2 and wave number in cm^-1.</summary>
    public static double OscillatorStrength(double waveNumber, double lineStrength, int lowerWeight)
        => 2.0 / 3 * (waveNumber / Hartree) * lineStrength / lowerWeight;

    /// <summary>Spontaneous rate in 1/s from line strength in e^2 a_0^2 and wave number in cm^-1.</summary>
    public static double EinsteinA(double waveNumber, double lineStrength, int upperWeight)
        => 4.0 / 3 * RatePerAtomicUnit * Math.Pow(waveNumber / Hartree, 3) * lineStrength / upperWeight;

    public List<FineStructureComponent> Components(int upper, int lower)
    {
        var integrals = new RadialIntegrals(upper, lower);
        var components = new List<FineStructureComponent>(6 * lower);
        for (int l = 1; l <= lower; l++)
        {
            Split(components, (upper, l), (lower, l - 1), l, integrals.FromHigherL(l));
            if (l < lower)
                Split(components, (upper, l - 1), (lower, l), l, integrals.FromLowerL(l));
        }

        return components;
    }

    // A doublet-doublet multiplet between l and l - 1 has three components whose strengths are as
    // (2l - 1)(l + 1) : (l - 1)(2l + 1) : 1 (E. U. Condon and G. H. Shortley, The Theory of Atomic Spectra, section 9.2).
    private void Split(List<FineStructureComponent> components, (int N, int L) upper, (int N, int L) lower, int greaterL, double integral)
    {
        int l = greaterL;
        double unit = 2 * l * integral * integral * _scale / ((2 * l - 1) * (2 * l + 1));
        Add(components, upper, lower, +1, +1, unit * (2 * l - 1) * (l + 1));
        Add(components, upper, lower, -1, -1, unit * (l - 1) * (2 * l + 1));
        Add(components, upper, lower, upper.L == l ? -1 : +1, upper.L == l ? +1 : -1, unit);
    }

    private void Add(
        List<FineStructureComponent> components, (int N, int L) upper, (int N, int L) lower, int upperSpin, int lowerSpin, double strength)
    {
        if (strength == 0)
            return;
        var high = new HydrogenicLevel(upper.N, upper.L, 2 * upper.L + upperSpin);
        var low = new HydrogenicLevel(lower.N, lower.L, 2 * lower.L + lowerSpin);
        double waveNumber = atom.Energy(high) - atom.Energy(low);
        components.Add(new(high, low, waveNumber, strength, EinsteinA(waveNumber, strength, high.Weight)));
    }
}
