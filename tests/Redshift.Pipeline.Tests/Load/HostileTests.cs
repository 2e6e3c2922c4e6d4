using System.IO.Compression;
using System.Text;
using CsCheck;
using Redshift.Fits;
using Redshift.Pipeline.Load;
using Redshift.Testing;
using Xunit;

namespace Redshift.Pipeline.Tests.Load;

/// <summary>Files that are broken, empty, absurd or malicious end as one reject each; nothing is thrown.</summary>
public sealed class HostileTests : IDisposable
{
    private readonly LoadBench _bench = new();

    public void Dispose() => _bench.Dispose();

    [Fact]
    public void File_that_is_not_there_is_refused() =>
        Assert.Equal("file", LoadBench.Refused(_bench.Path(_bench.FileIn("none.fits"))).Place);

    [Fact]
    public void Folder_is_refused() => Assert.Equal("a folder", LoadBench.Refused(_bench.Path(_bench.Folder)).Found);

    [Fact]
    public void Empty_file_is_refused() => Assert.Equal("nothing: it is empty", LoadBench.Refused(_bench.Bytes("empty.fits", [])).Found);

    [Fact]
    public void Binary_that_is_not_FITS_is_refused() =>
        Assert.Equal("line 1", LoadBench.Refused(_bench.Bytes("fork.fits", [0, 5, 0x16, 7, 0, 2, 0, 0, .. "Mac OS X"u8])).Place);

    [Theory]
    [InlineData("", "a line of more than 1048576 bytes")]
    [InlineData("\n", "more than 67108864 bytes")]
    public void Compressed_text_that_expands_without_end_is_refused(string end, string found)
    {
        var piece = Encoding.ASCII.GetBytes("#" + new string('0', 1 << 16) + end);
        using var target = new MemoryStream();
        using (var gzip = new GZipStream(target, CompressionLevel.Fastest, leaveOpen: true))
            for (var written = 0; written < 70 << 20; written += piece.Length) gzip.Write(piece);
        Assert.Equal(found, LoadBench.Refused(_bench.Damaged(target.ToArray())).Found);
    }

    [Fact]
    public void Header_without_data_is_refused_with_what_was_found()
    {
        var reject = LoadBench.Refused(_bench.Fits(static writer => writer.WriteHeader("")));
        Assert.Contains("HDU 0", reject.Found, StringComparison.Ordinal);
        Assert.StartsWith("a spectrum", reject.Expected, StringComparison.Ordinal);
    }

    [Fact]
    public void Truncated_file_is_refused()
    {
        using var stream = new MemoryStream();
        new FitsWriter(stream).WriteImage("", LoadBench.Flux(4000), [4000], LoadBench.Axis(5000, 1));
        var reject = LoadBench.Refused(_bench.Bytes("cut.fits", stream.ToArray()[..8000]));
        Assert.Equal("night/spectrum.fits", reject.Source);
    }

    [Fact]
    public void Flux_that_is_nowhere_finite_is_refused() =>
        Assert.Equal("fewer than 16 usable pixels", Refuse(LoadBench.Constant(double.NaN)).Found);

    [Fact]
    public void Flux_that_is_the_same_everywhere_is_refused() =>
        Assert.Equal("fewer than 16 usable pixels", Refuse(LoadBench.Constant(3)).Found);

    [Fact]
    public void Three_pixels_are_refused() => Assert.Equal("an image of 3", Refuse([1, 2, 3]).Found);

    [Fact]
    public void Four_axes_are_refused() => Assert.Equal("at most three axes", LoadBench.Refused(_bench.Fits(static writer =>
        writer.WriteImage("", new double[16 * 2 * 2 * 2], [16, 2, 2, 2], LoadBench.Axis(5000, 1)))).Expected);

    [Fact]
    public void Table_without_a_flux_is_refused_with_its_columns() =>
        Assert.Contains("MAGNITUDE", LoadBench.Refused(_bench.Fits(static writer =>
        writer.WriteTable("CATALOG", LoadBench.Pixels, [ColumnDefinition.Doubles("MAGNITUDE", LoadBench.Flux())]))).Found, StringComparison.Ordinal);

    [Fact]
    public void Absurd_axis_lengths_are_refused()
    {
        var bytes = new FitsText().Header("SIMPLE  =                    T", "BITPIX  =                  -64", "NAXIS   =                    2",
            "NAXIS1  =  9223372036854775807", "NAXIS2  =  9223372036854775807").Data(1, 2, 3).ToBytes();
        Assert.NotNull(LoadBench.Refused(_bench.Bytes("huge.fits", bytes)));
    }

    [Theory]
    [InlineData("CRVAL1  =                  NaN", "CDELT1  =                    1")]
    [InlineData("CRVAL1  =                1E400", "CDELT1  =                    1")]
    [InlineData("CRVAL1  =               5000.0", "CDELT1  =                    0")]
    [InlineData("CRVAL1  =                'abc'", "CDELT1  =                 '1,0'")]
    [InlineData("CRVAL1  =              -5000.0", "CDELT1  =                 -1.0")]
    public void Axis_that_gives_no_wavelengths_is_refused(string crval, string cdelt)
    {
        var bytes = new FitsText().Header("SIMPLE  =                    T", "BITPIX  =                    8", "NAXIS   =                    1",
            "NAXIS1  =                   64", crval, cdelt).Data([.. Enumerable.Range(1, 64).Select(static i => (byte)(i * 3))]).ToBytes();
        Assert.NotNull(LoadBench.Refused(_bench.Bytes("axis.fits", bytes)));
    }

    [Fact]
    public void Whatever_bytes_change_nothing_is_thrown()
    {
        byte[][] files = [Table(), Image(), Arms()];
        Gen.Select(Gen.Int[0, files.Length - 1], Gen.Select(Gen.Int[0, 20000], Gen.Byte).Array[1, 12]).Sample((which, changes) =>
        {
            byte[] bytes = [.. files[which]];
            foreach (var (at, value) in changes) bytes[at % bytes.Length] = value;
            Assert.NotEmpty(_bench.Damaged(bytes));
        }, iter: 600, threads: 1);
    }

    [Fact]
    public void Whatever_printable_characters_change_in_a_header_nothing_is_thrown()
    {
        byte[][] files = [Table(), Image(), Arms()];
        Gen.Select(Gen.Int[0, files.Length - 1], Gen.Select(Gen.Int[0, 2 * 2880], Gen.Char["0123456789.-+E'/ =TNAXIS1"]).Array[1, 6]).Sample((which, changes) =>
        {
            byte[] bytes = [.. files[which]];
            foreach (var (at, value) in changes) bytes[at % bytes.Length] = (byte)value;
            Assert.NotEmpty(_bench.Damaged(bytes));
        }, iter: 600, threads: 1);
    }

    [Fact]
    public void Whatever_text_is_given_nothing_is_thrown() =>
        Gen.String[Gen.Char["0123456789.,;-+eED#\t\n wavflux\0"], 0, 400].Sample(text => Assert.NotEmpty(_bench.Damaged(Encoding.UTF8.GetBytes(text))), iter: 1000, threads: 1);

    private Pipeline.Observations.Reject Refuse(double[] flux) =>
        LoadBench.Refused(_bench.Fits(writer => writer.WriteImage("", flux, [flux.Length], LoadBench.Axis(5000, 1))));

    private static byte[] Written(Action<FitsWriter> write)
    {
        using var stream = new MemoryStream();
        write(new FitsWriter(stream));
        return stream.ToArray();
    }

    private static byte[] Table() => Written(static writer => writer.WriteTable("SPECTRUM", 2,
    [
        ColumnDefinition.Int16s("SPORDER", [1, 2]),
        ColumnDefinition.Doubles("WAVE", [.. LoadBench.Linear(500, 1), .. LoadBench.Linear(600, 1)], LoadBench.Pixels) with { Unit = "nm", Ucd = "em.wl" },
        ColumnDefinition.Doubles("FLUX", [.. LoadBench.Flux(), .. LoadBench.Flux()], LoadBench.Pixels) with { Unit = "mJy" },
        ColumnDefinition.Doubles("ERR", LoadBench.Constant(0.5, 2 * LoadBench.Pixels), LoadBench.Pixels),
    ], [Card.Of("DATE-OBS", "2022-10-14T21:34:00"), Card.Of("SPECSYS", "BARYCENT"), Card.Of("RA", "12:30:00"), Card.Of("DEC", "-05:15:00")]));

    private static byte[] Image() =>
        Written(static writer => writer.WriteImage("", [.. LoadBench.Flux(), .. LoadBench.Flux()], [LoadBench.Pixels, 2],
    [
        Card.Of("WAT2_001", "wtype=multispec spec1 = \"1 31 0 5800. 3. 64 0. 1. 8.\" spec2 = \"2 30 2 60"), Card.Of("WAT2_002", "00. 4.7 64 0. 1. 8. 1. 0. 3 2 1. 64. 6150. 150. 1 2 3\""),
        Card.Of("CTYPE1", "MULTISPE"), Card.Of("APNUM1", "1 1"), Card.Of("CRVAL1", 1.0), Card.Of("CD1_1", 1.0),
    ]));

    private static byte[] Arms() => Written(static writer =>
    {
        writer.WriteImage("B_WAVELENGTH", LoadBench.Linear(5000, 1), [LoadBench.Pixels]);
        writer.WriteImage("B_FLUX", [.. LoadBench.Flux(), .. LoadBench.Flux()], [LoadBench.Pixels, 2]);
        writer.WriteImage("B_IVAR", LoadBench.Constant(4, 2 * LoadBench.Pixels), [LoadBench.Pixels, 2]);
        writer.WriteTable("FIBERMAP", 2, [ColumnDefinition.Int64s("TARGETID", [1, 2]), ColumnDefinition.Strings("TYPE", ["P", "S"])]);
    });
}
