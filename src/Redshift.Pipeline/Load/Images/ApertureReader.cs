using Redshift.Pipeline.Load.Layouts;
using Redshift.Pipeline.Load.Metadata;
using Redshift.Pipeline.Load.Roles;
using Redshift.Pipeline.Load.SpectralAxis;

namespace Redshift.Pipeline.Load.Images;

/// <summary>Reads images whose rows have a dispersion each: echelle orders of one object, or fibres with an object each.</summary>
internal static class ApertureReader
{
    /// <summary>The spectra of all apertures.</summary>
    /// <param name="family">The image and its siblings.</param>
    /// <param name="length">Pixels of a row.</param>
    /// <param name="rows">Number of apertures.</param>
    /// <param name="bands">Number of bands of each.</param>
    /// <param name="axes">The dispersions, one a row.</param>
    public static UnitContent Read(ImageFamily family, int length, int rows, int bands, IReadOnlyList<ApertureAxis> axes)
    {
        var all = new SpectrumSources
        {
            Wavelength = new ApertureWavelengths(axes, family.Flux.Index),
            Flux = Rows(family, length, rows, bands, 0),
            Noise = ErrorBand(family, bands) is { } band
                ? (Role.Error, Rows(family, length, rows, bands, band))
                : ImageReader.NoiseOf(family, length, rows),
            Mask = family.Array(Role.Mask, length, rows) is { } mask && mask.Length == length ? new(mask) : null,
        };
        return OrderRanges.AreOrders([.. axes.Take(rows).Select(axis => Range(axis, length))])
            ? new(Orders(all, new(axes, family.Flux.Index)), 1)
            : new([all], rows) { Targets = TargetTable.For(family.File, rows) };
    }

    /// <summary>The rows as orders of one object, by the numbers of their beams.</summary>
    public static IReadOnlyList<SpectrumSources> Orders(SpectrumSources all, ApertureWavelengths axes) =>
        [.. Enumerable.Range(0, all.Flux.Rows).Select(row => all.AtRow(row, axes.OrderLabel(row), axes.Place))];

    private static ImageArray Rows(ImageFamily family, int length, int rows, int bands, int band) =>
        new(family.Flux, length, rows, (long)band * rows * length, length)
        {
            Place = bands == 1 ? $"HDU {family.Flux.Index}" : $"HDU {family.Flux.Index} band {band}",
            Label = family.FluxLabel,
        };

    private static int? ErrorBand(ImageFamily family, int bands)
    {
        var names = bands == 1 ? null : BandNames.Read(family.Header, bands) ?? BandReader.UsualBands(bands);
        for (var band = 0; band < names?.Count; band++)
            if (RoleGuesser.Of(new(names[band])).Role == Role.Error) return band;
        return null;
    }

    private static (double Low, double High) Range(ApertureAxis axis, int length)
    {
        var (first, last) = (axis.At(1), axis.At(length));
        return (Math.Min(first, last), Math.Max(first, last));
    }
}
