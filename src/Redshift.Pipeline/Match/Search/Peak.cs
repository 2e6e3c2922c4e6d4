using Redshift.Pipeline.Match.Fit;

namespace Redshift.Pipeline.Match.Search;

/// <summary>A place worth fitting exactly.</summary>
/// <param name="Model">The model that did best there.</param>
/// <param name="LnShift">ln(1+z).</param>
/// <param name="LnEvidence">ln evidence of the search.</param>
internal readonly record struct Peak(FitModel Model, double LnShift, double LnEvidence);
