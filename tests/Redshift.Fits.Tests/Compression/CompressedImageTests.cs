using Xunit;

namespace Redshift.Fits.Tests;

public sealed class CompressedImageTests
{
    public static TheoryData<string> Names => [.. CompressedFiles.Names];

    // Expected: the image HDU behind the compressed one, as astropy 5.2.1 decompressed it (Data/make.py).
    [Theory]
    [MemberData(nameof(Names))]
    public void ReadDoubles_CompressedImage_EqualsReferenceToTheLastBit(string name)
    {
        using var stream = CompressedFiles.Open(name);
        using var file = FitsFile.Open(stream, name);
        var packed = Assert.IsType<ImageHdu>(file.Hdus[1]);
        var expected = Assert.IsType<ImageHdu>(file.Hdus[2]);
        Assert.Equal(expected.Shape, packed.Shape);
        Assert.Equal(expected.Bitpix, packed.Bitpix);
        Assert.Equal(expected.ReadDoubles(0, (int)expected.Count), packed.ReadDoubles(0, (int)packed.Count));
        Assert.Null(file.Damage);
    }

    [Theory]
    [MemberData(nameof(Names))]
    public void ReadDoubles_AnyPart_EqualsThatPartOfTheWhole(string name)
    {
        using var stream = CompressedFiles.Open(name);
        using var file = FitsFile.Open(stream, name);
        var image = Assert.IsType<ImageHdu>(file.Hdus[1]);
        var whole = image.ReadDoubles(0, (int)image.Count);
        for (var first = 0; first < whole.Length; first += 29)
        {
            var count = Math.Min(37, whole.Length - first);
            Assert.Equal(whole[first..(first + count)], image.ReadDoubles(first, count));
        }
    }

    [Fact]
    public void Header_CompressedImage_IsThatOfAnImage()
    {
        using var stream = CompressedFiles.Open("rice-int16");
        using var file = FitsFile.Open(stream, "rice-int16");
        var header = file.Hdus[1].Header;
        Assert.Equal((16, 2, 14, 11), (header.GetInteger("BITPIX"), header.GetInteger("NAXIS"), header.GetInteger("NAXIS1"), header.GetInteger("NAXIS2")));
        Assert.Equal(("IMAGE", "PACKED"), (header.GetString("XTENSION"), file.Hdus[1].Name));
        Assert.False(header.Contains("TFORM1") || header.Contains("ZIMAGE") || header.Contains("ZCMPTYPE"));
    }
}
