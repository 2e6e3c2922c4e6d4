namespace Redshift.Pipeline.Ledger;

/// <summary>How the ledger keeps its promise that a commit is whole or not there at all.</summary>
internal static class JournalChoice
{
    // A write-ahead log needs memory that all processes share, which only disks of this machine give (https://sqlite.org/wal.html).
    // What is not known to be one is treated as a network disk, where a rollback journal and no sharing is always right.
    private static readonly string[] LocalDisks =
        ["ext2", "ext3", "ext4", "xfs", "btrfs", "zfs", "f2fs", "tmpfs", "overlay", "overlayfs", "apfs", "hfs", "ntfs", "msdos", "vfat", "exfat"];

    /// <summary>The statements that set up the connection for the disk that holds the folder.</summary>
    public static string For(string folder) => IsLocal(FormatOf(folder))
        ? "PRAGMA journal_mode=WAL; PRAGMA synchronous=FULL;"
        : "PRAGMA locking_mode=EXCLUSIVE; PRAGMA journal_mode=DELETE; PRAGMA synchronous=FULL;";

    /// <summary>Whether a format, as the system names it, is one of this machine's own disks.</summary>
    public static bool IsLocal(string format) => LocalDisks.Contains(format, StringComparer.OrdinalIgnoreCase);

    private static string FormatOf(string folder)
    {
        try
        {
            return new DriveInfo(Path.GetFullPath(folder)).DriveFormat;
        }
        catch (Exception unknown) when (unknown is IOException or UnauthorizedAccessException or ArgumentException)
        {
            return "";
        }
    }
}
