using Redshift.Physics.Statistics;
using Redshift.Simulation.Atoms;
using Redshift.Simulation.Light;

namespace Redshift.Simulation.Sources.Stars;

/// <summary>White dwarfs, emission-line stars, carbon stars.</summary>
internal static class OddStars
{
    /// <summary>Hydrogen white dwarf: Balmer lines of 15–35 Å, broad, gone above H9.</summary>
    public static Canvas HydrogenWhiteDwarf(LogGrid grid, double z, RandomSource random)
    {
        var temperature = random.LogUniform(7500, 50000);
        var canvas = new Canvas(grid).Fill(Continuum.Law(new(Math.Max(temperature, 12500), 8, 0, 0)));
        var strongest = 42 * Math.Exp(-Math.Pow(Math.Log(temperature / 13500) / 0.75, 2) / 2) * random.Scatter(0.12);
        double[] shares = [0.75, 1, 0.95, 0.8, 0.5, 0.25, 0.08];
        for (var i = 0; i < shares.Length; i++)
            canvas.Absorb(Balmer.Wavelengths[i], 900, strongest * shares[i], 0.6 - (0.03 * i), Profile.Stark);
        canvas.Absorb(Balmer.LymanWavelengths[0], 1500, strongest * 2, 0.9, Profile.Lorentzian);
        return canvas;
    }

    /// <summary>Helium white dwarf.</summary>
    public static Canvas HeliumWhiteDwarf(LogGrid grid, double z, RandomSource random)
    {
        var canvas = new Canvas(grid).Fill(Continuum.Law(new(random.Uniform(12500, 30000), 8, 0, 0)));
        var strength = random.Uniform(5, 14);
        foreach (var line in HotLine.All.Where(line => line.Species == "He I"))
            canvas.Absorb(line.Vacuum, 700, line.PeakWidth * strength * random.Scatter(0.15), 0.45, Profile.Lorentzian);
        return canvas;
    }

    /// <summary>B star with a disc: Hα and its sisters in double-peaked emission.</summary>
    public static Canvas Disc(LogGrid grid, double z, RandomSource random)
    {
        var canvas = Photosphere.Draw(grid, new(random.Uniform(11000, 30000), 3.8, 0, random.Uniform(100, 350)), random);
        var rotation = random.Uniform(60, 300);
        var width = random.LogUniform(4, 60);
        double[] shares = [1, 0.12, 0.045, 0.02];
        for (var i = 0; i < shares.Length; i++)
            DoublePeak(canvas, Balmer.Wavelengths[i], rotation, width * shares[i] * (canvas.At(Balmer.Wavelengths[i]) ?? 0), random);
        DoublePeak(canvas, 5877.243, rotation, 0.02 * width * (canvas.At(5877.243) ?? 0), random);
        var reddening = random.Exponential(0.15);
        return canvas.FilterSlowly(wavelength => Dust.Transmission(Dust.Galactic(wavelength), reddening));
    }

    /// <summary>Red dwarf with chromospheric emission.</summary>
    public static Canvas Flaring(LogGrid grid, double z, RandomSource random)
    {
        var canvas = Photosphere.Draw(grid, new(random.Uniform(2800, 3700), 4.9, 0, random.Exponential(15)), random);
        var width = random.LogUniform(1.5, 12);
        double[] shares = [1, 1.2, 1.1, 1, 0.9, 0.8, 0.6];
        for (var i = 0; i < shares.Length; i++)
            canvas.Emit(Balmer.Wavelengths[i], 30, width * shares[i] * random.Scatter(0.2) * (canvas.At(Balmer.Wavelengths[i]) ?? 0));
        canvas.Emit(3934.777, 20, 1.5 * width * (canvas.At(3960) ?? 0));
        canvas.Emit(3969.591, 20, 1.2 * width * (canvas.At(3960) ?? 0));
        return canvas;
    }

    // Heads of the Swan bands of C2 (air, degraded to the violet) with scales and strengths.
    private static readonly (double Head, double Tail, double Strength)[] Swan =
    [
        (4382, 60, 0.4), (4737.1, 110, 1), (4715, 60, 0.4), (5165.2, 140, 1.3), (5129, 70, 0.5), (5635.5, 130, 0.9), (5585, 70, 0.4), (6191, 110, 0.4), (6122, 60, 0.25),
    ];

    /// <summary>Carbon star: C2 and CN instead of oxides.</summary>
    public static Canvas Carbon(LogGrid grid, double z, RandomSource random)
    {
        var canvas = Photosphere.Draw(grid, new(random.Uniform(3950, 5000), 1.8, -0.4, 5), random);
        var strength = random.Uniform(0.5, 1.6);
        foreach (var band in SwanBands())
            Molecules.Absorb(canvas, band, strength * band.Strength * random.Scatter(0.15));
        foreach (var (head, tail) in ((double, double)[])[(6925, 110), (7088, 90), (7876, 150), (8067, 120), (9140, 170), (4215.9, 80), (3883.4, 50)])
            Molecules.Absorb(canvas, new("CN", Air.ToVacuum(head), tail, 1, head > 5000), 0.5 * strength * random.Scatter(0.2));
        var reddening = random.Exponential(0.2);
        return canvas.FilterSlowly(wavelength => Dust.Transmission(Dust.Galactic(wavelength), reddening));
    }

    /// <summary>The bands of C2, which carbon stars absorb and comets emit.</summary>
    public static IEnumerable<Band> SwanBands() =>
        Swan.Select(band => new Band("C2", Air.ToVacuum(band.Head), band.Tail, band.Strength, Redwards: false));

    private static void DoublePeak(Canvas canvas, double wavelength, double rotationKmS, double area, RandomSource random)
    {
        var imbalance = random.Uniform(0.4, 0.6);
        var offset = wavelength * rotationKmS / 2 / LogGrid.C;
        canvas.Emit(wavelength - offset, 0.45 * rotationKmS, imbalance * area);
        canvas.Emit(wavelength + offset, 0.45 * rotationKmS, (1 - imbalance) * area);
    }
}
