namespace Redshift.Physics.Stars;

/// <summary>
/// Continuous opacity of stellar gas in cm² per hydrogen nucleus, after Gray 2005, The Observation and Analysis of Stellar
/// Photospheres, chapter 8.
/// </summary>
internal sealed class ContinuousOpacity
{
    private const double RydbergEv = 13.598;
    private const double LymanLimit = 911.7535;
    private const double ThomsonCrossSection = 0.6652e-24;
    private const int LastLevel = 8;

    // In helium atmospheres the excited levels from this one on are those of helium, which are hydrogen's but for a few per cent.
    private const int HeliumLevel = 3;

    // Threshold (vacuum Å), cross-section there (cm²), lower level (eV), its weight: order of magnitude, from memory of Travis & Matsushima
    // 1968, ApJ 154, 689.
    private static readonly (Element Element, double Edge, double CrossSection, double Excitation, double Weight)[] MetalEdges =
    [
        (Element.Find("Mg"), 2514, 3.0e-18, 2.71, 9), (Element.Find("Mg"), 1622, 1.2e-18, 0, 1),
        (Element.Find("Mg"), 3757, 3.0e-17, 4.35, 3), (Element.Find("Al"), 2076, 6.5e-17, 0, 6),
        (Element.Find("Si"), 1525, 3.7e-17, 0, 9), (Element.Find("Si"), 1682, 3.5e-17, 0.78, 5),
        (Element.Find("Si"), 1985, 4.6e-17, 1.91, 1), (Element.Find("C"), 1101, 1.2e-17, 0, 9),
        (Element.Find("C"), 1240, 1.0e-17, 1.26, 5), (Element.Find("Fe"), 1570, 6.3e-18, 0, 25),
        (Element.Find("Fe"), 2100, 6.0e-18, 1.5, 21), (Element.Find("Fe"), 2500, 3.0e-18, 2.4, 21),
        (Element.Find("Ca"), 2028, 2.0e-19, 0, 1), (Element.Find("Ca"), 2930, 6.0e-18, 1.88, 9),
    ];

    // Cross-section per nucleus that the countless weak lines of TiO and water add at 1e6 dyn/cm² below 3600 K: order of magnitude of
    // published Rosseland means (Ferguson et al. 2005, ApJ 623, 585), which fall with pressure as the gaps between lines open.
    private const double MolecularHaze = 2e-25;

    // Shares of it that act as a continuum in the blue, where lines crowd, and in the red, between the bands that are treated one by one.
    private const double BlueShare = 1.3;
    private const double RedShare = 0.3;

    private readonly Gas _gas;
    private readonly double[] _levels = new double[LastLevel + 1];
    private readonly double[] _edges = new double[MetalEdges.Length];
    private readonly double _free;
    private readonly double _haze;
    private readonly double _wholeLevels;
    private readonly double _kT;
    private readonly double _negativeIons;
    private readonly double _logTheta;

    public ContinuousOpacity(Gas gas)
    {
        _gas = gas;
        _kT = Cgs.BoltzmannEv * gas.Temperature;
        var theta = Cgs.Theta(gas.Temperature);
        _haze = HazeOf(gas);
        for (var n = gas.Composition.Helium > 1 ? HeliumLevel : 1; n <= LastLevel; n++)
            _levels[n] = Math.Exp(-RydbergEv * (1 - (1.0 / (n * n))) / _kT) / (n * n * n);
        _free = Math.Exp(-RydbergEv / _kT) * _kT / (2 * RydbergEv);
        _negativeIons = 4.158e-10 * gas.ElectronPressure * Math.Pow(theta, 2.5) * Math.Pow(10, 0.754 * theta);
        _wholeLevels = 1 / Math.Pow(HydrogenLevels.FirstDissolved * HydrogenLevels.LastLine(gas.ElectronDensity), 2);
        _logTheta = Math.Log10(Math.Clamp(theta, 0.4, 2.0));
        for (var i = 0; i < MetalEdges.Length; i++)
            _edges[i] = PerThreshold(MetalEdges[i]);
    }

    /// <summary>Opacity at a vacuum wavelength in Å.</summary>
    public double At(double wavelength)
    {
        var emission = 1 - Math.Exp(-Cgs.SecondRadiation / (wavelength * _gas.Temperature));
        var hydrogen = 1.0449e-26 * Cube(wavelength) * BoundAndFree(wavelength);
        var atoms = emission * (hydrogen + (_negativeIons * NegativeIonBoundFree(wavelength)));
        return (_gas.NeutralHydrogen * (atoms + NegativeIonFreeFree(wavelength) + Rayleigh(wavelength)))
            + (ThomsonCrossSection * _gas.ElectronsPerNucleus)
            + (HazeShare(wavelength) * _haze)
            + (wavelength < 4000 ? emission * Metals(wavelength) : 0);
    }

    /// <summary>Rosseland mean: harmonic mean weighted by dB/dT.</summary>
    public double RosselandMean()
    {
        double sum = 0, weights = 0;
        for (var x = 0.9; x < 16; x *= 1.15)
        {
            var weight = x * x * x * x * x * Math.Exp(-x) / ((1 - Math.Exp(-x)) * (1 - Math.Exp(-x)));
            sum += weight / (At(Cgs.SecondRadiation / (x * _gas.Temperature)) + ((1 - RedShare) * _haze));
            weights += weight;
        }

        return weights / sum;
    }

    // Ionization from levels up to 8 one by one, from the rest as an integral (Unsöld), and free-free.
    private double BoundAndFree(double wavelength)
    {
        var sum = 0.0;
        for (var n = 1; n <= LastLevel; n++)
            sum += DissolvedShare(n, wavelength) * _levels[n];
        var highest = Math.Min(RydbergEv * LymanLimit / wavelength, RydbergEv / ((LastLevel + 0.5) * (LastLevel + 0.5)));
        return sum + (_free * (Math.Exp(highest / _kT) - 1)) + _free;
    }

    // Near a series limit the highest levels are dissolved by the fields of neighbours; the continuum reaches to longer waves in their
    // place.
    private double DissolvedShare(int lower, double wavelength)
    {
        var inverse = (1.0 / (lower * lower)) - (LymanLimit / wavelength);
        return inverse <= 0 ? 1 : inverse > _wholeLevels ? 0 : 1 - HydrogenLevels.Survival(1 / Math.Sqrt(inverse), _gas.ElectronDensity);
    }

    private static double NegativeIonBoundFree(double wavelength)
    {
        if (wavelength > 16300)
            return 0;
        var w = Math.Max(wavelength, 2250);
        var high = -4.40524e-10 + (w * (3.23992e-14 + (w * (-1.39568e-18 + (w * 2.78701e-23)))));
        var cross = 1.99654 + (w * (-1.18267e-5 + (w * (2.64243e-6 + (w * high)))));
        return Math.Max(cross, 0) * 1e-18 * Math.Min(1, wavelength / 2250);
    }

    private double NegativeIonFreeFree(double wavelength)
    {
        var x = Math.Log10(Math.Max(wavelength, 2600));
        var f0 = -2.2763 + (x * (-1.6850 + (x * (0.76661 - (x * 0.0533464)))));
        var f1 = 15.2827 + (x * (-9.2846 + (x * (1.99381 - (x * 0.142631)))));
        var f2 = -197.789 + (x * (190.266 + (x * (-67.9775 + (x * (10.6913 - (x * 0.625151)))))));
        return 1e-26 * _gas.ElectronPressure * Math.Pow(10, f0 + (f1 * _logTheta) + (f2 * _logTheta * _logTheta));
    }

    private static double Rayleigh(double wavelength)
    {
        var inverse = 1 / Math.Pow(Math.Max(wavelength, 1400), 2);
        return inverse * inverse * (5.799e-13 + (inverse * (1.422e-6 + (inverse * 2.784))));
    }

    private double PerThreshold((Element Element, double Edge, double CrossSection, double Excitation, double Weight) e) =>
        _gas.AbundanceOf(e.Element) * _gas.Fraction(e.Element, 0) * e.Weight / e.Element.Partition[0]
        * Math.Exp(-e.Excitation / _kT) * e.CrossSection / Cube(e.Edge);

    private double Metals(double wavelength)
    {
        var sum = 0.0;
        for (var i = 0; i < MetalEdges.Length; i++)
        {
            if (wavelength < MetalEdges[i].Edge)
                sum += _edges[i];
        }

        return sum * Cube(wavelength);
    }

    private static double HazeOf(Gas gas) =>
        MolecularHaze * Math.Pow(10, gas.Composition.Metallicity) * Math.Pow(gas.GasPressure / 1e6, 0.7)
        / (1 + Math.Exp((gas.Temperature - 3600) / 250));

    private static double HazeShare(double wavelength) =>
        BlueShare + ((RedShare - BlueShare) * Math.Clamp((wavelength - 5900) / 3000, 0, 1));

    private static double Cube(double x) => x * x * x;
}
