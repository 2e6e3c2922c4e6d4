namespace Redshift.Fits;

/// <summary>How the pixels of a tile were compressed (ZCMPTYPE, section 10.4).</summary>
internal enum TileMethod
{
    Gzip,
    ShuffledGzip,
    Rice,
    Plio,
    Hcompress,
    None,
}
