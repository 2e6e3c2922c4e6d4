using Redshift.Fits;
using Redshift.Pipeline.Load.Layouts;
using Redshift.Pipeline.Load.Roles;

namespace Redshift.Pipeline.Load.Images;

/// <summary>Finds the images that hold flux.</summary>
internal static class ImageUnits
{
    /// <summary>All images whose name says flux; failing that, the first that nothing else claims.</summary>
    public static IReadOnlyList<SpectrumUnit> Find(FitsFile file)
    {
        var images = file.Hdus.OfType<ImageHdu>()
            .Where(static hdu => hdu.Count > 1)
            .Select(static hdu => (Hdu: hdu, RoleGuesser.Of(ImageFamily.LabelOf(hdu)).Role))
            .ToList();
        var named = images.Where(static image => image.Role == Role.Flux).Select(static image => image.Hdu).ToList();
        // A primary array without a name beside extensions that are named for its noise is the flux.
        var unnamed = images.Where(static image => image.Role == Role.Other).Select(static image => image.Hdu).Take(1);
        var flux = named.Count > 0 && !(images[0] is { Role: Role.Other, Hdu.Index: 0 }) ? named : [.. unnamed];
        return [.. flux.Select(hdu => new SpectrumUnit(hdu, () => ImageReader.Read(new(file, hdu))))];
    }
}
