using Redshift.Pipeline.Load.Roles;

namespace Redshift.Pipeline.Load.Layouts;

/// <summary>What fills the roles of one spectrum of an observation.</summary>
internal sealed record SpectrumSources
{
    /// <summary>Arm, order or exposure; empty where there is only one spectrum.</summary>
    public string Label { get; init; } = "";

    /// <summary>Wavelengths.</summary>
    public required WavelengthSource Wavelength { get; init; }

    /// <summary>Flux.</summary>
    public required NumberArray Flux { get; init; }

    /// <summary>Error, variance or inverse variance, as its role says.</summary>
    public (Role Role, NumberArray Values)? Noise { get; init; }

    /// <summary>Quality flags.</summary>
    public MaskSource? Mask { get; init; }

    /// <summary>Resolution of each pixel.</summary>
    public WidthSource? Width { get; init; }

    /// <summary>The places of all that is used.</summary>
    public IEnumerable<string> Places =>
        new[] { Wavelength.Place, Flux.Place, Noise?.Values.Place, Mask?.Place, Width?.Place }.OfType<string>();

    /// <summary>One row of many as a spectrum of its own.</summary>
    public SpectrumSources AtRow(int row, string label) => this with
    {
        Label = label,
        Wavelength = Wavelength.IsShared ? Wavelength : new WavelengthsOfRow(Wavelength, row),
        Flux = new FixedRow(Flux, row),
        Noise = Noise is { } noise ? (noise.Role, new FixedRow(noise.Values, row)) : null,
        Mask = Mask?.AtRow(row),
        Width = Width?.AtRow(row),
    };
}
