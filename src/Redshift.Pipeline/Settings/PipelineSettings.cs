using Redshift.Physics.Units;
using Redshift.Pipeline.Match.Posterior;
using Redshift.Pipeline.Results;

namespace Redshift.Pipeline.Settings;

/// <summary>The parameters of all stages, as a pipeline file states them; the defaults suit any spectrograph.</summary>
public sealed record PipelineSettings
{
    /// <summary>How files are read.</summary>
    public LoadSettings Load { get; init; } = new();

    /// <summary>What is searched.</summary>
    public MatchSettings Match { get; init; } = new();
}

/// <summary>How files are read where they do not say it themselves, or say it wrongly.</summary>
public sealed record LoadSettings
{
    /// <summary>Resolving power λ/FWHM, overriding the file.</summary>
    public double? Resolution { get; init; }

    /// <summary>Instrumental FWHM in Å, overriding the file.</summary>
    public double? FwhmA { get; init; }

    /// <summary>Medium, overriding the file.</summary>
    public WavelengthMedium? Medium { get; init; }

    /// <summary>Frame, overriding the file.</summary>
    public VelocityFrame? Frame { get; init; }

    /// <summary>Header cards to keep as extra columns of the catalogue.</summary>
    public IReadOnlyList<string> Keep { get; init; } = [];

    /// <summary>Rules for odd files; the first whose conditions all hold is used.</summary>
    public IReadOnlyList<LoadRule> Rules { get; init; } = [];
}

/// <summary>What the match stage searches, and how much it expects it.</summary>
public sealed record MatchSettings
{
    /// <summary>The only kind to search, or null for all.</summary>
    public ObjectKind? Expect { get; init; }

    /// <summary>Lower end of the redshift grid.</summary>
    public double ZMin { get; init; } = -0.01;

    /// <summary>Upper end of the redshift grid.</summary>
    public double ZMax { get; init; } = 7.5;

    /// <summary>Prior weight of stars; the four are normalised.</summary>
    public double PriorStar { get; init; } = 1;

    /// <summary>Prior weight of galaxies.</summary>
    public double PriorGalaxy { get; init; } = 1;

    /// <summary>Prior weight of quasars.</summary>
    public double PriorQuasar { get; init; } = 0.5;

    /// <summary>Prior weight of nebulae.</summary>
    public double PriorNebula { get; init; } = 0.05;

    /// <summary>How evidence maps to confidence.</summary>
    public ConfidenceMaps Confidence { get; init; } = new();

    /// <summary>Whether the user says which kinds are expected, or how often.</summary>
    internal bool StatesKinds => Expect is not null || Shares != new MatchSettings().Shares;

    private (double, double, double) Shares => (PriorStar, PriorGalaxy, PriorQuasar);
}
