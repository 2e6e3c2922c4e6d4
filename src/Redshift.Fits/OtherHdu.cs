namespace Redshift.Fits;

/// <summary>An extension of a type that is not read here: its header is, its data are skipped.</summary>
public sealed class OtherHdu : Hdu
{
    internal OtherHdu(HduLayout layout, ByteSource file, string type)
        : base(layout, file) => Type = type;

    /// <summary>Value of XTENSION.</summary>
    public string Type { get; }
}
