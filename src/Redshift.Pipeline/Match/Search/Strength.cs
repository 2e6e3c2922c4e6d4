using System.Runtime.Intrinsics;
using Redshift.Pipeline.Numerics;

namespace Redshift.Pipeline.Match.Search;

/// <summary>Marginal likelihood of a template's strength with a normal prior about 1, over that of strength zero.</summary>
internal static class Strength
{
    /// <summary>A computed spectrum should appear at its own strength; the prior σ allows for mixtures, veiling and wrong metallicity.</summary>
    public const float Spread = 0.35f;

    /// <summary>ln evidence of eight templates.</summary>
    /// <param name="gradient">Data against template.</param>
    /// <param name="curvature">Template against itself.</param>
    /// <param name="precision">1/σ² of the prior.</param>
    public static Vector256<float> LnEvidence(Vector256<float> gradient, Vector256<float> curvature, Vector256<float> precision)
    {
        Vector256<float> m = curvature + precision, v = gradient + precision;
        return (v * v / m - precision - VectorMath.Ln(m / precision)) * 0.5f;
    }
}
