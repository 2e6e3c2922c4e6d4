namespace Redshift.Pipeline.Match.Models;

/// <summary>Groups of ionised gas in our own Galaxy (H II regions, planetary nebulae): strong lines on next to no continuum.</summary>
internal static class NebulaLines
{
    public static IReadOnlyList<EmissionGroup> All { get; } =
    [
        Group("Balmer", 0.1, [new(6564.608, 2.86), new(4862.683, 1), new(4341.684, 0.468), new(4102.892, 0.259), new(3971.195, 0.159), new(3890.151, 0.105)]),
        Group("H alpha", 0.5, [new(6564.608, 1)]),
        Group("[O III]", 0.2, [new(5008.240, 1), new(4960.295, 1 / 2.98)]),
        Group("[N II]", 0.2, [new(6585.27, 1), new(6549.86, 1 / 3.05)]),
        Group("[S II]", 0.3, [new(6718.294, 1), new(6732.674, 0.9)]),
        Group("[O II]", 0.4, [new(3727.092, 0.45), new(3729.875, 0.55)]),
        Group("He I", 0.3, [new(5877.243, 1), new(6679.996, 0.28), new(7067.125, 0.3), new(4472.735, 0.37)]),
        Group("He II", 0.5, [new(4687.017, 1), new(5413.025, 0.08)]),
        Group("[Ar III]", 0.4, [new(7137.77, 1), new(7753.2, 0.24)]),
        Group("[O I]", 0.5, [new(6302.046, 1), new(6365.536, 1 / 3.1)]),
        Group("[Ne III]", 0.4, [new(3869.86, 1), new(3968.59, 1 / 3.32)]),
        Group("[S III]", 0.4, [new(9533.2, 1), new(9071.1, 1 / 2.47)]),
        Group("Paschen", 0.4, [new(18756.13, 1), new(12821.59, 0.482), new(10941.09, 0.267), new(10052.13, 0.163), new(9548.59, 0.108), new(9231.55, 0.075), new(9017.39, 0.054)]),
        Group("He I 10833", 0.3, [new(10833.1, 1)]),
    ];

    private static EmissionGroup Group(string name, double absent, GroupLine[] lines) =>
        new() { Name = name, Lines = lines, Mean = 0, Spread = 200, Absent = absent };
}
