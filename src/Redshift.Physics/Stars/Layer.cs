namespace Redshift.Physics.Stars;

/// <summary>A layer of the atmosphere in which lines are formed.</summary>
internal sealed class Layer
{
    private readonly double[] _opacity = new double[Nodes.Count];

    public Layer(Gas gas, StellarParameters star)
    {
        Gas = gas;
        Turbulence = 1e5 * MicroTurbulence(star);
        var opacity = new ContinuousOpacity(gas);
        for (var i = 0; i < _opacity.Length; i++)
            _opacity[i] = opacity.At(Nodes.Wavelength(i));
        RosselandMean = opacity.RosselandMean();
    }

    public Gas Gas { get; }

    public double RosselandMean { get; }

    /// <summary>Microturbulence in cm/s.</summary>
    public double Turbulence { get; }

    /// <summary>Continuous opacity in cm² per hydrogen nucleus at a node.</summary>
    public double ContinuousOpacityAtNode(int node) => _opacity[node];

    /// <summary>Continuous opacity in cm² per hydrogen nucleus at a place between nodes.</summary>
    public double ContinuousOpacityAt(double place) => Nodes.At(_opacity, place);

    /// <summary>Most probable speed of the absorbers, thermal and turbulent, in cm/s.</summary>
    public double DopplerCm(Element element) =>
        Math.Sqrt((2 * Cgs.Boltzmann * Gas.Temperature / (element.Mass * Cgs.AtomicMass)) + (Turbulence * Turbulence));

    // km/s: 1.1 in dwarfs like the Sun, growing to giants; 2 to 3 in A stars, 4 and more in the hottest (Gray & Corbally 2009).
    private static double MicroTurbulence(StellarParameters star)
    {
        var hot = Math.Clamp((star.TemperatureK - 6000) / 2000, 0, 1);
        var veryHot = Math.Clamp((star.TemperatureK - 15000) / 15000, 0, 1);
        return 1.1 + (0.25 * Math.Max(0, 4.4 - star.LogGravity)) + (1.2 * hot) + (3 * veryHot);
    }
}
