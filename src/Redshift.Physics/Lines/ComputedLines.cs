using Redshift.Physics.Hydrogen;

namespace Redshift.Physics.Lines;

/// <summary>The lines of hydrogen and ionized helium, which need no publication.</summary>
internal static class ComputedLines
{
    private const string Source = "computed: Dirac levels with recoil and Lamb shift";

    private const LineUses Everywhere = LineUses.Star | LineUses.Galaxy | LineUses.Quasar | LineUses.Nebula;

    public static IEnumerable<SpectralLine> Hydrogen() =>
    [
        .. Series(HydrogenicAtom.Hydrogen, LineFamily.Hydrogen, 1, 10, LineUses.Galaxy | LineUses.Quasar),
        .. Series(HydrogenicAtom.Hydrogen, LineFamily.Hydrogen, 2, 16, Everywhere),
        .. Series(HydrogenicAtom.Hydrogen, LineFamily.Hydrogen, 3, 16, Everywhere),
        .. Series(HydrogenicAtom.Hydrogen, LineFamily.Hydrogen, 4, 14, LineUses.Star | LineUses.Galaxy | LineUses.Nebula),
    ];

    // The line 4-2 at 1215 A cannot be told from Lyman alpha and is left out.
    public static IEnumerable<SpectralLine> IonizedHelium() =>
    [
        FromAtom(HydrogenicAtom.HeliumPlus.Line(3, 2), LineFamily.Helium, Everywhere),
        .. Series(HydrogenicAtom.HeliumPlus, LineFamily.Helium, 3, 6, Everywhere),
        .. Series(HydrogenicAtom.HeliumPlus, LineFamily.Helium, 4, 12, Everywhere),
    ];

    private static IEnumerable<SpectralLine> Series(HydrogenicAtom atom, LineFamily family, int lower, int highestUpper, LineUses uses)
        => Enumerable.Range(lower + 1, highestUpper - lower).Select(upper => FromAtom(atom.Line(upper, lower), family, uses));

    private static SpectralLine FromAtom(HydrogenicLine line, LineFamily family, LineUses uses)
        => new(line.Name, family, line.VacuumAngstrom, LineKind.Both, uses, line.OscillatorStrength, Source);
}
