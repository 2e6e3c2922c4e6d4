namespace Redshift.Physics.Stars;

/// <summary>What all lines of one ion have in common in a layer.</summary>
internal readonly struct Absorbers
{
    private readonly double _perWeight;
    private readonly double _kT;
    private readonly double _radiation;
    private readonly double _damping;

    public Absorbers(Layer layer, Element element, int stage)
    {
        var gas = layer.Gas;
        var doppler = layer.DopplerCm(element);
        Doppler = doppler / Cgs.LightSpeed;
        _kT = Cgs.BoltzmannEv * gas.Temperature;
        _radiation = Cgs.SecondRadiation / gas.Temperature;
        _perWeight = gas.AbundanceOf(element) * gas.Fraction(element, stage) / element.Partition[stage]
            * Cgs.ClassicalCrossSection * Cgs.LightSpeed * 1e-8 / (Math.Sqrt(Math.PI) * doppler);
        _damping = DampingRate(gas, element, stage) * 1e-8 / (4 * Math.PI * doppler);
    }

    /// <summary>Doppler width as a fraction of the wavelength.</summary>
    public double Doppler { get; }

    /// <summary>Opacity at the centre of a line of unit g f, in cm² per hydrogen nucleus.</summary>
    public double CentralOpacity(double wavelength, double excitation) =>
        _perWeight * wavelength * Math.Exp(-excitation / _kT) * (1 - Math.Exp(-_radiation / wavelength));

    /// <summary>Damping constant a = Γλ/(4π v) of a line.</summary>
    public double Damping(double wavelength) => _damping * wavelength;

    // Natural width, van der Waals width by hydrogen, and the quadratic Stark effect to the order of magnitude of Griem 1974; the
    // diffuse lines of helium are much wider.
    private static double DampingRate(Gas gas, Element element, int stage)
    {
        var hydrogen = (stage == 0 ? 3.0e-8 : 1.6e-8) * Math.Pow(gas.Temperature / 1e4, 0.3) * gas.NeutralHydrogenDensity;
        var electrons = (element.Symbol == "He" ? 4e-5 : 1e-6) * gas.ElectronDensity;
        return 1.2e8 + hydrogen + electrons;
    }
}
