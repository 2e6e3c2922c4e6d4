namespace Redshift.Physics.Stars;

/// <summary>A chemical element of the stellar gas.</summary>
/// <param name="Symbol">Chemical symbol.</param>
/// <param name="Abundance">Decimal logarithm of the number of nuclei, hydrogen 12: Asplund et al. 2009, ARA&amp;A 47, 481.</param>
/// <param name="Mass">Atomic mass in u.</param>
/// <param name="Ionization">Ionization energies in eV, neutral atom first (from memory of the NIST tables).</param>
/// <param name="Partition">Partition functions of the stages near the temperature at which each matters (from memory, Gray 2005).</param>
internal sealed record Element(string Symbol, double Abundance, double Mass, double[] Ionization, double[] Partition)
{
    public static readonly Element Hydrogen = new("H", 12, 1.008, [13.598], [2, 1]);

    public static readonly Element[] Others =
    [
        new("He", 10.93, 4.003, [24.587, 54.418], [1, 2, 1]),
        new("Li", 1.05, 6.94, [5.392, 75.64], [2.1, 1, 2]),
        new("C", 8.43, 12.011, [11.260, 24.383, 47.888, 64.494], [9.3, 6, 1.1, 2, 1]),
        new("N", 7.83, 14.007, [14.534, 29.601, 47.449, 77.474], [4.5, 9, 6, 1.1, 2]),
        new("O", 8.69, 15.999, [13.618, 35.117, 54.936, 77.414], [8.9, 4.5, 9, 6, 1]),
        new("Na", 6.24, 22.990, [5.139, 47.286], [2.1, 1, 6]),
        new("Mg", 7.60, 24.305, [7.646, 15.035, 80.144], [1.03, 2, 1, 6]),
        new("Al", 6.45, 26.982, [5.986, 18.829, 28.448, 119.99], [5.9, 1, 2, 1, 6]),
        new("Si", 7.51, 28.085, [8.152, 16.346, 33.493, 45.142], [9.3, 5.7, 1.1, 2, 1]),
        new("S", 7.12, 32.06, [10.360, 23.338, 34.79, 47.222], [8.1, 4.2, 9, 6, 1]),
        new("K", 5.03, 39.098, [4.341, 31.63], [2.2, 1, 6]),
        new("Ca", 6.34, 40.078, [6.113, 11.872, 50.913], [1.2, 2.3, 1, 6]),
        new("Sc", 3.15, 44.956, [6.561, 12.800, 24.757], [12, 23, 10, 1]),
        new("Ti", 4.95, 47.867, [6.828, 13.576, 27.492], [30, 56, 21, 10]),
        new("V", 3.93, 50.942, [6.746, 14.618, 29.311], [48, 43, 28, 20]),
        new("Cr", 5.64, 51.996, [6.767, 16.486, 30.96], [10.5, 7.2, 25, 28]),
        new("Mn", 5.43, 54.938, [7.434, 15.640, 33.668], [6.4, 7.7, 6, 25]),
        new("Fe", 7.50, 55.845, [7.902, 16.199, 30.651, 54.8], [27, 43, 30, 25, 6]),
        new("Co", 4.99, 58.933, [7.881, 17.084, 33.5], [33, 29, 28, 25]),
        new("Ni", 6.22, 58.693, [7.640, 18.169, 35.19], [29, 10, 20, 25]),
        new("Sr", 2.87, 87.62, [5.695, 11.030, 42.89], [1.3, 2.2, 1, 6]),
        new("Y", 2.21, 88.906, [6.217, 12.224, 20.52], [12, 16, 10, 1]),
        new("Zr", 2.58, 91.224, [6.634, 13.1, 23.2], [35, 45, 20, 10]),
        new("Ba", 2.18, 137.327, [5.212, 10.004, 35.8], [2.9, 4.2, 1, 6]),
        new("La", 1.10, 138.905, [5.577, 11.06, 19.18], [20, 28, 10, 1]),
    ];

    /// <summary>Place among the elements other than hydrogen.</summary>
    public int Index => _index ??= Array.IndexOf(Others, this);

    private int? _index;

    public static Element Find(string symbol) =>
        symbol == "H" ? Hydrogen : Array.Find(Others, e => e.Symbol == symbol) ?? throw new ArgumentException($"no element '{symbol}'");
}
