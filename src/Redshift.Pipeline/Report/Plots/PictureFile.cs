using SkiaSharp;

namespace Redshift.Pipeline.Report.Plots;

/// <summary>Pictures on disk.</summary>
internal static class PictureFile
{
    /// <summary>Saves a picture as PNG, making the folders on the way.</summary>
    /// <exception cref="IOException">The file cannot be written.</exception>
    public static void Save(SKImage image, string path)
    {
        using var data = image.Encode(SKEncodedImageFormat.Png, 100);
        if (Path.GetDirectoryName(path) is { Length: > 0 } folder)
            Directory.CreateDirectory(folder);
        using var file = File.Create(path);
        data.SaveTo(file);
    }
}
