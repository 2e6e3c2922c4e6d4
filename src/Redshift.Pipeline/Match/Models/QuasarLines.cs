using Redshift.Physics.Units;

namespace Redshift.Pipeline.Match.Models;

/// <summary>
/// Broad and narrow groups of quasars. Expected equivalent widths follow the composite of Vanden Berk et al. 2001 (AJ 122, 549, table 2;
/// from memory, rounded); the spread is as wide as the mean, as individual quasars are. Iron multiplets: wavelengths of Fe II UV 1–3, 60–63, 78 and optical 37, 38, 42, 48, 49 (from memory).
/// </summary>
internal static class QuasarLines
{
    /// <summary>The groups with the high-ionisation lines at the composite's blueshift, and with the strong wind that many z &gt; 5 quasars show.</summary>
    public static IReadOnlyList<(string Name, IReadOnlyList<EmissionGroup> Groups)> Winds { get; } = [("calm", Groups(500)), ("windy", Groups(2200))];

    private static EmissionGroup[] Groups(double blueshiftKmS) => Groups(1 - blueshiftKmS / Velocity.SpeedOfLightKmS, 0.5 * blueshiftKmS);

    private static EmissionGroup[] Groups(double blue, double spread) =>
    [
        Broad("Ly alpha", 0.05, 60, 50, [new(1215.670, 1)]),
        Core("Ly alpha core", 0.4, 0, 25, [new(1215.670, 1)]),
        Broad("N V", 0.1, 16, 15, [new(1240.8 * blue, 1, spread)]),
        Broad("O VI + Ly beta", 0.3, 10, 10, [new(1034.0 * blue, 0.8), new(1025.722, 0.2)]),
        Broad("O I + C II", 0.4, 3, 4, [new(1304.5, 0.7), new(1335.3, 0.3)]),
        Broad("Si IV + O IV]", 0.15, 9, 8, [new(1396.8 * blue, 0.6, 600), new(1402.1 * blue, 0.4, 600)]),
        Broad("C IV", 0.04, 30, 28, [new(1549.06 * blue, 1, spread)]),
        Broad("He II + O III]", 0.3, 6, 6, [new(1640.417 * blue, 0.6), new(1665.0, 0.4, 1000)]),
        Broad("C III]", 0.05, 20, 16, [new(1908.734, 0.75), new(1892.03, 0.18), new(1857.8, 0.1)]),
        Broad("Mg II", 0.04, 30, 25, [new(2799.12, 1)]),
        Core("C IV core", 0.5, 0, 8, [new(1549.06 * blue, 1)]),
        Core("C III] core", 0.6, 0, 5, [new(1908.734, 1)]),
        Core("Mg II core", 0.5, 0, 8, [new(2799.12, 1)]),
        Core("H beta core", 0.5, 0, 15, [new(4862.683, 1)]),
        Core("H alpha core", 0.5, 0, 50, [new(6564.608, 1)]),
        Broad("Fe II ultraviolet", 0.2, 30, 30,
            [
                new(2075, 0.10, 4000), new(2250, 0.09, 4500), new(2345, 0.11, 2500), new(2395, 0.16, 2500), new(2490, 0.16, 5000), new(2605, 0.12, 3000),
                new(2740, 0.08, 2500), new(2885, 0.06, 3500), new(2960, 0.07, 3000), new(3190, 0.05, 4500),
            ]),
        Broad("Balmer continuum", 0.3, 30, 30,
            [new(3600, 0.22, 2500), new(3480, 0.24, 4500), new(3320, 0.22, 5500), new(3130, 0.18, 6500), new(2930, 0.14, 7000)]),
        Broad("H beta, gamma, delta", 0.05, 50, 40, [new(4862.683, 1), new(4341.684, 0.36), new(4102.892, 0.16)]),
        Broad("H alpha", 0.05, 180, 130, [new(6564.608, 1)]),
        Broad("Fe II optical", 0.25, 30, 30,
            [
                new(4490, 0.12, 2200), new(4530, 0.12, 2000), new(4570, 0.18, 2200), new(4620, 0.12, 2200), new(4924.9, 0.05), new(5019.8, 0.06), new(5170.5, 0.08),
                new(5200, 0.10, 1800), new(5275, 0.14, 2000), new(5320, 0.12, 1800), new(5365, 0.06, 1800),
            ]),
        Broad("He I 5877", 0.4, 5, 6, [new(5877.243, 1)]),
        Broad("He I + Pa gamma", 0.3, 40, 40, [new(10833.1, 0.7), new(10941.09, 0.3)]),
        Broad("Pa beta", 0.3, 30, 30, [new(12821.59, 1)]),
        Broad("Pa alpha", 0.3, 60, 60, [new(18756.13, 1)]),
        Narrow("[O III]", 0.3, 0, 25, [new(5008.240, 1), new(4960.295, 1 / 2.98)]),
        Narrow("[O II]", 0.5, 0, 5, [new(3727.092, 0.42), new(3729.875, 0.58)]),
        Narrow("[Ne III]", 0.5, 0, 4, [new(3869.86, 1), new(3968.59, 1 / 3.32)]),
        Narrow("[Ne V]", 0.6, 0, 3, [new(3426.9, 1), new(3346.8, 1 / 2.73)]),
        Narrow("H alpha, beta", 0.6, 0, 10, [new(6564.608, 3), new(4862.683, 1)]),
        Narrow("[N II]", 0.6, 0, 10, [new(6585.27, 1), new(6549.86, 1 / 3.05)]),
        Narrow("[S II]", 0.6, 0, 5, [new(6718.294, 1), new(6732.674, 0.85)]),
    ];

    private static EmissionGroup Broad(string name, double absent, double mean, double spread, GroupLine[] lines) =>
        new() { Name = name, Lines = lines, Mean = mean, Spread = spread, Absent = absent, Broad = true };

    /// <summary>The peak of a broad line above its wings, 500 km/s wide.</summary>
    private static EmissionGroup Core(string name, double absent, double mean, double spread, GroupLine[] lines) =>
        Narrow(name, absent, mean, spread, Array.ConvertAll(lines, l => l with { WidthKmS = 500 }));

    private static EmissionGroup Narrow(string name, double absent, double mean, double spread, GroupLine[] lines) =>
        new() { Name = name, Lines = lines, Mean = mean, Spread = spread, Absent = absent };
}
