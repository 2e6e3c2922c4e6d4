namespace Redshift.Physics.Stars;

/// <summary>Chemical make-up of an atmosphere.</summary>
/// <param name="Metallicity">[M/H]; very low for white dwarfs.</param>
/// <param name="Helium">Factor on the solar helium abundance.</param>
/// <param name="Carbon">Factor on the solar carbon abundance, besides the metallicity.</param>
internal sealed record Composition(double Metallicity, double Helium = 1, double Carbon = 1)
{
    private static readonly Composition PureHydrogen = new(-9, 1e-6);

    public static Composition Of(StellarParameters star) => star.Variant switch
    {
        StellarVariant.WhiteDwarfDA => PureHydrogen,
        StellarVariant.WhiteDwarfDB => new(-9, 120),
        StellarVariant.Carbon => new(star.Metallicity, 1, 2.2),
        _ => new(star.Metallicity),
    };

    public double Of(Element element, double metalFactor) => element.Symbol switch
    {
        "H" => 1,
        "He" => Helium * Solar(element),
        "C" => Carbon * metalFactor * Solar(element),
        _ => metalFactor * Solar(element),
    };

    private static double Solar(Element element) => Math.Pow(10, element.Abundance - 12);
}
