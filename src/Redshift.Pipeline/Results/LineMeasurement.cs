namespace Redshift.Pipeline.Results;

/// <summary>How a line of the answer stands in the spectrum.</summary>
public enum LineState
{
    /// <summary>Measured where the answer puts it.</summary>
    Matched,

    /// <summary>Should be there and is not: <see cref="LineMeasurement.FluxErr"/> holds the limit.</summary>
    ExpectedMissing,

    /// <summary>Cannot be told from a neighbour at this resolution.</summary>
    Blended,

    /// <summary>Falls on unusable pixels.</summary>
    Masked,

    /// <summary>A feature that the answer does not explain.</summary>
    Unexplained,
}

/// <summary>One line of the answer, measured at native pixels. Absorption is positive in equivalent width.</summary>
public sealed record LineMeasurement
{
    /// <summary>Standard spectroscopic name, e.g. <c>H alpha</c>.</summary>
    public required string Line { get; init; }

    /// <summary>Family, e.g. <c>hydrogen</c>, <c>metals</c>, <c>forbidden</c>.</summary>
    public required string Family { get; init; }

    /// <summary>Rest wavelength in vacuum, Å; null for an unexplained feature.</summary>
    public double? RestVacuumA { get; init; }

    /// <summary>Rest wavelength in air, Å; null below 2000 Å.</summary>
    public double? RestAirA { get; init; }

    /// <summary>Measured centre in vacuum in the file's frame, Å.</summary>
    public double? ObservedVacuumA { get; init; }

    /// <summary>1σ of the centre, Å.</summary>
    public double? ObservedErrA { get; init; }

    /// <summary>Velocity of the line against the answer, km/s.</summary>
    public double? OffsetKmS { get; init; }

    /// <summary>1σ of the offset, km/s.</summary>
    public double? OffsetErrKmS { get; init; }

    /// <summary>Integrated flux over the continuum, negative in absorption, flux unit × Å.</summary>
    public double? Flux { get; init; }

    /// <summary>1σ of the flux.</summary>
    public double? FluxErr { get; init; }

    /// <summary>Unit of the flux.</summary>
    public string FluxUnit { get; init; } = "";

    /// <summary>Equivalent width in the rest frame, Å.</summary>
    public double? EquivalentWidthRestA { get; init; }

    /// <summary>1σ of the equivalent width, Å.</summary>
    public double? EquivalentWidthErrA { get; init; }

    /// <summary>Observed full width at half maximum, km/s.</summary>
    public double? FwhmObservedKmS { get; init; }

    /// <summary>The width with the instrument taken out, km/s; null where the line is not resolved.</summary>
    public double? FwhmIntrinsicKmS { get; init; }

    /// <summary>Share of the ln-likelihood gain of the answer over the smooth model.</summary>
    public double? LnLikelihoodGain { get; init; }

    /// <summary>How the line stands.</summary>
    public required LineState State { get; init; }

    /// <summary>A remark, or empty.</summary>
    public string Note { get; init; } = "";
}
