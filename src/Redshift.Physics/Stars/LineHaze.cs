namespace Redshift.Physics.Stars;

/// <summary>
/// The smooth part of line blanketing: weak lines of neutral iron-peak atoms below the limit of the tables, crowded in the blue and
/// ultraviolet.
/// </summary>
internal static class LineHaze
{
    // Opacity ratio in the Sun at 4000 Å, the wavelength over which it falls by e, and the step shortward of Ca II where strong multiplets
    // crowd: what the listed lines leave of the blocked light of Allen 1973, Astrophysical Quantities, section 80 (0.22 at 4050 Å, 0.41 at
    // 3850 Å).
    private const double SolarRatio = 0.10;
    private const double StepRatio = 0.08;
    private const double StepWavelength = 3960;
    private const double StepWidth = 15;
    private const double ScaleLength = 600;
    private const double Excitation = 2.8;
    private const double LastWavelength = 6500;
    private const int Block = 8;
    private static readonly Element Iron = Element.Find("Fe");
    private static readonly double SolarOpacityRatio = SolarIron();

    public static void Add(Span<double> ratio, LogWavelengthGrid grid, Photosphere star)
    {
        var iron = new Absorbers(star.Lines, Iron, 0);
        var last = Math.Min(ratio.Length - Block, (int)grid.Position(LastWavelength));
        for (var i = Math.Max(0, (int)grid.Position(1900)); i < last; i += Block)
        {
            var wavelength = grid.Wavelength(i + (Block / 2));
            var haze = SolarHaze(wavelength) * OpacityRatio(iron, star.Lines, wavelength) / SolarOpacityRatio;
            foreach (ref var r in ratio.Slice(i, Block))
                r += haze;
        }
    }

    private static double SolarHaze(double wavelength) =>
        (SolarRatio * Math.Exp((4000 - Math.Max(wavelength, 2700)) / ScaleLength))
        + (StepRatio / (1 + Math.Exp((wavelength - StepWavelength) / StepWidth)));

    private static double OpacityRatio(in Absorbers iron, Layer layer, double wavelength) =>
        iron.CentralOpacity(wavelength, Excitation) / layer.ContinuousOpacityAt(Nodes.Place(Math.Log(wavelength)));

    private static double SolarIron()
    {
        var layer = new Photosphere(LineTables.Sun).Lines;
        return OpacityRatio(new Absorbers(layer, Iron, 0), layer, 4000);
    }
}
