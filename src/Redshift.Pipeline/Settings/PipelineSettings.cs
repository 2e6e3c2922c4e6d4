using Redshift.Physics.Units;
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

/// <summary>Spells out the roles of an odd file; chosen by header values.</summary>
public sealed record LoadRule
{
    /// <summary>Header keywords and the values they must have; empty matches all files.</summary>
    public IReadOnlyDictionary<string, string> When { get; init; } = new Dictionary<string, string>();

    /// <summary>HDU index or EXTNAME that holds the spectrum.</summary>
    public string? Hdu { get; init; }

    /// <summary>Column, image row (<c>row 0</c>) or HDU with the wavelength.</summary>
    public string? Wavelength { get; init; }

    /// <summary>Unit of the wavelength, e.g. <c>nm</c> or <c>log10(Angstrom)</c>.</summary>
    public string? WavelengthUnit { get; init; }

    /// <summary>Column, image row or HDU with the flux.</summary>
    public string? Flux { get; init; }

    /// <summary>Column, image row or HDU with the error.</summary>
    public string? Error { get; init; }

    /// <summary>Column, image row or HDU with the inverse variance.</summary>
    public string? InverseVariance { get; init; }

    /// <summary>Column, image row or HDU with the mask; non-zero is bad.</summary>
    public string? Mask { get; init; }

    /// <summary>Medium of the wavelengths.</summary>
    public WavelengthMedium? Medium { get; init; }

    /// <summary>Frame of the wavelengths.</summary>
    public VelocityFrame? Frame { get; init; }

    /// <summary>Resolving power.</summary>
    public double? Resolution { get; init; }

    /// <summary>Instrumental FWHM in Å.</summary>
    public double? FwhmA { get; init; }
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
}
