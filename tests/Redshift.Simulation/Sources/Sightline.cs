using Redshift.Physics.Statistics;
using Redshift.Simulation.Light;

namespace Redshift.Simulation.Sources;

/// <summary>What intergalactic gas and our own Galaxy do to light from afar.</summary>
internal static class Sightline
{
    private const double Alpha = 1215.67;
    private const double Beta = 1025.72;
    private const double Limit = 911.75;

    /// <summary>Absorbs, on the rest-frame grid of an object at z.</summary>
    public static void Absorb(Canvas canvas, double z, RandomSource random)
    {
        if (canvas.Grid.Wavelength[0] < Alpha && z > 0.3)
            DrawForest(canvas, z, random);
        if (canvas.Grid.Wavelength[0] < Limit)
            DrawLimit(canvas, z, random);
        var foreground = random.Exponential(0.03);
        canvas.FilterSlowly(wavelength => Dust.Transmission(Dust.Galactic(wavelength * (1 + z)), foreground));
    }

    private static void DrawForest(Canvas canvas, double z, RandomSource random)
    {
        var persistence = Math.Exp(-canvas.Grid.StepKmS / random.Uniform(70, 130));
        var proximity = random.Uniform(300, 3000);
        var (alpha, beta) = (new Clouds(z, Alpha, proximity, persistence), new Clouds(z, Beta, proximity, persistence));
        for (var i = 0; i < canvas.Flux.Length && canvas.Grid.Wavelength[i] < Alpha; i++)
        {
            var wavelength = canvas.Grid.Wavelength[i];
            var depth = alpha.Depth(wavelength, random);
            if (wavelength < Beta)
                depth += 0.35 * beta.Depth(wavelength, random);
            canvas.Flux[i] *= Math.Exp(-depth);
        }
    }

    // The nearest cloud that is opaque to ionising light: about one a unit redshift at z = 2, more beyond.
    private static void DrawLimit(Canvas canvas, double z, RandomSource random)
    {
        var frame = 1 - (random.Exponential(0.35) / (1 + z));
        var depth = random.LogUniform(0.5, 20);
        canvas.Filter(wavelength => wavelength < Limit * frame ? Math.Exp(-depth * Math.Pow(wavelength / Limit / frame, 3)) : 1);
    }
}
