using Redshift.Simulation.Light;

namespace Redshift.Simulation.Atoms;

/// <summary>A molecular band: sharp head, tail of rotational lines.</summary>
/// <param name="Molecule">Its carrier.</param>
/// <param name="Head">Vacuum wavelength of the head, Å.</param>
/// <param name="Tail">Length scale of the tail, Å.</param>
/// <param name="Strength">Strength relative to the strongest band of the molecule.</param>
/// <param name="Redwards">Whether the tail runs to the red.</param>
internal sealed record Band(string Molecule, double Head, double Tail, double Strength, bool Redwards)
{
    public static IReadOnlyList<Band> All { get; } =
    [
        .. from row in Table.Rows("bands.csv")
           select new Band(row[0], Air.ToVacuum(Table.Number(row[1])), Table.Number(row[2]), Table.Number(row[3]), row[4] != "violet"),
    ];

    /// <summary>Optical depth relative to the head: a parabola that ends at three scales, rippled by the rotational structure.</summary>
    public double Shape(double wavelength)
    {
        var x = (Redwards ? wavelength - Head : Head - wavelength) / Tail;
        if (x is < 0 or > 3)
            return 0;
        var tail = (1 - (x / 3)) * (1 - (x / 3));
        return tail * (1 + (0.2 * Math.Cos(9.4 * x)));
    }
}
