using Redshift.Physics.Air;

namespace Redshift.Pipeline.Load.SpectralAxis;

/// <summary>One spectral variable as a function of vacuum wavelength (Greisen et al. 2006, A&amp;A 446, 747, table 3).</summary>
/// <param name="variable">Which variable.</param>
/// <param name="restAngstrom">Rest wavelength in vacuum, Å; used by velocities and redshift only.</param>
internal readonly struct SpectralScale(SpectralVariable variable, double restAngstrom)
{
    private const double Light = 299792458;

    /// <summary>The quantity, hence the unit, of the values.</summary>
    public static SpectralQuantity QuantityOf(SpectralVariable variable) => variable switch
    {
        SpectralVariable.Wave or SpectralVariable.Awav => SpectralQuantity.Wavelength,
        SpectralVariable.Freq => SpectralQuantity.Frequency,
        SpectralVariable.Wavn => SpectralQuantity.Wavenumber,
        SpectralVariable.Ener => SpectralQuantity.Energy,
        SpectralVariable.Zopt or SpectralVariable.Beta => SpectralQuantity.Ratio,
        _ => SpectralQuantity.Velocity,
    };

    /// <summary>Whether the variable means something only with a rest wavelength.</summary>
    public static bool NeedsRest(SpectralVariable variable) =>
        variable is SpectralVariable.Vrad or SpectralVariable.Vopt or SpectralVariable.Zopt or SpectralVariable.Velo or SpectralVariable.Beta;

    /// <summary>The variable at a vacuum wavelength.</summary>
    public double FromVacuum(double angstrom) => variable switch
    {
        SpectralVariable.Wave => angstrom,
        SpectralVariable.Awav => AirRefraction.ToAir(angstrom),
        SpectralVariable.Freq => SpectralUnit.LightAngstromPerSecond / angstrom,
        SpectralVariable.Wavn => 1e8 / angstrom,
        SpectralVariable.Ener => SpectralUnit.PlanckLightElectronvoltAngstrom / angstrom,
        SpectralVariable.Vrad => Light * (1 - restAngstrom / angstrom),
        SpectralVariable.Vopt => Light * (angstrom / restAngstrom - 1),
        SpectralVariable.Zopt => angstrom / restAngstrom - 1,
        SpectralVariable.Velo => Light * BetaAt(angstrom),
        _ => BetaAt(angstrom),
    };

    /// <summary>The vacuum wavelength in Å at a value.</summary>
    public double ToVacuum(double value) => variable switch
    {
        SpectralVariable.Wave => value,
        SpectralVariable.Awav => AirRefraction.ToVacuum(value),
        SpectralVariable.Freq => SpectralUnit.LightAngstromPerSecond / value,
        SpectralVariable.Wavn => 1e8 / value,
        SpectralVariable.Ener => SpectralUnit.PlanckLightElectronvoltAngstrom / value,
        SpectralVariable.Vrad => restAngstrom / (1 - value / Light),
        SpectralVariable.Vopt => restAngstrom * (1 + value / Light),
        SpectralVariable.Zopt => restAngstrom * (1 + value),
        SpectralVariable.Velo => AtBeta(value / Light),
        _ => AtBeta(value),
    };

    /// <summary>Derivative of the variable by vacuum wavelength.</summary>
    public double Slope(double angstrom) => variable switch
    {
        SpectralVariable.Wave => 1,
        SpectralVariable.Awav => AirSlope(angstrom),
        SpectralVariable.Freq => -SpectralUnit.LightAngstromPerSecond / (angstrom * angstrom),
        SpectralVariable.Wavn => -1e8 / (angstrom * angstrom),
        SpectralVariable.Ener => -SpectralUnit.PlanckLightElectronvoltAngstrom / (angstrom * angstrom),
        SpectralVariable.Vrad => Light * restAngstrom / (angstrom * angstrom),
        SpectralVariable.Vopt => Light / restAngstrom,
        SpectralVariable.Zopt => 1 / restAngstrom,
        SpectralVariable.Velo => Light * BetaSlope(angstrom),
        _ => BetaSlope(angstrom),
    };

    private double BetaAt(double angstrom)
    {
        var square = angstrom / restAngstrom * (angstrom / restAngstrom);
        return (square - 1) / (square + 1);
    }

    private double AtBeta(double beta) => restAngstrom * Math.Sqrt((1 + beta) / (1 - beta));

    private double BetaSlope(double angstrom)
    {
        var ratio = angstrom / restAngstrom;
        var sum = ratio * ratio + 1;
        return 4 * ratio / (sum * sum * restAngstrom);
    }

    private static double AirSlope(double angstrom)
    {
        var step = 1e-5 * angstrom;
        return (AirRefraction.ToAir(angstrom + step) - AirRefraction.ToAir(angstrom - step)) / (2 * step);
    }
}
