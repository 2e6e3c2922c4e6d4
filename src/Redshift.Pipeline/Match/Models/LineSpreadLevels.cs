using Redshift.Physics.Units;

namespace Redshift.Pipeline.Match.Models;

/// <summary>
/// The ladder of line widths to which templates are broadened: σ in ln λ in steps of a sixth,
/// so that the nearest is never more than 8 % off, less than files state their resolution to.
/// </summary>
internal static class LineSpreadLevels
{
    public const int Count = 36;

    private const double Smallest = 12 / Velocity.SpeedOfLightKmS;
    private const double Ratio = 1.1666666666666667;
    private static readonly double LogRatio = Math.Log(Ratio);

    /// <summary>σ of a level.</summary>
    public static double Sigma(int level) => Smallest * Math.Pow(Ratio, level);

    /// <summary>The level nearest to σ.</summary>
    public static int Nearest(double sigma) =>
        sigma <= Smallest ? 0 : Math.Min(Count - 1, (int)Math.Round(Math.Log(sigma / Smallest) / LogRatio));
}
