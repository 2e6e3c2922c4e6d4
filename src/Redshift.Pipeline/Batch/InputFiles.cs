namespace Redshift.Pipeline.Batch;

/// <summary>Finds the files of a run. Neither the order of the paths nor a path given twice makes a difference.</summary>
public static class InputFiles
{
    /// <summary>All files at and below the paths, sorted by <see cref="InputFile.Source"/>, each once.</summary>
    /// <param name="paths">Files and folders; folders are walked to the bottom, without hidden files and linked folders.</param>
    /// <param name="except">A folder to leave out: the reports of an earlier run are no input.</param>
    /// <returns>The files; a path that does not exist becomes a file with a problem.</returns>
    public static IReadOnlyList<InputFile> Find(IEnumerable<string> paths, string? except)
    {
        var inputs = paths.Select(Path.GetFullPath).Select(Path.TrimEndingDirectorySeparator)
            .Distinct(StringComparer.Ordinal).ToList();
        if (inputs.Count == 0)
            return [];
        var root = CommonParent(inputs.Select(input => Directory.Exists(input) ? input : Path.GetDirectoryName(input)!));
        var excluded = except is null ? null : Path.TrimEndingDirectorySeparator(Path.GetFullPath(except));
        var files = inputs.SelectMany(input => Expand(root, input, excluded)).DistinctBy(file => file.Relative).ToArray();
        Array.Sort(files, static (a, b) =>
            string.CompareOrdinal(a.Source, b.Source) is var order and not 0 ? order : string.CompareOrdinal(a.Relative, b.Relative));
        return TellTwinsApart(files);
    }

    // A name that cannot be printed as it is may look like another one; the source must still be the file's own.
    private static InputFile[] TellTwinsApart(InputFile[] files)
    {
        for (var i = 1; i < files.Length; i++)
        {
            if (files[i].Printable == files[i - 1].Printable)
                files[i] = files[i] with { Twin = files[i - 1].Twin + 1 };
        }

        return files;
    }

    private static string CommonParent(IEnumerable<string> folders) => folders.Aggregate(CommonParent);

    private static string CommonParent(string first, string second)
    {
        while (!IsBelow(second, first))
            first = Path.GetDirectoryName(first)!;
        return first;
    }

    private static bool IsBelow(string path, string folder) =>
        string.Equals(path, folder, StringComparison.Ordinal)
        || path.StartsWith(Path.EndsInDirectorySeparator(folder) ? folder : folder + Path.DirectorySeparatorChar, StringComparison.Ordinal);

    private static IEnumerable<InputFile> Expand(string root, string input, string? excluded)
    {
        if (Directory.Exists(input))
            return Walk(root, input, excluded);
        return File.Exists(input)
            ? [FileAt(root, input)]
            : [FileAt(root, input) with { Problem = ("nothing at this path", "a file or folder") }];
    }

    private static IEnumerable<InputFile> Walk(string root, string folder, string? excluded)
    {
        if (string.Equals(folder, excluded, StringComparison.Ordinal))
            yield break;
        if (!TryList(folder, out var entries))
            yield return FileAt(root, folder) with { Problem = ("a folder that cannot be opened", "permission to read it") };
        foreach (var entry in entries)
        {
            if (entry is DirectoryInfo { LinkTarget: null } below)
            {
                foreach (var file in Walk(root, below.FullName, excluded))
                    yield return file;
            }
            else if (entry is FileInfo)
            {
                yield return FileAt(root, entry.FullName);
            }
        }
    }

    private static bool TryList(string folder, out FileSystemInfo[] entries)
    {
        try
        {
            entries = [.. new DirectoryInfo(folder).EnumerateFileSystemInfos().Where(entry => entry.Name[0] != '.')];
            return true;
        }
        catch (Exception problem) when (problem is IOException or UnauthorizedAccessException)
        {
            entries = [];
            return false;
        }
    }

    private static InputFile FileAt(string root, string path) => new(root, Path.GetRelativePath(root, path));
}
