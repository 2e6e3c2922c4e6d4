using Redshift.Physics.Units;

namespace Redshift.Pipeline.Settings;

/// <summary>Spells out the roles of one spectrum of an odd file; what is null is found as without the rule.</summary>
/// <remarks>
/// Places are written <c>HDU 1 column FLUX</c>, <c>HDU 0 row 2</c>, <c>HDU 0 band 3</c>, <c>HDU 0 axis</c>, <c>HDU B_FLUX</c>, or without
/// the HDU where the rule's own is meant.
/// </remarks>
public abstract record SpectrumRule
{
    /// <summary>Place of the wavelengths.</summary>
    public string? Wavelength { get; init; }

    /// <summary>Unit of the wavelength, e.g. <c>nm</c> or <c>log10(Angstrom)</c>.</summary>
    public string? WavelengthUnit { get; init; }

    /// <summary>Column with the step from pixel to pixel, where the wavelength column gives the first alone.</summary>
    public string? WavelengthStep { get; init; }

    /// <summary>Place of the flux.</summary>
    public string? Flux { get; init; }

    /// <summary>Unit of the flux.</summary>
    public string? FluxUnit { get; init; }

    /// <summary>Place of the standard deviation.</summary>
    public string? Error { get; init; }

    /// <summary>Place of the variance.</summary>
    public string? Variance { get; init; }

    /// <summary>Place of the inverse variance.</summary>
    public string? InverseVariance { get; init; }

    /// <summary>Place of flags that are not zero where a pixel is bad.</summary>
    public string? Mask { get; init; }

    /// <summary>Place of flags that are not zero where a pixel is good.</summary>
    public string? Good { get; init; }

    /// <summary>Resolving power.</summary>
    public double? Resolution { get; init; }

    /// <summary>Instrumental FWHM in Å.</summary>
    public double? FwhmA { get; init; }

    /// <summary>Place of resolving powers, or of a resolution matrix.</summary>
    public string? ResolutionPlace { get; init; }

    /// <summary>Place of the instrumental FWHM of each pixel.</summary>
    public string? Fwhm { get; init; }

    /// <summary>Place of the instrumental standard deviation of each pixel.</summary>
    public string? Sigma { get; init; }

    /// <summary>Unit of <see cref="Fwhm"/> or <see cref="Sigma"/>: of length, of velocity, or <c>pixel</c>.</summary>
    public string? WidthUnit { get; init; }

    /// <summary>
    /// What names the rows where these are orders of one object: a column, <c>axis</c> for the numbers in the header, or <c>row</c>.
    /// Null where the rows are objects of their own.
    /// </summary>
    public string? Order { get; init; }
}

/// <summary>Spells out how an odd file is read; chosen by header values.</summary>
public sealed record LoadRule : SpectrumRule
{
    /// <summary>Header keywords and the values they must have; empty matches all files.</summary>
    public IReadOnlyDictionary<string, string> When { get; init; } = new Dictionary<string, string>();

    /// <summary>
    /// Indices or EXTNAMEs of the HDUs that hold the spectra; each gives an observation, also where several have one name. Empty for
    /// the first with data.
    /// </summary>
    public IReadOnlyList<string> Hdus { get; init; } = [];

    /// <summary>Medium of the wavelengths.</summary>
    public WavelengthMedium? Medium { get; init; }

    /// <summary>Frame of the wavelengths.</summary>
    public VelocityFrame? Frame { get; init; }

    /// <summary>Column or header card (<c>card OBJECT</c>) with the target's name.</summary>
    public string? Target { get; init; }

    /// <summary>Column or header card with the right ascension.</summary>
    public string? Ra { get; init; }

    /// <summary>Column or header card with the declination.</summary>
    public string? Dec { get; init; }

    /// <summary>Unit of right ascension and declination.</summary>
    public AngleUnit? AngleUnit { get; init; }

    /// <summary>Column that tells objects, sky, parked and broken fibres.</summary>
    public string? Fibre { get; init; }

    /// <summary>The spectra of one object, where it has several.</summary>
    public IReadOnlyList<ArmRule> Arms { get; init; } = [];
}

/// <summary>One of several spectra of an object: an arm, an order, an exposure.</summary>
public sealed record ArmRule : SpectrumRule
{
    /// <summary>Its name; empty for the one that has none.</summary>
    public string Name { get; init; } = "";
}
