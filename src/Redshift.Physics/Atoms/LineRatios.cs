using Redshift.Physics.Lines;

namespace Redshift.Physics.Atoms;

/// <summary>Pairs of lines whose ratio is fixed or bounded by atomic physics.</summary>
public static class LineRatios
{
    private const string Weights = "oscillator strengths: ";

    /// <summary>
    /// Energy flux ratios of forbidden lines from one upper level: the same in all thin gas, whatever its temperature,
    /// density and composition.
    /// </summary>
    public static IReadOnlyList<LineRatio> Fixed { get; } =
    [
        Same("[O III] 5007", "[O III] 4959", 2.98, "Storey & Zeippen 2000 MNRAS 312 813"),
        Same("[N II] 6583", "[N II] 6548", 3.05, "Storey & Zeippen 2000 MNRAS 312 813"),
        Same("[O I] 6300", "[O I] 6364", 3.1, "Storey & Zeippen 2000 MNRAS 312 813"),
        Same("[Ne III] 3869", "[Ne III] 3968", 3.32, "NIST Atomic Spectra Database, transition rates"),
        Same("[Ne V] 3426", "[Ne V] 3346", 2.73, "NIST Atomic Spectra Database, transition rates"),
        Same("[S III] 9531", "[S III] 9069", 2.47, "middle of 2.44 to 2.50: Mendoza & Zeippen 1982 MNRAS 199 1025 and later rates"),
        Same("[Ar III] 7136", "[Ar III] 7751", 4.1, "Mendoza & Zeippen 1983 MNRAS 202 981"),
    ];

    /// <summary>
    /// Resonance doublets: the highest ratio, of f times wavelength, holds for the optical depths and for equivalent
    /// widths and fluxes in thin gas; saturation takes it to 1.
    /// </summary>
    public static IReadOnlyList<LineRatio> Resonance { get; } =
    [
        Doublet("O VI 1032", "O VI 1038"),
        Doublet("N V 1239", "N V 1243"),
        Doublet("Si IV 1394", "Si IV 1403"),
        Doublet("C IV 1548", "C IV 1551"),
        Doublet("Al III 1855", "Al III 1863"),
        Doublet("Mg II 2796", "Mg II 2804"),
        Doublet("Ca II K", "Ca II H"),
        Doublet("Na I D2", "Na I D1"),
        Doublet("K I 7665", "K I 7699"),
    ];

    /// <summary>Energy flux ratios that fall from the highest value in thin gas to the lowest in dense gas.</summary>
    public static IReadOnlyList<LineRatio> DensityDependent { get; } =
    [
        new("[O II] 3729", "[O II] 3726", 0.35, 1.5, "Pradhan et al. 2006 MNRAS 366 L6"),
        new("[S II] 6716", "[S II] 6731", 0.44, 1.44, "Osterbrock & Ferland 2006 Astrophysics of Gaseous Nebulae, figure 5.8"),
        new("[C III] 1907", "C III] 1909", 0, 1.5, "Osterbrock & Ferland 2006 Astrophysics of Gaseous Nebulae, section 5.6"),
    ];

    private static LineRatio Same(string numerator, string denominator, double ratio, string source)
        => new(numerator, denominator, ratio, ratio, source);

    private static LineRatio Doublet(string stronger, string weaker)
        => new(stronger, weaker, 1, Depth(stronger) / Depth(weaker), Weights + LineList.Find(stronger).Source);

    private static double Depth(string name)
    {
        SpectralLine line = LineList.Find(name);
        return line.VacuumAngstrom * line.OscillatorStrength
            ?? throw new InvalidOperationException($"The line list has no oscillator strength for {name}.");
    }
}
