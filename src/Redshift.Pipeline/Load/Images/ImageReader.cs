using Redshift.Fits;
using Redshift.Pipeline.Load.Layouts;
using Redshift.Pipeline.Load.Metadata;
using Redshift.Pipeline.Load.Roles;
using Redshift.Pipeline.Load.SpectralAxis;
using Redshift.Pipeline.Observations;

namespace Redshift.Pipeline.Load.Images;

/// <summary>Decides what the axes of an image with flux are: one spectrum, bands of one, a stack, or orders.</summary>
internal static class ImageReader
{
    private const int FewestPixels = 16;

    // Images with no more rows than this are bands of one spectrum or a few spectra, but no frame of a slit.
    private const int MostBands = 8;

    /// <summary>Reads the layout of an image and its siblings.</summary>
    /// <exception cref="LoadException">The structure is ambiguous or no spectrum.</exception>
    public static UnitContent Read(ImageFamily family)
    {
        return SpectralShape.Of(family.Flux)?.Lengths switch
        {
            [var length] => OneAxis(family, length),
            [var length, var rows] => TwoAxes(family, length, rows),
            [var length, var apertures, var bands] => ThreeAxes(family, length, apertures, bands),
            _ => throw Unfit(family, "at most three axes"),
        };
    }

    private static UnitContent OneAxis(ImageFamily family, int length) => ApertureAxis.ReadAll(family.Header) is { Count: > 0 } apertures
        ? ApertureReader.Read(family, length, 1, 1, apertures)
        : Stack(family, length, 1);

    private static UnitContent TwoAxes(ImageFamily family, int length, int rows)
    {
        if (length <= MostBands && rows >= 100) return SidewaysTable(family, length);
        if (BandNames.Read(family.Header, rows) is { } names) return BandReader.Named(family, length, names);
        if (ApertureAxis.ReadAll(family.Header) is { Count: > 0 } apertures && apertures.Count >= rows)
            return ApertureReader.Read(family, length, rows, 1, apertures);
        if (IsStack(family, length, rows)) return Stack(family, length, rows);
        return rows <= MostBands
            ? BandReader.Unnamed(family, length, rows)
            : throw Unfit(family, "a stack with a table of its rows, named bands, or a [[load]] rule");
    }

    private static UnitContent ThreeAxes(ImageFamily family, int length, int apertures, int bands)
    {
        var header = family.Header;
        if (apertures is 3 or 4 && BandReader.HasWavelengthRow(family, length)) return BandReader.Orders(family, length, apertures, bands);
        var axes = ApertureAxis.ReadAll(header);
        if (axes.Count >= apertures) return ApertureReader.Read(family, length, apertures, bands, axes);
        var names = BandNames.Read(header, bands) ?? BandReader.UsualBands(bands) ?? throw Unfit(family, "a spectrum along one axis, or bands named by BANDIDn");
        return BandReader.Named(family, length, names, apertures);
    }

    // Rows are spectra where something counts them: a table with as many rows, noise of the same shape, an aperture card for each.
    private static bool IsStack(ImageFamily family, int length, int rows)
    {
        if (AxisReader.IsForeign(family.Header, SpectralShape.Of(family.Flux)!.Value.Axis + 1)) return false;
        if (TargetTable.For(family.File, rows) is not null) return true;
        var apertureCards = family.Header.Has("APNUM1") && family.Header.Has(HeaderScope.Indexed("APNUM", rows));
        var type = family.Header.Text("CTYPE2")?.ToUpperInvariant() ?? "";
        return apertureCards
            || type.ContainsAny("FIB", "SPEC", "APER")
            || family.Wavelengths(length, rows).Array?.Rows == rows
            || HasNoiseOfItsRows(family, length, rows);
    }

    // Two-dimensional frames come with errors too, but hardly with inverse variances, and never with a handful of rows.
    private static bool HasNoiseOfItsRows(ImageFamily family, int length, int rows) =>
        NoiseOf(family, length, rows) is { } noise && noise.Values.Rows == rows && (noise.Role == Role.InverseVariance || rows <= MostBands);

    private static UnitContent Stack(ImageFamily family, int length, int rows)
    {
        if (length < FewestPixels) throw Unfit(family, $"at least {FewestPixels} pixels along the first axis");
        var flux = new ImageArray(family.Flux, length, rows, 0, length) { Place = $"HDU {family.Flux.Index}", Label = family.FluxLabel };
        var (listed, wavelengthHdu) = family.Wavelengths(length, rows);
        var sources = new SpectrumSources
        {
            Wavelength = listed is null ? AxisOf(family, length) : new ArrayWavelengths(listed),
            Flux = flux,
            Noise = NoiseOf(family, length, rows) ?? (rows == 1 ? BandReader.UnnamedError(family, flux) : null),
            Mask = family.Array(Role.Mask, length, rows) is { } mask && mask.Length == length ? new(mask) : null,
            Width = WidthOf(family, length, rows),
        };
        var targets = rows > 1 ? TargetTable.For(family.File, rows) : null;
        if (targets is null && listed is not null && OrderRanges.AreOrders(listed))
            return new(sources.Numbered(), 1) { ListsWavelengths = true, WavelengthHdu = wavelengthHdu };
        return new([sources], rows) { ListsWavelengths = listed is not null, WavelengthHdu = wavelengthHdu, Targets = targets };
    }

    /// <summary>Noise from a sibling image.</summary>
    public static (Role Role, NumberArray Values)? NoiseOf(ImageFamily family, int length, int rows)
    {
        foreach (var role in (ReadOnlySpan<Role>)[Role.InverseVariance, Role.Error, Role.Variance])
            if (family.Array(role, length, rows) is { } array && array.Length == length) return (role, array);
        return null;
    }

    private static WidthSource? WidthOf(ImageFamily family, int length, int rows)
    {
        foreach (var role in (ReadOnlySpan<Role>)[Role.Resolution, Role.Sigma, Role.Fwhm])
            if (family.Array(role, length, rows) is { } array) return new(array, role);
        return null;
    }

    /// <summary>The axis of the image's own header, or of the primary one where its own has none.</summary>
    public static AxisWavelengths AxisOf(ImageFamily family, int length)
    {
        var number = SpectralShape.Of(family.Flux)!.Value.Axis;
        if (AxisReader.IsForeign(family.Header, number)) throw Unfit(family, "a spectral first axis");
        var axis = AxisReader.Read(family.Header, number, length, family.File);
        return axis is null
            ? throw new LoadException(PlaceOf(family), $"neither CRVAL{number} with CDELT{number} or CD{number}_{number} nor an array of wavelengths", "wavelengths")
            : new(axis, family.Flux.Index, number);
    }

    private static UnitContent SidewaysTable(ImageFamily family, int columns)
    {
        var arrays = Enumerable.Range(0, columns)
            .Select(column => new ImageColumnArray(family.Flux, column) { Place = $"HDU {family.Flux.Index} column {column + 1}", Label = new("") })
            .ToList<NumberArray>();
        return BandReader.ByContent(family, arrays);
    }

    /// <summary>The reject of an image whose shape is not understood.</summary>
    public static LoadException Unfit(ImageFamily family, string expected) =>
        new(PlaceOf(family), $"an image of {string.Join(" x ", family.Flux.Shape)}", expected);

    private static string PlaceOf(ImageFamily family) => $"HDU {family.Flux.Index} {family.Flux.Name}".TrimEnd();
}
