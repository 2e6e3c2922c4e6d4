namespace Redshift.Pipeline.Match.Models;

/// <summary>
/// Nebular groups of galaxies. Ratios within a group are fixed by atomic physics: Case B at 10⁴ K (Hummer &amp; Storey 1987),
/// [O III] 2.98 and [N II] 3.05 (Storey &amp; Zeippen 2000), [Ne III] 3.3, [O I] 3.1, [S III] 2.47 (A values).
/// The mixed groups hold typical ratios of metal-rich and metal-poor H II galaxies and of Seyfert 2 nuclei (common practice);
/// they let one strong line speak for the lines that go with it.
/// </summary>
internal static class GalaxyLines
{
    private static readonly GroupLine[] BalmerLines =
    [
        new(6564.608, 2.86), new(4862.683, 1), new(4341.684, 0.468), new(4102.892, 0.259), new(3971.195, 0.159), new(3890.151, 0.105),
    ];

    /// <summary>The same behind E(B−V) = 0.7 (Cardelli, Clayton &amp; Mathis 1989): Hα without Hβ does not exist.</summary>
    private static readonly GroupLine[] DustyBalmerLines =
    [
        new(6564.608, 5.7), new(4862.683, 1), new(4341.684, 0.36), new(4102.892, 0.18),
    ];

    private static readonly GroupLine[] PaschenLines =
    [
        new(18756.13, 1), new(12821.59, 0.482), new(10941.09, 0.267), new(10052.13, 0.163), new(9548.59, 0.108),
    ];

    /// <summary>All lines of an H II region or a nucleus at once, in typical ratios.</summary>
    public static IReadOnlyList<EmissionGroup> Mixed { get; } =
    [
        Group("metal-rich H II", 0.6, 0, 12, [.. BalmerLines, new(3727.09, 1.2), new(3729.88, 1.6), new(5008.24, 0.9), new(4960.295, 0.3), new(6585.27, 1.1), new(6549.86, 0.36), new(6718.294, 0.6), new(6732.674, 0.45)]),
        Group("metal-poor H II", 0.6, 0, 25, [.. BalmerLines, new(3727.09, 0.8), new(3729.88, 1.1), new(5008.24, 5), new(4960.295, 1.68), new(3869.86, 0.4), new(3968.59, 0.12), new(6585.27, 0.15), new(6718.294, 0.2), new(6732.674, 0.15), new(5877.243, 0.12)]),
        Group("Seyfert 2", 0.8, 0, 15, [.. BalmerLines, new(3727.09, 1.2), new(3729.88, 1.2), new(5008.24, 9), new(4960.295, 3), new(3869.86, 0.9), new(3426.9, 0.5), new(6585.27, 2.5), new(6549.86, 0.8), new(6718.294, 0.8), new(6732.674, 0.8), new(6302.046, 0.4)]),
    ];

    /// <summary>Hydrogen alone, clear and behind dust.</summary>
    public static IReadOnlyList<EmissionGroup> Balmer { get; } = [Group("Balmer", 0.5, 0, 10, BalmerLines), Group("Balmer behind dust", 0.6, 0, 6, DustyBalmerLines)];

    /// <summary>The other optical lines of ionised gas, ion by ion.</summary>
    public static IReadOnlyList<EmissionGroup> Ions { get; } =
    [
        Group("[O II]", 0.5, 0, 12, [new(3727.092, 0.42), new(3729.875, 0.58)]),
        Group("[O III]", 0.5, 0, 25, [new(5008.240, 1), new(4960.295, 1 / 2.98)]),
        Group("[N II]", 0.5, 0, 12, [new(6585.27, 1), new(6549.86, 1 / 3.05)]),
        Group("[S II]", 0.5, 0, 8, [new(6718.294, 1), new(6732.674, 0.78)]),
        Group("[Ne III]", 0.7, 0, 5, [new(3869.86, 1), new(3968.59, 1 / 3.32)]),
        Group("[O I]", 0.7, 0, 3, [new(6302.046, 1), new(6365.536, 1 / 3.1)]),
    ];

    /// <summary>Lines that no mixed group has, or only in part.</summary>
    public static IReadOnlyList<EmissionGroup> Others { get; } =
    [
        Group("He I", 0.7, 0, 3, [new(5877.243, 1), new(6679.996, 0.28), new(7067.125, 0.2), new(4472.735, 0.37)]),
        Group("[S III]", 0.6, 0, 10, [new(9533.2, 1), new(9071.1, 1 / 2.47)]),
        Group("Paschen", 0.6, 0, 15, PaschenLines),
        Group("He I 10833", 0.6, 0, 15, [new(10833.1, 1)]),
        // Radiative transfer leaves the red side of the line, some hundred km/s wide and shifted.
        Group("Ly alpha", 0.5, 0, 60, [new(1216.6, 1, 160)]),
        Group("C III] 1908", 0.6, 0, 5, [new(1906.683, 0.6), new(1908.734, 0.4)]),
        Group("He II 1640", 0.7, 0, 4, [new(1640.417, 1), new(1660.809, 0.3), new(1666.150, 0.8)]),
        Group("C IV 1549", 0.8, 0, 4, [new(1548.204, 0.6), new(1550.781, 0.4)]),
        Group("Mg II 2800", 0.8, 0, 4, [new(2796.354, 0.6), new(2803.532, 0.4)]),
    ];

    /// <summary>Every group; groups that share lines compete in a fit.</summary>
    public static IReadOnlyList<EmissionGroup> All { get; } = [.. Mixed, .. Balmer, .. Ions, .. Others];

    private static EmissionGroup Group(string name, double absent, double mean, double spread, GroupLine[] lines) =>
        new() { Name = name, Lines = lines, Mean = mean, Spread = spread, Absent = absent };
}
