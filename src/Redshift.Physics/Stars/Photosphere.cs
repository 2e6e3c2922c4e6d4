namespace Redshift.Physics.Stars;

/// <summary>A grey atmosphere, seen at each wavelength as deep as the continuous opacity allows (Eddington &amp; Barbier).</summary>
internal sealed class Photosphere
{
    private const double HottestMolecules = 6800;
    private const double GiantGravity = 3.5;
    private const double CoolSurface = 0.70;
    private const double ContinuumDepth = 2.0 / 3;

    // Rosseland depths of the layers that stand for the formation of each kind of feature.
    private const double ContinuumLayerDepth = 0.35;
    private const double LineDepth = 0.1;
    private const double MolecularDepth = 0.03;
    private const double HydrogenDepth = 0.6;

    // Molecules cool the outer layers of giants below the grey temperature: per unit of log g, in effective temperatures.
    private const double MolecularCooling = 0.010;

    // Surface over effective temperature, from core depths of Ca II in the Sun, of the Balmer lines along the main sequence and of the
    // resonance lines of Na I and Ca I in M dwarfs, whose convection makes the gradient shallow; below the grey value of 0.84 as lines
    // cool the surface, and lowest in hot stars, where scattering deepens the cores.
    private static readonly (double Kelvin, double Ratio)[] Surface =
    [
        (2600, CoolSurface), (3200, 0.73), (3600, 0.80), (4200, 0.79), (5200, CoolSurface), (6500, CoolSurface), (8000, 0.82),
        (10500, 0.82), (13000, 0.75), (22000, 0.64), (60000, 0.62),
    ];

    private readonly double[] _flux = new double[Nodes.Count];
    private readonly double[] _strongest = new double[Nodes.Count];
    private readonly double[] _half = new double[Nodes.Count];

    public Photosphere(StellarParameters star)
    {
        Star = star;
        var composition = Composition.Of(star);
        Layer At(double depth, double cooling = 0) =>
            new(Gas.InBalance(GreyTemperature(depth) - (cooling * star.TemperatureK), star.LogGravity, composition, depth), star);
        Lines = At(LineDepth);
        if (star.TemperatureK < HottestMolecules)
            Molecules = At(MolecularDepth, MolecularCooling * Math.Max(0, 4.5 - star.LogGravity));
        Hydrogen = At(HydrogenDepth);
        Tabulate(At(ContinuumLayerDepth));
    }

    public StellarParameters Star { get; }

    /// <summary>Where metal lines form.</summary>
    public Layer Lines { get; }

    /// <summary>Where molecular bands form; none in hot stars.</summary>
    public Layer? Molecules { get; }

    /// <summary>Where the wings of hydrogen lines form.</summary>
    public Layer Hydrogen { get; }

    /// <summary>Temperature of the layer that the cores of strong lines come from.</summary>
    private double SurfaceTemperature
    {
        get
        {
            var next = Math.Clamp(Array.FindIndex(Surface, s => s.Kelvin >= Star.TemperatureK), 1, Surface.Length - 1);
            var (cool, hot) = (Surface[next - 1], Surface[next]);
            var share = Math.Clamp((Star.TemperatureK - cool.Kelvin) / (hot.Kelvin - cool.Kelvin), 0, 1);
            var ratio = cool.Ratio + (share * (hot.Ratio - cool.Ratio));
            return Star.TemperatureK * (Star.LogGravity < GiantGravity && Star.TemperatureK < 6500 ? CoolSurface : ratio);
        }
    }

    /// <summary>Continuum flux F_λ in arbitrary units at a place between nodes.</summary>
    public double ContinuumFlux(double place) => Nodes.At(_flux, place);

    /// <summary>Depth that an infinitely strong line would have at a place between nodes, 0 to 1.</summary>
    public double StrongestDepth(double place) => Nodes.At(_strongest, place);

    /// <summary>Opacity ratio at which half of the strongest depth is reached, at a place between nodes.</summary>
    public double HalfDepthRatio(double place) => Nodes.At(_half, place);

    private static double Planck(double wavelength, double kelvin) =>
        Math.Pow(wavelength / 5500, -5) / (Math.Exp(Cgs.SecondRadiation / (wavelength * kelvin)) - 1);

    private void Tabulate(Layer continuum)
    {
        for (var i = 0; i < Nodes.Count; i++)
        {
            // Opacity grows inwards, which keeps transparent wavelengths from very deep layers.
            var depth = Math.Min(3, ContinuumDepth * continuum.RosselandMean / continuum.ContinuousOpacityAtNode(i));
            var wavelength = Nodes.Wavelength(i);
            var temperature = GreyTemperature(depth);
            _flux[i] = Planck(wavelength, temperature);
            _strongest[i] = 1 - (Planck(wavelength, SurfaceTemperature) / _flux[i]);
            _half[i] = _strongest[i] / InitialSlope(depth, Cgs.SecondRadiation / (wavelength * temperature));
        }
    }

    // Depth of a weak line over its opacity ratio, from the slope of the grey temperature where the continuum forms:
    // −d ln B/dη = (G/4) τ/(τ + 2/3), G = d ln B/d ln T.
    private static double InitialSlope(double depth, double photonOverKT) =>
        photonOverKT / (1 - Math.Exp(-photonOverKT)) / 4 * depth / (depth + (2.0 / 3));

    private double GreyTemperature(double depth) => Star.TemperatureK * Math.Pow(0.75 * (depth + (2.0 / 3)), 0.25);
}
