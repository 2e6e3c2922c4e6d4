namespace Redshift.Testing;

/// <summary>Finds files of the repository from a test's build folder.</summary>
public static class Repository
{
    /// <summary>The folder with the solution.</summary>
    public static string Root { get; } = Find();

    /// <summary>A path below the root.</summary>
    public static string PathOf(params string[] parts) => Path.Combine([Root, .. parts]);

    private static string Find()
    {
        var folder = new DirectoryInfo(AppContext.BaseDirectory);
        while (!File.Exists(Path.Combine(folder.FullName, "Redshift.sln")))
            folder = folder.Parent ?? throw new InvalidOperationException("the tests run outside the repository");
        return folder.FullName;
    }
}
