namespace Redshift.Physics.Lines;

/// <summary>
/// Emission of the night sky: airglow with the bands of OH, and the mercury, sodium and fluorescent lamps of towns.
/// </summary>
public static class SkyLines
{
    /// <summary>The lines, by rising vacuum wavelength, at rest on the ground.</summary>
    public static IReadOnlyList<SpectralLine> All { get; } =
        [.. PublishedLines.Read("sky-lines.csv").OrderBy(line => line.VacuumAngstrom)];
}
