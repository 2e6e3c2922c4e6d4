namespace Redshift.Fits;

/// <summary>A header-data unit: a header and what it describes.</summary>
public abstract class Hdu
{
    private protected Hdu(HduLayout layout, ByteSource source)
    {
        Layout = layout;
        Source = source;
    }

    /// <summary>0-based place in the file; the primary unit is 0.</summary>
    public int Index => Layout.Where.Hdu.GetValueOrDefault();

    /// <summary>EXTNAME, or empty.</summary>
    public string Name => Header.GetString("EXTNAME") ?? "";

    /// <summary>EXTVER, 1 when it is not given.</summary>
    public int Version => (int)Math.Clamp(Header.GetInteger("EXTVER") ?? 1, int.MinValue, int.MaxValue);

    /// <summary>The cards.</summary>
    public Header Header => Layout.Header;

    internal HduLayout Layout { get; }

    internal ByteSource Source { get; }
}
