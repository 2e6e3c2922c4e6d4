using System.Globalization;
using Redshift.Physics.Lines;
using Redshift.Physics.Units;
using Redshift.Pipeline.Match.Fit;
using Redshift.Pipeline.Results;

namespace Redshift.Pipeline.Match.Measure;

/// <summary>The listed lines that suit an answer, with the widths such objects give them.</summary>
internal static class LineSelection
{
    private const double KmS = 1 / Velocity.SpeedOfLightKmS;

    /// <summary>Shortward of this, Å at rest, the forest of distant objects drowns every line.</summary>
    private const double ForestEdge = 1205;

    private const double ForestRedshift = 1.8;

    /// <summary>The lines of an answer by rising wavelength, in range or not.</summary>
    public static List<LineTarget> For(Refined answer) => answer.Model.Kind switch
    {
        ObjectKind.Star => Stellar(answer),
        ObjectKind.Galaxy => Galactic(answer),
        ObjectKind.Quasar => Active(answer),
        ObjectKind.Nebula => Gaseous(answer),
        _ => [],
    };

    /// <summary>Which of two lines at the same place gives the blend its name: the one with the greater rank.</summary>
    /// <param name="line">The line.</param>
    /// <param name="emission">The side of the continuum on which the blend is seen.</param>
    /// <param name="answer">The answer.</param>
    public static int Rank(SpectralLine line, bool emission, Refined answer)
    {
        var spectralType = answer.Model.Template?.SpectralType ?? "";
        var hydrogenRules = spectralType.Length > 0 && "OBAD".Contains(spectralType[0], StringComparison.Ordinal);
        var family = line.Family switch
        {
            LineFamily.Hydrogen when hydrogenRules => 8,
            LineFamily.Hydrogen => emission ? 3 : 1,
            LineFamily.Helium => hydrogenRules ? 4 : 0,
            _ => 0,
        };
        var side = line.Kind == (emission ? LineKind.Emission : LineKind.Absorption) ? 2 : 0;
        return 2 * (family + side) + (PrincipalLines.Of(answer.Model.Kind).Contains(line.Name) ? 1 : 0);
    }

    private static List<LineTarget> Stellar(Refined answer)
    {
        var type = answer.Model.Template?.SpectralType ?? "";
        return Targets(answer, LineUses.Star, l => SuitsStar(l, type), l => l.Family switch
        {
            LineFamily.Hydrogen => new(60, type.StartsWith('D') ? 4000 : 1500, 40, l.Kind),
            LineFamily.Helium => new(40, type.StartsWith('D') ? 2000 : 400, 40, l.Kind),
            LineFamily.Molecular => new(500, 900, 100, l.Kind),
            _ => new(10, 200, 30, l.Kind),
        });
    }

    private static List<LineTarget> Gaseous(Refined answer) =>
        Targets(answer, LineUses.Nebula, l => l.Kind != LineKind.Absorption && SuitsGas(l, 12), _ => new(answer.Model.NarrowKmS, 0, 30, LineKind.Emission));

    private static bool SuitsStar(SpectralLine line, string type)
    {
        var letter = type.Length > 0 ? type[0] : 'G';
        var hot = letter is 'O' or 'B';
        return line.Family switch
        {
            LineFamily.Hydrogen => !type.StartsWith("DB", StringComparison.Ordinal) && SeriesNumber(line.Name) <= LastStellarLine(letter),
            LineFamily.Helium => hot || type.StartsWith("DB", StringComparison.Ordinal),
            LineFamily.Ultraviolet => hot,
            LineFamily.Metals => letter != 'D' && SuitsIon(line.Name, letter),
            LineFamily.Molecular => line.Name == "G band" && letter is 'F' or 'G' or 'K',
            _ => false,
        };
    }

    /// <summary>Beyond these the series drowns in the lines of metals.</summary>
    private static int LastStellarLine(char letter) => letter switch
    {
        'O' or 'B' or 'A' => 12,
        'F' or 'D' => 10,
        _ => 0,
    };

    /// <summary>The number in names such as H10 and Pa9; 0 where a Greek letter stands.</summary>
    private static int SeriesNumber(string name) => int.TryParse(name.TrimStart('L', 'y', 'H', 'P', 'a', 'B', 'r'), NumberStyles.None, CultureInfo.InvariantCulture, out var number) ? number : 0;

    /// <summary>Thin gas shows the series up to a number, and of ionized helium the strong lines that hydrogen does not hide.</summary>
    private static bool SuitsGas(SpectralLine line, int lastNumber) => line.Family switch
    {
        LineFamily.Hydrogen => SeriesNumber(line.Name) <= lastNumber,
        LineFamily.Helium => !line.Name.StartsWith("He II", StringComparison.Ordinal) || line.Name is "He II 1640" or "He II 3203" or "He II 4686",
        LineFamily.Molecular => line.Name == "G band",
        _ => true,
    };

    /// <summary>Ions that stars of a class show; elsewhere another element's line stands at the same place.</summary>
    private static bool SuitsIon(string name, char letter)
    {
        var ion = name.Split(' ')[1];
        return letter switch
        {
            'O' or 'B' => ion is not "I",
            'A' => ion is "I" or "II" && !name.StartsWith("Li", StringComparison.Ordinal),
            'F' => ion is "I" || (ion is "II" && name.Split(' ')[0] is "Ca" or "Sr" or "Fe"),
            _ => ion is "I" || (ion is "II" && name.Split(' ')[0] is "Ca" or "Sr"),
        };
    }

    private static List<LineTarget> Galactic(Refined answer) =>
        Targets(answer, LineUses.Galaxy, l => SuitsGas(l, 10), l => l.Kind switch
        {
            LineKind.Emission => new(answer.Model.NarrowKmS, 0, 60, l.Kind),
            LineKind.Absorption when l.Family == LineFamily.Molecular => new(500, 0, 100, l.Kind),
            LineKind.Absorption => new(200, 0, 80, l.Kind),
            _ => new(answer.Model.NarrowKmS, l.Family == LineFamily.Hydrogen ? 800 : 400, 60, l.Kind),
        });

    private static List<LineTarget> Active(Refined answer) =>
        Targets(answer, LineUses.Quasar, l => l.Kind != LineKind.Absorption && SuitsGas(l, 0) && l.Name != "[C III] 1907", l => l.Name.StartsWith('[')
            ? new(answer.Model.NarrowKmS, 0, 150, LineKind.Emission)
            : new(answer.Model.BroadKmS, 0, 600, LineKind.Emission));

    private static List<LineTarget> Targets(Refined answer, LineUses uses, Func<SpectralLine, bool> suits, Func<SpectralLine, Width> width)
    {
        var drowned = Math.Exp(answer.LnShift) - 1 > ForestRedshift ? ForestEdge : 0;
        return
        [
            .. LineList.For(uses).Where(l => l.VacuumAngstrom > drowned && suits(l)).Select(l =>
            {
                var (expected, widest, shift, side) = width(l);
                return new LineTarget(l, Math.Log(l.VacuumAngstrom) + answer.LnShift, expected * KmS, widest * KmS, side, shift * KmS);
            }),
        ];
    }

    /// <summary>Expected σ, widest σ and spread of shifts in km/s; the side of the continuum.</summary>
    private readonly record struct Width(double ExpectedKmS, double WidestKmS, double ShiftKmS, LineKind Side);
}
