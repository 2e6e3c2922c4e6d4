using Redshift.Fits;
using Redshift.Pipeline.Ledger;

namespace Redshift.Pipeline.Batch;

/// <summary>
/// Tells which files of a folder are complete while others are still being written. It looks again and again, because notices of changes
/// do not come through from network disks.
/// </summary>
/// <param name="folder">The folder.</param>
/// <param name="except">A folder below it to leave out, or null.</param>
public sealed class FolderWatch(string folder, string? except)
{
    /// <summary>
    /// Looks after which a file that rests is taken as it is, though its FITS content is cut short: then nobody is writing it any more, and
    /// an observer should hear of it. Should it grow after all, it is read again.
    /// </summary>
    public const int Patience = 12;

    private Dictionary<string, Sight> _seen = new(StringComparer.Ordinal);
    private HashSet<(string Path, FileStamp Stamp)> _told = [];

    /// <summary>Whether the folder can be seen at the moment.</summary>
    public bool IsThere => Directory.Exists(folder);

    /// <summary>Looks at the folder once.</summary>
    /// <returns>All files that have not changed since the last look and are whole; null where these are the same as at the last look.</returns>
    public IReadOnlyList<InputFile>? Look()
    {
        if (!IsThere)
            return null;
        var files = InputFiles.Find([folder], except).Where(static file => file.Problem is null).ToList();
        var seen = new Dictionary<string, Sight>(StringComparer.Ordinal);
        foreach (var file in files)
            seen[file.Path] = Look(file.Path);
        _seen = seen;
        var complete = files.Where(file => seen[file.Path].IsComplete).ToList();
        var told = complete.Select(file => (file.Path, seen[file.Path].Stamp)).ToHashSet();
        if (told.SetEquals(_told))
            return null;
        _told = told;
        return complete;
    }

    private Sight Look(string path)
    {
        var stamp = FileStamp.Of(path);
        if (!_seen.TryGetValue(path, out var before) || before.Stamp != stamp)
            return new(stamp, 0, IsWhole: false);
        return before.IsWhole ? before : new(stamp, before.Rests + 1, IsWhole(path));
    }

    // Text tells nothing of its length; that it rests must do.
    private static bool IsWhole(string path)
    {
        try
        {
            using var file = FitsFile.Open(path);
            return file.Damage is null;
        }
        catch (NotFitsException)
        {
            return new FileInfo(path) is { Exists: true, Length: > 0 };
        }
        catch (Exception trouble) when (trouble is FitsException or IOException or UnauthorizedAccessException)
        {
            return false;
        }
    }

    private readonly record struct Sight(FileStamp Stamp, int Rests, bool IsWhole)
    {
        public bool IsComplete => IsWhole || Rests >= Patience;
    }
}
