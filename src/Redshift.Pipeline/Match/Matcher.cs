using Redshift.Pipeline.Match.Fit;
using Redshift.Pipeline.Match.Models;
using Redshift.Pipeline.Match.Posterior;
using Redshift.Pipeline.Match.Search;
using Redshift.Pipeline.Normalize;
using Redshift.Pipeline.Results;
using Redshift.Pipeline.Settings;

namespace Redshift.Pipeline.Match;

/// <summary>The match stage: search over all redshifts, exact fits of the leaders, posterior.</summary>
internal sealed class Matcher(MatchSettings settings)
{
    /// <summary>Where models turn out so wrong that less than this share of the information counts, the search is repeated knowing it.</summary>
    private const double SearchAgain = 0.85;

    /// <summary>A peak so far below the best, in units of the best's own ln evidence and in ln, is no rival.</summary>
    private const double HopelessShare = 0.35;
    private const double Hopeless = 15;

    /// <summary>A rival so far below the best in ln weight is not climbed, a share of the best's ln evidence allowed for what a climb may add.</summary>
    private const double Negligible = 12;
    private const double MostGained = 0.15;

    /// <summary>Peaks of each kind that are rivals however far below, and those that are fitted in full after a first look.</summary>
    private const int AlwaysRivals = 2;
    private const int FittedInFull = 6;

    /// <summary>ln evidence of a galaxy behind gas from which the gas may belong to something in front of a quasar.</summary>
    private const double PlainGas = 15;

    /// <summary>So much nearer in ln(1+z) than the quasar it must be: a galaxy's own gas is no gas in front of a quasar.</summary>
    private const double WellInFront = 0.05;

    /// <summary>Peaks of each kind that are fitted in full whatever the first look says.</summary>
    private const int AlwaysFitted = 3;

    /// <summary>Places of galaxies and of quasars at which all models of the kind are looked at, and those of them that are fitted in full.</summary>
    private const int VariedPlaces = 4;
    private const int VariantsInFull = 2;

    /// <summary>Cells of the exact fits at most.</summary>
    private const int MostFitCells = 12000;

    /// <summary>Matches an observation with at least one spectrum.</summary>
    /// <returns>The decision with the fit it rests on, or null where nothing can be matched.</returns>
    public MatchResult? Match(NormalizedObservation observation)
    {
        var peaks = Search(observation, ModelError.Uniform);
        if (peaks.Count == 0) return null;
        var (refined, error, excess) = Refine(observation, peaks);
        var light = SpreadOfLight.Of(observation);
        var hypotheses = refined.Select(r => r.Soften(excess))
            .Select(r => new Hypothesis(r, r.LnVolume + RedshiftPrior.LnDensity(r.Model.Kind, r.LnShift, light, settings)))
            .Where(h => double.IsFinite(h.LnWeight)).OrderByDescending(h => h.LnWeight).ToList();
        if (hypotheses.Count == 0) return null;
        return new(PosteriorSum.Decide(hypotheses, observation.Resolution), hypotheses, error, excess);
    }

    /// <summary>The exact fits: a first round shows how wrong models are, a second, knowing it, which rivals there are.</summary>
    private (List<Refined> Refined, ModelError Error, double Excess) Refine(NormalizedObservation observation, List<Peak> peaks)
    {
        var cell = FitCell(observation);
        List<PixelRun> runs = Runs(observation, cell), coarse = Runs(observation, 2 * cell);
        var before = FitPixels.Build(runs, ModelError.Uniform, Cells.Step);
        var fit = new ModelFit(before);
        var leaders = FirstLook(Look(coarse, ModelError.Uniform), Settle(fit, peaks, cell));
        var error = Learn(fit, leaders, before, runs, cell);

        var pixels = FitPixels.Build(runs, error, Cells.Step);
        fit = new ModelFit(pixels);
        var look = Look(coarse, error);
        if (pixels.Information < SearchAgain * before.Information)
            leaders = Distinct(leaders.Concat(FirstLook(look, Settle(fit, Search(observation, error), cell))));
        var refined = Climb(fit, Rivals(WithVariants(fit, look, InFull(fit, leaders))), cell);
        refined.AddRange(BehindGas(fit, refined, cell));
        return (refined, error, fit.Excess(refined.MaxBy(r => r.LnEvidence)!));
    }

    private static List<PixelRun> Runs(NormalizedObservation observation, double cell) => [.. observation.Spectra.Select(s => PixelRun.Binned(s, cell))];

    private List<Peak> Search(NormalizedObservation observation, ModelError error) =>
        new GridSearch(Cells.Build(observation.Spectra, error), settings).Peaks();

    /// <summary>For first looks, which tell places and models apart on pixels twice as wide as well.</summary>
    private static ModelFit Look(List<PixelRun> coarse, ModelError error) => new(FitPixels.Build(coarse, error, Cells.Step));

    /// <summary>Measures the model error on the best model of a first round.</summary>
    private static ModelError Learn(ModelFit fit, List<Peak> leaders, FitPixels pixels, List<PixelRun> runs, double cell)
    {
        var best = InFull(fit, BestOfKinds(leaders)).MaxBy(p => p.LnEvidence);
        var climbed = Refinement.Climb(fit, best.Model, best.LnShift, 0.5 * cell);
        fit.Fit(climbed.Model, climbed.LnShift);
        return ModelError.Measure(pixels, runs, fit, climbed.LnShift);
    }

    /// <summary>
    /// The best peaks of each kind by fits without partners, and the first ones of whoever found them: a template that is wrong on its own
    /// may be right in a mixture, and must not take its strong lines down with it.
    /// </summary>
    private static List<Peak> FirstLook(ModelFit look, List<Peak> peaks) => [.. peaks.GroupBy(p => p.Model.Kind).SelectMany(found =>
    {
        var looked = found.OrderByDescending(p => p.LnEvidence).Select(p => p with { LnEvidence = look.LnEvidence(p.Model, p.LnShift, mixed: false) }).ToList();
        return Peak.OnePerPlace(looked, PlaceKmS(found.Key)).Take(FittedInFull).Union(looked.Take(AlwaysFitted));
    })];

    /// <summary>Redshifts so near, in km/s, are one place to the choice of a model; a star's place is known, its type is what is looked for.</summary>
    private static double PlaceKmS(ObjectKind kind) => kind switch
    {
        ObjectKind.Star => 0,
        ObjectKind.Quasar => 2000,
        _ => 340,
    };

    private static List<Peak> InFull(ModelFit fit, IEnumerable<Peak> peaks) =>
        [.. peaks.Select(p => p with { LnEvidence = fit.LnEvidence(p.Model, p.LnShift) })];

    /// <summary>
    /// Adds, at the leading places of galaxies and quasars, the kind's other models that a first look prefers: the search knows which place,
    /// but only roughly which model.
    /// </summary>
    private static List<Peak> WithVariants(ModelFit fit, ModelFit look, List<Peak> peaks)
    {
        var places = Promising(peaks).Where(p => p.Model.Kind is ObjectKind.Galaxy or ObjectKind.Quasar).GroupBy(p => p.Model.Kind)
            .SelectMany(g => Peak.OnePerPlace(g, PlaceKmS(g.Key)).Take(VariedPlaces));
        var variants = places.SelectMany(place => ModelLibrary.Instance.OfKind(place.Model.Kind)
            .Select(model => place with { Model = model, LnEvidence = look.LnEvidence(model, place.LnShift, mixed: false) })
            .OrderByDescending(p => p.LnEvidence).Take(VariantsInFull)).ToList();
        return Distinct(peaks.Concat(InFull(fit, variants)));
    }

    /// <summary>The peaks, each model once at a place.</summary>
    private static List<Peak> Distinct(IEnumerable<Peak> peaks) => [.. peaks.DistinctBy(p => (p.Model, Math.Round(p.LnShift / Cells.Step)))];

    private static List<Peak> Rivals(List<Peak> peaks) => [.. Promising(peaks).Union(BestOfKinds(peaks))];

    private static IEnumerable<Peak> BestOfKinds(List<Peak> peaks) =>
        peaks.GroupBy(p => p.Model.Kind).SelectMany(g => g.OrderByDescending(p => p.LnEvidence).Take(AlwaysRivals));

    private static List<Peak> Promising(List<Peak> peaks)
    {
        var best = peaks.Max(p => p.LnEvidence);
        return peaks.FindAll(p => p.LnEvidence > best - Hopeless - HopelessShare * Math.Abs(best));
    }

    /// <summary>Climbs the best peak, and those that could still come within reach of it; the others count as they are.</summary>
    private static List<Refined> Climb(ModelFit fit, List<Peak> peaks, double cell)
    {
        var first = peaks.MaxBy(p => p.LnEvidence);
        var best = Refinement.Climb(fit, first.Model, first.LnShift, 0.5 * cell);
        var least = best.LnEvidence - Negligible * fit.Excess(best) - MostGained * Math.Abs(best.LnEvidence);
        Refined Rival(Peak p) => p.LnEvidence < least ? new(p.Model, p.LnShift, cell, p.LnEvidence) : Refinement.Climb(fit, p.Model, p.LnShift, 0.5 * cell);
        return peaks.ConvertAll(p => p == first ? best : Rival(p)).Aggregate(new List<Refined>(), WithNewTop);
    }

    /// <summary>Two climbs of one model to the same top are one.</summary>
    private static List<Refined> WithNewTop(List<Refined> tops, Refined next)
    {
        if (!tops.Exists(t => t.Model == next.Model && Math.Abs(t.LnShift - next.LnShift) < t.Sigma)) tops.Add(next);
        return tops;
    }

    /// <summary>The quasars found, seen through the gas that passed for a galaxy of smaller redshift.</summary>
    private static List<Refined> BehindGas(ModelFit fit, List<Refined> refined, double cell)
    {
        var gas = refined.Where(r => r.Model.BehindOwnGas && r.LnEvidence > PlainGas).MaxBy(r => r.LnEvidence);
        if (gas is null) return [];
        return refined.FindAll(r => r.Model.Kind == ObjectKind.Quasar && r.LnShift > gas.LnShift + WellInFront)
            .OrderByDescending(r => r.LnEvidence).Take(AlwaysRivals)
            .Select(r => Refinement.Climb(fit, new InterveningGas(gas.LnShift).Before(r.Model), r.LnShift, 0.5 * cell)).ToList();
    }

    /// <summary>Cells of the exact fits: those of the search, or half a resolution element where that is finer and the pixels stay few.</summary>
    private static double FitCell(NormalizedObservation observation)
    {
        var range = observation.Spectra.Sum(s => s.LnWavelength[^1] - s.LnWavelength[0]);
        return Math.Min(Cells.Step, Math.Max(0.5 / observation.Resolution, range / MostFitCells));
    }

    /// <summary>Where lines are narrower than a cell of the search, each peak is looked for around its place in steps that cannot miss it.</summary>
    private static List<Peak> Settle(ModelFit fit, List<Peak> peaks, double cell)
    {
        if (cell > 0.5 * Cells.Step) return peaks;
        var reach = (int)Math.Ceiling(Cells.Step / cell);
        return peaks.ConvertAll(p => p.Model.Kind is ObjectKind.Quasar ? p : Enumerable.Range(-reach, 2 * reach + 1)
            .Select(k => p with { LnShift = p.LnShift + k * cell })
            .MaxBy(q => fit.LnEvidence(q.Model, q.LnShift, mixed: false)));
    }
}

/// <summary>What matching gives.</summary>
/// <param name="Decision">The answer and its rivals.</param>
/// <param name="Hypotheses">All refined peaks by weight.</param>
/// <param name="Error">How wrong models are, along the spectrum.</param>
/// <param name="Excess">Factor by which ln likelihoods were softened.</param>
internal sealed record MatchResult(Decision Decision, IReadOnlyList<Hypothesis> Hypotheses, ModelError Error, double Excess)
{
    /// <summary>ln of the worst model error over its least value.</summary>
    public double Misfit => Math.Log(Error.Greatest / ModelError.Least);
}

/// <summary>A refined peak with its weight in the posterior.</summary>
/// <param name="Fit">The peak.</param>
/// <param name="LnWeight">ln of prior times likelihood, integrated over the peak, over that of a smooth spectrum.</param>
internal sealed record Hypothesis(Refined Fit, double LnWeight);
