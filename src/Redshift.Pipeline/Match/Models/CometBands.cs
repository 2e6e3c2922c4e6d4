namespace Redshift.Pipeline.Match.Models;

/// <summary>
/// Emission bands of cometary gas on reflected sunlight: CN violet, C₃ and the Swan sequences of C₂, with NH₂ in the red
/// (band heads from the molecular constants in Herzberg 1950, Spectra of Diatomic Molecules; from memory). They are models of the kind
/// <c>unknown</c>: without them such bands pass for broad quasar lines.
/// </summary>
internal static class CometBands
{
    public static IReadOnlyList<EmissionGroup> All { get; } =
    [
        Group("CN 3880", [new(3876, 0.7, 500), new(3882, 0.3, 300)]),
        Group("C3 4050", [new(4020, 0.4, 1600), new(4051, 0.6, 900)]),
        Group("C2 4737", [new(4737, 0.45, 400), new(4715, 0.35, 900), new(4690, 0.2, 1100)]),
        Group("C2 5165", [new(5165, 0.4, 350), new(5130, 0.3, 800), new(5095, 0.2, 1000), new(5050, 0.1, 1400)]),
        Group("C2 5636", [new(5635, 0.35, 400), new(5595, 0.35, 900), new(5550, 0.3, 1200)]),
        Group("C2 6191", [new(6190, 0.4, 600), new(6140, 0.6, 1500)]),
        Group("NH2", [new(5702, 0.2, 500), new(5977, 0.3, 500), new(6002, 0.2, 400), new(6335, 0.3, 500)]),
        Group("Na I D", [new(5891.583, 2), new(5897.558, 1)]),
        Group("[O I]", [new(6302.046, 1), new(6365.536, 1 / 3.1), new(5578.887, 0.3)]),
    ];

    private static EmissionGroup Group(string name, GroupLine[] lines) =>
        new() { Name = name, Lines = lines, Mean = 0, Spread = 60, Absent = 0.3 };
}
