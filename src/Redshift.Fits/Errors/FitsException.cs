namespace Redshift.Fits;

/// <summary>
/// Root of everything that can be wrong with the content of a FITS file. No other exception comes out of reading
/// hostile bytes; trouble of the file system keeps its own <see cref="IOException"/> family.
/// </summary>
public abstract class FitsException : Exception
{
    private protected FitsException(FitsLocation location, string message, Exception? inner = null)
        : base(Printable($"{location}: {message}"), inner) => Location = location;

    private protected FitsException(FitsLocation location, string expected, string found, string what, Exception? inner = null)
        : this(location, $"{what}expected {expected}, found {found}", inner) => (Expected, Found) = (Printable(expected), Printable(found));

    /// <summary>What should be there, where the message says so; otherwise null.</summary>
    public string? Expected { get; }

    /// <summary>What is there instead, where the message says so; otherwise null.</summary>
    public string? Found { get; }

    /// <summary>Where the trouble was found.</summary>
    public FitsLocation Location { get; }

    // Header text is quoted in messages, and messages reach terminals.
    private static string Printable(string text) =>
        string.Create(text.Length, text, static (into, from) =>
        {
            for (var i = 0; i < into.Length; i++) into[i] = char.IsControl(from[i]) ? '?' : from[i];
        });
}
