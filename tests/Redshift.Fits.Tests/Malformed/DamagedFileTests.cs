using System.IO.Compression;
using System.Text;
using Redshift.Testing;
using Xunit;

namespace Redshift.Fits.Tests;

public sealed class DamagedFileTests
{
    private static readonly string[] Sound =
        ["SIMPLE  =                    T", "BITPIX  =                    8", "NAXIS   =                    1", "NAXIS1  =                    4"];

    [Theory]
    [InlineData("", "an empty file")]
    [InlineData("version https://example.org", "'version https://'")]
    [InlineData("SIMPLE", "'SIMPLE'")]
    public void Open_SomethingElse_ThrowsNotFits(string content, string found)
    {
        var error = Assert.Throws<NotFitsException>(() => Open(Encoding.ASCII.GetBytes(content)));
        Assert.Equal($"test.fits: not a FITS file: expected it to begin with 'SIMPLE  =', found {found}", error.Message);
    }

    [Fact]
    public void Open_ControlCharacters_DoNotReachTheMessage() =>
        Assert.Contains("'?[31mred'", Assert.Throws<NotFitsException>(() => Open(Encoding.ASCII.GetBytes("\u001b[31mred"))).Message, StringComparison.Ordinal);

    [Fact]
    public void Open_HeaderWithoutEnd_ThrowsTruncated()
    {
        var error = Assert.Throws<FitsTruncatedException>(() => Open(new FitsText().Records(Sound).ToBytes()));
        Assert.Equal("test.fits, HDU 0, byte 0: the file is cut short: expected an END card, found the end of the file", error.Message);
        Assert.Equal(new FitsLocation("test.fits", 0, null, 0), error.Location);
    }

    [Fact]
    public void Open_DataCutShort_ThrowsTruncated()
    {
        var error = Assert.Throws<FitsTruncatedException>(() => Open(new FitsText().Header(Sound).Raw(1, 2).ToBytes()));
        Assert.Contains("expected 4 bytes of data, found 2 bytes", error.Message, StringComparison.Ordinal);
        Assert.Equal(2880, error.Location.Offset);
    }

    [Theory]
    [InlineData("BITPIX  =                   12", "BITPIX", "expected 8, 16, 32, 64, -32 or -64, found '12'")]
    [InlineData("BITPIX  = 'eight'", "BITPIX", "expected an integer from -64 to 64, found 'eight'")]
    [InlineData("NAXIS   =                 1000", "NAXIS", "expected an integer from 0 to 999, found '1000'")]
    [InlineData("NAXIS1  =                   -4", "NAXIS1", "found '-4'")]
    [InlineData("NAXIS1  =                  4.0", "NAXIS1", "found '4.0'")]
    [InlineData("NAXIS1  =  9223372036854775807", "NAXIS", "a product beyond 64 bits")]
    public void Open_ImpossibleMandatoryCard_ThrowsHeader(string line, string keyword, string message)
    {
        string[] lines = [.. Sound.Select(sound => sound[..8] == line[..8] ? line : sound)];
        if (message.Contains("product", StringComparison.Ordinal)) lines[1] = "BITPIX  =                   64";
        var error = Assert.Throws<FitsHeaderException>(() => Open(new FitsText().Header(lines).Data(1, 2, 3, 4).ToBytes()));
        Assert.Contains(message, error.Message, StringComparison.Ordinal);
        Assert.Equal(keyword, error.Location.Keyword);
    }

    [Fact]
    public void Open_MissingMandatoryCard_ThrowsHeader()
    {
        var error = Assert.Throws<FitsHeaderException>(() => Open(new FitsText().Header(Sound[..3]).Data(1, 2, 3, 4).ToBytes()));
        Assert.Contains("keyword NAXIS1", error.Message, StringComparison.Ordinal);
        Assert.Contains("no such card", error.Message, StringComparison.Ordinal);
    }

    [Fact]
    public void Open_RandomGroups_ThrowsUnsupported()
    {
        string[] groups = ["SIMPLE  =                    T", "BITPIX  =                    8", "NAXIS   =                    2", "NAXIS1  =                    0", "NAXIS2  =                    4", "GROUPS  =                    T", "PCOUNT  =                    0", "GCOUNT  =                    1"];
        var error = Assert.Throws<FitsUnsupportedException>(() => Open(new FitsText().Header(groups).Data(1, 2, 3, 4).ToBytes()));
        Assert.Contains("random groups", error.Message, StringComparison.Ordinal);
    }

    [Fact]
    public void Open_MissingPadding_ReadsAllAndReportsIt()
    {
        using var file = Open(new FitsText().Header(Sound).Raw(1, 2, 3, 4).ToBytes());
        Assert.Equal([1, 2, 3, 4], ((ImageHdu)file.Hdus[0]).ReadDoubles(0, 4));
        Assert.IsType<FitsTruncatedException>(file.Damage);
    }

    [Fact]
    public void Open_TailWithoutEnd_KeepsTheSoundUnitsAndReportsIt()
    {
        using var file = Open(new FitsText().Header(Sound).Data(1, 2, 3, 4).Records("XTENSION= 'IMAGE   '").ToBytes());
        Assert.Equal([1, 2, 3, 4], ((ImageHdu)Assert.Single(file.Hdus)).ReadDoubles(0, 4));
        Assert.Contains("HDU 1, byte 5760", Assert.IsType<FitsTruncatedException>(file.Damage).Message, StringComparison.Ordinal);
    }

    [Fact]
    public void Open_TailThatIsNoHeader_IsReported()
    {
        using var file = Open(new FitsText().Header(Sound).Data(1, 2, 3, 4).Data(9, 9, 9).ToBytes());
        Assert.Single(file.Hdus);
        Assert.IsType<FitsHeaderException>(file.Damage);
    }

    [Fact]
    public void Open_ZerosBehindTheLastUnit_AreNoDamage()
    {
        using var file = Open(new FitsText().Header(Sound).Data(1, 2, 3, 4).Data(0).ToBytes());
        Assert.Null(file.Damage);
    }

    [Fact]
    public void Open_GzipCutShort_KeepsTheSoundUnits()
    {
        var content = new FitsText().Header(Sound).Data(1, 2, 3, 4)
            .Header("XTENSION= 'IMAGE   '", "BITPIX  =                    8", "NAXIS   =                    1", "NAXIS1  =               100000")
            .Data(RandomBytes(100_000)).ToBytes();
        using var file = Open(Zip(content)[..50_000]);
        Assert.Equal([1, 2, 3, 4], ((ImageHdu)Assert.Single(file.Hdus)).ReadDoubles(0, 4));
        Assert.NotNull(file.Damage);
    }

    [Fact]
    public void Open_GzipBeyondTheLimit_ThrowsUnsupported()
    {
        var content = new FitsText().Header(Sound).Data(new byte[100_000]).ToBytes();
        var options = new FitsReadOptions { MaxExpandedBytes = 50_000 };
        var error = Assert.Throws<FitsUnsupportedException>(() => FitsFile.Open(new MemoryStream(Zip(content)), "test.fits", options));
        Assert.Contains("longer than the 50000 bytes allowed", error.Message, StringComparison.Ordinal);
    }

    [Fact]
    public void Open_UnknownExtension_IsSkippedAndNamed()
    {
        string[] foreign = ["XTENSION= 'FOREIGN '", "BITPIX  =                    8", "NAXIS   =                    1", "NAXIS1  =                    3"];
        using var file = Open(new FitsText().Header(Sound).Data(1, 2, 3, 4).Header(foreign).Data(7, 7, 7).ToBytes());
        Assert.Equal("FOREIGN", Assert.IsType<OtherHdu>(file.Hdus[1]).Type);
        Assert.Null(file.Damage);
    }

    [Fact]
    public void ReadDoubles_AfterDisposal_Throws()
    {
        var file = Open(new FitsText().Header(Sound).Data(1, 2, 3, 4).ToBytes());
        file.Dispose();
        Assert.Throws<ObjectDisposedException>(() => ((ImageHdu)file.Hdus[0]).ReadDoubles(0, 4));
    }

    [Fact]
    public void CheckSums_ChangedByte_IsWrong()
    {
        var stream = new MemoryStream();
        new FitsWriter(stream, checksums: true).WriteImage("X", new double[] { 1, 2, 3 }, [3]);
        var bytes = stream.ToArray();
        using (var file = Open(bytes)) Assert.Equal((ChecksumState.Correct, ChecksumState.Correct), (file.Hdus[0].CheckData(), file.Hdus[0].CheckAll()));
        bytes[2881] ^= 4;
        using (var file = Open(bytes)) Assert.Equal((ChecksumState.Wrong, ChecksumState.Wrong), (file.Hdus[0].CheckData(), file.Hdus[0].CheckAll()));
    }

    private static FitsFile Open(byte[] bytes) => FitsFile.Open(new MemoryStream(bytes), "test.fits");

    private static byte[] RandomBytes(int count)
    {
        var bytes = new byte[count];
        new Random(1).NextBytes(bytes);
        return bytes;
    }

    private static byte[] Zip(byte[] content)
    {
        var target = new MemoryStream();
        using (var gzip = new GZipStream(target, CompressionLevel.Fastest)) gzip.Write(content);
        return target.ToArray();
    }
}
