using System.Globalization;
using Redshift.Fits;
using Redshift.Pipeline.Load.Images;
using Redshift.Pipeline.Load.Layouts;
using Redshift.Pipeline.Load.Tables;

namespace Redshift.Pipeline.Load.Rules;

/// <summary>Finds the arrays that a rule names in a FITS file.</summary>
/// <param name="file">The file.</param>
/// <param name="defaultHdu">The rule's own HDU, by index or name; null for the first with data.</param>
internal sealed class FitsReferences(FitsFile file, string? defaultHdu)
{
    /// <summary>The array of a reference and the unit it is in.</summary>
    /// <exception cref="LoadException">There is none.</exception>
    public (NumberArray Array, Hdu Hdu) Resolve(string text)
    {
        var reference = ArrayReference.Parse(text);
        // A single word may be a column of the rule's unit or the name of another unit.
        if (reference is { Hdu: null, Column: { } word } && Named(word) is { } named && !HasColumn(Default(), word))
            return (Whole(named, null), named);
        var hdu = HduOf(reference, Default());
        return hdu switch
        {
            TableHdu table => (Column(table, reference.Column ?? throw Missing(text)), hdu),
            ImageHdu image => (Whole(image, reference.Row), hdu),
            _ => throw Missing(text),
        };
    }

    /// <summary>The unit of a reference.</summary>
    public Hdu HduOf(ArrayReference reference, Hdu otherwise) =>
        reference.Hdu is { } name ? Named(name) ?? throw Missing($"HDU {name}") : otherwise;

    private Hdu Default() => defaultHdu is { } name
        ? Named(name) ?? throw Missing($"HDU {name}")
        : file.Hdus.FirstOrDefault(static hdu => hdu is ImageHdu { Count: > 0 } or TableHdu { RowCount: > 0 }) ?? throw Missing("data");

    private Hdu? Named(string name) =>
        int.TryParse(name, NumberStyles.None, CultureInfo.InvariantCulture, out var index)
            ? file.Hdus.FirstOrDefault(hdu => hdu.Index == index)
            : file.Hdus.FirstOrDefault(hdu => hdu.Name.Equals(name, StringComparison.OrdinalIgnoreCase));

    private static bool HasColumn(Hdu hdu, string name) => hdu is TableHdu table && table.Find(name) is not null;

    private static NumberArray Column(TableHdu table, string name) =>
        TableUnits.Form(table)?.FirstOrDefault(array => array.Label.Name.Equals(name, StringComparison.OrdinalIgnoreCase))
        ?? throw Missing($"HDU {table.Index} column {name}");

    private static ImageArray Whole(Hdu hdu, int? row)
    {
        if (hdu is not ImageHdu { Count: > 0 } image || image.Shape[0] > Array.MaxLength) throw Missing($"HDU {hdu.Index} as an image");
        var length = (int)image.Shape[0];
        var rows = image.Count / length;
        if (row >= rows || rows > int.MaxValue) throw Missing($"HDU {hdu.Index} row {row}");
        var label = ImageFamily.LabelOf(image);
        return row is { } one
            ? new(image, length, 1, (long)one * length) { Place = $"HDU {hdu.Index} row {one}", Label = label }
            : new(image, length, (int)rows, 0, length) { Place = $"HDU {hdu.Index}", Label = label };
    }

    private static LoadException Missing(string what) =>
        new("pipeline file, [[load]]", $"{what}, which the file does not have", "the places of arrays in the file");
}
