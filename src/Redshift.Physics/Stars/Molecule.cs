namespace Redshift.Physics.Stars;

/// <summary>A diatomic molecule: what its equilibrium with the free atoms depends on.</summary>
/// <param name="First">First element.</param>
/// <param name="Second">Second element.</param>
/// <param name="Dissociation">Dissociation energy in eV.</param>
/// <param name="Rotation">Rotational constant B_e of the ground state in cm⁻¹.</param>
/// <param name="Vibration">Vibrational constant ω_e of the ground state in cm⁻¹.</param>
/// <param name="Weight">Statistical weight of the electronic states that are populated, over the symmetry number.</param>
/// <remarks>Constants from memory of Huber &amp; Herzberg 1979, Constants of Diatomic Molecules.</remarks>
internal sealed record Molecule(Element First, Element Second, double Dissociation, double Rotation, double Vibration, double Weight)
{
    public static readonly Molecule CarbonMonoxide = Of("C", "O", 11.09, 1.9313, 2169.8, 1);
    public static readonly Molecule Cyanogen = Of("C", "N", 7.72, 1.8997, 2068.6, 2.2);
    public static readonly Molecule Carbon2 = Of("C", "C", 6.21, 1.8198, 1854.7, 3.5);
    public static readonly Molecule Nitrogen2 = Of("N", "N", 9.76, 1.998, 2358.6, 0.5);
    public static readonly Molecule Methylidyne = Of("C", "H", 3.465, 14.457, 2858.5, 4);
    public static readonly Molecule Hydroxyl = Of("O", "H", 4.392, 18.911, 3737.8, 4);
    public static readonly Molecule Imidogen = Of("N", "H", 3.42, 16.699, 3282.3, 3);
    public static readonly Molecule MagnesiumHydride = Of("Mg", "H", 1.34, 5.8257, 1495.2, 2);
    public static readonly Molecule CalciumHydride = Of("Ca", "H", 1.70, 4.2766, 1298.3, 2);
    public static readonly Molecule IronHydride = Of("Fe", "H", 1.63, 6.59, 1827, 12);
    public static readonly Molecule SiliconMonoxide = Of("Si", "O", 8.26, 0.7268, 1241.6, 1);
    public static readonly Molecule TitaniumMonoxide = Of("Ti", "O", 6.87, 0.53541, 1009.0, 6.5);
    public static readonly Molecule VanadiumMonoxide = Of("V", "O", 6.44, 0.54638, 1011.3, 4);

    /// <summary>Molecules of the equilibrium.</summary>
    public static readonly Molecule[] All =
    [
        CarbonMonoxide, Cyanogen, Carbon2, Nitrogen2, Methylidyne, Hydroxyl, Imidogen, MagnesiumHydride, CalciumHydride, IronHydride,
        SiliconMonoxide, TitaniumMonoxide, VanadiumMonoxide,
    ];

    /// <summary>Chemical formula.</summary>
    public string Formula => First == Second ? First.Symbol + "2" : First.Symbol + Second.Symbol;

    /// <summary>Reduced mass in u.</summary>
    public double ReducedMass => First.Mass * Second.Mass / (First.Mass + Second.Mass);

    /// <summary>Vibrational partition function of the ground state, harmonic.</summary>
    public double VibrationalPartition(double kelvin) => 1 / (1 - Math.Exp(-Cgs.WavenumberKelvin * Vibration / kelvin));

    /// <summary>p(A) p(B)/p(AB) in dyn/cm²: law of mass action with rigid-rotator and harmonic partition functions.</summary>
    public double DissociationConstant(double kelvin)
    {
        var motion = Math.Pow(2 * Math.PI * ReducedMass * Cgs.AtomicMass * Cgs.Boltzmann * kelvin / (Cgs.Planck * Cgs.Planck), 1.5);
        var internalStates = Weight * kelvin / (Cgs.WavenumberKelvin * Rotation) * VibrationalPartition(kelvin);
        return motion * Cgs.Boltzmann * kelvin * First.Partition[0] * Second.Partition[0] / internalStates
            * Math.Exp(-Dissociation / (Cgs.BoltzmannEv * kelvin));
    }

    public static Molecule Find(string formula) => All.Single(m => m.Formula == formula);

    private static Molecule Of(string first, string second, double dissociation, double rotation, double vibration, double weight) =>
        new(Element.Find(first), Element.Find(second), dissociation, rotation, vibration, weight);
}
