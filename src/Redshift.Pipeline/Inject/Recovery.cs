using Redshift.Physics.Statistics;
using Redshift.Pipeline.Report;
using Redshift.Pipeline.Results;

namespace Redshift.Pipeline.Inject;

/// <summary>What was recovered, by signal to noise, redshift and kind, and whether confidences were true.</summary>
/// <param name="injections">The injections, at least one.</param>
public sealed class Recovery(IReadOnlyList<Injection> injections)
{
    private static readonly double[] RedshiftEdges = [0, 0.2, 0.5, 1, 2, 3, 4, 5];

    /// <summary>All of them.</summary>
    public RecoveryGroup All { get; } = new("all", injections);

    /// <summary>By the rungs of signal to noise, low to high.</summary>
    public IReadOnlyList<RecoveryGroup> BySnr { get; } =
        [.. injections.GroupBy(i => i.Snr).OrderBy(g => g.Key)
            .Select(g => new RecoveryGroup(FormattableString.Invariant($"S/N {g.Key}"), [.. g]) { Range = (g.Key, g.Key) })];

    /// <summary>By kind.</summary>
    public IReadOnlyList<RecoveryGroup> ByKind { get; } =
        [.. injections.GroupBy(i => i.Kind).OrderBy(g => g.Key).Select(g => new RecoveryGroup(Words.Of(g.Key), [.. g]))];

    /// <summary>By redshift, objects of our Galaxy left out.</summary>
    public IReadOnlyList<RecoveryGroup> ByRedshift { get; } =
    [
        .. injections.Where(i => i.Kind is ObjectKind.Galaxy or ObjectKind.Quasar)
            .GroupBy(i => Array.FindLastIndex(RedshiftEdges, edge => i.Z >= edge)).OrderBy(g => g.Key)
            .Select(g => new RecoveryGroup(RangeName(g.Key), [.. g]) { Range = Range(g.Key) }),
    ];

    /// <summary>Stated against found probability of the answers that have a redshift.</summary>
    public IReadOnlyList<ReliabilityBin> Reliability => ReliabilityOf(1);

    /// <summary>The same with neighbouring ranges joined until each has a least number of answers.</summary>
    public IReadOnlyList<ReliabilityBin> ReliabilityOf(int least) =>
        Physics.Statistics.Reliability.Table(injections.Where(i => i.FoundZ is not null).Select(i => i.Forecast), least);

    private static (double From, double To) Range(int bin) => (
        bin < 0 ? double.NegativeInfinity : RedshiftEdges[bin],
        bin + 1 < RedshiftEdges.Length ? RedshiftEdges[bin + 1] : double.PositiveInfinity);

    private static string RangeName(int bin) => Range(bin) switch
    {
        (double.NegativeInfinity, _) => "z < 0",
        (var from, double.PositiveInfinity) => FormattableString.Invariant($"z > {from}"),
        var (from, to) => FormattableString.Invariant($"z {from} to {to}"),
    };
}
