using Redshift.Physics.Units;
using Redshift.Pipeline.Match.Fit;
using Redshift.Pipeline.Match.Models;
using Redshift.Pipeline.Results;
using Redshift.Pipeline.Settings;

namespace Redshift.Pipeline.Match.Search;

/// <summary>The coarse stage: every model at every redshift of the grid, peaks of each kind handed on.</summary>
internal sealed class GridSearch
{
    /// <summary>Peaks nearer than this many cells are one.</summary>
    private const int Separation = 5;

    /// <summary>Peaks of models with lines of different widths nearer than this, in km/s, are one.</summary>
    private const double BroadSeparationKmS = 2000;

    private const double KmSPerLn = Velocity.SpeedOfLightKmS;

    /// <summary>Stars beyond this velocity are not bound to the Galaxy.</summary>
    private const double FastestStarKmS = 1200;

    private readonly Cells _cells;
    private readonly MatchSettings _settings;
    private readonly int _firstShift;
    private readonly int _shifts;
    private readonly ModelLibrary _library = ModelLibrary.Instance;
    private readonly PopulationScan _populations;

    public GridSearch(Cells cells, MatchSettings settings)
    {
        _cells = cells;
        _settings = settings;
        _firstShift = (int)Math.Floor(Math.Log(1 + settings.ZMin) / Cells.Step);
        _shifts = (int)Math.Ceiling(Math.Log(1 + settings.ZMax) / Cells.Step) - _firstShift + 1;
        _populations = new(cells, _firstShift, _shifts);
    }

    /// <summary>The best peaks of each kind.</summary>
    public List<Peak> Peaks()
    {
        var peaks = new List<Peak>();
        if (Wanted(ObjectKind.Star)) peaks.AddRange(Stars());
        if (Wanted(ObjectKind.Galaxy)) peaks.AddRange(Galaxies());
        if (Wanted(ObjectKind.Quasar)) peaks.AddRange(Quasars());
        if (Wanted(ObjectKind.Nebula)) peaks.AddRange(Nebulae());
        if (_settings.Expect is null) peaks.AddRange(_library.Comets.Select(m => new Peak(m, 0, 0)));
        return peaks;
    }

    private bool Wanted(ObjectKind kind) => _settings.Expect is null || _settings.Expect == kind;

    private List<Peak> Stars()
    {
        const double Stride = 2 * Cells.Step;
        var reach = (int)Math.Ceiling(FastestStarKmS / KmSPerLn / Stride);
        int from = Math.Max(-reach, _firstShift >> 1), to = Math.Min(reach, (_firstShift + _shifts - 1) >> 1);
        var peaks = new List<Peak>();
        var evidence = StarScan.Of(_library.StarTemplates, _cells).LnEvidence(_cells.Pairs, from, Math.Max(0, to - from + 1));
        for (var t = 0; t < evidence.Length; t++)
        {
            var model = _library.Stars[t];
            peaks.AddRange(Highest(evidence[t], 2 * from, 2, 2, _ => model));
        }

        return [.. peaks.OrderByDescending(p => p.LnEvidence).Take(10)];
    }

    private List<Peak> Galaxies()
    {
        var best = _populations.Fine(_firstShift, _shifts);
        AddGas(best);
        return Highest(best, _firstShift, 1, 14, s => _library.Galaxies[_populations.Template(_firstShift + s)]);
    }

    private List<Peak> Quasars()
    {
        var peaks = new List<Peak>();
        foreach (var width in _library.Quasars.Where(m => m.Template is null).GroupBy(m => m.BroadKmS))
        {
            // Steps of a fifth of the line's σ lose nothing; narrow lines are left to the exact fits.
            var stride = Math.Max(1, (int)(0.2 * width.Key / KmSPerLn / Cells.Step));
            var broad = new LineScan(_cells, Width(width.Key), stride);
            foreach (var model in width)
            {
                var total = new float[_shifts / stride];
                for (var s = 0; s < total.Length; s++) total[s] = _populations.ForestStep(_firstShift + s * stride);
                foreach (var group in model.Groups.Where(g => g.Broad)) broad.Add(group, _firstShift, total);
                peaks.AddRange(Highest(total, _firstShift, stride, 14, _ => model));
            }
        }

        return [.. peaks.GroupBy(p => p.Model.Groups).SelectMany(wind => Peak.OnePerPlace(wind, BroadSeparationKmS).Take(12))];
    }

    private List<Peak> Nebulae()
    {
        var reach = (int)Math.Ceiling(600 / KmSPerLn / Cells.Step);
        var total = new float[2 * reach + 1];
        var narrow = new LineScan(_cells, Width(_library.Nebulae[0].NarrowKmS));
        foreach (var group in _library.Nebulae[0].Groups) narrow.Add(group, -reach, total);
        return Highest(total, -reach, 1, 2, _ => _library.Nebulae[0]);
    }

    /// <summary>
    /// Adds the lines of a galaxy's gas: all in typical ratios, or ion by ion, whichever fits better. Each line counts once, as in the exact
    /// fits; otherwise one spike of the sky, claimed by every group that has a line there, outweighs a galaxy.
    /// </summary>
    private void AddGas(float[] total)
    {
        var narrow = new LineScan(_cells, Width(_library.Galaxies[0].NarrowKmS));
        float[] Of(EmissionGroup group)
        {
            var evidence = new float[_shifts];
            narrow.Add(group, _firstShift, evidence);
            return evidence;
        }

        var gas = GalaxyLines.Balmer.Select(Of).Aggregate(Greater);
        foreach (var group in GalaxyLines.Ions) narrow.Add(group, _firstShift, gas);
        gas = GalaxyLines.Mixed.Select(Of).Append(gas).Aggregate(Greater);
        foreach (var group in GalaxyLines.Others) narrow.Add(group, _firstShift, total);
        for (var i = 0; i < total.Length; i++) total[i] += gas[i];
    }

    private static float[] Greater(float[] first, float[] second)
    {
        for (var i = 0; i < first.Length; i++) first[i] = Math.Max(first[i], second[i]);
        return first;
    }

    private double Width(double kmS) => Math.Sqrt(_cells.SigmaLn * _cells.SigmaLn + kmS * kmS / (KmSPerLn * KmSPerLn));

    /// <summary>The highest local maxima, not closer than <see cref="Separation"/>.</summary>
    private static List<Peak> Highest(ReadOnlySpan<float> evidence, int firstShift, int stride, int count, Func<int, FitModel> model)
    {
        var maxima = new List<(int Shift, float Value)>();
        for (var s = 0; s < evidence.Length; s++)
        {
            var value = evidence[s];
            if (s > 0 && evidence[s - 1] > value) continue;
            if (s + 1 < evidence.Length && evidence[s + 1] >= value) continue;
            maxima.Add((s, value));
        }

        maxima.Sort((a, b) => b.Value != a.Value ? b.Value.CompareTo(a.Value) : a.Shift.CompareTo(b.Shift));
        var peaks = new List<Peak>();
        var taken = new List<int>();
        foreach (var (shift, value) in maxima)
        {
            if (taken.Exists(t => Math.Abs(t - shift) * stride < Separation)) continue;
            taken.Add(shift);
            peaks.Add(new(model(shift), (firstShift + (stride == 1 ? shift : (shift + Offset(evidence, shift)) * stride)) * Cells.Step, value));
            if (peaks.Count == count) break;
        }

        return peaks;
    }

    /// <summary>Where between its neighbours a maximum lies, in steps: the top of the parabola through them.</summary>
    private static double Offset(ReadOnlySpan<float> evidence, int at)
    {
        if (at == 0 || at + 1 == evidence.Length) return 0;
        double below = evidence[at] - evidence[at - 1], above = evidence[at] - evidence[at + 1];
        return double.IsFinite(below + above) && below + above > 0 ? 0.5 * (below - above) / (below + above) : 0;
    }
}
