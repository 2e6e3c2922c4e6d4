using Redshift.Simulation.Light;

namespace Redshift.Simulation.Atoms;

/// <summary>An absorption line of hot stars, strongest at its own temperature.</summary>
/// <param name="Species">Element and stage.</param>
/// <param name="Vacuum">Vacuum wavelength, Å.</param>
/// <param name="PeakWidth">Largest equivalent width, Å.</param>
/// <param name="PeakTemperature">Temperature of the largest width, K.</param>
internal sealed record HotLine(string Species, double Vacuum, double PeakWidth, double PeakTemperature)
{
    public static IReadOnlyList<HotLine> All { get; } =
    [
        .. from row in Table.Rows("hot-stars.csv")
           select new HotLine(row[0], Air.ToVacuum(Table.Number(row[1])), Table.Number(row[2]), Table.Number(row[3])),
    ];

    /// <summary>Equivalent width at a temperature: a normal law in ln T, wider for helium.</summary>
    public double WidthAt(double temperature)
    {
        var sigma = Species switch { "He I" => 0.38, "He II" => 0.22, _ => 0.26 };
        var x = Math.Log(temperature / PeakTemperature) / sigma;
        return PeakWidth * Math.Exp(-x * x / 2);
    }
}
