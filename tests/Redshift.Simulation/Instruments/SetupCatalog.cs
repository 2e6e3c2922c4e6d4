using Redshift.Physics.Statistics;

namespace Redshift.Simulation.Instruments;

/// <summary>The kinds of spectrograph, each drawn with the variety found among real ones.</summary>
internal static class SetupCatalog
{
    public static IReadOnlyDictionary<string, Func<RandomSource, Setup>> All { get; } = new Dictionary<string, Func<RandomSource, Setup>>
    {
        ["fibre"] = Fibre,
        ["fibre-stars"] = FibreStars,
        ["three-arms"] = ThreeArms,
        ["faint-slit"] = FaintSlit,
        ["near-infrared"] = NearInfrared,
        ["two-arms"] = TwoArms,
        ["amateur"] = Amateur,
        ["amateur-high"] = AmateurHigh,
        ["ultraviolet"] = Ultraviolet,
        ["course"] = Course,
        ["echelle"] = Echelle,
    };

    private static Setup Fibre(RandomSource random)
    {
        var r = random.Uniform(1800, 2200);
        return new()
        {
            Name = "fibre",
            Arms = [LogArm("", random.Uniform(3560, 3850), random.Uniform(9200, 10400), 69, r)],
            Snr = (5, 0.9, 0.3, 60),
            Sky = random.LogUniform(0.3, 6),
            Hits = 0.15,
            SkyRemains = random.LogUniform(0.5, 5),
            ErrorScale = SmallErrorOfErrors(random),
            Resampled = random.Chance(0.5),
            GapChance = 0.03,
            TelluricCorrected = true,
            Wings = random.Uniform(0, 0.06),
            Waves = random.Uniform(0.005, 0.05),
            FluxUnit = random.LogUniform(0.5, 30),
        };
    }

    private static Setup FibreStars(RandomSource random) => new()
    {
        Name = "fibre-stars",
        Arms = [LogArm("", random.Uniform(3690, 3750), random.Uniform(8900, 9100), 69, random.Uniform(1500, 1900))],
        Snr = (22, 0.8, 3, 200),
        Sky = random.LogUniform(0.03, 1),
        SkyRemains = random.LogUniform(0.5, 5),
        ErrorScale = random.Chance(0.5) ? random.Uniform(0.5, 1.6) : 1,
        Resampled = true,
        GapChance = 0.03,
        Waves = random.Uniform(0.02, 0.12),
        ZeroPointKmS = 5,
        Wings = random.Uniform(0, 0.06),
        Normalised = random.Chance(0.1),
        FluxUnit = random.LogUniform(50, 5000),
    };

    private static Setup ThreeArms(RandomSource random)
    {
        var r = random.Uniform(0.85, 1.15);
        return new()
        {
            Name = "three-arms",
            Arms =
            [
                LinearArm("B", 3600, 5800, 0.8, 1.8 / r),
                LinearArm("R", 5760, 7620, 0.8, 1.7 / r),
                LinearArm("Z", 7520, 9824, 0.8, 1.8 / r),
            ],
            Snr = (2.5, 1, 0.3, 40),
            Sky = random.LogUniform(0.5, 8),
            Hits = 0.15,
            SkyRemains = random.LogUniform(0.5, 5),
            ErrorScale = SmallErrorOfErrors(random),
            TelluricCorrected = true,
            Waves = random.Uniform(0.005, 0.03),
            FluxUnit = random.LogUniform(0.3, 20),
        };
    }

    private static Setup FaintSlit(RandomSource random)
    {
        var dispersion = random.Chance(0.7) ? random.Uniform(4.8, 5.3) : random.Uniform(2.5, 7);
        return new()
        {
            Name = "faint-slit",
            Arms = [LinearArm("", random.Uniform(4750, 5300), random.Uniform(9300, 10200), dispersion, dispersion * random.Uniform(2, 2.8))],
            Snr = (2.2, 0.7, 0.4, 15),
            Sky = random.LogUniform(3, 30),
            SkyRemains = random.LogUniform(0.5, 5),
            ErrorScale = random.Chance(0.4) ? random.Uniform(0.5, 3) : random.Uniform(0.9, 1.15),
            Resampled = random.Chance(0.7),
            TelluricCorrected = random.Chance(0.5),
            StatesResolution = random.Chance(0.3),
            Air = random.Chance(0.5),
            DeadEnds = random.Chance(0.5) ? random.Exponential(0.03) : 0,
            Hits = 1.5,
            Masked = 0.002,
            ZeroPointKmS = 30,
            BendKmS = 20,
            Waves = random.Uniform(0.02, 0.08),
            FluxUnit = random.LogUniform(1e-19, 1e-17),
        };
    }

    private static Setup NearInfrared(RandomSource random)
    {
        var r = random.LogUniform(500, 4000);
        var (from, to) = random.Index(4) switch
        {
            0 => (9900.0, 24000.0),
            1 => (11000.0, 18000.0),
            2 => (14600.0, 24000.0),
            _ => (9700.0, 13500.0),
        };
        var pixels = random.Uniform(2, 3.5);
        var middle = 0.5 * (from + to);
        return new()
        {
            Name = "near-infrared",
            Arms = [new("", from, to, Sampling.Linear, middle / r / pixels, middle / r, random.Chance(0.5))],
            Snr = (4, 0.8, 0.4, 60),
            Sky = random.LogUniform(0.3, 10),
            SkyRemains = random.LogUniform(0.5, 5),
            ErrorScale = random.Chance(0.4) ? random.Uniform(0.5, 3) : random.Uniform(0.9, 1.15),
            Resampled = random.Chance(0.7),
            TelluricCorrected = random.Chance(0.9),
            Water = random.LogUniform(0.4, 2.5),
            StatesResolution = random.Chance(0.5),
            Hits = 2,
            Masked = 0.01,
            GapChance = 0.1,
            ZeroPointKmS = 15,
            Waves = random.Uniform(0.02, 0.1),
            FluxUnit = random.LogUniform(1e-19, 1e-16),
        };
    }

    private static Setup TwoArms(RandomSource random)
    {
        var binning = random.Uniform(1, 2.5);
        return new()
        {
            Name = "two-arms",
            Arms =
            [
                LogArm("VIS", 5600, 10200, 10 * binning, random.Uniform(5000, 8900)),
                LogArm("NIR", random.Uniform(9950, 10300), 24000, 14 * binning, random.Uniform(4500, 7500)),
            ],
            Snr = (5, 0.8, 0.5, 40),
            Sky = random.LogUniform(0.3, 8),
            SkyRemains = random.LogUniform(0.5, 5),
            ErrorScale = SmallErrorOfErrors(random),
            Resampled = random.Chance(0.5),
            TelluricCorrected = true,
            Water = random.LogUniform(0.4, 2),
            Hits = 1,
            Masked = 0.01,
            FluxUnit = random.LogUniform(1e-18, 1e-16),
        };
    }

    private static Setup Amateur(RandomSource random)
    {
        var fwhm = 5500 / random.LogUniform(300, 1100);
        return new()
        {
            Name = "amateur",
            Arms = [LinearArm("", random.Uniform(3700, 4100), random.Uniform(6800, 7800), fwhm / random.Uniform(2.2, 5), fwhm)],
            Snr = (50, 0.8, 5, 200),
            HasErrors = false,
            StatesResolution = random.Chance(0.3),
            Air = true,
            Sky = random.LogUniform(0.01, 0.4),
            SkyRemains = random.LogUniform(0.5, 5),
            Town = random.Uniform(0, 1),
            Water = random.LogUniform(1, 6),
            Waves = random.LogUniform(0.02, 0.2),
            ZeroPointKmS = 30,
            BendKmS = 20,
            Resampled = true,
            Hits = 0.3,
            Masked = 0,
            Wings = random.Uniform(0, 0.15),
            Uncalibrated = random.Chance(0.25),
            Normalised = random.Chance(0.2),
            FluxUnit = random.Chance(0.6) ? 1 : random.LogUniform(1e-13, 1e4),
        };
    }

    private static Setup AmateurHigh(RandomSource random)
    {
        var r = random.Uniform(8000, 17000);
        var (from, to) = random.Index(5) switch
        {
            0 => (6450.0, 6700.0),
            1 => (6500.0, 6640.0),
            2 => (6470.0, 6720.0),
            3 => (4400.0, 4600.0),
            _ => (5830.0, 5970.0),
        };
        var fwhm = 0.5 * (from + to) / r;
        return new()
        {
            Name = "amateur-high",
            Arms = [LinearArm("", from, to, fwhm / random.Uniform(2.5, 6), fwhm)],
            Snr = (70, 0.7, 10, 200),
            HasErrors = false,
            StatesResolution = random.Chance(0.3),
            Air = true,
            Sky = 0.01,
            Water = random.LogUniform(1, 6),
            Waves = random.LogUniform(0.005, 0.05),
            ZeroPointKmS = 2,
            BendKmS = 1,
            Resampled = true,
            Hits = 0.3,
            Masked = 0,
            Normalised = random.Chance(0.6),
            FluxUnit = random.Chance(0.7) ? 1 : random.LogUniform(1e-12, 1e5),
        };
    }

    private static Setup Ultraviolet(RandomSource random)
    {
        var low = random.Chance(0.5);
        var (from, to, fwhm) = random.Index(3) switch
        {
            0 => (1150.0, 1780.0, 0.1),
            1 => (1160.0, 3180.0, 1.5),
            _ => (1650.0, 3180.0, 2.0),
        };
        fwhm *= low ? 6 : 2;
        return new()
        {
            Name = "ultraviolet",
            Arms = [LinearArm("", from, to, fwhm / random.Uniform(1.5, 3), fwhm)],
            Snr = (6, 0.8, 0.5, 80),
            OnGround = false,
            Sky = 0.05,
            ReadNoise = 0.4,
            ErrorScale = random.Chance(0.4) ? random.Uniform(0.7, 2) : 1,
            StatesResolution = random.Chance(0.5),
            ZeroPointKmS = 20,
            Masked = 0.003,
            Hits = 0,
            GapChance = 0.1,
            FluxUnit = random.LogUniform(1e-17, 1e-13),
        };
    }

    private static Setup Course(RandomSource random)
    {
        var fwhm = random.Uniform(3, 9);
        return new()
        {
            Name = "course",
            Arms = [LinearArm("", random.Uniform(3500, 4200), random.Uniform(6500, 8500), fwhm / random.Uniform(2, 3.5), fwhm)],
            Snr = (25, 0.9, 3, 200),
            HasErrors = random.Chance(0.4),
            StatesResolution = random.Chance(0.3),
            Air = true,
            Sky = random.LogUniform(0.05, 2),
            SkyRemains = random.LogUniform(0.5, 5),
            Town = random.Uniform(0, 0.6),
            Water = random.LogUniform(0.7, 3),
            ErrorScale = random.Uniform(0.5, 3),
            Waves = random.LogUniform(0.02, 0.12),
            ZeroPointKmS = 25,
            BendKmS = 15,
            Resampled = random.Chance(0.8),
            Hits = 1,
            Uncalibrated = random.Chance(0.3),
            FluxUnit = random.LogUniform(1e-16, 1e3),
        };
    }

    // Orders of one grating equation m λ = const overlap in the blue and nearly part in the red; each has its own blaze.
    private static Setup Echelle(RandomSource random)
    {
        var r = random.Uniform(9000, 14000);
        var orders = Enumerable.Range(33, 18).Reverse().Select(order => (Order: order, Blaze: 224000.0 / order));
        return new()
        {
            Name = "echelle",
            Arms =
            [
                .. from order in orders
                   let span = 1.15 * order.Blaze / order.Order
                   select LinearArm($"order {order.Order}", order.Blaze - (span / 2), order.Blaze + (span / 2), order.Blaze / r / 2.6, order.Blaze / r),
            ],
            Snr = (30, 0.8, 4, 150),
            StatesResolution = random.Chance(0.5),
            Air = random.Chance(0.6),
            Sky = 0.02,
            Water = random.LogUniform(1, 4),
            Waves = random.Uniform(0.02, 0.1),
            ZeroPointKmS = 0.5,
            BendKmS = 0.5,
            Resampled = random.Chance(0.6),
            Uncalibrated = random.Chance(0.5),
            FluxUnit = random.LogUniform(1, 1e4),
        };
    }

    private static double SmallErrorOfErrors(RandomSource random) =>
        random.Chance(0.15) ? random.Uniform(0.5, 3) : random.Uniform(0.92, 1.12);

    private static Arm LogArm(string label, double from, double to, double pixelKmS, double r)
    {
        var middle = 0.5 * (from + to);
        return new(label, from, to, Sampling.Logarithmic, middle * pixelKmS / Light.LogGrid.C, middle / r, ConstantR: true);
    }

    private static Arm LinearArm(string label, double from, double to, double pixelA, double fwhmA) =>
        new(label, from, to, Sampling.Linear, pixelA, fwhmA, ConstantR: false);
}
