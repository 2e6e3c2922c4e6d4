namespace Redshift.Physics.Stars;

/// <summary>
/// Gas of one layer in thermal equilibrium: ionization by Saha, hydrogen molecules by mass action, pressure from hydrostatic
/// equilibrium. One layer stands for the depth where lines (or the continuum) form, as in the classical one-layer model.
/// </summary>
internal sealed class Gas
{
    private const double HydrogenMassPerNucleus = 1.4;
    private readonly double _metalFactor;
    private readonly double[][] _stages;

    private Gas(double temperature, double electronPressure, Composition composition)
    {
        Temperature = temperature;
        ElectronPressure = electronPressure;
        Composition = composition;
        _metalFactor = Math.Pow(10, composition.Metallicity);
        _stages = [.. Element.Others.Select(Stages)];
        var ionRatio = SahaRatio(Element.Hydrogen, 0);
        var electronsPerNucleus = Element.Others.Select((e, i) => AbundanceOf(e) * MeanCharge(_stages[i])).Sum();
        var molecular = 1 / HydrogenMoleculeConstant(temperature);
        var linear = (electronsPerNucleus * (1 + ionRatio)) + ionRatio;
        AtomicHydrogenPressure = PositiveRoot(2 * electronsPerNucleus * molecular, linear, electronPressure);
        NucleiPressure = (AtomicHydrogenPressure * (1 + ionRatio)) + (2 * MoleculePressure);
        NeutralHydrogen = AtomicHydrogenPressure / NucleiPressure;
        GasPressure = electronPressure + NucleiPressure - MoleculePressure + (NucleiPressure * Element.Others.Sum(AbundanceOf));
    }

    public double Temperature { get; }

    /// <summary>Electron pressure in dyn/cm².</summary>
    public double ElectronPressure { get; }

    public Composition Composition { get; }

    /// <summary>Pressure of all particles in dyn/cm².</summary>
    public double GasPressure { get; }

    /// <summary>Pressure that the hydrogen nuclei alone would have, dyn/cm²: the unit of all abundances.</summary>
    public double NucleiPressure { get; }

    public double AtomicHydrogenPressure { get; }

    /// <summary>Neutral hydrogen atoms per hydrogen nucleus.</summary>
    public double NeutralHydrogen { get; }

    public double MoleculePressure => AtomicHydrogenPressure * AtomicHydrogenPressure / HydrogenMoleculeConstant(Temperature);

    /// <summary>Electrons per cm³.</summary>
    public double ElectronDensity => ElectronPressure / (Cgs.Boltzmann * Temperature);

    /// <summary>Neutral hydrogen atoms per cm³, which damp lines by collisions.</summary>
    public double NeutralHydrogenDensity => AtomicHydrogenPressure / (Cgs.Boltzmann * Temperature);

    public double ElectronsPerNucleus => ElectronPressure / NucleiPressure;

    /// <summary>Layer of a temperature at a Rosseland optical depth: P = g τ / κ with P and κ both set by the electron pressure.</summary>
    public static Gas InBalance(double temperature, double logGravity, Composition composition, double opticalDepth)
    {
        var target = Math.Log(Math.Pow(10, logGravity) * opticalDepth * HydrogenMassPerNucleus * Cgs.AtomicMass);
        Gas At(double lnPressure) => new(temperature, Math.Exp(lnPressure), composition);
        double Excess(Gas gas) => Math.Log(gas.GasPressure * new ContinuousOpacity(gas).RosselandMean()) - target;
        double before = 2, here = 4, excessBefore = Excess(At(before));
        for (var step = 0; step < 20; step++)
        {
            var gas = At(here);
            var excess = Excess(gas);
            if (Math.Abs(excess) < 1e-4)
                return gas;
            var slope = Math.Clamp((excess - excessBefore) / (here - before), 0.5, 4);
            (before, excessBefore) = (here, excess);
            here -= Math.Clamp(excess / slope, -4, 4);
        }

        return At(here);
    }

    /// <summary>Nuclei of an element per hydrogen nucleus.</summary>
    public double AbundanceOf(Element element) => Composition.Of(element, _metalFactor);

    /// <summary>Share of an element that is in an ionization stage, 0 neutral.</summary>
    public double Fraction(Element element, int stage) =>
        element == Element.Hydrogen
            ? (stage == 0 ? NeutralHydrogen : NeutralHydrogen * SahaRatio(element, 0))
            : _stages[element.Index][stage];

    /// <summary>
    /// N(stage + 1)/N(stage): Saha equation in the form of Gray 2005, eq. 1.20: Φ(T)/P_e, Φ = 0.6665 (U₁/U₀) T^(5/2) 10^(−θI).
    /// </summary>
    public static double SahaRatio(Element element, int stage, double kelvin, double electronPressure) =>
        0.6665 * element.Partition[stage + 1] / element.Partition[stage] * kelvin * kelvin * Math.Sqrt(kelvin)
        * Math.Exp(-element.Ionization[stage] / (Cgs.BoltzmannEv * kelvin)) / electronPressure;

    private double SahaRatio(Element element, int stage) => SahaRatio(element, stage, Temperature, ElectronPressure);

    /// <summary>p(H)²/p(H2) in dyn/cm²: Tsuji 1973, A&amp;A 23, 411.</summary>
    public static double HydrogenMoleculeConstant(double kelvin)
    {
        var theta = Cgs.Theta(kelvin);
        return Math.Pow(10, 12.533505 - (4.9251644 * theta) + (0.056191273 * theta * theta) - (0.0032687661 * theta * theta * theta));
    }

    private static double MeanCharge(double[] fractions) => fractions.Select((f, charge) => f * charge).Sum();

    private static double PositiveRoot(double quadratic, double linear, double constant) =>
        2 * constant / (linear + Math.Sqrt((linear * linear) + (4 * quadratic * constant)));

    private double[] Stages(Element element)
    {
        var fractions = new double[element.Ionization.Length + 1];
        fractions[0] = 1;
        for (var stage = 0; stage < element.Ionization.Length; stage++)
            fractions[stage + 1] = Math.Min(fractions[stage] * SahaRatio(element, stage), 1e100);
        var total = fractions.Sum();
        return [.. fractions.Select(f => f / total)];
    }
}
