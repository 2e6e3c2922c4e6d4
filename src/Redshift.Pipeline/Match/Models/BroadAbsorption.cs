using Redshift.Physics.Units;
using Redshift.Pipeline.Results;

namespace Redshift.Pipeline.Match.Models;

/// <summary>A quasar continuum behind a broad outflow: troughs 3,000–12,000 km/s blueward of N V, Si IV and C IV (Weymann et al. 1991, ApJ 373, 23).</summary>
internal static class BroadAbsorption
{
    private const double KmSPerLn = Velocity.SpeedOfLightKmS;

    private static readonly (double RestA, double Depth)[] Lines = [(1240.8, 0.7), (1396.8, 0.45), (1549.1, 0.7)];

    public static Template Template { get; } = new("broad absorption", ObjectKind.Quasar, Compute());

    private static float[] Compute()
    {
        var flux = new float[TemplateGrid.Count];
        Array.Fill(flux, 1f);
        foreach (var (rest, depth) in Lines)
            for (var i = 0; i < flux.Length; i++)
            {
                var velocity = (TemplateGrid.LnStart + i * TemplateGrid.Step - Math.Log(rest)) * KmSPerLn;
                var u = (velocity + 7000) / 2600;
                if (Math.Abs(u) < 4) flux[i] *= (float)(1 - depth * Math.Exp(-0.5 * u * u));
            }

        return flux;
    }
}
