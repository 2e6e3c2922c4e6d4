using Redshift.Physics.Units;
using Redshift.Pipeline.Results;

namespace Redshift.Pipeline.Match.Posterior;

/// <summary>What the hypotheses add up to.</summary>
internal sealed record Decision
{
    /// <summary>The answer's best hypothesis.</summary>
    public required Hypothesis Answer { get; init; }

    /// <summary>All candidates, one for each kind and redshift window, by probability.</summary>
    public required IReadOnlyList<Candidate> Candidates { get; init; }

    /// <summary>Best candidate outside the window of the answer, or null.</summary>
    public required Candidate? Next { get; init; }

    /// <summary>Share of that candidate among all candidates outside the window; 0 where there is none.</summary>
    public required double NextShare { get; init; }

    /// <summary>ln odds of the answer's window against all else.</summary>
    public required double LnOdds { get; init; }

    /// <summary>ln weight of the answer's window against a featureless spectrum.</summary>
    public required double LnOddsFeatures { get; init; }

    /// <summary>Share of the answer's kind among the hypotheses within the window.</summary>
    public required double KindShare { get; init; }
}

/// <summary>Sums the hypotheses over kinds within the tolerance of the answered kind.</summary>
internal static class PosteriorSum
{
    private const double KmSPerLn = Velocity.SpeedOfLightKmS;

    /// <summary>Tolerance in km/s within which a redshift of a kind counts as the same.</summary>
    public static double ToleranceKmS(ObjectKind kind, double resolution) => kind switch
    {
        ObjectKind.Star => Math.Max(100, 0.5 * KmSPerLn / resolution),
        ObjectKind.Quasar => 3000,
        _ => 1000,
    };

    /// <summary>Decides between hypotheses, of which there is at least one, sorted by weight.</summary>
    public static Decision Decide(IReadOnlyList<Hypothesis> hypotheses, double resolution)
    {
        // A star whose lines are not seen says no more than that the spectrum is smooth.
        var top = hypotheses.FirstOrDefault(h => h.Fit.LnEvidence > SeenLnEvidence && h.LnWeight > hypotheses[0].LnWeight - Negligible) ?? hypotheses[0];
        var kind = top.Fit.Model.Kind;
        var tolerance = ToleranceKmS(kind, resolution) / KmSPerLn;
        bool Inside(Hypothesis h) => Math.Abs(h.Fit.LnShift - top.Fit.LnShift) < tolerance;
        var total = LnSum(hypotheses);
        var inside = LnSum(hypotheses.Where(Inside));
        var outside = LnSum(hypotheses.Where(h => !Inside(h)).Select(h => h.LnWeight).Append(NothingLnWeight));
        var kindInside = LnSum(hypotheses.Where(h => Inside(h) && h.Fit.Model.Kind == kind));
        var candidates = Candidates(hypotheses, resolution, total);
        var rivals = candidates.FindAll(c => Math.Abs(Math.Log(1 + c.Z) - top.Fit.LnShift) >= tolerance);
        return new()
        {
            Answer = top,
            Candidates = candidates,
            Next = rivals.Count > 0 ? rivals[0] : null,
            NextShare = rivals.Count > 0 ? rivals[0].Probability / Math.Max(double.Epsilon, rivals.Sum(c => c.Probability)) : 0,
            LnOdds = inside - outside,
            LnOddsFeatures = inside,
            KindShare = Math.Exp(kindInside - inside),
        };
    }

    /// <summary>ln evidence from which a model's features count as seen.</summary>
    private const double SeenLnEvidence = 3;

    /// <summary>So far below the best in ln weight, seen features do not count.</summary>
    private const double Negligible = 10;

    /// <summary>ln weight of a spectrum with neither lines nor breaks: the smooth model has ln evidence 0 by definition and one unit of prior.</summary>
    private const double NothingLnWeight = 0;

    private static List<Candidate> Candidates(IReadOnlyList<Hypothesis> hypotheses, double resolution, double total)
    {
        var candidates = new List<Candidate>();
        var taken = new HashSet<Hypothesis>();
        foreach (var lead in hypotheses)
        {
            if (taken.Contains(lead)) continue;
            var kind = lead.Fit.Model.Kind;
            var reach = ToleranceKmS(kind, resolution) / KmSPerLn;
            var group = hypotheses.Where(h => !taken.Contains(h) && h.Fit.Model.Kind == kind && Math.Abs(h.Fit.LnShift - lead.Fit.LnShift) < reach).ToList();
            taken.UnionWith(group);
            var z = Math.Exp(lead.Fit.LnShift) - 1;
            candidates.Add(new(kind, z, lead.Fit.Sigma * (1 + z), lead.Fit.Model.Name, lead.Fit.LnEvidence, Math.Exp(LnSum(group) - total)));
        }

        candidates.Sort((a, b) => b.Probability.CompareTo(a.Probability));
        return candidates;
    }

    private static double LnSum(IEnumerable<Hypothesis> hypotheses) => LnSum(hypotheses.Select(h => h.LnWeight));

    private static double LnSum(IEnumerable<double> values)
    {
        var all = values.ToList();
        if (all.Count == 0) return double.NegativeInfinity;
        var greatest = all.Max();
        return greatest + Math.Log(all.Sum(v => Math.Exp(v - greatest)));
    }
}
