using System.Globalization;
using Redshift.Testing;
using Xunit;

namespace Redshift.Fits.Tests;

public sealed class AstropyReadsTests
{
    private const string Script = """
        import struct, sys
        from astropy.io import fits
        def shown(values):
            return " ".join(struct.pack(">d", float(v)).hex() for v in values.ravel())
        with fits.open(sys.argv[1], checksum=True) as file:
            file.verify("exception")
            for unit in file:
                if unit.is_image and unit.data is not None:
                    print(unit.name, unit.data.shape, shown(unit.data))
            table = file["TABLE"]
            for column in table.columns:
                cells = table.data[column.name]
                text = "|".join(cells) if column.format.endswith("A") else shown(cells.astype("f8"))
                print(column.name, column.format, column.unit, text)
            print(repr(file[0].header["ABSTRACT"]), repr(file[0].header["ESO DET ID"]), file[0].header["EXPTIME"].hex())
        """;

    [AstropyFact]
    public void Output_IsReadByAstropyAsItWasGiven()
    {
        using var folder = new TemporaryFolder();
        var path = folder.File("ours.fits");
        using (var stream = File.Create(path)) Write(new FitsWriter(stream, checksums: true));
        string[] expected =
        [
            $"DOUBLES (1, 3) {Shown(1, double.NaN, -1e-300)}",
            $"UNSIGNED (3,) {Shown(0, 32768, 65535)}",
            $"BYTES (2,) {Shown(0, 255)}",
            $"WAVE 1D Angstrom {Shown(6562.8, 4861.3)}",
            $"FLUX 3E None {Shown(1, 2, 3, 4, 5, 6)}",
            $"COUNT 1J None {Shown(-1, int.MaxValue)}",
            "NAME 5A None one|three",
            $"GOOD 1L None {Shown(1, 0)}",
            "'a long story & more, a long story & more, a long story & more, a long story & more,' 12 0x1.999999999999ap-4",
        ];
        Assert.Equal(expected, ExternalTool.RunPython(Script, path).Split('\n', StringSplitOptions.RemoveEmptyEntries));
    }

    private static void Write(FitsWriter writer)
    {
        Card[] cards =
        [
            Card.Of("ABSTRACT", string.Concat(Enumerable.Repeat("a long story & more, ", 4))), Card.Of("ESO DET ID", 12), Card.Of("EXPTIME", 0.1),
        ];
        writer.WriteImage("DOUBLES", new double[] { 1, double.NaN, -1e-300 }, [3, 1], cards);
        writer.WriteImage("UNSIGNED", new short[] { short.MinValue, 0, short.MaxValue }, [3], [Card.Of("BZERO", 32768)]);
        writer.WriteImage("BYTES", new byte[] { 0, 255 }, [2]);
        ColumnDefinition[] columns =
        [
            ColumnDefinition.Doubles("WAVE", [6562.8, 4861.3]) with { Unit = "Angstrom" },
            ColumnDefinition.Singles("FLUX", [1, 2, 3, 4, 5, 6], 3),
            ColumnDefinition.Int32s("COUNT", [-1, int.MaxValue]),
            ColumnDefinition.Strings("NAME", ["one", "three"]),
            ColumnDefinition.Logicals("GOOD", row => row == 0),
        ];
        writer.WriteTable("TABLE", 2, columns);
    }

    private static string Shown(params double[] values) =>
        string.Join(' ', values.Select(value => BitConverter.DoubleToUInt64Bits(value).ToString("x16", CultureInfo.InvariantCulture)));
}
