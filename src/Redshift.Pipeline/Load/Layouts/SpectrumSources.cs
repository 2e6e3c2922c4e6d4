using System.Globalization;
using Redshift.Pipeline.Load.Assembly;
using Redshift.Pipeline.Load.Roles;

namespace Redshift.Pipeline.Load.Layouts;

/// <summary>What fills the roles of one spectrum of an observation.</summary>
internal sealed record SpectrumSources
{
    /// <summary>The word of a load rule for orders that nothing but their place numbers.</summary>
    public const string RowNumbers = "row";

    /// <summary>Arm, order or exposure; empty where there is only one spectrum.</summary>
    public string Label { get; init; } = "";

    /// <summary>The part of the label that names the arm, where its spectra are several.</summary>
    public string Arm { get; init; } = "";

    /// <summary>What names the rows of which this is one, in the words of a load rule; null where it is no row of many.</summary>
    public string? Orders { get; init; }

    /// <summary>Wavelengths.</summary>
    public required WavelengthSource Wavelength { get; init; }

    /// <summary>Flux.</summary>
    public required NumberArray Flux { get; init; }

    /// <summary>Unit of the flux where the pipeline file states it.</summary>
    public string? FluxUnit { get; init; }

    /// <summary>Error, variance or inverse variance, as its role says.</summary>
    public (Role Role, NumberArray Values)? Noise { get; init; }

    /// <summary>Quality flags.</summary>
    public MaskSource? Mask { get; init; }

    /// <summary>Resolution of each pixel.</summary>
    public WidthSource? Width { get; init; }

    /// <summary>Resolution of all pixels where the pipeline file states it for this spectrum.</summary>
    public StatedResolution? Resolution { get; init; }

    /// <summary>The places of all that is used.</summary>
    public IEnumerable<string> Places =>
        new[] { Wavelength.Place, Flux.Place, Noise?.Values.Place, Mask?.Place, Width?.Place }.OfType<string>();

    /// <summary>All rows as orders of one object, numbered from 1.</summary>
    public IReadOnlyList<SpectrumSources> Numbered() =>
        [.. Enumerable.Range(0, Flux.Rows).Select(row => AtRow(row, string.Create(CultureInfo.InvariantCulture, $"order {row + 1}"), RowNumbers))];

    /// <summary>One row of many as a spectrum of its own.</summary>
    /// <param name="row">Which row.</param>
    /// <param name="label">Its name.</param>
    /// <param name="orders">What names the rows.</param>
    public SpectrumSources AtRow(int row, string label, string orders) => this with
    {
        Label = label,
        Orders = orders,
        Wavelength = Wavelength.IsShared ? Wavelength : new WavelengthsOfRow(Wavelength, row),
        Flux = new FixedRow(Flux, row),
        Noise = Noise is { } noise ? (noise.Role, new FixedRow(noise.Values, row)) : null,
        Mask = Mask?.AtRow(row),
        Width = Width?.AtRow(row),
    };
}
