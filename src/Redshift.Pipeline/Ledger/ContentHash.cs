using System.Globalization;
using System.IO.Hashing;

namespace Redshift.Pipeline.Ledger;

/// <summary>
/// Tells whether the bytes of a file changed. Nobody forges spectra against their own ledger, so speed counts and XXH3 with 128 bits
/// will do: two different files agree by chance once in 10^19 even among 10^9 files.
/// </summary>
public static class ContentHash
{
    /// <summary>The hash of a whole file, in hexadecimal digits.</summary>
    /// <exception cref="IOException">The file cannot be read.</exception>
    /// <exception cref="UnauthorizedAccessException">The file may not be read.</exception>
    public static string Of(string path)
    {
        // Sharing everything spares a lock, which network disks are slow to give. The pass also brings the file into the system's cache.
        using var file = new FileStream(
            path, FileMode.Open, FileAccess.Read, FileShare.ReadWrite | FileShare.Delete, 1, FileOptions.SequentialScan);
        var hash = new XxHash128();
        hash.Append(file);
        return hash.GetCurrentHashAsUInt128().ToString("x32", CultureInfo.InvariantCulture);
    }
}
