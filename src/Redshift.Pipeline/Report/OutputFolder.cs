namespace Redshift.Pipeline.Report;

/// <summary>The output folder of a run, held so that no other run writes there at the same time.</summary>
public sealed class OutputFolder : IDisposable
{
    private readonly FileStream _lock;

    /// <summary>Takes hold of the folder, making it where it does not exist.</summary>
    /// <param name="path">The folder.</param>
    /// <exception cref="FolderInUseException">Another run writes there.</exception>
    /// <exception cref="IOException">The folder cannot be written.</exception>
    public OutputFolder(string path)
    {
        Path = path;
        try
        {
            Directory.CreateDirectory(path);
            _lock = Lock(path);
        }
        catch (Exception problem) when (problem is UnauthorizedAccessException or FileNotFoundException or DirectoryNotFoundException || File.Exists(path))
        {
            throw new IOException($"{path}: found {Obstacle(path)}; expected a folder to write to, or a name for a new one", problem);
        }
    }

    /// <summary>The folder.</summary>
    public string Path { get; }

    /// <inheritdoc/>
    public void Dispose() => _lock.Dispose();

    private static string Obstacle(string path) =>
        File.Exists(path) ? "a file"
        : Directory.Exists(path) ? "a folder that may not be written to"
        : "a place where no folder may be made";

    private static FileStream Lock(string folder)
    {
        var path = System.IO.Path.Combine(folder, ".in-use");
        try
        {
            return new(path, FileMode.OpenOrCreate, FileAccess.Write, FileShare.None, 1, FileOptions.DeleteOnClose);
        }
        catch (IOException) when (File.Exists(path))
        {
            throw new FolderInUseException(folder);
        }
    }
}
