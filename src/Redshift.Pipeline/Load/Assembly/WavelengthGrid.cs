using Redshift.Physics.Air;
using Redshift.Physics.Units;

namespace Redshift.Pipeline.Load.Assembly;

/// <summary>
/// The wavelengths of a file made ready: in vacuum, strictly increasing, without repeats, and in several runs where the file sets
/// overlapping orders one behind the other.
/// </summary>
internal sealed class WavelengthGrid
{
    /// <summary>Fewest pixels that make a run of its own.</summary>
    public const int ShortestRun = 16;

    private WavelengthGrid(double[] angstroms, IReadOnlyList<GridRun> runs)
    {
        Angstroms = angstroms;
        Runs = runs;
    }

    /// <summary>Wavelengths in Å as the file has them, in its order and medium.</summary>
    public double[] Angstroms { get; }

    /// <summary>The runs, in the order of the file; none where no wavelength is usable.</summary>
    public IReadOnlyList<GridRun> Runs { get; }

    /// <summary>Makes a grid.</summary>
    /// <param name="angstroms">Wavelengths in Å of the medium; those not finite or not positive are left out.</param>
    /// <param name="medium">Their medium.</param>
    public static WavelengthGrid Build(double[] angstroms, WavelengthMedium medium)
    {
        var vacuum = ToVacuum(angstroms, medium);
        if (IsStrictlyIncreasing(vacuum)) return new(angstroms, [new(vacuum, null)]);
        var pixels = UsablePixels(vacuum);
        if (IsMostlyDecreasing(vacuum, pixels)) Array.Reverse(pixels);
        return new(angstroms, [.. SplitAtOverlaps(vacuum, pixels)]);
    }

    private static double[] ToVacuum(double[] angstroms, WavelengthMedium medium)
    {
        if (medium == WavelengthMedium.Vacuum) return angstroms;
        var vacuum = new double[angstroms.Length];
        for (var i = 0; i < vacuum.Length; i++)
            vacuum[i] = double.IsFinite(angstroms[i]) && angstroms[i] > 0 ? AirRefraction.ToVacuum(angstroms[i]) : double.NaN;
        return vacuum;
    }

    private static bool IsStrictlyIncreasing(double[] vacuum)
    {
        if (vacuum.Length == 0 || !(vacuum[0] > 0) || !double.IsFinite(vacuum[^1])) return false;
        for (var i = 1; i < vacuum.Length; i++)
            if (!(vacuum[i] > vacuum[i - 1])) return false;
        return true;
    }

    private static int[] UsablePixels(double[] vacuum)
    {
        var pixels = new List<int>(vacuum.Length);
        for (var i = 0; i < vacuum.Length; i++)
            if (double.IsFinite(vacuum[i]) && vacuum[i] > 0) pixels.Add(i);
        return [.. pixels];
    }

    private static bool IsMostlyDecreasing(double[] vacuum, int[] pixels)
    {
        var balance = 0;
        for (var i = 1; i < pixels.Length; i++) balance += Math.Sign(vacuum[pixels[i]] - vacuum[pixels[i - 1]]);
        return balance < 0;
    }

    private static IEnumerable<GridRun> SplitAtOverlaps(double[] vacuum, int[] pixels)
    {
        var starts = RunStarts(vacuum, pixels);
        // Orders are long; a few steps back among many are pixels out of place.
        if (starts.Count == 0 || pixels.Length / starts.Count < 2 * ShortestRun) return Sorted(vacuum, pixels);
        return starts.Select((start, i) => Run(vacuum, pixels.AsSpan(start..(i + 1 < starts.Count ? starts[i + 1] : pixels.Length))));
    }

    private static List<int> RunStarts(double[] vacuum, int[] pixels)
    {
        var starts = new List<int>();
        for (var i = 0; i < pixels.Length; i++)
            if (i == 0 || vacuum[pixels[i]] < vacuum[pixels[i - 1]]) starts.Add(i);
        return starts;
    }

    private static IEnumerable<GridRun> Sorted(double[] vacuum, int[] pixels)
    {
        if (pixels.Length == 0) return [];
        var sorted = pixels.OrderBy(pixel => vacuum[pixel]).ToArray();
        return [Run(vacuum, sorted)];
    }

    private static GridRun Run(double[] vacuum, ReadOnlySpan<int> pixels)
    {
        var kept = new List<int>(pixels.Length);
        foreach (var pixel in pixels)
            if (kept.Count == 0 || vacuum[pixel] > vacuum[kept[^1]]) kept.Add(pixel);
        return new([.. kept.Select(pixel => vacuum[pixel])], [.. kept]);
    }
}
