using Redshift.Physics.Hydrogen;

namespace Redshift.Physics.Stars;

/// <summary>
/// Hydrogen lines broadened by the fields of ions and electrons (linear Stark effect) and by collisions with hydrogen atoms.
/// </summary>
internal static class HydrogenLines
{
    private const int LastUpper = 40;
    private const double FarthestReach = 0.3;
    private const double FaintestRatio = 0.004;

    // Stark displacement per unit field, Å per esu: Underhill & Waddell 1959, NBS Circular 603; lower level 1..4, upper minus lower 1..3.
    private static readonly double[][] StarkScale =
    [
        [0.0001716, 0.0005235, 0.0008912], [0.009019, 0.01772, 0.02507], [0.1001, 0.171, 0.223], [0.582, 0.866, 1.02],
    ];

    private static readonly HydrogenicLine[] Lines = [.. HydrogenSeries.All.Take(5).SelectMany(s => s.Lines(LastUpper))];

    /// <summary>Adds the line-to-continuum opacity ratios of all series.</summary>
    public static void Add(Span<double> ratio, LogWavelengthGrid grid, Layer layer)
    {
        var doppler = layer.DopplerCm(Element.Hydrogen);
        foreach (var line in Lines)
            AddLine(ratio, grid, new Line(line, layer.Gas, doppler, grid.LnStep), layer);
    }

    private static void AddLine(Span<double> ratio, LogWavelengthGrid grid, in Line line, Layer layer)
    {
        var strength = line.Strength / layer.ContinuousOpacityAt(Nodes.Place(Math.Log(line.Center)));
        if (strength * line.Profile(0) < FaintestRatio)
            return;
        var reach = line.Reach(FaintestRatio / strength);
        var middle = grid.Position(line.Center);
        var first = Math.Max(0, (int)(middle - (reach / (line.Center * grid.LnStep))));
        var last = Math.Min(grid.Count - 1, (int)(middle + (reach / (line.Center * grid.LnStep))));
        if (first > last)
            return;
        var growth = Math.Exp(grid.LnStep);
        var wavelength = grid.Wavelength(first);
        for (var i = first; i <= last; i++, wavelength *= growth)
            ratio[i] += strength * line.Profile(wavelength - line.Center);
    }

    private readonly struct Line
    {
        // S(β) = w/(b + β^2.5), normalized to one over both sides, Holtsmark wings of the ions having w = 1.5. Electrons double the
        // far wings only; where the lines are half deep they add less (Edmonds, Schlüter & Wells 1967, MmRAS 71, 271).
        private const double Wing = 1.8;
        private static readonly double Core = Math.Pow(2.643 * Wing, 1 / 0.6);
        private readonly double _scale;
        private readonly double _smoothing;
        private readonly double _perScaleSquare;
        private readonly double _starkFactor;
        private readonly double _lorentz;

        public Line(HydrogenicLine line, Gas gas, double dopplerCm, double lnStep)
        {
            var (lower, upper) = (line.Lower, line.Upper);
            Center = line.VacuumAngstrom;
            var field = 1.25e-9 * Math.Pow(gas.ElectronDensity, 2.0 / 3);
            _scale = field * Scale(lower, upper);
            _perScaleSquare = 1 / (_scale * _scale);
            _starkFactor = Wing / _scale;
            var smoothing = Center * Math.Max(dopplerCm / Cgs.LightSpeed, lnStep);
            _smoothing = smoothing * smoothing;
            _lorentz = CollisionWidth(gas, Center, lower, upper) / Math.PI;
            var excitation = 13.598 * (1 - (1.0 / (lower * lower)));
            var population = gas.NeutralHydrogen * lower * lower * Math.Exp(-excitation / (Cgs.BoltzmannEv * gas.Temperature));
            var emission = 1 - Math.Exp(-Cgs.SecondRadiation / (Center * gas.Temperature));
            var survival = HydrogenLevels.Survival(upper, gas.ElectronDensity);
            Strength = population * emission * survival * line.OscillatorStrength * Cgs.ClassicalCrossSection * 1e-8 * Center * Center;
        }

        public double Center { get; }

        public double Strength { get; }

        public double Profile(double offset)
        {
            var square = (offset * offset) + _smoothing;
            var beta2 = square * _perScaleSquare;
            return (_starkFactor / (Core + (beta2 * Math.Sqrt(Math.Sqrt(beta2))))) + (_lorentz / square);
        }

        public double Reach(double profile) =>
            Math.Min(FarthestReach * Center, Math.Pow(Wing * Math.Pow(_scale, 1.5) / profile, 0.4) + Math.Sqrt(_lorentz / profile));

        private static double Scale(int lower, int upper)
        {
            if (lower <= 4 && upper - lower <= 3)
                return StarkScale[lower - 1][upper - lower - 1];
            double product = (double)lower * lower * upper * upper;
            return 5.5e-5 * product * product / ((upper * upper) - (lower * lower)) / (1 + (0.13 / (upper - lower)));
        }

        // Collisions with hydrogen atoms: cross-sections of Barklem, Piskunov & O'Mara 2000, A&A 363, 1091 (Hα 1180, Hβ 2320, Hγ 4208
        // atomic units); for the Lyman lines the natural width is added.
        private static double CollisionWidth(Gas gas, double center, int lower, int upper)
        {
            const double squareBohr = 2.8003e-17;
            var cross = 1180 * Math.Pow(Math.Min(upper, 8) / 3.0, 2.5) * squareBohr;
            var speed = Math.Sqrt(8 * Cgs.Boltzmann * gas.Temperature / (Math.PI * 0.504 * Cgs.AtomicMass));
            var radians = (cross * speed * gas.NeutralHydrogenDensity) + (lower == 1 ? 3.1e8 : 0);
            return radians * center * center * 1e-8 / (2 * Math.PI * Cgs.LightSpeed);
        }
    }
}
