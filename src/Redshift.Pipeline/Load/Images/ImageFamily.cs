using Redshift.Fits;
using Redshift.Pipeline.Load.Layouts;
using Redshift.Pipeline.Load.Metadata;
using Redshift.Pipeline.Load.Roles;
using Redshift.Pipeline.Load.SpectralAxis;
using Redshift.Pipeline.Load.Tables;

namespace Redshift.Pipeline.Load.Images;

/// <summary>An image with the flux and the sibling images of the same arm and version that hold its other arrays.</summary>
internal sealed class ImageFamily
{
    private readonly IReadOnlyList<(ImageHdu Hdu, Label Label, Role Role)> _siblings;

    /// <summary>Gathers the siblings.</summary>
    /// <param name="file">The file.</param>
    /// <param name="flux">The unit with the flux.</param>
    public ImageFamily(FitsFile file, ImageHdu flux)
    {
        File = file;
        Flux = flux;
        FluxLabel = LabelOf(flux);
        var own = Qualifiers(FluxLabel);
        _siblings =
        [
            .. from hdu in file.Hdus.OfType<ImageHdu>()
               where hdu != flux && hdu.Count > 0
               let label = LabelOf(hdu)
               let role = RoleGuesser.Of(label).Role
               where role is not (Role.Other or Role.Flux)
               let words = Qualifiers(label)
               where words.SetEquals(own) || own.Count == 0 && words.Count == 0
               where hdu.Version == flux.Version || hdu.Shape.Count == 1 && role == Role.Wavelength
               select (hdu, label, role),
        ];
    }

    /// <summary>The file.</summary>
    public FitsFile File { get; }

    /// <summary>The image with the flux.</summary>
    public ImageHdu Flux { get; }

    /// <summary>What the file says of it.</summary>
    public Label FluxLabel { get; }

    /// <summary>The headers that speak of it.</summary>
    public HeaderScope Header => Flux.Index == 0 ? new([Flux.Header]) : new([Flux.Header, File.Hdus[0].Header]);

    /// <summary>What the file says of an image: its name, or what stands in for one.</summary>
    public static Label LabelOf(ImageHdu hdu)
    {
        var header = new HeaderScope([hdu.Header]);
        var name = hdu.Name is { Length: > 0 } given && !given.Equals("PRIMARY", StringComparison.OrdinalIgnoreCase) && given != "COMPRESSED_IMAGE"
            ? given
            : header.Text("HDUCLAS2", "CONTENT") ?? "";
        return new(name, header.Text("BUNIT", "YUNITS", "FLUXUNIT", "UNITS") ?? "");
    }

    /// <summary>The only other image of the same shape, where it has no name.</summary>
    public ImageHdu? UnnamedTwin() =>
        File.Hdus.OfType<ImageHdu>().Where(IsTwin).ToList() is [var only] && LabelOf(only).Name.Length == 0 ? only : null;

    private bool IsTwin(ImageHdu hdu) => hdu != Flux && hdu.Shape.SequenceEqual(Flux.Shape);

    private ImageHdu? Sibling(Role role, int length)
    {
        foreach (var (hdu, _, itsRole) in _siblings)
            if (itsRole == role && SpectralShape.Of(hdu)?.Lengths[0] == length) return hdu;
        return null;
    }

    /// <summary>An array of a sibling beside a flux of this length and number of rows; null where the shapes do not match.</summary>
    public NumberArray? Array(Role role, int length, int rows) =>
        Sibling(role, length) is { } hdu ? ArrayOf(hdu, length, rows) : null;

    /// <summary>The wavelengths in a sibling or, where the header tells none, in the only table that has as many; and where they are.</summary>
    public (NumberArray? Array, Hdu? Hdu) Wavelengths(int length, int rows)
    {
        if (Sibling(Role.Wavelength, length) is { } hdu && ArrayOf(hdu, length, rows) is { } array) return (array, hdu);
        var isUncalibrated = AxisReader.IsUncalibrated(Header, SpectralShape.Of(Flux)!.Value.Axis);
        return isUncalibrated && TableUnits.Wavelengths(File, length) is [var (column, table)] ? (column, table) : (null, null);
    }

    /// <summary>An image as the companion of spectra: shared by all, or with one or more values a pixel for each.</summary>
    /// <param name="hdu">The image.</param>
    /// <param name="length">Pixels of a spectrum.</param>
    /// <param name="rows">Number of spectra.</param>
    /// <returns>Null where the shapes do not match.</returns>
    public static NumberArray? ArrayOf(ImageHdu hdu, int length, int rows)
    {
        var place = $"HDU {hdu.Index}";
        if (hdu.Count == length) return new ImageArray(hdu, length) { Place = place, Label = LabelOf(hdu) };
        var perRow = hdu.Count / (rows * (long)length);
        if (hdu.Count % (rows * (long)length) != 0 || perRow is < 1 or > 64) return null;
        var elements = checked((int)(perRow * length));
        return new ImageArray(hdu, elements, rows, 0, elements) { Place = place, Label = LabelOf(hdu) };
    }

    private static HashSet<string> Qualifiers(Label label) =>
        [.. RoleGuesser.Qualifiers(label.Words).Where(static word => word != "resolution" && word != "resol")];
}
