namespace Redshift.Testing;

/// <summary>A folder that vanishes with all it holds.</summary>
public sealed class TemporaryFolder : IDisposable
{
    /// <summary>Its path.</summary>
    public string Path { get; } = Directory.CreateTempSubdirectory("redshift-test-").FullName;

    /// <summary>Path of a file in it.</summary>
    public string File(string name) => System.IO.Path.Combine(Path, name);

    /// <inheritdoc/>
    public void Dispose() => Directory.Delete(Path, recursive: true);
}
