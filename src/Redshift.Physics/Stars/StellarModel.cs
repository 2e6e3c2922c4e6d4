namespace Redshift.Physics.Stars;

/// <summary>Computes stellar spectra from the physics of one-layer atmospheres and published line tables.</summary>
public static class StellarModel
{
    /// <summary>
    /// The computed stars that a search goes through: 2400 to 50000 K, dwarfs and giants, metal-poor stars, white dwarfs, Be, dMe and
    /// carbon stars; hot to cool within a kind.
    /// </summary>
    public static IReadOnlyList<StellarParameters> StandardGrid { get; } = StandardStars.List();

    /// <summary>Computes the spectrum of a star at rest.</summary>
    /// <param name="p">Parameters of the star.</param>
    /// <param name="grid">Vacuum wavelengths to compute it on; lines are broadened by a Gaussian of about one step.</param>
    /// <returns>The spectrum.</returns>
    /// <remarks>
    /// Residual flux of Milne &amp; Eddington, 1 − A X/(1 + X), X being the opacity of resolved lines and bands over the continuous
    /// one; lines narrower than the grid enter by their equivalent widths from the curve of growth. Not treated: departures from
    /// thermal equilibrium, winds, rotation.
    /// </remarks>
    /// <exception cref="ArgumentOutOfRangeException">A temperature outside 2000 to 80000 K.</exception>
    public static StellarSpectrum Compute(StellarParameters p, LogWavelengthGrid grid)
    {
        ArgumentOutOfRangeException.ThrowIfLessThan(p.TemperatureK, 2000);
        ArgumentOutOfRangeException.ThrowIfGreaterThan(p.TemperatureK, 80000);
        return new SpectrumBuilder(new Photosphere(p), grid).Build();
    }
}
