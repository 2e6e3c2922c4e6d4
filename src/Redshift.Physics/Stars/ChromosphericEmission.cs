using Redshift.Physics.Constants;
using Redshift.Physics.Hydrogen;

namespace Redshift.Physics.Stars;

/// <summary>Emission lines of stars with a disc or an active chromosphere, as Gaussians of given equivalent widths.</summary>
internal static class ChromosphericEmission
{
    // Equivalent widths of H alpha, beta, gamma, delta, epsilon in Å: Be stars have steep decrements, flare stars flat ones
    // (Gray & Corbally 2009; Gizis, Reid & Hawley 2002, AJ 123, 3356 for dMe).
    private static readonly double[] Disc = [32, 4.5, 1.5, 0.6, 0.3];
    private static readonly double[] Chromosphere = [4.5, 6, 7, 7, 5];
    private static readonly (double Wavelength, double Width)[] Calcium = [(3934.777, 9), (3969.591, 6)];

    /// <summary>Adds the emission of a star to its flux relative to the continuum.</summary>
    public static void Add(Span<double> emission, LogWavelengthGrid grid, StellarParameters star)
    {
        if (star.Variant == StellarVariant.EmissionLine)
            AddBalmer(emission, grid, Disc, 110);
        if (star.Variant != StellarVariant.ActiveM)
            return;
        AddBalmer(emission, grid, Chromosphere, 35);
        foreach (var (wavelength, width) in Calcium)
            AddLine(emission, grid, wavelength, width, 30);
    }

    private static void AddBalmer(Span<double> emission, LogWavelengthGrid grid, double[] widths, double sigmaKms)
    {
        for (var i = 0; i < widths.Length; i++)
            AddLine(emission, grid, HydrogenSeries.Balmer.Line(3 + i).VacuumAngstrom, widths[i], sigmaKms);
    }

    private static void AddLine(Span<double> emission, LogWavelengthGrid grid, double wavelength, double width, double sigmaKms)
    {
        var sigma = Math.Max(sigmaKms / Codata2022.SpeedOfLightKmS / grid.LnStep, 1);
        var peak = width / (wavelength * grid.LnStep * sigma * Math.Sqrt(2 * Math.PI));
        var position = grid.Position(wavelength);
        var last = Math.Min(grid.Count - 1, (int)(position + (5 * sigma)));
        for (var i = Math.Max(0, (int)(position - (5 * sigma))); i <= last; i++)
            emission[i] += peak * Math.Exp(-0.5 * (i - position) * (i - position) / (sigma * sigma));
    }
}
