using Redshift.Physics.Lines;
using Redshift.Physics.Profiles;

namespace Redshift.Pipeline.Match.Measure;

/// <summary>Lines that the spectrograph cannot tell apart, under the name of one of them.</summary>
/// <param name="Leader">The line that gives its name.</param>
/// <param name="Others">The lines hidden in it.</param>
internal sealed record Blend(LineTarget Leader, IReadOnlyList<SpectralLine> Others);

/// <summary>Puts lines closer than a resolution element together.</summary>
internal static class Blends
{
    /// <summary>Lines closer than this share of their full width at half maximum are one.</summary>
    private const double Closest = 0.7;

    /// <summary>Groups lines.</summary>
    /// <param name="targets">Lines by rising centre.</param>
    /// <param name="instrument">σ of the line spread at a place, null out of range; such lines are left out.</param>
    /// <param name="rank">Which line gives a blend its name: the greatest.</param>
    public static List<Blend> Group(IEnumerable<LineTarget> targets, Func<double, double?> instrument, Func<LineTarget, int> rank)
    {
        var blends = new List<Blend>();
        var group = new List<LineTarget>();
        foreach (var target in targets)
        {
            if (instrument(target.Centre) is not { } sigma) continue;
            if (group.Count > 0 && target.Centre - group[^1].Centre > Closest * LineWidth.FwhmPerSigma * Width(group[^1], target, sigma)) Close(group, blends, rank);
            group.Add(target);
        }

        Close(group, blends, rank);
        return blends;
    }

    private static double Width(LineTarget a, LineTarget b, double instrument)
    {
        var own = Math.Min(a.Sigma, b.Sigma);
        return Math.Sqrt(own * own + instrument * instrument);
    }

    private static void Close(List<LineTarget> group, List<Blend> blends, Func<LineTarget, int> rank)
    {
        if (group.Count == 0) return;
        var leader = group.MaxBy(rank)!;
        blends.Add(new(leader, [.. group.Where(t => t != leader).Select(t => t.Line)]));
        group.Clear();
    }
}
