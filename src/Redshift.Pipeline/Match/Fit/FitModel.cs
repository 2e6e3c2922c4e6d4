using Redshift.Pipeline.Match.Models;
using Redshift.Pipeline.Results;

namespace Redshift.Pipeline.Match.Fit;

/// <summary>A model to be fitted at trial redshifts: a computed spectrum times the smooth nuisance, plus emission groups.</summary>
internal sealed record FitModel
{
    public required ObjectKind Kind { get; init; }

    public required string Name { get; init; }

    /// <summary>The computed spectrum; null for a featureless continuum.</summary>
    public Template? Template { get; init; }

    /// <summary>Computed spectra that may be mixed into the template, in either direction: neighbours in temperature, metallicity, rotation.</summary>
    public IReadOnlyList<Template> Partners { get; init; } = [];

    /// <summary>Whether light shortward of Lyman alpha passes the intergalactic medium.</summary>
    public bool Forest { get; init; }

    /// <summary>Gas of another galaxy in front, or null.</summary>
    public InterveningGas? Gas { get; init; }

    /// <summary>Whether the template itself has the lines of gas.</summary>
    public bool BehindOwnGas { get; init; }

    public IReadOnlyList<EmissionGroup> Groups { get; init; } = [];

    /// <summary>Greatest ln(1+z) at which such an object can exist: a population is not older than the Universe.</summary>
    public double GreatestLnShift { get; init; } = double.PositiveInfinity;

    /// <summary>σ of narrow lines, km/s.</summary>
    public double NarrowKmS { get; init; } = 90;

    /// <summary>σ of broad lines, km/s.</summary>
    public double BroadKmS { get; init; } = 2000;

    /// <summary>ln of the prior share of this model among those of its kind.</summary>
    public double LnPrior { get; init; }
}
