namespace Redshift.Pipeline.Ledger;

/// <summary>Size and time of a file: as long as they stay, the file counts as unchanged.</summary>
/// <param name="Size">Bytes.</param>
/// <param name="Modified">Time of the last change in ticks of 100 ns, UTC.</param>
public readonly record struct FileStamp(long Size, long Modified)
{
    /// <summary>The stamp of no file: nothing on disk ever has it, so what bears it is looked at again.</summary>
    public static FileStamp None { get; } = new(-1, 0);

    /// <summary>The stamp of the file as it lies there now, <see cref="None"/> where there is none.</summary>
    public static FileStamp Of(string path)
    {
        var file = new FileInfo(path);
        return file.Exists ? new(file.Length, file.LastWriteTimeUtc.Ticks) : None;
    }
}
