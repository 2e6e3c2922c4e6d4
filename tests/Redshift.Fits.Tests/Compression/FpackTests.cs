using Redshift.Testing;
using Xunit;

namespace Redshift.Fits.Tests;

public sealed class FpackTests
{
    // Two-dimensional, not a multiple of any tile, with a step, a gradient and noise.
    private const int Width = 61;
    private const int Height = 37;

    [ToolFact("fpack")]
    public void ReadDoubles_PackedImages_EqualWhatFunpackRestores()
    {
        using var folder = new TemporaryFolder();
        string[][] settings = [["-r"], ["-g"], ["-g2"], ["-h", "-s", "0"], ["-h", "-s", "3"], ["-r", "-q", "8"], ["-r", "-qz", "4"], ["-r", "-w"], ["-g1", "-q", "0"]];
        for (var i = 0; i < settings.Length; i++) Check(folder.File($"image{i}.fits"), settings[i]);
    }

    private static void Check(string path, string[] settings)
    {
        using (var stream = File.Create(path)) WriteImages(new FitsWriter(stream));
        Succeed("fpack", [.. settings, path]);
        File.Delete(path);
        Succeed("funpack", [path + ".fz"]);
        using var packed = FitsFile.Open(path + ".fz");
        using var plain = FitsFile.Open(path);
        var expected = Images(plain);
        var found = Images(packed);
        Assert.Equal(3, expected.Length);
        Assert.Equal(expected.Length, found.Length);
        for (var i = 0; i < expected.Length; i++) Assert.Equal(expected[i], found[i]);
    }

    private static double[][] Images(FitsFile file) =>
        [.. file.Hdus.OfType<ImageHdu>().Where(image => image.Count > 0).Select(image => image.ReadDoubles(0, (int)image.Count))];

    private static void WriteImages(FitsWriter writer)
    {
        var noise = new Random(5);
        var values = new double[Width * Height];
        for (var i = 0; i < values.Length; i++) values[i] = 500 + i % Width * 3 + (i > 900 ? 200 : 0) + 20 * noise.NextDouble();
        writer.WriteImage("SHORTS", [.. values.Select(value => (short)value)], [Width, Height], [Card.Of("BZERO", 32768)]);
        writer.WriteImage("SINGLES", [.. values.Select((value, i) => Float(value, i))], [Width, Height]);
        writer.WriteImage("INTS", [.. values.Select(value => (int)(1000 * value))], [Width, Height]);
    }

    // Blanks, exact zeros, and rows whose range is too wide to be quantised.
    private static float Float(double value, int i)
    {
        if (i % 400 == 7) return float.NaN;
        if (i / Width is 9 or 20) return (float)(value * Math.Pow(10, i % Width / 2));
        return i % 90 == 0 ? 0 : (float)value;
    }

    private static void Succeed(string program, string[] arguments)
    {
        var (exitCode, output) = ExternalTool.Run(program, arguments);
        Assert.True(exitCode == 0, $"{program} {string.Join(' ', arguments)}: {output}");
    }
}
