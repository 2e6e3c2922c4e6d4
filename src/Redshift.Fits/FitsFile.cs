namespace Redshift.Fits;

/// <summary>
/// A FITS file opened for reading. Reading from several threads at once is fine; disposing while others read is not.
/// Headers stay readable after disposal, data do not.
/// </summary>
public sealed class FitsFile : IDisposable
{
    private readonly ByteSource _source;

    private FitsFile(ByteSource source, FitsReadOptions options)
    {
        _source = source;
        (Hdus, Damage) = HduScanner.Scan(source, options);
    }

    /// <summary>Path or name it was opened by.</summary>
    public string Name => _source.Name;

    /// <summary>The sound header-data units, in order.</summary>
    public IReadOnlyList<Hdu> Hdus { get; }

    /// <summary>
    /// What is wrong behind the last sound unit: a truncated or damaged tail, missing padding, bytes that belong to nothing.
    /// Null for a sound file.
    /// </summary>
    public FitsException? Damage { get; }

    /// <summary>Opens a file, plain or compressed with gzip.</summary>
    /// <param name="path">Path of the file.</param>
    /// <param name="options">Bounds, or null for the defaults.</param>
    /// <exception cref="NotFitsException">The file is something else.</exception>
    /// <exception cref="FitsException">Not one header-data unit with data is sound.</exception>
    /// <exception cref="IOException">The file system says no.</exception>
    public static FitsFile Open(string path, FitsReadOptions? options = null) =>
        Open(SourceOpener.Open(path, options ?? FitsReadOptions.Default), options ?? FitsReadOptions.Default);

    /// <summary>Reads a stream, seekable or not, to its end; the stream stays the caller's.</summary>
    /// <param name="stream">Plain or gzip-compressed FITS.</param>
    /// <param name="name">Name for messages.</param>
    /// <param name="options">Bounds, or null for the defaults.</param>
    /// <exception cref="NotFitsException">The stream is something else.</exception>
    /// <exception cref="FitsException">Not one header-data unit with data is sound.</exception>
    public static FitsFile Open(Stream stream, string name, FitsReadOptions? options = null) =>
        Open(SourceOpener.Open(stream, name, options ?? FitsReadOptions.Default), options ?? FitsReadOptions.Default);

    /// <summary>Whether a file that begins with these bytes claims to be FITS; ten bytes suffice.</summary>
    public static bool LooksLikeFits(ReadOnlySpan<byte> firstBytes) => firstBytes.StartsWith("SIMPLE  ="u8);

    /// <inheritdoc/>
    public void Dispose() => _source.Dispose();

    private static FitsFile Open(ByteSource source, FitsReadOptions options)
    {
        try
        {
            return new FitsFile(source, options);
        }
        catch
        {
            source.Dispose();
            throw;
        }
    }
}
