using Redshift.Physics.Statistics;

namespace Redshift.Pipeline.Inject;

/// <summary>What was recovered of a group of injections.</summary>
/// <param name="Name">Which group.</param>
/// <param name="Members">The injections, at least one.</param>
public sealed record RecoveryGroup(string Name, IReadOnlyList<Injection> Members)
{
    /// <summary>What the group spans in the quantity that it is grouped by; both alike for a single value, infinite where it is open.</summary>
    public (double From, double To) Range { get; init; }

    /// <summary>Right redshifts.</summary>
    public int Good => Members.Count(m => m.IsGood);

    /// <summary>Answers that were likely or firm.</summary>
    public int Confident => Members.Count(m => m.IsConfident);

    /// <summary>Right redshifts that were likely or firm.</summary>
    public int GoodConfident => Members.Count(m => m.IsConfident && m.IsGood);

    /// <summary>Share of right redshifts.</summary>
    public double GoodShare => (double)Good / Members.Count;

    /// <summary>Share of all that got a right redshift which was likely or firm.</summary>
    public double Completeness => (double)GoodConfident / Members.Count;

    /// <summary>Share of right ones among the likely and firm; null without any.</summary>
    public double? Purity => Confident == 0 ? null : (double)GoodConfident / Confident;

    /// <summary>Normalised median absolute deviation of right redshifts in km/s; null without any.</summary>
    public double? NmadKmS => Width(m => m.OffsetKmS);

    /// <summary>The same of error over stated error: 1 where stated errors are true.</summary>
    public double? PullWidth => Width(m => m.Pull);

    /// <summary>Joins neighbours until each has a least number of members, for shares of few swing by chance.</summary>
    public static IReadOnlyList<RecoveryGroup> Joined(IEnumerable<RecoveryGroup> groups, int least) =>
        Neighbours.Join(groups, group => group.Members.Count, (group, next) => group.With(next), least);

    private RecoveryGroup With(RecoveryGroup next) =>
        new($"{Name} and {next.Name}", [.. Members, .. next.Members]) { Range = (Range.From, next.Range.To) };

    private double? Width(Func<Injection, double?> value)
    {
        double[] values = [.. Members.Where(m => m.IsGood).Select(value).OfType<double>()];
        return values.Length < 3 ? null : Measures.RobustWidth(values);
    }
}
