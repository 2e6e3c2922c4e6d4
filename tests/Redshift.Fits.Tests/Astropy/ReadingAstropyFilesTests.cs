using System.Globalization;
using System.IO.Compression;
using System.Text;
using Redshift.Testing;
using Xunit;

namespace Redshift.Fits.Tests;

public sealed class ReadingAstropyFilesTests(AstropyFile written) : IClassFixture<AstropyFile>
{
    [AstropyFact]
    public void EveryLayout_IsReadAsAstropyReadsIt()
    {
        var lines = written.Lines;
        using var file = FitsFile.Open(written.Path);
        CheckAll(file, lines);
    }

    [AstropyFact]
    public void EveryLayout_PieceByPiece_IsReadAsAstropyReadsIt()
    {
        var lines = written.Lines;
        using var file = FitsFile.Open(written.Path, new FitsReadOptions { MemoryLimit = 100 });
        CheckAll(file, lines);
    }

    [AstropyFact]
    public void EveryLayout_ThroughGzip_IsReadAsAstropyReadsIt()
    {
        var lines = written.Lines;
        using (var zipped = File.Create(written.Path + ".gz"))
        using (var gzip = new GZipStream(zipped, CompressionLevel.Fastest)) gzip.Write(File.ReadAllBytes(written.Path));
        using (var file = FitsFile.Open(written.Path + ".gz")) CheckAll(file, lines);
        using (var file = FitsFile.Open(written.Path + ".gz", new FitsReadOptions { MemoryLimit = 5000 })) CheckAll(file, lines);
    }

    private static void CheckAll(FitsFile file, string[] lines)
    {
        Assert.Null(file.Damage);
        Assert.True(lines.Length > 300);
        foreach (var line in lines) Assert.True(Holds(file, line), line);
    }

    private static bool Holds(FitsFile file, string line)
    {
        var words = line.Split(' ', StringSplitOptions.RemoveEmptyEntries);
        var hdu = file.Hdus[int.Parse(words[1], CultureInfo.InvariantCulture)];
        return words[0] switch
        {
            "P" => HoldsPixels((ImageHdu)hdu, words[2..]),
            "T" or "R" or "N" => HoldsCard(hdu.Header, words[0], words[2].Replace('_', ' '), words[3]),
            "I" when hdu is ImageHdu image => HoldsIntegers(image, words[4..]),
            "U" when hdu is ImageHdu image => HoldsUnsigned(image, words[4..]),
            _ => HoldsCell(((TableHdu)hdu).Find(words[2])!, words[0], long.Parse(words[3], CultureInfo.InvariantCulture), words[4..]),
        };
    }

    private static bool HoldsPixels(ImageHdu image, string[] expected)
    {
        var doubles = image.ReadDoubles(0, expected.Length);
        var singles = new float[expected.Length];
        image.ReadSingles(0, singles);
        return image.Count == expected.Length
            && doubles.SequenceEqual(expected.Select(Double))
            && singles.SequenceEqual(expected.Select(word => (float)Double(word)));
    }

    private static bool HoldsIntegers(ImageHdu image, string[] expected)
    {
        var values = new long[expected.Length];
        image.ReadIntegers(0, values);
        return values.SequenceEqual(expected.Select(Integer));
    }

    private static bool HoldsUnsigned(ImageHdu image, string[] expected)
    {
        var values = new ulong[expected.Length];
        image.ReadUnsigned(0, values);
        return values.SequenceEqual(expected.Select(Unsigned));
    }

    private static bool HoldsCard(Header header, string kind, string keyword, string expected) => kind switch
    {
        "T" => header.GetString(keyword) == Text(expected),
        "R" => header.GetDouble(keyword) == Double(expected),
        _ => header.GetInteger(keyword) == Integer(expected),
    };

    private static bool HoldsCell(TableColumn column, string kind, long row, string[] expected) => kind switch
    {
        "D" => column.ReadDoubles(row).SequenceEqual(expected.Select(Double)) && HoldsColumn(column, row, expected),
        "I" => column.ReadIntegers(row).SequenceEqual(expected.Select(Integer)),
        "U" => column.ReadUnsigned(row).SequenceEqual(expected.Select(Unsigned)),
        "S" => column.ReadStrings(row).SequenceEqual(expected.Select(Text)),
        "L" => column.ReadLogicals(row).SequenceEqual(expected.Select(word => (bool?)(word == "1"))),
        "X" => column.ReadBits(row).SequenceEqual(expected.Select(word => word == "1")),
        _ => column.ReadComplex(row).SelectMany(value => new[] { value.Real, value.Imaginary }).SequenceEqual(expected.Select(Double)),
    };

    private static bool HoldsColumn(TableColumn column, long row, string[] expected) =>
        column.IsVariableLength || column.Repeat != 1 || column.ReadColumn()[row].Equals(Double(expected[0]));

    private static double Double(string hex) => BitConverter.UInt64BitsToDouble(Convert.ToUInt64(hex, 16));

    private static long Integer(string word) => long.Parse(word, CultureInfo.InvariantCulture);

    private static ulong Unsigned(string word) => ulong.Parse(word, CultureInfo.InvariantCulture);

    private static string Text(string hex) => Encoding.Latin1.GetString(Convert.FromHexString(hex[1..]));
}
