namespace Redshift.Fits.Tests;

/// <summary>Looks at everything a file offers, a bounded number of elements of each.</summary>
internal static class Tour
{
    private const int Most = 5000;

    public static void Visit(byte[] bytes)
    {
        // A small limit keeps mutations quick that claim huge images.
        var options = new FitsReadOptions { MaxExpandedBytes = 1 << 20 };
        using var file = FitsFile.Open(new MemoryStream(bytes), "mutated", options);
        foreach (var hdu in file.Hdus) Try(() => Visit(hdu));
    }

    private static void Visit(Hdu hdu)
    {
        foreach (var card in hdu.Header) _ = (card.ToString(), card.Value.AsDouble(), card.Value.AsComplex(), card.Value.AsInteger());
        _ = (hdu.Name, hdu.Version, hdu.CheckData(), hdu.CheckAll());
        if (hdu is ImageHdu image) Visit(image);
        if (hdu is TableHdu table) Visit(table);
    }

    private static void Visit(ImageHdu image)
    {
        var count = (int)Math.Min(Most, image.Count);
        Try(() => image.ReadDoubles(0, count));
        Try(() => image.ReadSingles(image.Count - count, new float[count]));
        Try(() => image.ReadIntegers(0, new long[count]));
        Try(() => image.ReadUnsigned(0, new ulong[count]));
    }

    private static void Visit(TableHdu table)
    {
        foreach (var column in table.Columns)
        {
            _ = (column.Name, column.Unit, column.Ucd, column.Utype, column.Comment, column.Dimensions.Count);
            if (table.RowCount == 0) continue;
            Try(() => column.ReadColumn(0, new double[Math.Min(Most, table.RowCount)]));
            VisitAsEverything(column);
            Visit(column, table.RowCount / 2);
            Visit(column, table.RowCount - 1);
        }
    }

    private static void Visit(TableColumn column, long row) => Try(() =>
    {
        _ = column.LengthAt(row);
        if (column.IsNumeric) column.ReadDoubles(row);
        if (column.IsText) column.ReadStrings(row);
    });

    // Most of these are refused, which takes its time: one row is enough.
    private static void VisitAsEverything(TableColumn column)
    {
        Try(() => column.ReadDoubles(0));
        Try(() => column.ReadIntegers(0));
        Try(() => column.ReadUnsigned(0));
        Try(() => column.ReadString(0));
        Try(() => column.ReadStrings(0));
        Try(() => column.ReadLogicals(0));
        Try(() => column.ReadBits(0));
        Try(() => column.ReadComplex(0));
    }

    // Every refusal must be of the FITS family; anything else is a bug and ends the tour.
    private static void Try(Action read)
    {
        try
        {
            read();
        }
        catch (FitsException)
        {
        }
    }
}
