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
/// <param name="OscillatorStrength">Absorption oscillator strength of the electronic transition, scaled for a one-layer atmosphere.</param>
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

    /// <summary>Systems seen in stars.</summary>
    public static readonly BandSystem[] All = [.. StarTables.Rows("band-systems.csv").Select(Parse)];

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

    private static BandSystem Parse(string[] row)
    {
        double At(int column) => StarTables.Number(row[column]);
        MolecularState State(int column) => new(At(column), At(column + 1), At(column + 2), At(column + 3));
        var marks = row[16].Split(';').Select(m => m.Split(':')).Select(m => (StarTables.Number(m[0]), StarTables.Number(m[1])));
        return new BandSystem(
            Molecule.Find(row[1]), State(2), State(6), At(10), At(11), At(12) * At(13), At(14), At(15), [.. marks], row[17] == "origin");
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
        var lowest = AtOrigin ? mark : Band.OriginOfHead(mark, Upper.RotationAt(0), Lower.RotationAt(0));
        var origin = lowest + Upper.Term(upper) - Lower.Term(lower);
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
