namespace Redshift.Pipeline.Match.Models;

/// <summary>One line of a group.</summary>
/// <param name="RestA">Rest wavelength in vacuum, Å.</param>
/// <param name="Share">Flux over that of the group's reference line.</param>
/// <param name="WidthKmS">σ added to the group's own, km/s: blends and multiplets that are wider than a line.</param>
internal readonly record struct GroupLine(double RestA, double Share, double WidthKmS = 0)
{
    /// <summary>ln of the rest wavelength in Å.</summary>
    public double LnRest { get; } = Math.Log(RestA);
}

/// <summary>Emission lines whose ratios are tied, with what is expected of their strength before the spectrum is seen.</summary>
internal sealed class EmissionGroup
{
    public required string Name { get; init; }

    public required GroupLine[] Lines { get; init; }

    /// <summary>Expected rest equivalent width of the reference line, Å.</summary>
    public required double Mean { get; init; }

    /// <summary>Width of the (half-)normal prior of the equivalent width, Å.</summary>
    public required double Spread { get; init; }

    /// <summary>Prior probability that the group is absent.</summary>
    public required double Absent { get; init; }

    /// <summary>Whether the lines have the broad width of the model.</summary>
    public bool Broad { get; init; }

    /// <summary>The tabulated evidence of this group.</summary>
    public GroupEvidence Evidence => field ??= new GroupEvidence(this);
}
