namespace Redshift.Physics.Stars;

/// <summary>A layer of the atmosphere in which lines are formed.</summary>
internal sealed class Layer
{
    private const double NodeStep = 0.005;
    private static readonly double FirstNode = Math.Log(800);
    private readonly double[] _lnOpacity = new double[720];

    public Layer(Gas gas, StellarParameters star)
    {
        Gas = gas;
        Turbulence = 1e5 * MicroTurbulence(star);
        var opacity = new ContinuousOpacity(gas);
        for (var i = 0; i < _lnOpacity.Length; i++)
            _lnOpacity[i] = Math.Log(opacity.At(Math.Exp(FirstNode + (i * NodeStep))));
        RosselandMean = opacity.RosselandMean();
    }

    public Gas Gas { get; }

    public double RosselandMean { get; }

    /// <summary>Microturbulence in cm/s.</summary>
    public double Turbulence { get; }

    /// <summary>Continuous opacity in cm² per hydrogen nucleus.</summary>
    public double ContinuousOpacityAt(double wavelength)
    {
        var place = Math.Clamp((Math.Log(wavelength) - FirstNode) / NodeStep, 0, _lnOpacity.Length - 1.001);
        var node = (int)place;
        return Math.Exp(_lnOpacity[node] + ((place - node) * (_lnOpacity[node + 1] - _lnOpacity[node])));
    }

    /// <summary>Most probable speed of the absorbers, thermal and turbulent, in cm/s.</summary>
    public double DopplerCm(Element element) =>
        Math.Sqrt((2 * Constants.BoltzmannErg * Gas.Temperature / (element.Mass * Constants.AtomicMassGram)) + (Turbulence * Turbulence));

    /// <summary>Damping constant a = Γλ/(4π v): collisions with hydrogen and electrons, and the natural width.</summary>
    public double Damping(SpectralLine line)
    {
        var t = Gas.Temperature / 1e4;
        var hydrogen = (line.Stage == 0 ? 3.0e-8 : 1.6e-8) * Math.Pow(t, 0.3) * Gas.NeutralHydrogenDensity;
        var electrons = StarkPerElectron(line) * Gas.ElectronDensity;
        return (1.2e8 + hydrogen + electrons) * line.Wavelength * 1e-8 / (4 * Math.PI * DopplerCm(line.Element));
    }

    // Quadratic Stark widths, order of magnitude of Griem 1974; the diffuse lines of helium are much wider.
    private static double StarkPerElectron(SpectralLine line) => line.Element.Symbol == "He" ? 4e-5 : 1e-6;

    // km/s: 1.1 in dwarfs like the Sun, growing to giants; 2 to 3 in A stars, 4 and more in the hottest (Gray & Corbally 2009).
    private static double MicroTurbulence(StellarParameters star)
    {
        var hot = Math.Clamp((star.TemperatureK - 6000) / 2000, 0, 1);
        var veryHot = Math.Clamp((star.TemperatureK - 15000) / 15000, 0, 1);
        return 1.1 + (0.25 * Math.Max(0, 4.4 - star.LogGravity)) + (1.2 * hot) + (3 * veryHot);
    }
}
