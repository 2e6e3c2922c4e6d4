namespace Redshift.Fits;

/// <summary>
/// Root of everything that can be wrong with the content of a FITS file. No other exception comes out of reading
/// hostile bytes; trouble of the file system keeps its own <see cref="IOException"/> family.
/// </summary>
public abstract class FitsException : Exception
{
    private protected FitsException(FitsLocation location, string message, Exception? inner = null)
        : base(Printable($"{location}: {message}"), inner) => Location = location;

    /// <summary>Where the trouble was found.</summary>
    public FitsLocation Location { get; }

    // Header text is quoted in messages, and messages reach terminals.
    private static string Printable(string text) =>
        string.Create(text.Length, text, static (into, from) =>
        {
            for (var i = 0; i < into.Length; i++) into[i] = char.IsControl(from[i]) ? '?' : from[i];
        });
}
