using Redshift.Testing;
using Xunit;

namespace Redshift.Fits.Tests;

public sealed class TableTests
{
    private static readonly string[] Primary =
        ["SIMPLE  =                    T", "BITPIX  =                    8", "NAXIS   =                    0"];

    [Fact]
    public void Columns_WiderThanTheRow_ThrowsHeader()
    {
        var table = Table(["NAXIS1  =                    4", "TFIELDS =                    1", "TFORM1  = '1D'"], 4);
        var error = Assert.Throws<FitsHeaderException>(() => table.Columns);
        Assert.Contains("expected columns within the 4 bytes of a row, found one that ends at 8", error.Message, StringComparison.Ordinal);
    }

    [Theory]
    [InlineData("'1Z'")]
    [InlineData("''")]
    [InlineData("'4'")]
    [InlineData("'2PE(3)'")]
    [InlineData("'99999999999E'")]
    public void Columns_UnknownFormat_ThrowsHeader(string form)
    {
        var table = Table(["NAXIS1  =                    4", "TFIELDS =                    1", $"TFORM1  = {form}"], 4);
        var error = Assert.Throws<FitsHeaderException>(() => table.Columns);
        Assert.Equal("TFORM1", error.Location.Keyword);
    }

    [Theory]
    [InlineData(new byte[] { 0, 0, 0, 3, 0, 0, 0, 0 })]
    [InlineData(new byte[] { 0, 0, 0, 1, 0, 0, 0, 5 })]
    [InlineData(new byte[] { 0, 0, 0, 1, 255, 255, 255, 255 })]
    [InlineData(new byte[] { 128, 0, 0, 1, 0, 0, 0, 0 })]
    public void ReadDoubles_DescriptorOutsideTheHeap_ThrowsIntegrity(byte[] descriptor)
    {
        string[] cards = ["NAXIS1  =                    8", "PCOUNT  =                    8", "TFIELDS =                    1", "TFORM1  = '1PE(2)'"];
        var column = Table(cards, [.. descriptor, .. new byte[8]]).Columns[0];
        var error = Assert.Throws<FitsIntegrityException>(() => column.ReadDoubles(0));
        Assert.Contains("expected an array within the heap of 8 bytes", error.Message, StringComparison.Ordinal);
    }

    [Fact]
    public void ReadDoubles_TextColumn_ThrowsUnsupported()
    {
        var column = Table(["NAXIS1  =                    4", "TFIELDS =                    1", "TTYPE1  = 'NAME'", "TFORM1  = '4A'"], 4).Columns[0];
        var error = Assert.Throws<FitsUnsupportedException>(() => column.ReadDoubles(0));
        Assert.Contains("column 1 'NAME' holds Text, not numbers", error.Message, StringComparison.Ordinal);
    }

    [Fact]
    public void ReadColumn_RowsOutside_ThrowsArgument()
    {
        var column = Table(["NAXIS1  =                    4", "TFIELDS =                    1", "TFORM1  = '1J'"], 4).Columns[0];
        Assert.Throws<ArgumentOutOfRangeException>(() => column.ReadDoubles(1));
        Assert.Throws<ArgumentOutOfRangeException>(() => column.ReadDoubles(-1));
        Assert.Throws<ArgumentOutOfRangeException>(() => column.ReadColumn(0, new double[2]));
    }

    // Section 7.2.1: a number without a written point has its last d digits behind it; a blank field is zero.
    [Theory]
    [InlineData("F8.2", "    1234", 12.34)]
    [InlineData("F8.2", "   12.5 ", 12.5)]
    [InlineData("F8.2", "        ", 0.0)]
    [InlineData("E8.2", " 1234E-1", 1.234)]
    [InlineData("D8.1", " 1.5D+02", 150.0)]
    [InlineData("I8", "   +42  ", 42.0)]
    public void ReadDoubles_AsciiField_FollowsFortran(string form, string field, double expected)
    {
        var column = AsciiTable(form, field).Columns[0];
        Assert.Equal(expected, Assert.Single(column.ReadDoubles(0)));
    }

    [Fact]
    public void ReadDoubles_AsciiGarbage_ThrowsIntegrity()
    {
        var error = Assert.Throws<FitsIntegrityException>(() => AsciiTable("F8.2", "1.2.3   ").Columns[0].ReadDoubles(0));
        Assert.Contains("expected a number, found '1.2.3   '", error.Message, StringComparison.Ordinal);
    }

    [Fact]
    public void ReadDoubles_ManyRowsPieceByPiece_EqualThoseInMemory()
    {
        using var folder = new TemporaryFolder();
        var values = Enumerable.Range(0, 300_000).Select(i => i * 0.5).ToArray();
        using (var stream = File.Create(folder.File("rows.fits")))
            new FitsWriter(stream).WriteTable("ROWS", values.Length, [ColumnDefinition.Doubles("X", values), ColumnDefinition.Int16s("Y", row => (short)row)]);
        using var file = FitsFile.Open(folder.File("rows.fits"), new FitsReadOptions { MemoryLimit = 1000 });
        var table = (TableHdu)file.Hdus[1];
        Assert.Equal(values, table.Find("X")!.ReadColumn());
        Assert.Equal(values.Select((_, i) => (double)(short)i), table.Find("Y")!.ReadColumn());
    }

    private static TableHdu AsciiTable(string form, string field)
    {
        string[] header = ["XTENSION= 'TABLE   '", "BITPIX  =                    8", "NAXIS   =                    2", "NAXIS1  =                    8", "NAXIS2  =                    1", "TFIELDS =                    1", "TBCOL1  = 1", $"TFORM1  = '{form}'"];
        return Open(new FitsText().Header(Primary).Header(header).Data(System.Text.Encoding.ASCII.GetBytes(field)));
    }

    private static TableHdu Table(string[] cards, params byte[] data)
    {
        string[] header = ["XTENSION= 'BINTABLE'", "BITPIX  =                    8", "NAXIS   =                    2", "NAXIS2  =                    1", .. cards];
        return Open(new FitsText().Header(Primary).Header(header).Data(data));
    }

    private static TableHdu Table(string[] cards, int bytes) => Table(cards, new byte[bytes]);

    private static TableHdu Open(FitsText text) => (TableHdu)FitsFile.Open(text.ToStream(), "test.fits").Hdus[1];
}
