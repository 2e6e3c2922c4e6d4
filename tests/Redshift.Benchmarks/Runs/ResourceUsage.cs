using System.Runtime.InteropServices;

namespace Redshift.Benchmarks.Runs;

/// <summary>What the system counts for the processes that this one started and waited for.</summary>
internal static partial class ResourceUsage
{
    private const int Children = -1;

    /// <summary>Processor time of all children that ended, user and system.</summary>
    public static TimeSpan OfChildren() => GetResourceUsage(Children, out var usage) == 0
        ? Seconds(usage.User) + Seconds(usage.System)
        : throw new InvalidOperationException("getrusage failed");

    private static TimeSpan Seconds(TimeValue value) => TimeSpan.FromSeconds(value.Seconds) + TimeSpan.FromMicroseconds(value.Microseconds);

    [LibraryImport("libc", EntryPoint = "getrusage")]
    [DefaultDllImportSearchPaths(DllImportSearchPath.SafeDirectories)]
    private static partial int GetResourceUsage(int who, out Usage usage);

    // struct timeval and struct rusage of 64-bit Linux (getrusage(2)).
    [StructLayout(LayoutKind.Sequential)]
    private struct TimeValue
    {
        public long Seconds;
        public long Microseconds;
    }

    [StructLayout(LayoutKind.Sequential, Size = 144)]
    private struct Usage
    {
        public TimeValue User;
        public TimeValue System;
    }
}
