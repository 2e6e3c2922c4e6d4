using System.Globalization;
using Redshift.Fits;
using Redshift.Pipeline.Load.Images;
using Redshift.Pipeline.Load.Layouts;
using Redshift.Pipeline.Load.Tables;

namespace Redshift.Pipeline.Load.Rules;

/// <summary>Finds what a rule names in a FITS file.</summary>
/// <param name="file">The file.</param>
/// <param name="own">The unit that is meant where a reference names none; null for the first with data.</param>
internal sealed class FitsReferences(FitsFile file, Hdu? own)
{
    /// <summary>The units of an index or a name.</summary>
    public static IReadOnlyList<Hdu> Units(FitsFile file, string name) =>
    [
        .. int.TryParse(name, NumberStyles.None, CultureInfo.InvariantCulture, out var index)
            ? file.Hdus.Where(hdu => hdu.Index == index)
            : file.Hdus.Where(hdu => hdu.Name.Equals(name, StringComparison.OrdinalIgnoreCase)),
    ];

    /// <summary>The array of a reference and the unit it is in.</summary>
    /// <param name="text">The reference.</param>
    /// <param name="flux">The flux to which it belongs; null for the flux itself.</param>
    /// <exception cref="LoadException">There is none.</exception>
    public (NumberArray Array, Hdu Hdu) Array(string text, NumberArray? flux = null)
    {
        var reference = ArrayReference.Parse(text);
        // A single word may be a column of the rule's unit or the name of another unit.
        if (reference is { Hdu: null, Column: { } word } && Find(word) is { } named && !HasColumn(Own(), word))
            reference = new(word, null, null, null, false);
        var hdu = UnitOf(reference);
        return hdu switch
        {
            TableHdu table => (TableUnits.ArrayOf(ColumnOf(table, reference.Column) ?? throw Missing(text)), hdu),
            ImageHdu { Count: > 0 } image => (OfImage(image, reference, flux) ?? throw Missing(text), hdu),
            _ => throw Missing(text),
        };
    }

    /// <summary>The column of a reference.</summary>
    /// <exception cref="LoadException">There is none.</exception>
    public TableColumn Column(string text)
    {
        var reference = ArrayReference.Parse(text);
        return UnitOf(reference) is TableHdu table && ColumnOf(table, reference.Column) is { } column ? column : throw Missing(text);
    }

    /// <summary>The unit of a reference.</summary>
    /// <exception cref="LoadException">There is none.</exception>
    public Hdu UnitOf(ArrayReference reference) =>
        reference.Hdu is { } name ? Find(name) ?? throw Missing($"HDU {name}") : Own();

    /// <summary>The refusal of a rule that names what is not there.</summary>
    public static LoadException Missing(string what) =>
        new("pipeline file, [[load]]", $"{what}, which the file does not have", "the places of arrays in the file");

    private Hdu Own() => own
        ?? file.Hdus.FirstOrDefault(static hdu => hdu is ImageHdu { Count: > 0 } or TableHdu { RowCount: > 0 })
        ?? throw Missing("data");

    private Hdu? Find(string name) => Units(file, name) is [var first, ..] ? first : null;

    private static bool HasColumn(Hdu hdu, string name) => hdu is TableHdu table && ColumnOf(table, name) is not null;

    private static TableColumn? ColumnOf(TableHdu table, string? name)
    {
        if (name is null || table.RowCount == 0) return null;
        return table.Find(name)
            ?? (int.TryParse(name, NumberStyles.None, CultureInfo.InvariantCulture, out var number) && number >= 1 && number <= table.Columns.Count
                ? table.Columns[number - 1]
                : null);
    }

    private static NumberArray? OfImage(ImageHdu image, ArrayReference reference, NumberArray? flux)
    {
        if (SpectralShape.Of(image) is not { Lengths: [var length, ..] lengths }) return null;
        var rows = image.Count / length;
        if (reference.Column is { } column) return SidewaysColumn(image, column);
        if (reference.Row is { } row) return row < rows ? Part(image, length, 1, row, $"row {row}") : null;
        if (reference.Band is { } band) return BandOf(image, lengths, band);
        if (flux is not null && ImageFamily.ArrayOf(image, flux.Length, flux.Rows) is { } companion) return companion;
        return rows <= System.Array.MaxLength ? Part(image, length, (int)rows, 0, "") : null;
    }

    private static ImageArray? BandOf(ImageHdu image, IReadOnlyList<int> lengths, int band) =>
        lengths is [var length, var rows, var bands] && band < bands ? Part(image, length, rows, (long)band * rows, $"band {band}") : null;

    private static ImageArray Part(ImageHdu image, int length, int rows, long firstRow, string name) =>
        new(image, length, rows, firstRow * length, length) { Place = $"HDU {image.Index} {name}".TrimEnd(), Label = ImageFamily.LabelOf(image) };

    private static ImageColumnArray? SidewaysColumn(ImageHdu image, string text) =>
        image.Shape.Count == 2 && int.TryParse(text, NumberStyles.None, CultureInfo.InvariantCulture, out var number) && number >= 1 && number <= image.Shape[0]
            ? new(image, number - 1) { Place = $"HDU {image.Index} column {number}", Label = ImageFamily.LabelOf(image) }
            : null;
}
