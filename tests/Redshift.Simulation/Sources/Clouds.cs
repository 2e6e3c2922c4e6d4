using Redshift.Physics.Statistics;
using Redshift.Simulation.Light;

namespace Redshift.Simulation.Sources;

/// <summary>Hydrogen clouds along a sightline, absorbing in one Lyman line: a lognormal optical depth, correlated over some 100 km/s.</summary>
internal sealed class Clouds(double z, double line, double proximityKmS, double persistence)
{
    private const double Spread = 1.9;
    private readonly double _innovation = Math.Sqrt(1 - (persistence * persistence));
    private double _field = double.NaN;
    private double _median;
    private int _age;

    /// <summary>Optical depth at the next wavelength, in the rest frame of the object behind.</summary>
    public double Depth(double wavelength, RandomSource random)
    {
        _field = double.IsNaN(_field) ? random.Normal() : (persistence * _field) + (_innovation * random.Normal());
        // The mean varies so slowly that it need not be worked out at every point.
        if (_age++ % 32 == 0)
            _median = Median(wavelength / line * (1 + z));
        // Near the object its own light thins the clouds out.
        var distance = (1 - (wavelength / line)) * LogGrid.C;
        return _median * Math.Exp(Spread * _field) * distance / (distance + proximityKmS);
    }

    // ln of the median depth of the lognormal law against ln of the effective depth −ln⟨exp(−τ)⟩, worked out by quadrature.
    private static readonly Curve LnMedian = new(
        (-3, -4.47), (-2.303, -3.59), (-1.609, -2.62), (-0.916, -1.516), (-0.511, -0.789), (-0.105, 0.017), (0.182, 0.646), (0.693, 1.908), (1.099, 3.075), (1.386, 4.011), (1.609, 4.809), (1.946, 6.151));

    // Mean transmission of the forest after Becker et al. 2013 (MNRAS 430, 2067), steepened beyond z = 5.5.
    private static double Median(double onePlusZ)
    {
        var effective = (0.751 * Math.Pow(onePlusZ / 4.5, 2.9)) - 0.132;
        if (onePlusZ > 6.5)
            effective *= Math.Pow(onePlusZ / 6.5, 8);
        return Math.Exp(LnMedian.At(Math.Log(Math.Max(0.03, effective))));
    }
}
