using Redshift.Testing;

namespace Redshift.Fits.Tests;

/// <summary>One file written by write_everything.py, and what astropy reads from it.</summary>
public sealed class AstropyFile : IDisposable
{
    private readonly TemporaryFolder _folder = new();
    private readonly Lazy<string[]> _lines;

    public AstropyFile() => _lines = new Lazy<string[]>(Write);

    public string Path => _folder.File("everything.fits");

    public string[] Lines => _lines.Value;

    public void Dispose() => _folder.Dispose();

    private string[] Write()
    {
        var script = System.IO.Path.Combine(AppContext.BaseDirectory, "Astropy", "write_everything.py");
        var (exitCode, output) = ExternalTool.Run(ExternalTool.Python, script, Path);
        return exitCode == 0
            ? output.Split('\n', StringSplitOptions.RemoveEmptyEntries)
            : throw new InvalidOperationException($"the script failed: {output}");
    }
}
