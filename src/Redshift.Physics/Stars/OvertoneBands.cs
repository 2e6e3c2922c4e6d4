namespace Redshift.Physics.Stars;

/// <summary>Vibration-rotation bands of CO in the near infrared: second overtone at 1.6 µm, first at 2.3 µm.</summary>
internal static class OvertoneBands
{
    /// <summary>Spacing of rotational lines over their Doppler width near 2.3 µm.</summary>
    public const double SpacingOverWidth = 30;

    private const int LastVibration = 9;

    // Constants of the ground state from memory of Huber & Herzberg 1979; integrated cross-sections in cm of the bands from v = 0 from
    // memory of HITRAN.
    private static readonly MolecularState Ground = new(2169.81, 13.288, 1.93128, 0.01750);
    private static readonly (int Step, double CrossSection)[] Overtones = [(2, 7.6e-20), (3, 4.8e-22)];

    /// <summary>The bands with their cross-sections at a temperature.</summary>
    public static IEnumerable<Band> Bands(double kelvin)
    {
        var vibrational = Molecule.CarbonMonoxide.VibrationalPartition(kelvin);
        foreach (var (step, crossSection) in Overtones)
        {
            for (var v = 0; v <= LastVibration; v++)
            {
                var population = Math.Exp(-Cgs.WavenumberKelvin * Ground.Term(v) / kelvin) / vibrational;
                var origin = Ground.Term(v + step) - Ground.Term(v);
                var strength = crossSection * Binomial(v + step, step) * population;
                yield return new Band(origin, Ground.RotationAt(v + step), Ground.RotationAt(v), 0, strength);
            }
        }
    }

    // Harmonic oscillator: overtones from higher levels are stronger by (v + Δ)!/(v! Δ!).
    private static double Binomial(int n, int k)
    {
        var product = 1.0;
        for (var i = 1; i <= k; i++)
            product *= (n - k + i) / (double)i;
        return product;
    }
}
