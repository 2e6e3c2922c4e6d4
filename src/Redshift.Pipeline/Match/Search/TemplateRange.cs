using Redshift.Pipeline.Match.Models;

namespace Redshift.Pipeline.Match.Search;

/// <summary>A template that is searched over a range of redshifts.</summary>
/// <param name="Template">The template.</param>
/// <param name="Index">Its number among the models; negative for one that is kept apart.</param>
/// <param name="Spread">Prior σ of its strength about one.</param>
/// <param name="GreatestLnShift">Greatest ln(1+z) at which it can exist.</param>
internal sealed record SearchedTemplate(Template Template, int Index, double Spread, double GreatestLnShift);

/// <summary>A range of redshifts within which one depth of the forest serves all templates.</summary>
/// <param name="From">Where it begins, in ln(1+z).</param>
/// <param name="To">Where it ends.</param>
/// <param name="ForestLnShift">ln(1+z) of the forest's depth, 0 for none.</param>
/// <param name="Templates">What is searched there.</param>
internal sealed record TemplateRange(double From, double To, double ForestLnShift, IReadOnlyList<SearchedTemplate> Templates)
{
    /// <summary>The ranges that cover all redshifts.</summary>
    /// <param name="templates">All templates.</param>
    /// <param name="forest">What is searched besides where there is a forest.</param>
    public static IReadOnlyList<TemplateRange> Split(IReadOnlyList<SearchedTemplate> templates, SearchedTemplate forest) =>
    [
        new(double.NegativeInfinity, Forest.Ranges[0].From, 0, templates),
        .. Forest.Ranges.Select(r => new TemplateRange(r.From, r.To, r.Middle, [.. templates.Where(t => t.GreatestLnShift > r.From), forest])),
    ];
}
