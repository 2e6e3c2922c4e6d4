namespace Redshift.Pipeline.Report;

/// <summary>The output folder of a run, held so that no other run writes there at the same time.</summary>
public sealed class OutputFolder : IDisposable
{
    private readonly FileStream _lock;

    /// <summary>Takes hold of the folder, making it where it does not exist.</summary>
    /// <param name="path">The folder.</param>
    /// <exception cref="FolderInUseException">Another run writes there.</exception>
    /// <exception cref="IOException">The folder cannot be written.</exception>
    /// <exception cref="UnauthorizedAccessException">The folder cannot be written.</exception>
    public OutputFolder(string path)
    {
        Directory.CreateDirectory(path);
        Path = path;
        _lock = Lock(path);
    }

    /// <summary>The folder.</summary>
    public string Path { get; }

    /// <inheritdoc/>
    public void Dispose() => _lock.Dispose();

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
