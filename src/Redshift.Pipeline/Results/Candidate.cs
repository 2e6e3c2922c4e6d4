namespace Redshift.Pipeline.Results;

/// <summary>One peak of the posterior over kind and redshift.</summary>
/// <param name="Kind">The kind of model.</param>
/// <param name="Z">Redshift as the file's wavelengths stand.</param>
/// <param name="ZErr">1σ of <paramref name="Z"/>.</param>
/// <param name="Template">The computed model that fits best, e.g. <c>5800 K dwarf</c>.</param>
/// <param name="LnEvidence">ln of the marginal likelihood of this peak over that of the smooth model, priors included.</param>
/// <param name="Probability">Share of the posterior.</param>
public sealed record Candidate(ObjectKind Kind, double Z, double ZErr, string Template, double LnEvidence, double Probability);
