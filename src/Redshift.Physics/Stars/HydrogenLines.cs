namespace Redshift.Physics.Stars;

/// <summary>Hydrogen lines broadened by the fields of ions and electrons (linear Stark effect) and by collisions with hydrogen atoms.</summary>
internal static class HydrogenLines
{
    private const double RydbergHydrogen = 109677.58340;
    private const int LastUpper = 40;
    private const double FaintestRatio = 0.004;

    // Stark displacement per unit field, Å per esu: Underhill & Waddell 1959, NBS Circular 603; lower level 1..4, upper minus lower 1..3.
    private static readonly double[][] StarkScale =
    [
        [0.0001716, 0.0005235, 0.0008912], [0.009019, 0.01772, 0.02507], [0.1001, 0.171, 0.223], [0.582, 0.866, 1.02],
    ];

    /// <summary>Adds the line-to-continuum opacity ratios of all series.</summary>
    public static void Add(Span<double> ratio, LogWavelengthGrid grid, Layer layer)
    {
        var doppler = layer.DopplerCm(Element.Hydrogen);
        for (var lower = 1; lower <= 5; lower++)
        {
            for (var upper = lower + 1; upper <= LastUpper; upper++)
                AddLine(ratio, grid, new Line(lower, upper, layer.Gas, doppler, grid.LnStep), layer);
        }
    }

    /// <summary>Vacuum wavelength in Å; the quantum defect of 7e-6 stands for the mean fine-structure shift (level centres of Kramida 2010).</summary>
    public static double Wavelength(int lower, int upper) => 1e8 / (Term(lower) - Term(upper));

    /// <summary>Absorption oscillator strength: Kramers' formula with the Gaunt factors of Menzel &amp; Pekeris 1935 to first order.</summary>
    public static double OscillatorStrength(int lower, int upper)
    {
        double n2 = lower * lower, m2 = upper * upper, x = (1 / n2) - (1 / m2);
        var gaunt = 1 - (0.1728 * (1 + (n2 / m2)) / Math.Pow(n2 * (1 - (n2 / m2)), 2.0 / 3) * 1.0);
        return 1.9603 / (Math.Pow(lower, 5) * Math.Pow(upper, 3) * x * x * x) * (KnownGaunt(lower, upper) ?? gaunt);
    }

    private static double? KnownGaunt(int lower, int upper) => (lower, upper) switch
    {
        (1, 2) => 0.717,
        (1, 3) => 0.765,
        (1, 4) => 0.779,
        (2, 3) => 0.7577,
        (2, 4) => 0.8211,
        (2, 5) => 0.8418,
        (3, 4) => 0.770,
        (1, _) => 0.79,
        (2, 6) => 0.852,
        (2, _) => 0.865,
        (3, _) => 0.87,
        _ => 0.88,
    };

    private static double Term(int n) => RydbergHydrogen / ((n - 7e-6) * (n - 7e-6));

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
        // S(β) = w/(b + β^2.5), normalized to one over both sides. Holtsmark wings of the ions have w = 1.5, doubled by electrons in the far
        // wings only; where lines are half deep the effect of electrons is smaller (Edmonds, Schlüter & Wells 1967, MmRAS 71, 271).
        private const double Wing = 1.9;
        private static readonly double Core = Math.Pow(2.643 * Wing, 1 / 0.6);
        private readonly double _scale;
        private readonly double _smoothing;
        private readonly double _perScaleSquare;
        private readonly double _starkFactor;
        private readonly double _lorentz;

        public Line(int lower, int upper, Gas gas, double dopplerCm, double lnStep)
        {
            Center = Wavelength(lower, upper);
            var field = 1.25e-9 * Math.Pow(gas.ElectronDensity, 2.0 / 3);
            _scale = field * Scale(lower, upper);
            _perScaleSquare = 1 / (_scale * _scale);
            _starkFactor = Wing / _scale;
            var smoothing = Center * Math.Max(dopplerCm / Constants.LightSpeedCm, lnStep);
            _smoothing = smoothing * smoothing;
            _lorentz = CollisionWidth(gas, Center, lower, upper) / Math.PI;
            var excitation = 13.598 * (1 - (1.0 / (lower * lower)));
            var population = gas.NeutralHydrogen * lower * lower * Math.Exp(-excitation / (Constants.BoltzmannEv * gas.Temperature));
            var emission = 1 - Math.Exp(-Constants.SecondRadiation / (Center * gas.Temperature));
            var survival = HydrogenLevels.Survival(upper, gas.ElectronDensity);
            Strength = population * emission * survival * OscillatorStrength(lower, upper) * Constants.ClassicalCrossSection * 1e-8 * Center * Center;
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
            Math.Min(0.12 * Center, Math.Pow(Wing * Math.Pow(_scale, 1.5) / profile, 0.4) + Math.Sqrt(_lorentz / profile));

        private static double Scale(int lower, int upper)
        {
            if (lower <= 4 && upper - lower <= 3)
                return StarkScale[lower - 1][upper - lower - 1];
            double product = (double)lower * lower * upper * upper;
            return 5.5e-5 * product * product / ((upper * upper) - (lower * lower)) / (1 + (0.13 / (upper - lower)));
        }

        // Collisions with hydrogen atoms: cross-sections of Barklem, Piskunov & O'Mara 2000, A&A 363, 1091 (Hα 1180, Hβ 2320, Hγ 4208 atomic units);
        // for the Lyman lines the natural width is added.
        private static double CollisionWidth(Gas gas, double center, int lower, int upper)
        {
            const double squareBohr = 2.8003e-17;
            var cross = 1180 * Math.Pow(Math.Min(upper, 8) / 3.0, 2.5) * squareBohr;
            var speed = Math.Sqrt(8 * Constants.BoltzmannErg * gas.Temperature / (Math.PI * 0.504 * Constants.AtomicMassGram));
            var radians = (cross * speed * gas.NeutralHydrogenDensity) + (lower == 1 ? 3.1e8 : 0);
            return radians * center * center * 1e-8 / (2 * Math.PI * Constants.LightSpeedCm);
        }
    }
}
