namespace Redshift.Fits;

/// <summary>How floating-point pixels were made integers before compression (ZQUANTIZ, section 10.2).</summary>
internal enum Quantization
{
    NoDither,
    SubtractiveDither1,
    SubtractiveDither2,
}
