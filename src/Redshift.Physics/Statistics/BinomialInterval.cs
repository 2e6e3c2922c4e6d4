namespace Redshift.Physics.Statistics;

/// <summary>How well a share is known from counts.</summary>
public static class BinomialInterval
{
    /// <summary>
    /// Score interval of a binomial share; unlike share ± σ it stays within 0 and 1 and says something also when all or none succeed.
    /// Reference: E. B. Wilson, J. Am. Statist. Assoc. 22, 209 (1927).
    /// </summary>
    /// <param name="successes">Successes, 0 to <paramref name="trials"/>.</param>
    /// <param name="trials">Trials, at least one.</param>
    /// <param name="sigmas">Width: 1 for 68 %, 1.96 for 95 %.</param>
    /// <returns>Both ends.</returns>
    /// <exception cref="ArgumentOutOfRangeException">No trial, or successes that are none of the trials.</exception>
    public static (double Low, double High) Wilson(int successes, int trials, double sigmas = 1)
    {
        ArgumentOutOfRangeException.ThrowIfLessThan(trials, 1);
        ArgumentOutOfRangeException.ThrowIfNegative(successes);
        ArgumentOutOfRangeException.ThrowIfGreaterThan(successes, trials);
        double share = (double)successes / trials, square = sigmas * sigmas / trials;
        var centre = (share + (square / 2)) / (1 + square);
        var half = Math.Sqrt((share * (1 - share) * square) + (square * square / 4)) / (1 + square);
        return (Math.Max(0, centre - half), Math.Min(1, centre + half));
    }
}
