namespace Redshift.Pipeline.Match.Models;

/// <summary>Mean transmission of the intergalactic medium shortward of Lyman alpha.</summary>
internal static class Forest
{
    /// <summary>ln of the wavelength of Lyman alpha in Å.</summary>
    public const double LnLymanAlpha = 7.1030506;

    /// <summary>ln of the wavelength of Lyman beta in Å.</summary>
    public const double LnLymanBeta = 6.9331520;

    /// <summary>ln of the wavelength of the Lyman limit in Å.</summary>
    public const double LnLymanLimit = 6.8153695;

    /// <summary>ln 4.5, where the published power law is anchored, and ln(1+z) from which the forest thickens faster.</summary>
    private const double LnPivot = 1.5040774;
    private const double LnSteeper = 1.77;

    /// <summary>Scatter of a two-state forest, as a share; see <see cref="Scatter"/>.</summary>
    public const double ScatterShare = 0.45;

    /// <summary>
    /// Transmission at an observed wavelength, exp(−τ): τ = 0.751 ((1+z)/4.5)^2.90 − 0.132 at the redshift z of the absorbing gas
    /// (Becker et al. 2013, MNRAS 430, 2067, for z = 2.2 to 4.9), and more steeply beyond, so that τ = 3 at 5.5 and 4.8 at 6
    /// (mean fluxes of Bosman et al. 2022, MNRAS 514, 55). All numbers from memory, the second pair rounded.
    /// Lyman beta adds a third of it; below the Lyman limit nearly nothing passes at z &gt; 3.
    /// </summary>
    /// <param name="lnObserved">ln of the observed vacuum wavelength in Å.</param>
    /// <param name="lnShift">ln(1+z) of the object.</param>
    public static double Transmission(double lnObserved, double lnShift)
    {
        var lnRest = lnObserved - lnShift;
        if (lnRest >= LnLymanAlpha) return 1;
        var transmission = AlphaTransmission(lnObserved);
        if (lnRest < LnLymanBeta) transmission *= BetaTransmission(lnObserved);
        return transmission * LymanLimit.Own(lnShift).Transmission(lnObserved);
    }

    /// <summary>What the gas lets pass whose Lyman alpha falls on an observed wavelength.</summary>
    public static double AlphaTransmission(double lnObserved) => Math.Exp(-OpticalDepth(lnObserved - LnLymanAlpha));

    /// <summary>What the gas lets pass whose Lyman beta falls on an observed wavelength.</summary>
    public static double BetaTransmission(double lnObserved) => Math.Exp(-0.35 * OpticalDepth(lnObserved - LnLymanBeta));

    /// <summary>
    /// Whether the forest is so thick that only a forest can look like it: elsewhere, and below the Lyman limit where nobody knows what passes,
    /// scatter may as well be the lines of a star taken for a quasar.
    /// </summary>
    /// <param name="lnObserved">ln of the observed vacuum wavelength in Å.</param>
    /// <param name="lnShift">ln(1+z) of the object.</param>
    public static bool IsDark(double lnObserved, double lnShift) =>
        lnObserved - lnShift > LnLymanLimit && Transmission(lnObserved, lnShift) < 0.5;

    /// <summary>The same as an instrument sees it, the step at Lyman alpha rounded by the line spread.</summary>
    /// <param name="lnObserved">ln of the observed vacuum wavelength in Å.</param>
    /// <param name="lnShift">ln(1+z) of the object.</param>
    /// <param name="sigmaLn">σ of the line spread in ln λ.</param>
    public static double Transmission(double lnObserved, double lnShift, double sigmaLn)
    {
        var distance = (lnObserved - lnShift - LnLymanAlpha) / sigmaLn;
        if (distance > 3) return 1;
        if (distance < -3) return Transmission(lnObserved, lnShift);
        var below = Transmission(LnLymanAlpha + lnShift - 1e-9, lnShift);
        return below + (1 - below) * Math.Exp(HalfNormalEvidence.LnTail(distance));
    }

    /// <summary>Redshift ranges within which one depth of the forest serves the search: where they begin, in ln(1+z), and the redshift of the depth.</summary>
    public static IReadOnlyList<(double From, double To, double Middle)> Ranges { get; } =
        [(Math.Log(3.0), Math.Log(4.2), Math.Log(3.7)), (Math.Log(4.2), Math.Log(5.6), Math.Log(5.0)), (Math.Log(5.6), Math.Log(9.0), Math.Log(6.6))];

    /// <summary>
    /// Scatter of the transmission about its mean in pixels of some 100 km/s: the forest is a random process, between dark and clear.
    /// A two-state process has √(F(1−F)); real forests, with the instrument's smoothing, have about half of that (common practice).
    /// </summary>
    public static double Scatter(double transmission) => ScatterShare * Math.Sqrt(Math.Max(0, transmission * (1 - transmission)));

    private static double OpticalDepth(double lnAbsorber)
    {
        var published = Math.Max(0, 0.751 * Math.Exp(2.90 * (lnAbsorber - LnPivot)) - 0.132);
        return lnAbsorber > LnSteeper ? published * Math.Exp(3.5 * (lnAbsorber - LnSteeper)) : published;
    }
}
