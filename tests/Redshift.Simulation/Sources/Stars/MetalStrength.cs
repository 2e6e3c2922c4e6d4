using Redshift.Physics.Statistics;
using Redshift.Simulation.Light;

namespace Redshift.Simulation.Sources.Stars;

/// <summary>How strong the lines of each element are, relative to the Sun.</summary>
internal sealed class MetalStrength
{
    private static readonly Curve Iron = new(
        (2800, 1.5), (3500, 1.7), (4000, 1.75), (4500, 1.6), (5000, 1.3), (5777, 1), (6500, 0.66), (7200, 0.4), (8000, 0.18), (9000, 0.08), (10500, 0.03), (12500, 0));

    private static readonly Curve EasilyIonised = new(
        (2800, 3.4), (3500, 3.3), (4000, 2.9), (4500, 2.15), (5000, 1.5), (5777, 1), (6500, 0.6), (7200, 0.35), (8000, 0.15), (9000, 0.05), (10500, 0));

    private static readonly Curve Light = new(
        (2800, 2.4), (3500, 2.5), (4500, 2.1), (5000, 1.45), (5777, 1), (6500, 0.65), (7500, 0.32), (8500, 0.15), (10000, 0.05), (12500, 0));

    private static readonly Curve Ionised = new(
        (3000, 0.65), (4000, 0.8), (5000, 0.92), (5777, 1), (6500, 1.1), (7500, 1.15), (8500, 0.85), (10000, 0.4), (12000, 0.15), (16000, 0.02), (20000, 0));

    private readonly Dictionary<string, double> _abundances = [];
    private readonly StarParameters _star;
    private readonly RandomSource _random;
    private readonly double _overall;

    public MetalStrength(StarParameters star, RandomSource random)
    {
        (_star, _random) = (star, random);
        // Most visible lines sit on the flat part of the curve of growth: 0.35 to 0.5 dex in width a dex in abundance.
        _overall = Math.Pow(10, 0.42 * star.Metallicity);
    }

    /// <summary>Factor to the solar equivalent width; each element has an abundance of its own in every star.</summary>
    public double Of(string species)
    {
        if (!_abundances.TryGetValue(species, out var factor))
            _abundances[species] = factor = _overall * Law(species) * _random.Scatter(0.12);
        return factor;
    }

    private double Law(string species) => species switch
    {
        "Fe I" or "Ni I" or "Co I" or "Mn I" => Iron.At(_star.Temperature),
        "Mg I" or "Al I" or "Si I" => Light.At(_star.Temperature) * (1 - (0.8 * Math.Min(1, _star.Giantness))),
        _ when species.EndsWith(" II", StringComparison.Ordinal) => Ionised.At(_star.Temperature) * (1 + (0.4 * _star.Giantness)),
        _ => EasilyIonised.At(_star.Temperature) * (1 + (0.1 * _star.Giantness)),
    };
}
