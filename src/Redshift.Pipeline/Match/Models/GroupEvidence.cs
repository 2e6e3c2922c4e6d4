using System.Runtime.CompilerServices;

namespace Redshift.Pipeline.Match.Models;

/// <summary>
/// <see cref="HalfNormalEvidence"/> from tables, for the search, which needs it some hundred thousand times a spectrum.
/// Linear interpolation is good to a few thousandths, far below what separates peaks.
/// </summary>
internal sealed class GroupEvidence
{
    private const float Lowest = -12;
    private const float Highest = 6;
    private const float PerUnit = 64;
    private const float MixtureReach = 20;
    private static readonly float[] LnMills = Tabulate(Lowest, Highest, x => HalfNormalEvidence.LnTail(x) + 0.5 * x * x);

    private readonly float[] _mixture;
    private readonly float _lnPresent;
    private readonly float _constant;
    private readonly float _mean;
    private readonly float _spread;

    public GroupEvidence(EmissionGroup group)
    {
        _mean = (float)group.Mean;
        _spread = (float)group.Spread;
        double ratio = group.Mean / group.Spread;
        _constant = (float)(-HalfNormalEvidence.LnTail(ratio) - 0.5 * ratio * ratio);
        _lnPresent = (float)Math.Log(1 - group.Absent);
        _mixture = Tabulate(-MixtureReach, MixtureReach, b => Math.Log(group.Absent + (1 - group.Absent) * Math.Exp(b)));
    }

    /// <summary>ln evidence of the group.</summary>
    /// <param name="gradient">Data against the group.</param>
    /// <param name="curvature">The group against itself.</param>
    /// <param name="level">Continuum that the equivalent widths refer to.</param>
    public float LnMixture(float gradient, float curvature, float level)
    {
        var spread = _spread * level;
        var precision = 1 / (spread * spread);
        var m = curvature + precision;
        var x = (gradient + _mean * level * precision) / MathF.Sqrt(m);
        var bayes = LnMillsAt(x) + _constant - 0.5f * FastLn(m * spread * spread);
        if (bayes >= MixtureReach) return bayes + _lnPresent;
        return bayes <= -MixtureReach ? _mixture[0] : Interpolate(_mixture, (bayes + MixtureReach) * PerUnit);
    }

    private static float LnMillsAt(float x)
    {
        if (x >= Highest) return 0.5f * x * x;
        // Mills' ratio far below: ln Φ(x) + x²/2 → −ln(−x√2π).
        return x <= Lowest ? -FastLn(-x * 2.5066283f) : Interpolate(LnMills, (x - Lowest) * PerUnit);
    }

    /// <summary>ln by exponent and a cubic in the mantissa, |error| &lt; 1e-3.</summary>
    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    private static float FastLn(float x)
    {
        var bits = BitConverter.SingleToInt32Bits(x);
        var exponent = (bits >> 23) - 127;
        var mantissa = BitConverter.Int32BitsToSingle((bits & 0x7FFFFF) | 0x3F800000) - 1;
        return 0.69314718f * (exponent + mantissa * (1.4249f + mantissa * (-0.5827f + mantissa * 0.1578f)));
    }

    private static float Interpolate(float[] table, float at)
    {
        var i = (int)at;
        return table[i] + (at - i) * (table[i + 1] - table[i]);
    }

    private static float[] Tabulate(double from, double to, Func<double, double> function)
    {
        var table = new float[(int)((to - from) * PerUnit) + 2];
        for (var i = 0; i < table.Length; i++) table[i] = (float)function(from + i / PerUnit);
        return table;
    }
}
