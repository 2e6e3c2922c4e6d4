using System.Collections.Frozen;

namespace Redshift.Pipeline.Load.Layouts;

/// <summary>The words by which files name the arms of a spectrograph.</summary>
internal static class ArmNames
{
    private static readonly FrozenSet<string> Names = new[]
    {
        "b", "r", "z", "g", "v", "i", "n", "m", "blue", "red", "green", "uvb", "vis", "nir", "ir", "uv", "fuv", "nuv", "swp", "lwp", "lwr",
        "fuva", "fuvb", "arm", "orange", "yellow",
    }.ToFrozenSet(StringComparer.Ordinal);

    /// <summary>Whether a lower-case word names an arm.</summary>
    public static bool Contains(string word) => Names.Contains(word);
}
