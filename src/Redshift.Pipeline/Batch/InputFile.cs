using Redshift.Pipeline.Observations;
using Redshift.Pipeline.Report;

namespace Redshift.Pipeline.Batch;

/// <summary>One file to read.</summary>
/// <param name="Root">The common parent of all inputs.</param>
/// <param name="Relative">Path below <paramref name="Root"/>.</param>
/// <param name="Problem">What keeps it from being read, as (found, expected), or null.</param>
/// <param name="Twin">Number of files before it whose names look the same once they are printable.</param>
public readonly record struct InputFile(string Root, string Relative, (string Found, string Expected)? Problem = null, int Twin = 0)
{
    /// <summary>Where the file is.</summary>
    public string Path => System.IO.Path.Combine(Root, Relative);

    /// <summary>Its name in catalogues and messages: printable, with <c>/</c> between folders.</summary>
    public string Source => Printable + (Twin > 0 ? FormattableString.Invariant($" ({Twin + 1})") : "");

    /// <summary>Its name without regard to others that look the same.</summary>
    internal string Printable => HarmlessText.ForTable(Relative.Replace(System.IO.Path.DirectorySeparatorChar, '/'));

    /// <summary>The reject of a file that cannot be read at all.</summary>
    public Reject? Reject => Problem is var (found, expected) ? new(Source, null, "path", found, expected) : null;
}
