namespace Redshift.Pipeline.Match.Models;

/// <summary>
/// A cloud so thick that it is opaque to ionising light. It lies anywhere in front of its quasar: one to a unit of redshift at z = 2, three at
/// z = 4 (Songaila &amp; Cowie 2010, ApJ 721, 1448, from memory), so that a quasar's own limit is no sign of where its light ends.
/// </summary>
/// <param name="LnEdge">ln of the observed wavelength of its Lyman limit in Å; negative infinity for no cloud at all.</param>
/// <param name="Depth">Optical depth at the limit; it falls as λ³ (Osterbrock &amp; Ferland 2006, §2.1).</param>
internal readonly record struct LymanLimit(double LnEdge, double Depth)
{
    /// <summary>A clear line of sight.</summary>
    public static LymanLimit None { get; } = new(double.NegativeInfinity, 0);

    /// <summary>The limit of the object itself: the gas of a galaxy, and all clouds near it.</summary>
    /// <param name="lnShift">ln(1+z) of the object.</param>
    public static LymanLimit Own(double lnShift) => new(lnShift + Forest.LnLymanLimit, Math.Max(0, 3 * (Math.Exp(lnShift) - 1.8)));

    /// <summary>What passes at an observed wavelength.</summary>
    /// <param name="lnObserved">ln of the observed vacuum wavelength in Å.</param>
    public double Transmission(double lnObserved) => lnObserved >= LnEdge ? 1 : Math.Exp(-Depth * Math.Exp(3 * (lnObserved - LnEdge)));
}
