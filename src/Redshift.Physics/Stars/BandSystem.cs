using Redshift.Physics.Air;

namespace Redshift.Physics.Stars;

/// <summary>Electronic state of a molecule, constants in cm⁻¹.</summary>
internal readonly record struct MolecularState(double Vibration, double Anharmonicity, double Rotation, double Coupling)
{
    /// <summary>Vibrational term above v = 0.</summary>
    public double Term(int v) => (Vibration * v) - (Anharmonicity * v * (v + 1));

    /// <summary>Rotational constant B_v.</summary>
    public double RotationAt(int v) => Rotation - (Coupling * (v + 0.5));
}

/// <summary>A system of bands between two electronic states; wavelengths of all bands follow from those of the (0,0) heads.</summary>
/// <param name="Molecule">Molecule that absorbs.</param>
/// <param name="Upper">Upper state.</param>
/// <param name="Lower">Lower state.</param>
/// <param name="LowerEnergy">Energy of the lower state above the ground state in cm⁻¹.</param>
/// <param name="LowerWeight">Share of the molecule's statistical weight that the lower state has.</param>
/// <param name="OscillatorStrength">Absorption oscillator strength of the electronic transition.</param>
/// <param name="QShare">Share of the Q branch: about one half when Λ changes by one, zero when it does not.</param>
/// <param name="SpacingOverWidth">Spacing of rotational lines over their Doppler width: how soon the band saturates.</param>
/// <param name="Marks">Air wavelengths in Å that place the (0,0) band, one for each spin component, with their shares.</param>
/// <param name="AtOrigin">True when the marks are the beginnings of Q branches, false when they are heads.</param>
internal sealed record BandSystem(
    Molecule Molecule,
    MolecularState Upper,
    MolecularState Lower,
    double LowerEnergy,
    double LowerWeight,
    double OscillatorStrength,
    double QShare,
    double SpacingOverWidth,
    (double Air, double Share)[] Marks,
    bool AtOrigin = false)
{
    private const int LastVibration = 7;
    private const double FaintestShare = 0.004;
    private const double LowestOrigin = 3000;

    // The one-layer model makes bands of metal oxides too strong: published oscillator strengths are scaled by this.
    private const double Oxide = 0.31;
    private static readonly MolecularState TitaniumX = new(1009.02, 4.498, 0.53541, 0.00301);
    private static readonly MolecularState TitaniumA = new(1018.27, 4.52, 0.53760, 0.00298);
    private static readonly MolecularState TitaniumD = new(1023.8, 4.9, 0.54922, 0.00337);
    private static readonly MolecularState VanadiumX = new(1011.3, 4.86, 0.54638, 0.00352);
    private static readonly MolecularState CyanogenX = new(2068.59, 13.09, 1.8997, 0.0174);

    /// <summary>
    /// Systems seen in stars. Constants from memory of Huber &amp; Herzberg 1979; heads of Pearse &amp; Gaydon 1976; oscillator strengths
    /// of TiO as in Allard, Hauschildt &amp; Schwenke 2000, ApJ 540, 1005, of the others from memory, to within a factor of two.
    /// </summary>
    public static readonly BandSystem[] All =
    [
        new(Molecule.TitaniumMonoxide, new(838.26, 4.76, 0.48989, 0.00306), TitaniumX, 0, 0.92, 0.106 * Oxide, 0, 0.3, [(5166.8, 1)]),
        new(Molecule.TitaniumMonoxide, new(917.55, 4.54, 0.52300, 0.00314), TitaniumA, 3446, 0.31, 0.125 * Oxide, 0.5, 0.3, [(5597.7, 1)]),
        new(Molecule.TitaniumMonoxide, new(867.78, 3.94, 0.50739, 0.00315), TitaniumX, 0, 0.92, 0.0786 * Oxide, 0.5, 0.3, [(7054.3, 0.34), (7087.9, 0.33), (7125.6, 0.33)]),
        new(Molecule.TitaniumMonoxide, new(875.0, 4.0, 0.50617, 0.00310), TitaniumX, 0, 0.92, 0.0935 * Oxide, 0.5, 0.3, [(6158.5, 0.34), (6186.3, 0.33), (6214.9, 0.33)]),
        new(Molecule.TitaniumMonoxide, new(924.2, 5.1, 0.5173, 0.0033), TitaniumX, 0, 0.92, 0.0024 * Oxide, 0.5, 0.3, [(8432, 0.34), (8442, 0.33), (8452, 0.33)]),
        new(Molecule.TitaniumMonoxide, new(919.76, 4.28, 0.51337, 0.00290), TitaniumA, 3446, 0.31, 0.048 * Oxide, 0.5, 0.3, [(8859.6, 1)]),
        new(Molecule.TitaniumMonoxide, new(919.76, 4.28, 0.51337, 0.00290), TitaniumD, 5661, 0.15, 0.0178 * Oxide, 0.5, 0.3, [(11035, 1)]),
        new(Molecule.VanadiumMonoxide, new(910.9, 4.96, 0.5142, 0.0033), VanadiumX, 0, 1, 0.05 * Oxide, 0.5, 0.3, [(7851, 0.25), (7865, 0.25), (7900, 0.25), (7938, 0.25)]),
        new(Molecule.VanadiumMonoxide, new(884, 5.0, 0.5171, 0.0035), VanadiumX, 0, 1, 0.0105 * Oxide, 0.5, 0.3, [(10456, 0.5), (10520, 0.5)]),
        new(Molecule.VanadiumMonoxide, new(864, 5.4, 0.4946, 0.0034), VanadiumX, 0, 1, 0.1 * Oxide, 0, 0.3, [(5736.7, 1)]),
        new(Molecule.Cyanogen, new(2163.9, 20.2, 1.973, 0.023), CyanogenX, 0, 0.9, 0.010, 0, 4, [(3883.4, 1)]),
        new(Molecule.Cyanogen, new(1812.6, 12.6, 1.7151, 0.01708), CyanogenX, 0, 0.9, 0.0015, 0.5, 6, [(10925, 0.5), (10968, 0.5)]),
        new(Molecule.Carbon2, new(1788.2, 16.44, 1.7527, 0.01608), new(1641.35, 11.67, 1.6324, 0.01661), 716, 0.85, 0.009, 0, 2, [(5165.2, 1)]),
        new(Molecule.Methylidyne, new(2930.7, 96.65, 14.934, 0.697), new(2858.5, 63.0, 14.457, 0.534), 0, 1, 0.0053, 0.5, 6, [(4314.2, 1)], true),
        new(Molecule.Methylidyne, new(2250, 230, 13.3, 1.48), new(2858.5, 63.0, 14.457, 0.534), 0, 1, 0.0026, 0.4, 8, [(3889.0, 1)], true),
        new(Molecule.Imidogen, new(3231.2, 98.6, 16.675, 0.745), new(3282.3, 78.3, 16.699, 0.649), 0, 1, 0.0024, 0.5, 8, [(3360, 1)], true),
        new(Molecule.MagnesiumHydride, new(1599.5, 32.5, 6.1913, 0.1931), new(1495.2, 31.9, 5.8257, 0.1859), 0, 1, 0.048, 0.5, 6, [(5211.1, 1)]),
        new(Molecule.CalciumHydride, new(1333, 20, 4.3477, 0.106), new(1298.3, 19.1, 4.2766, 0.097), 0, 1, 0.045, 0.5, 5, [(6946, 0.5), (6908, 0.5)], true),
        new(Molecule.CalciumHydride, new(1285, 20, 4.447, 0.115), new(1298.3, 19.1, 4.2766, 0.097), 0, 1, 0.024, 0.3, 5, [(6385, 1)]),
        new(Molecule.IronHydride, new(1524, 40, 6.02, 0.21), new(1827, 32, 6.59, 0.21), 0, 0.5, 0.0012, 0.3, 3, [(9896, 1)]),
    ];

    private IReadOnlyList<(Band Band, double LowerTerm)>? _bands;

    // All bands with the cross-section they would have if every molecule were in the lower level.
    private IReadOnlyList<(Band Band, double LowerTerm)> AllBands => _bands ??= [.. ComputeBands()];

    /// <summary>The bands with their cross-sections at a temperature.</summary>
    public IEnumerable<Band> Bands(double kelvin)
    {
        var population = LowerWeight / Molecule.VibrationalPartition(kelvin);
        foreach (var (band, term) in AllBands)
            yield return band with { CrossSection = band.CrossSection * population * Math.Exp(-Cgs.WavenumberKelvin * term / kelvin) };
    }

    private IEnumerable<(Band Band, double LowerTerm)> ComputeBands()
    {
        for (var lower = 0; lower <= LastVibration; lower++)
        {
            for (var upper = 0; upper <= LastVibration; upper++)
            {
                var strength = OscillatorStrength * Cgs.ClassicalCrossSection * FranckCondon(upper, lower);
                foreach (var (air, share) in Marks)
                {
                    var band = BandAt(air, upper, lower, strength * share);
                    if (strength > FaintestShare * OscillatorStrength * Cgs.ClassicalCrossSection && band.Origin > LowestOrigin)
                        yield return (band, LowerEnergy + Lower.Term(lower));
                }
            }
        }
    }

    private Band BandAt(double markAir, int upper, int lower, double crossSection)
    {
        var mark = 1e8 / AirRefraction.ToVacuum(markAir);
        var origin = (AtOrigin ? mark : Band.OriginOfHead(mark, Upper.RotationAt(0), Lower.RotationAt(0))) + Upper.Term(upper) - Lower.Term(lower);
        return new Band(origin, Upper.RotationAt(upper), Lower.RotationAt(lower), QShare, crossSection);
    }

    /// <summary>
    /// Overlap of two displaced harmonic oscillators: exp(−S) S^|d| n!/(n + |d|)! L_n^|d|(S)², S from the bond lengths r ∝ (μB)^(−1/2).
    /// </summary>
    public double FranckCondon(int upper, int lower)
    {
        const double lengthSquare = 16.857629;
        var mass = Molecule.ReducedMass;
        var shift = Math.Sqrt(lengthSquare / (mass * Upper.Rotation)) - Math.Sqrt(lengthSquare / (mass * Lower.Rotation));
        var s = shift * shift * mass * Math.Sqrt(Upper.Vibration * Lower.Vibration) / (4 * lengthSquare);
        var (n, d) = (Math.Min(upper, lower), Math.Abs(upper - lower));
        var factor = Math.Exp(-s) * Math.Pow(s, d);
        for (var i = n + 1; i <= n + d; i++)
            factor /= i;
        var laguerre = Laguerre(n, d, s);
        return factor * laguerre * laguerre;
    }

    private static double Laguerre(int n, int order, double x)
    {
        var (before, here) = (0.0, 1.0);
        for (var k = 0; k < n; k++)
            (before, here) = (here, ((((2 * k) + 1 + order - x) * here) - ((k + order) * before)) / (k + 1));
        return here;
    }
}
