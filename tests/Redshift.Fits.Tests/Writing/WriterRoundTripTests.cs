using CsCheck;
using Redshift.Testing;
using Xunit;

namespace Redshift.Fits.Tests;

public sealed class WriterRoundTripTests
{
    [Fact]
    public void WriteImage_Doubles_AreReadBackBitByBit() =>
        Gen.Double.Array[0, 300].Sample(values =>
        {
            using var file = Written(writer => writer.WriteImage("FLUX", values, [values.Length]));
            var image = Assert.IsType<ImageHdu>(file.Hdus[0]);
            Assert.Equal(values, image.ReadDoubles(0, values.Length));
            Assert.Equal("FLUX", image.Name);
            Assert.Null(file.Damage);
        });

    [Fact]
    public void WriteTable_AllTypes_AreReadBack() =>
        Gen.Select(Gen.Double.Array[1, 40], Gen.Int, Gen.Long, Gen.Bool).Sample((values, number, big, flag) =>
        {
            var rows = values.Length;
            ColumnDefinition[] columns =
            [
                ColumnDefinition.Doubles("D", values) with { Unit = "Angstrom", Ucd = "em.wl", Comment = "wavelength in vacuum" },
                ColumnDefinition.Singles("E", row => (float)values[row]),
                ColumnDefinition.Int32s("J", row => number),
                ColumnDefinition.Int64s("K", row => big) with { Null = 7 },
                ColumnDefinition.Int16s("I", row => (short)row),
                ColumnDefinition.Bytes("B", new byte[rows * 3], 3),
                ColumnDefinition.Logicals("L", row => row == 0 ? null : flag),
                ColumnDefinition.Strings("A", [.. values.Select((_, i) => new string('x', i % 7))]),
                ColumnDefinition.Doubles("V", 3, row => [row, values[row], double.NaN]),
            ];
            using var file = Written(writer => writer.WriteTable("SPECTRUM", rows, columns));
            var table = Assert.IsType<TableHdu>(file.Hdus[1]);
            Assert.Equal(rows, table.RowCount);
            Assert.Equal(values, table.Columns[0].ReadColumn());
            Assert.Equal(("Angstrom", "em.wl", "wavelength in vacuum"), (table.Columns[0].Unit, table.Columns[0].Ucd, table.Columns[0].Comment));
            Assert.Equal(values.Select(v => (double)(float)v), table.Find("e")!.ReadColumn());
            Assert.Equal([number], table.Find("J")!.ReadIntegers(rows - 1));
            Assert.Equal([big], table.Find("K")!.ReadIntegers(0));
            Assert.Equal(Enumerable.Range(0, rows).Select(i => (double)i), table.Find("I")!.ReadColumn());
            Assert.Equal([0, 0, 0], table.Find("B")!.ReadDoubles(rows - 1));
            Assert.Equal([rows == 1 ? null : flag], table.Find("L")!.ReadLogicals(rows - 1));
            Assert.Equal(new string('x', (rows - 1) % 7), table.Find("A")!.ReadString(rows - 1));
            Assert.Equal([rows - 1, values[^1], double.NaN], table.Find("V")!.ReadDoubles(rows - 1));
        });

    [Fact]
    public void Cards_AnyText_IsReadBack() =>
        Gen.String[Gen.Char[' ', '~'], 0, 400].Sample(text =>
        {
            Card[] cards = [Card.Of("LONGTEXT", text, "a comment"), Card.Of("ESO DET CHIP1 NAME", text), Card.Of("AFTER", 1.5e-300)];
            using var file = Written(writer => writer.WriteImage("", new double[1], [1], cards));
            var header = file.Hdus[0].Header;
            Assert.Equal(text.TrimEnd(' '), header.GetString("longtext"));
            Assert.Equal(text.TrimEnd(' '), header.GetString("HIERARCH ESO DET CHIP1 NAME"));
            Assert.Equal(1.5e-300, header.GetDouble("AFTER"));
        });

    [Fact]
    public void Cards_AnyNumber_IsReadBackBitByBit() =>
        Gen.Select(Gen.Double.Where(double.IsFinite), Gen.Long, Gen.Bool).Sample((real, integer, logical) =>
        {
            Card[] cards = [Card.Of("REAL", real), Card.Of("INTEGER", integer), Card.Of("ESO A LOGICAL", logical)];
            using var file = Written(writer => writer.WriteHeader("", cards));
            var header = file.Hdus[0].Header;
            Assert.Equal(real, header.GetDouble("REAL"));
            Assert.Equal(integer, header.GetInteger("INTEGER"));
            Assert.Equal(logical, header.GetLogical("ESO A LOGICAL"));
        });

    [ToolFact("fitsverify")]
    public void Output_PassesFitsverifyWithoutErrorOrWarning()
    {
        using var folder = new TemporaryFolder();
        var path = folder.File("written.fits");
        using (var stream = File.Create(path)) WriteOneOfEach(new FitsWriter(stream, checksums: true));
        var (exitCode, output) = ExternalTool.Run("fitsverify", path);
        Assert.True(exitCode == 0 && output.Contains("0 warning(s) and 0 error(s)", StringComparison.Ordinal), output);
    }

    private static void WriteOneOfEach(FitsWriter writer)
    {
        Card[] cards =
        [
            Card.Of("OBJECT", "it's a 'star'", "target"), Card.Of("EXPTIME", 900.0, "s"), Card.Of("ESO DET ID", 12),
            Card.Of("ABSTRACT", string.Concat(Enumerable.Repeat("a long 'story' ", 30))), Card.Commentary("HISTORY", new string('h', 200)),
        ];
        writer.WriteImage("DOUBLES", new double[] { 1, double.NaN, -3 }, [3, 1], cards);
        writer.WriteImage("SINGLES", new float[6], [3, 2]);
        writer.WriteImage("SHORTS", new short[] { 1, 2, 3 }, [3], [Card.Of("BZERO", 32768), Card.Of("BUNIT", "adu")]);
        writer.WriteHeader("NOTHING");
        ColumnDefinition[] columns =
        [
            ColumnDefinition.Doubles("WAVE", [1, 2]) with { Unit = "Angstrom", Ucd = "em.wl", Utype = "spec:Data.SpectralAxis.Value", Comment = "vacuum" },
            ColumnDefinition.Singles("FLUX", new float[12], 6) with { Dimensions = [3, 2] },
            ColumnDefinition.Strings("NAME", ["one", "three"]),
            ColumnDefinition.Int32s("COUNT", [1, -1]) with { Null = -1 },
            ColumnDefinition.Int16s("UNSIGNED", [1, -1]) with { Zero = 32768 },
            ColumnDefinition.Logicals("GOOD", row => row == 0),
            ColumnDefinition.Strings("EMPTY", ["", ""]),
        ];
        writer.WriteTable("TABLE", 2, columns, cards);
    }

    private static FitsFile Written(Action<FitsWriter> write)
    {
        var stream = new MemoryStream();
        write(new FitsWriter(stream, checksums: true));
        stream.Position = 0;
        return FitsFile.Open(stream, "written");
    }
}
