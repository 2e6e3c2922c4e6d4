using System.Runtime.Intrinsics;
using Redshift.Pipeline.Numerics;

namespace Redshift.Pipeline.Match.Models;

/// <summary>
/// <see cref="HalfNormalEvidence"/> for eight redshifts at once, for the search, which needs it some hundred thousand times a spectrum.
/// Good to a thousandth, far below what separates peaks.
/// </summary>
internal sealed class GroupEvidence(EmissionGroup group)
{
    /// <summary>Beyond this ½x² nothing but the square itself counts, and the exponential would overflow.</summary>
    private const float Overwhelming = 60;

    private readonly float _mean = (float)group.Mean;
    private readonly float _spread = (float)group.Spread;
    private readonly float _absent = (float)group.Absent;
    private readonly float _present = (float)((1 - group.Absent) / (RiseAt(group.Mean / group.Spread)));

    /// <summary>ln evidence of the group.</summary>
    /// <param name="gradient">Data against the group.</param>
    /// <param name="curvature">The group against itself.</param>
    /// <param name="level">Continuum that the equivalent widths refer to.</param>
    public Vector256<float> LnMixture(Vector256<float> gradient, Vector256<float> curvature, Vector256<float> level)
    {
        var spread = level * _spread;
        var precision = Vector256<float>.One / (spread * spread);
        var root = Vector256.Sqrt(curvature + precision);
        var x = (gradient + level * _mean * precision) / root;
        var positive = Vector256.Max(x, Vector256<float>.Zero);
        var half = positive * positive * 0.5f;
        var kept = Vector256.Min(half, Vector256.Create(Overwhelming));
        var fall = Fall(Vector256.Abs(x));
        var rise = Vector256.ConditionalSelect(Vector256.LessThan(x, Vector256<float>.Zero), fall, VectorMath.Exp(kept) - fall);
        return VectorMath.Ln(Vector256.Create(_absent) + rise * _present / (root * spread)) + (half - kept);
    }

    /// <summary>Φ(x)·exp(x²/2), Φ being the normal distribution's share below x.</summary>
    private static double RiseAt(double x) => Math.Exp(HalfNormalEvidence.LnTail(x) + 0.5 * x * x);

    /// <summary>Φ(−y)·exp(y²/2) of y ≥ 0: a rational function with the right limit 1/(y√2π), fitted to 4e-4.</summary>
    private static Vector256<float> Fall(Vector256<float> y)
    {
        var above = Vector256.Create(0.500178f) + y * (Vector256.Create(0.314434f) + y * 0.0805678f);
        var below = Vector256<float>.One + y * (Vector256.Create(1.431009f) + y * (Vector256.Create(0.789072f) + y * 0.2019536f));
        return above / below;
    }
}
