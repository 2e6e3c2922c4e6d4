using Redshift.Physics.Statistics;

namespace Redshift.Pipeline.Inject;

/// <summary>What was recovered of a group of injections.</summary>
/// <param name="Name">Which group.</param>
/// <param name="Members">The injections, at least one.</param>
public sealed record RecoveryGroup(string Name, IReadOnlyList<Injection> Members)
{
    /// <summary>Right redshifts.</summary>
    public int Good => Members.Count(m => m.IsGood);

    /// <summary>Answers that were likely or firm.</summary>
    public int Confident => Members.Count(m => m.IsConfident);

    /// <summary>Share of right redshifts.</summary>
    public double GoodShare => (double)Good / Members.Count;

    /// <summary>Share of all that got a right redshift which was likely or firm.</summary>
    public double Completeness => (double)Members.Count(m => m.IsConfident && m.IsGood) / Members.Count;

    /// <summary>Share of right ones among the likely and firm; null without any.</summary>
    public double? Purity => Confident == 0 ? null : (double)Members.Count(m => m.IsConfident && m.IsGood) / Confident;

    /// <summary>Normalised median absolute deviation of right redshifts in km/s; null without any.</summary>
    public double? NmadKmS => Width(m => m.OffsetKmS);

    /// <summary>The same of error over stated error: 1 where stated errors are true.</summary>
    public double? PullWidth => Width(m => m.Pull);

    private double? Width(Func<Injection, double?> value)
    {
        double[] values = [.. Members.Where(m => m.IsGood).Select(value).OfType<double>()];
        return values.Length < 3 ? null : Measures.RobustWidth(values);
    }
}
