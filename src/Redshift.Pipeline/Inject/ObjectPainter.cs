using Redshift.Physics.Stars;
using Redshift.Physics.Statistics;
using Redshift.Pipeline.Match.Models;
using Redshift.Pipeline.Results;

namespace Redshift.Pipeline.Inject;

/// <summary>
/// Draws objects that lie between the engine's models: temperatures, gravities and metallicities off its grid, populations of other stars
/// in other shares, line ratios and widths that scatter, dust. All ranges are broad round numbers, stated here and nowhere else.
/// </summary>
internal static class ObjectPainter
{
    /// <summary>Flux of nebular lines over that of H beta: Case B at 10⁴ K for hydrogen, else typical values, and how they scatter (ln).</summary>
    private static readonly (double RestA, double Ratio, double Scatter, int Ion)[] NebularLines =
    [
        (6564.608, 2.86, 0, 0), (4862.683, 1, 0, 0), (4341.684, 0.468, 0, 0), (4102.892, 0.259, 0, 0), (3971.195, 0.159, 0, 0),
        (12821.59, 0.163, 0, 0), (10941.09, 0.090, 0, 0), (18756.13, 0.339, 0, 0), (10052.13, 0.055, 0, 0),
        (3727.092, 1.0, 0.5, 1), (3729.875, 1.4, 0.5, 1), (5008.240, 1.8, 0.9, 2), (4960.295, 1.8 / 2.98, 0.9, 2),
        (6585.27, 0.6, 0.7, 3), (6549.86, 0.6 / 3.05, 0.7, 3), (6718.294, 0.5, 0.4, 4), (6732.674, 0.38, 0.4, 4),
        (3869.86, 0.25, 0.6, 5), (6302.046, 0.08, 0.6, 6), (6365.536, 0.08 / 3.1, 0.6, 6), (5877.243, 0.12, 0.2, 7), (10833.1, 0.3, 0.5, 8),
        (9533.2, 0.6, 0.4, 9), (9071.1, 0.6 / 2.47, 0.4, 9),
    ];

    private const int Ions = 10;

    /// <summary>Paints an object.</summary>
    /// <param name="kind">What it is.</param>
    /// <param name="z">Its redshift, which says how much gas lies in front.</param>
    /// <param name="light">Takes the light.</param>
    /// <param name="random">The stream of this object.</param>
    /// <returns>What was painted, in a few words.</returns>
    public static string Paint(ObjectKind kind, double z, RestLight light, RandomSource random) => kind switch
    {
        ObjectKind.Star => Star(light, random),
        ObjectKind.Galaxy => Galaxy(z, light, random),
        ObjectKind.Quasar => Quasar(z, light, random),
        _ => Nebula(light, random),
    };

    private static string Star(RestLight light, RandomSource random)
    {
        var star = DrawStar(random);
        light.AddStar(star, 1);
        light.Broaden(random.Uniform(0, star.TemperatureK > 7000 && star.LogGravity < 6 ? 80 : 12));
        light.Redden(random.Uniform(0, 1.5));
        return FormattableString.Invariant($"star of {star.TemperatureK:F0} K, log g {star.LogGravity:F1}, [M/H] {Math.Round(star.Metallicity, 1) + 0.0:F1}");
    }

    private static StellarParameters DrawStar(RandomSource random)
    {
        if (random.Chance(0.06)) return new(random.LogUniform(8000, 45000), 8, 0, StellarVariant.WhiteDwarfDA);
        var temperature = random.LogUniform(2700, 28000);
        var gravity = temperature < 7000 && random.Chance(0.35)
            ? Math.Clamp(2.8 + (temperature - 5000) / 700 + random.Normal(0, 0.4), 0.3, 3.4)
            : random.Uniform(temperature < 4000 ? 4.6 : 3.8, 5.0);
        return new(temperature, gravity, random.Uniform(-1.6, 0.4));
    }

    private static string Galaxy(double z, RestLight light, RandomSource random)
    {
        // Old populations have not had the time to be at high redshift.
        var sort = random.Index(3) is var drawn && z > 1.8 ? 2 : drawn;
        var metallicity = random.Uniform(-0.7, 0.3);
        var young = sort switch { 0 => 0, 1 => random.Uniform(0.5, 0.9), _ => random.Uniform(0.4, 0.9) };
        if (young > 0) light.AddStar(new(sort == 1 ? random.LogUniform(7000, 13000) : random.LogUniform(11000, 38000), random.Uniform(3.8, 4.2), metallicity), young);
        light.AddStar(new(random.Uniform(5300, 6400), random.Uniform(4.1, 4.6), metallicity), 0.4 * (1 - young));
        light.AddStar(new(random.Uniform(4200, 5100), random.Uniform(2, 3), metallicity), 0.4 * (1 - young));
        light.AddStar(new(random.Uniform(3500, 4200), random.Uniform(0.6, 1.8), metallicity), 0.2 * (1 - young));
        light.Broaden(random.Uniform(90, 280));
        light.Redden(random.Uniform(0, 1.2));
        if (sort == 2) AddGas(z, light, random);
        light.PutBehindForest(z, random);
        return sort switch { 0 => "old galaxy", 1 => "galaxy of middle age", _ => "star-forming galaxy" };
    }

    private static void AddGas(double z, RestLight light, RandomSource random)
    {
        var absorption = random.Uniform(0.4, 1.4);
        var outflow = 1 + random.Normal(-150, 80) / Physics.Units.Velocity.SpeedOfLightKmS;
        foreach (var (rest, width) in InterstellarAbsorption.Lines) light.Absorb(rest * outflow, absorption * random.Scatter(0.3) * width, 200);
        AddNebularLines(light, random.LogUniform(2, 60), random.Uniform(50, 180), random);
        // Radiative transfer leaves the red side of Lyman alpha, some hundred km/s off.
        if (z > 1.5 && random.Chance(0.5)) light.AddLineOn(light.Flux, 1215.67 * (1 + random.Uniform(100, 500) / Physics.Units.Velocity.SpeedOfLightKmS), random.LogUniform(5, 90), 170);
    }

    private static void AddNebularLines(RestLight light, double widthOfHBetaA, double sigmaKmS, RandomSource random)
    {
        // Lines of one ion keep their ratio, which atomic physics fixes; dust dims the blue ones.
        double[] factor = [.. Enumerable.Range(0, Ions).Select(_ => random.Normal())];
        var dust = random.Uniform(0, 1.5);
        foreach (var (rest, ratio, scatter, ion) in NebularLines)
        {
            var passed = Math.Exp(-dust * (Math.Pow(rest / 4862.683, -1.2) - 1));
            light.AddLine(rest, widthOfHBetaA * ratio * Math.Exp(scatter * factor[ion]) * passed, sigmaKmS);
        }
    }

    private static string Quasar(double z, RestLight light, RandomSource random)
    {
        light.AddPowerLaw(random.Normal(-1.5, 0.4));
        light.Redden(random.Exponential(0.15));
        var continuum = (float[])light.Flux.Clone();
        double broad = random.LogUniform(700, 3800), narrow = random.Uniform(120, 320);
        foreach (var group in QuasarLines.Winds[random.Chance(0.25) ? 1 : 0].Groups.Where(g => !random.Chance(g.Absent)))
        {
            var width = group.Mean > 0 ? group.Mean * random.Scatter(0.5) : group.Spread * Math.Abs(random.Normal());
            var sigma = (group.Broad ? broad : narrow) * random.Scatter(0.15);
            var shift = 1 + (group.Broad ? random.Normal(0, 250) : 0) / Physics.Units.Velocity.SpeedOfLightKmS;
            foreach (var line in group.Lines)
                light.AddLineOn(continuum, line.RestA * shift, width * line.Share, Math.Sqrt(sigma * sigma + line.WidthKmS * line.WidthKmS));
        }

        light.PutBehindForest(z, random);
        return FormattableString.Invariant($"quasar, broad lines {2.355 * broad:F0} km/s");
    }

    private static string Nebula(RestLight light, RandomSource random)
    {
        light.AddPowerLaw(random.Uniform(-1, 0));
        AddNebularLines(light, random.LogUniform(30, 1000), random.Uniform(5, 30), random);
        return "nebula";
    }
}
