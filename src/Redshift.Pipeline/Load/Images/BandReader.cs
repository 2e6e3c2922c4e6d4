using Redshift.Pipeline.Load.Layouts;
using Redshift.Pipeline.Load.Roles;

namespace Redshift.Pipeline.Load.Images;

/// <summary>Reads images whose rows are the flux, the noise and the like of one spectrum.</summary>
internal static class BandReader
{
    /// <summary>What the four bands of an extracted long-slit spectrum are where nothing names them.</summary>
    public static IReadOnlyList<string>? UsualBands(int bands) => bands switch
    {
        4 => ["spectrum", "raw", "background", "sigma"],
        3 => ["spectrum", "raw", "sigma"],
        2 => ["spectrum", "sigma"],
        _ => null,
    };

    /// <summary>Bands with names; with several apertures, each is an observation.</summary>
    public static UnitContent Named(ImageFamily family, int length, IReadOnlyList<string> names, int apertures = 1)
    {
        var arrays = names.Select(NumberArray (name, band) => Band(family, length, name, band, apertures)).ToList();
        var roles = new RoleChoice(arrays, $"HDU {family.Flux.Index}");
        var flux = roles.Single(Role.Flux) ?? throw ImageReader.Unfit(family, $"a flux among the bands {string.Join(", ", names)}");
        var listed = roles.Single(Role.Wavelength) is { } row && IsMonotonic(row.Read(0)) ? row : null;
        return new([new()
        {
            Wavelength = listed is null ? ImageReader.AxisOf(family, length) : new ArrayWavelengths(listed),
            Flux = flux,
            Noise = roles.NoiseOf(flux) ?? ImageReader.NoiseOf(family, length, apertures),
            Mask = roles.MaskOf(flux),
            Width = roles.WidthOf(flux),
        }], apertures)
        { ListsWavelengths = listed is not null, Notes = [new("bands", string.Join(", ", names), "the names in the header, or the usual ones")] };
    }

    /// <summary>Whether the first row of an image holds wavelengths.</summary>
    public static bool HasWavelengthRow(ImageFamily family, int length) => LooksLikeWavelengths(family.Flux.ReadDoubles(0, length));

    /// <summary>Bands without names: wavelength, flux, error, by their content; else flux and error, if the second can only be one.</summary>
    public static UnitContent Unnamed(ImageFamily family, int length, int rows)
    {
        var arrays = Enumerable.Range(0, rows).Select(NumberArray (row) => Band(family, length, "", row, 1)).ToList();
        if (arrays.Any(static array => LooksLikeWavelengths(array.Read(0)))) return ByContent(family, arrays);
        if (rows != 2 || !LooksLikeErrors(arrays[1].Read(0), arrays[0].Read(0)))
            throw ImageReader.Unfit(family, "bands named by cards such as BANDIDn or ROWn, or a [[load]] rule");
        return new([new() { Wavelength = ImageReader.AxisOf(family, length), Flux = Labelled(arrays[0], family), Noise = (Role.Error, arrays[1]) }], 1);
    }

    /// <summary>Arrays without names: one that rises or falls all the way is the wavelength, the others are flux and error in this order.</summary>
    public static UnitContent ByContent(ImageFamily family, IReadOnlyList<NumberArray> all)
    {
        var wavelengths = all.Where(static array => LooksLikeWavelengths(array.Read(0))).ToList();
        if (wavelengths.Count != 1 || all.Count < 2)
            throw ImageReader.Unfit(family, "one row or column of wavelengths, or a [[load]] rule");
        NumberArray[] arrays = [wavelengths[0], .. all.Except(wavelengths)];
        var unit = family.Header.Text("XUNITS", "XUNIT", "WAVEUNIT", "CUNIT1") ?? "";
        var isError = arrays.Length > 2 && LooksLikeErrors(arrays[2].Read(0), arrays[1].Read(0));
        return new([new()
        {
            Wavelength = new ArrayWavelengths(arrays[0], SpectralAxis.SpectralUnit.Parse(unit)),
            Flux = Labelled(arrays[1], family),
            Noise = isError ? (Role.Error, arrays[2]) : null,
        }], 1)
        { ListsWavelengths = true };
    }

    /// <summary>The error in a second image without a name, if its content can be nothing else.</summary>
    public static (Role, NumberArray)? UnnamedError(ImageFamily family, NumberArray flux)
    {
        if (family.UnnamedTwin() is not { } twin) return null;
        var array = new ImageArray(twin, flux.Length) { Place = $"HDU {twin.Index}", Label = new("") };
        return LooksLikeErrors(array.Read(0), flux.Read(0)) ? (Role.Error, array) : null;
    }

    /// <summary>Orders of one object, each with rows for wavelength, flux and error.</summary>
    public static UnitContent Orders(ImageFamily family, int length, int rows, int orders) => new(
        [.. Enumerable.Range(0, orders)
            .Select(order => ByContent(family, [.. Enumerable.Range(0, rows).Select(row => Band(family, length, "", order * rows + row, 1))]))
            .Select(static (content, order) => content.Spectra[0] with { Label = $"order {order + 1}" })], 1)
    { ListsWavelengths = true };

    private static ImageArray Band(ImageFamily family, int length, string name, int band, int apertures) =>
        new ImageArray(family.Flux, length, apertures, (long)band * length * apertures, length)
        {
            Place = $"HDU {family.Flux.Index} {(apertures == 1 ? "row" : "band")} {band}",
            Label = new(name, RoleGuesser.Of(new(name)).Role == Role.Wavelength ? "" : family.FluxLabel.Unit),
        };

    private static Relabelled Labelled(NumberArray array, ImageFamily family) => new Relabelled(array, family.FluxLabel);

    private static bool IsMonotonic(double[] values)
    {
        if (!double.IsFinite(values[^1] - values[0]) || values[^1] == values[0]) return false;
        var sign = Math.Sign(values[^1] - values[0]);
        var last = double.NaN;
        foreach (var value in values)
        {
            if (!double.IsFinite(value)) continue;
            if (sign * (value - last) <= 0) return false;
            last = value;
        }
        return true;
    }

    private static bool LooksLikeWavelengths(double[] values) => values.All(static value => !(value <= 0)) && IsMonotonic(values);

    // Never negative, and of no more than the size of the flux.
    private static bool LooksLikeErrors(double[] values, double[] flux) =>
        values.All(static value => !(value < 0)) && values.Any(static value => value > 0) && Median(values) < Median([.. flux.Select(Math.Abs)]);

    private static double Median(double[] values)
    {
        var sorted = values.Where(double.IsFinite).Order().ToArray();
        return sorted.Length == 0 ? double.NaN : sorted[sorted.Length / 2];
    }
}
