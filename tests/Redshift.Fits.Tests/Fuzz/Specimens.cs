using System.IO.Compression;
using System.Text;
using Redshift.Testing;

namespace Redshift.Fits.Tests;

/// <summary>Sound files from which hostile ones are made.</summary>
internal static class Specimens
{
    public static byte[][] All() =>
        [Images(), Tables(), VariableLength(), Ascii(), Gzipped(), .. CompressedFiles.Names.Select(name => Expanded(CompressedFiles.Open(name)))];

    private static byte[] Images()
    {
        Card[] cards = [Card.Of("BSCALE", 0.5), Card.Of("BZERO", 32768.0), Card.Of("BLANK", 3), Card.Of("ESO DET ID", new string('x', 90))];
        return Written(writer =>
        {
            writer.WriteImage("SHORTS", new short[] { 1, 2, 3, 4, 5, 6 }, [3, 2], cards);
            writer.WriteImage("SINGLES", new float[40], [40]);
            writer.WriteImage("LONGS", new long[10], [10], [Card.Of("BZERO", 9223372036854775808.0)]);
        });
    }

    private static byte[] Tables() => Written(writer => writer.WriteTable(
        "TABLE",
        5,
        [
            ColumnDefinition.Doubles("WAVE", [1, 2, 3, 4, 5]) with { Unit = "Angstrom" },
            ColumnDefinition.Singles("FLUX", new float[30], 6) with { Dimensions = [3, 2] },
            ColumnDefinition.Strings("NAME", ["a", "bb", "ccc", "", "e"]),
            ColumnDefinition.Int32s("COUNT", [1, 2, 3, 4, 5]) with { Null = 3, Zero = 7 },
            ColumnDefinition.Logicals("GOOD", row => row == 0),
        ]));

    private static byte[] VariableLength() => new FitsText()
        .Header("SIMPLE  =                    T", "BITPIX  =                    8", "NAXIS   =                    0")
        .Header(
            "XTENSION= 'BINTABLE'", "BITPIX  =                    8", "NAXIS   =                    2", "NAXIS1  =                   24",
            "NAXIS2  =                    1", "PCOUNT  =                   16", "GCOUNT  =                    1",
            "TFIELDS =                    2", "TFORM1  = '1PE(2)'", "TFORM2  = '1QJ(2)'")
        .Data([0, 0, 0, 2, 0, 0, 0, 0, .. new byte[7], 2, .. new byte[7], 8, .. new byte[16]])
        .ToBytes();

    private static byte[] Ascii() => new FitsText()
        .Header("SIMPLE  =                    T", "BITPIX  =                    8", "NAXIS   =                    0")
        .Header(
            "XTENSION= 'TABLE   '", "BITPIX  =                    8", "NAXIS   =                    2", "NAXIS1  =                   20",
            "NAXIS2  =                    2", "PCOUNT  =                    0", "GCOUNT  =                    1",
            "TFIELDS =                    3", "TBCOL1  = 1", "TFORM1  = 'F8.3'", "TBCOL2  = 9", "TFORM2  = 'I5'", "TNULL2  = '-1'",
            "TBCOL3  = 14", "TFORM3  = 'A7'")
        .Data(Encoding.ASCII.GetBytes("   1.250   12  first2.5D+003   -1second "))
        .ToBytes();

    private static byte[] Gzipped()
    {
        var target = new MemoryStream();
        using (var gzip = new GZipStream(target, CompressionLevel.Optimal)) gzip.Write(Tables());
        return target.ToArray();
    }

    private static byte[] Expanded(Stream compressed)
    {
        using var gzip = new GZipStream(compressed, CompressionMode.Decompress);
        var target = new MemoryStream();
        gzip.CopyTo(target);
        return target.ToArray();
    }

    private static byte[] Written(Action<FitsWriter> write)
    {
        var stream = new MemoryStream();
        write(new FitsWriter(stream, checksums: true));
        return stream.ToArray();
    }
}
