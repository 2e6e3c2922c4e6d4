namespace Redshift.Physics.Indices;

/// <summary>A published measure of a spectral feature from the flux in a few bands, at rest, in air wavelengths.</summary>
/// <remarks>
/// Equivalent widths and magnitudes: G. Worthey, S. M. Faber, J. J. Gonzalez and D. Burstein, Astrophys. J. Suppl. 94,
/// 687 (1994), equations 1-3. Breaks: M. L. Balogh et al., Astrophys. J. 527, 54 (1999).
/// </remarks>
public sealed class SpectralIndex
{
    private readonly WavelengthBand[] _side;

    internal SpectralIndex(string name, IndexKind kind, WavelengthBand band, WavelengthBand[] side, string source)
        => (Name, Kind, Band, _side, Source) = (name, kind, band, side, source);

    /// <summary>The published name in ASCII, such as "Mgb".</summary>
    public string Name { get; }

    /// <summary>How the bands are compared.</summary>
    public IndexKind Kind { get; }

    /// <summary>The band of the feature; of a break, the red band.</summary>
    public WavelengthBand Band { get; }

    /// <summary>The bands it is compared with: blue and red; of a break, the blue band.</summary>
    public IReadOnlyList<WavelengthBand> SideBands => _side;

    /// <summary>The publication of the band limits.</summary>
    public string Source { get; }

    /// <summary>Measures the index.</summary>
    /// <param name="airAngstrom">Rest wavelengths of the pixels in air, angstrom, ascending.</param>
    /// <param name="flux">Flux per unit wavelength of the same pixels, any unit.</param>
    /// <returns>
    /// Angstrom, magnitudes or a pure number by <see cref="Kind"/>; null if the spectrum does not reach over all bands.
    /// NaN if a band's flux leaves it undefined.
    /// </returns>
    /// <exception cref="ArgumentException">The two spans differ in length.</exception>
    public double? Measure(ReadOnlySpan<double> airAngstrom, ReadOnlySpan<double> flux)
    {
        if (airAngstrom.Length != flux.Length)
            throw new ArgumentException($"{airAngstrom.Length} wavelengths but {flux.Length} fluxes.", nameof(flux));
        var spectrum = new SampledSpectrum(airAngstrom, flux);
        return Covers(spectrum) ? Measure(spectrum) : null;
    }

    private bool Covers(SampledSpectrum spectrum)
    {
        bool covered = spectrum.Covers(Band);
        foreach (WavelengthBand side in _side)
            covered &= spectrum.Covers(side);
        return covered;
    }

    private double Measure(SampledSpectrum spectrum) => Kind switch
    {
        IndexKind.EquivalentWidth => Band.Width * (1 - Residual(spectrum)),
        IndexKind.Magnitude => -2.5 * Math.Log10(Residual(spectrum)),
        IndexKind.Break => spectrum.Mean(Band, PerFrequency) / spectrum.Mean(_side[0], PerFrequency),
        _ => spectrum.Mean(Band, Flux) / SideMean(spectrum),
    };

    // Mean of the flux over the straight line through the means of the side bands.
    private double Residual(SampledSpectrum spectrum)
    {
        (WavelengthBand blue, WavelengthBand red) = (_side[0], _side[1]);
        double level = spectrum.Mean(blue, Flux);
        double slope = (spectrum.Mean(red, Flux) - level) / (red.Centre - blue.Centre);
        return spectrum.Mean(Band, (wavelength, flux) => flux / (level + slope * (wavelength - blue.Centre)));
    }

    private double SideMean(SampledSpectrum spectrum)
    {
        double sum = 0;
        foreach (WavelengthBand side in _side)
            sum += spectrum.Mean(side, Flux);
        return sum / _side.Length;
    }

    private static double Flux(double wavelength, double flux) => flux;

    // F_nu goes as wavelength squared times F_lambda.
    private static double PerFrequency(double wavelength, double flux) => flux * wavelength * wavelength;
}
