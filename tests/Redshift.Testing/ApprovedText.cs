using Xunit;

namespace Redshift.Testing;

/// <summary>
/// Compares text that others depend on with a file that a person has read and approved. To approve a change, run the tests with
/// APPROVE=1 and read the difference before committing it.
/// </summary>
public static class ApprovedText
{
    /// <summary>Fails where the text is not as approved.</summary>
    /// <param name="actual">The text.</param>
    /// <param name="path">Path of the approved file below the repository's root.</param>
    public static void Check(string actual, params string[] path)
    {
        var file = Repository.PathOf(path);
        if (Environment.GetEnvironmentVariable("APPROVE") == "1")
        {
            Directory.CreateDirectory(Path.GetDirectoryName(file)!);
            File.WriteAllText(file, actual);
        }

        Assert.True(File.Exists(file), $"{file} does not exist; approve it with APPROVE=1");
        Assert.Equal(File.ReadAllText(file), actual);
    }
}
