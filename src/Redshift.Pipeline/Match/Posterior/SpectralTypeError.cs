using Redshift.Physics.Stars;
using Redshift.Physics.Units;
using Redshift.Pipeline.Normalize;
using Redshift.Pipeline.Results;

namespace Redshift.Pipeline.Match.Posterior;

/// <summary>1σ of a star's spectral type: how far the evidence spreads over the computed stars, and how far these are from real ones.</summary>
internal static class SpectralTypeError
{
    /// <summary>
    /// Types are defined by lines between these wavelengths (Morgan, Keenan &amp; Kellman 1943, An Atlas of Stellar Spectra). Without half of
    /// the range, the scatter found on simulated stars is about twice as large.
    /// </summary>
    private const double BlueA = 3900;
    private const double RedA = 4900;
    private const double WithoutThem = 2;

    /// <summary>σ in subclasses; null for what is no star, or of a type outside the sequences.</summary>
    /// <param name="match">The answer and the other stars.</param>
    /// <param name="spectra">What was matched.</param>
    /// <param name="toleranceKmS">Stars so near in velocity are the same star.</param>
    public static double? Of(MatchResult match, IReadOnlyList<NormalizedSpectrum> spectra, double toleranceKmS)
    {
        var answer = match.Decision.Answer;
        if (answer.Fit.Model.Kind != ObjectKind.Star || SpectralTypes.Subclass(TypeOf(answer)) is not { } subclass) return null;
        var floor = Floor(TypeOf(answer)) * (ShowsDefiningLines(spectra) ? 1 : WithoutThem);
        return Math.Sqrt(floor * floor + Spread(match, subclass, toleranceKmS / Velocity.SpeedOfLightKmS));
    }

    /// <summary>Mean square distance in type of the stars of the same sequence and place, weighted by their evidence.</summary>
    private static double Spread(MatchResult match, double subclass, double reach)
    {
        var answer = match.Decision.Answer;
        double weights = 0, squares = 0;
        foreach (var star in match.Hypotheses)
        {
            if (star.Fit.Model.Kind != ObjectKind.Star || Math.Abs(star.Fit.LnShift - answer.Fit.LnShift) > reach) continue;
            if (SpectralTypes.IsWhiteDwarf(TypeOf(star)) != SpectralTypes.IsWhiteDwarf(TypeOf(answer)) || SpectralTypes.Subclass(TypeOf(star)) is not { } other) continue;
            var weight = Math.Exp(star.LnWeight - answer.LnWeight);
            weights += weight;
            squares += weight * (other - subclass) * (other - subclass);
        }

        return squares / weights;
    }

    /// <summary>
    /// What computed stars mistake in real ones, with the steps of the grid: the scatter found between the types of 141 library and survey
    /// stars, mostly of high signal to noise, and of 835 simulated ones whose lines are not the engine's.
    /// </summary>
    private static double Floor(string type) => type[0] switch
    {
        'D' => 1,
        'O' or 'B' or 'F' or 'K' => 4,
        'A' => 3.5,
        'G' => 4.5,
        _ => 3,
    };

    private static bool ShowsDefiningLines(IReadOnlyList<NormalizedSpectrum> spectra)
    {
        double blue = Math.Log(BlueA), red = Math.Log(RedA);
        return spectra.Sum(s => Math.Max(0, Math.Min(red, s.LnWavelength[^1]) - Math.Max(blue, s.LnWavelength[0]))) > 0.5 * (red - blue);
    }

    private static string TypeOf(Hypothesis star) => star.Fit.Model.Template?.SpectralType ?? "";
}
