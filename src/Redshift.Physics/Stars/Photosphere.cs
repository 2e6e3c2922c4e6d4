namespace Redshift.Physics.Stars;

/// <summary>A grey atmosphere, seen at each wavelength as deep as the continuous opacity allows (Eddington &amp; Barbier).</summary>
internal sealed class Photosphere
{
    private const double ContinuumDepth = 2.0 / 3;
    private const double ContinuumLayerDepth = 0.35;
    private const double LineDepth = 0.1;
    private const double HydrogenDepth = 0.7;

    // Line cores come from above the grey surface temperature of 0.81 T: measured cores of strong lines in the Sun and in A stars.
    private const double SurfaceTemperature = 0.66;
    private readonly Layer _continuum;

    public Photosphere(StellarParameters star)
    {
        Star = star;
        var composition = Composition.Of(star);
        Layer At(double depth) => new(Gas.AtDepth(star.TemperatureK, star.LogGravity, composition, depth), star);
        _continuum = At(ContinuumLayerDepth);
        Lines = At(LineDepth);
        Hydrogen = At(HydrogenDepth);
    }

    public StellarParameters Star { get; }

    /// <summary>Where metal lines and molecular bands form.</summary>
    public Layer Lines { get; }

    /// <summary>Where the wings of hydrogen lines form.</summary>
    public Layer Hydrogen { get; }

    /// <summary>Continuum flux F_λ in arbitrary units.</summary>
    public double ContinuumFlux(double wavelength) => Planck(wavelength, ContinuumTemperature(wavelength));

    /// <summary>Depth that an infinitely strong line would have at a wavelength, 0 to 1.</summary>
    public double StrongestDepth(double wavelength) =>
        1 - (Planck(wavelength, SurfaceTemperature * Star.TemperatureK) / ContinuumFlux(wavelength));

    /// <summary>
    /// Opacity ratio at which half of the strongest depth is reached: weak lines feel the slope of the grey temperature where the
    /// continuum forms, d ln B/dη = −(G/4) τ/(τ + 2/3) with G = d ln B/d ln T, strong ones its whole range.
    /// </summary>
    public double HalfDepthRatio(double wavelength)
    {
        var x = Constants.SecondRadiation / (wavelength * ContinuumTemperature(wavelength));
        var depth = ContinuumDepthAt(wavelength);
        return StrongestDepth(wavelength) * 4 * (1 + (2.0 / 3 / depth)) * (1 - Math.Exp(-x)) / x;
    }

    private static double Planck(double wavelength, double kelvin) =>
        Math.Pow(wavelength / 5500, -5) / (Math.Exp(Constants.SecondRadiation / (wavelength * kelvin)) - 1);

    private double ContinuumTemperature(double wavelength) =>
        Star.TemperatureK * Math.Pow(0.75 * (ContinuumDepthAt(wavelength) + (2.0 / 3)), 0.25);

    // Rosseland depth at which the continuum forms. Opacity grows inwards, which keeps transparent wavelengths from very deep layers.
    private double ContinuumDepthAt(double wavelength) =>
        Math.Min(3, ContinuumDepth * _continuum.RosselandMean / _continuum.ContinuousOpacityAt(wavelength));
}
