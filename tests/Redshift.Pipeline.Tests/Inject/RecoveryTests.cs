using Redshift.Pipeline.Inject;
using Redshift.Pipeline.Results;
using Xunit;

namespace Redshift.Pipeline.Tests.Inject;

public sealed class RecoveryTests
{
    private static readonly Injection[] Five =
    [
        Galaxy(0, 1.5, 0.5, offsetKmS: -30, Verdict.Firm, 0.99), Galaxy(1, 1.5, 0.5, offsetKmS: 0, Verdict.Unsettled, 0.5),
        Galaxy(2, 3, 0.6, offsetKmS: 60, Verdict.Likely, 0.9), Galaxy(3, 3, 2.5, offsetKmS: 2000, Verdict.Likely, 0.95),
        Galaxy(4, 3, 2.5, offsetKmS: null, Verdict.Nothing, 0),
    ];

    [Fact]
    public void Shares_and_widths_are_as_counted_by_hand()
    {
        var all = new Recovery(Five).All;
        Assert.Equal((3, 3), (all.Good, all.Confident));
        Assert.Equal(0.6, all.GoodShare, 12);
        Assert.Equal(0.4, all.Completeness, 12);
        Assert.Equal(2 / 3.0, all.Purity!.Value, 12);
        // Offsets -30, 0, 60: the median of |x - 0| is 30; stated errors are 15 km/s.
        Assert.Equal(1.4826 * 30, all.NmadKmS!.Value, 0.01);
        Assert.Equal(1.4826 * 2, all.PullWidth!.Value, 0.01);
    }

    [Fact]
    public void Groups_hold_every_injection_once_and_say_nothing_of_what_they_lack()
    {
        var recovery = new Recovery(Five);
        Assert.Equal(["S/N 1.5", "S/N 3"], recovery.BySnr.Select(g => g.Name));
        Assert.Equal([("z 0.5 to 1", 3), ("z 2 to 3", 2)], recovery.ByRedshift.Select(g => (g.Name, g.Members.Count)));
        Assert.Null(recovery.ByRedshift[1].NmadKmS);
        Assert.Null(new RecoveryGroup("one", [Five[4]]).Purity);
        Assert.Equal(4, recovery.Reliability.Sum(bin => bin.Count));
    }

    [Fact]
    public void Neighbours_are_joined_until_they_are_many_and_none_gets_lost()
    {
        var recovery = new Recovery(Five);
        Assert.Equal([(2, (1.5, 1.5)), (3, (3.0, 3.0))], recovery.BySnr.Select(g => (g.Members.Count, g.Range)));
        Assert.Equal(recovery.BySnr, RecoveryGroup.Joined(recovery.BySnr, 2));
        var joined = Assert.Single(RecoveryGroup.Joined(recovery.BySnr, 3));
        Assert.Equal((5, (1.5, 3.0), "S/N 1.5 and S/N 3"), (joined.Members.Count, joined.Range, joined.Name));
        Assert.Equal([(0.5, 3)], RecoveryGroup.Joined(recovery.ByRedshift, 3).Select(g => g.Range));
        Assert.Equal(4, Assert.Single(recovery.ReliabilityOf(4)).Count);
    }

    private static Injection Galaxy(int index, double snr, double z, double? offsetKmS, Verdict verdict, double confidence) => new()
    {
        Index = index,
        Source = "a.fits",
        Row = 0,
        Kind = ObjectKind.Galaxy,
        Description = "old galaxy",
        Z = z,
        Snr = snr,
        FoundKind = ObjectKind.Galaxy,
        FoundZ = z + offsetKmS / 299792.458 * (1 + z),
        FoundZErr = 15 / 299792.458 * (1 + z),
        Confidence = confidence,
        Verdict = verdict,
        ToleranceKmS = 1000,
    };
}
