using Redshift.Fits;

namespace Redshift.Pipeline.Load.Images;

/// <summary>The axes of an image without those of length 1, which only name a place on the sky or a polarisation.</summary>
/// <param name="Axis">1-based axis along which the spectra run.</param>
/// <param name="Lengths">Lengths from that axis on, up to the last that is longer than 1.</param>
internal readonly record struct SpectralShape(int Axis, IReadOnlyList<int> Lengths)
{
    /// <summary>Reads the shape; null where an axis is longer than any array.</summary>
    public static SpectralShape? Of(ImageHdu hdu)
    {
        var shape = hdu.Shape;
        if (shape.Any(static length => length > Array.MaxLength)) return null;
        var (first, end) = (0, shape.Count);
        while (first < end - 1 && shape[first] == 1) first++;
        while (end > first + 1 && shape[end - 1] == 1) end--;
        return new(first + 1, [.. shape.Skip(first).Take(end - first).Select(static length => (int)length)]);
    }
}
