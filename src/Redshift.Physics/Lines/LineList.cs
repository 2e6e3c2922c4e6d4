namespace Redshift.Physics.Lines;

/// <summary>
/// The rest lines of stars, galaxies, quasars and nebulae, by rising vacuum wavelength. Night-sky lines are in
/// <see cref="SkyLines"/>.
/// </summary>
public static class LineList
{
    private static readonly Dictionary<string, SpectralLine> ByName = Read().ToDictionary(line => line.Name);

    /// <summary>Every line, by rising vacuum wavelength.</summary>
    public static IReadOnlyList<SpectralLine> All { get; } = [.. ByName.Values.OrderBy(line => line.VacuumAngstrom)];

    /// <summary>The lines commonly met in a kind of object, by rising vacuum wavelength.</summary>
    /// <param name="uses">One or several kinds; a line of any of them is given.</param>
    /// <returns>The lines.</returns>
    public static IEnumerable<SpectralLine> For(LineUses uses) => All.Where(line => (line.Uses & uses) != 0);

    /// <summary>A line by its name.</summary>
    /// <param name="name">The exact name, such as "[O III] 5007".</param>
    /// <returns>The line.</returns>
    /// <exception cref="KeyNotFoundException">There is no line of this name.</exception>
    public static SpectralLine Find(string name) => ByName[name];

    private static IEnumerable<SpectralLine> Read()
        => [.. ComputedLines.Hydrogen(), .. ComputedLines.IonizedHelium(), .. PublishedLines.Read("spectral-lines.csv")];
}
