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

    private const double KmSPerLn = 299792.458;

    /// <summary>Stars beyond this velocity are not bound to the Galaxy.</summary>
    private const double FastestStarKmS = 1200;

    private readonly Cells _cells;
    private readonly MatchSettings _settings;
    private readonly int _firstShift;
    private readonly int _shifts;
    private readonly ModelLibrary _library = ModelLibrary.Instance;

    public GridSearch(Cells cells, MatchSettings settings)
    {
        _cells = cells;
        _settings = settings;
        _firstShift = (int)Math.Floor(Math.Log(1 + settings.ZMin) / Cells.Step);
        _shifts = (int)Math.Ceiling(Math.Log(1 + settings.ZMax) / Cells.Step) - _firstShift + 1;
    }

    /// <summary>The best peaks of each kind.</summary>
    public List<Peak> Peaks()
    {
        var peaks = new List<Peak>();
        if (Wanted(ObjectKind.Star)) peaks.AddRange(Stars());
        if (Wanted(ObjectKind.Galaxy)) peaks.AddRange(Galaxies());
        if (Wanted(ObjectKind.Quasar)) peaks.AddRange(Quasars());
        if (Wanted(ObjectKind.Nebula)) peaks.AddRange(Nebulae());
        return peaks;
    }

    private bool Wanted(ObjectKind kind) => _settings.Expect is null || _settings.Expect == kind;

    private List<Peak> Stars()
    {
        var reach = (int)Math.Ceiling(FastestStarKmS / KmSPerLn / Cells.Step);
        int from = Math.Max(-reach, _firstShift), to = Math.Min(reach, _firstShift + _shifts - 1);
        var peaks = new List<Peak>();
        foreach (var model in _library.Stars)
        {
            var template = CellTemplate.For(model.Template!, _cells.SigmaLn);
            var evidence = new float[Math.Max(0, to - from + 1)];
            for (var s = 0; s < evidence.Length; s++) evidence[s] = TemplateScan.Direct(_cells, template, from + s);
            peaks.AddRange(Highest(evidence, from, 2, _ => model));
        }

        return [.. peaks.OrderByDescending(p => p.LnEvidence).Take(10)];
    }

    private List<Peak> Galaxies()
    {
        var best = new float[_shifts];
        var which = new short[_shifts];
        Array.Fill(best, float.NegativeInfinity);
        var templates = _library.Galaxies.Select(m => CellTemplate.For(m.Template!, _cells.SigmaLn)).ToArray();
        var scan = new TemplateScan(_cells, templates[0].Relative.Length);
        for (var t = 0; t < templates.Length; t++)
        {
            var reach = (int)Math.Min(_shifts, _library.Galaxies[t].GreatestLnShift / Cells.Step - _firstShift + 1);
            scan.Take(templates[t], t, _firstShift, best.AsSpan(0, Math.Max(0, reach)), which);
        }

        AddGroups(_library.Galaxies[0], best);
        return Highest(best, _firstShift, 14, s => _library.Galaxies[which[s]]);
    }

    private List<Peak> Quasars()
    {
        var peaks = new List<Peak>();
        foreach (var model in _library.Quasars.Where(m => m.Template is null))
        {
            var total = new float[_shifts];
            AddGroups(model, total);
            peaks.AddRange(Highest(total, _firstShift, 8, _ => model));
        }

        return [.. peaks.OrderByDescending(p => p.LnEvidence).Take(14)];
    }

    private List<Peak> Nebulae()
    {
        var reach = (int)Math.Ceiling(600 / KmSPerLn / Cells.Step);
        var total = new float[2 * reach + 1];
        AddGroups(_library.Nebulae[0], total, -reach);
        return Highest(total, -reach, 2, _ => _library.Nebulae[0]);
    }

    private void AddGroups(FitModel model, float[] total) => AddGroups(model, total, _firstShift);

    private void AddGroups(FitModel model, float[] total, int firstShift)
    {
        var narrow = new LineScan(_cells, Width(model.NarrowKmS));
        var broad = model.Groups.Any(g => g.Broad) ? new LineScan(_cells, Width(model.BroadKmS)) : narrow;
        foreach (var group in model.Groups) (group.Broad ? broad : narrow).Add(group, firstShift, total);
    }

    private double Width(double kmS) => Math.Sqrt(_cells.SigmaLn * _cells.SigmaLn + kmS * kmS / (KmSPerLn * KmSPerLn));

    /// <summary>The highest local maxima, not closer than <see cref="Separation"/>.</summary>
    private static List<Peak> Highest(ReadOnlySpan<float> evidence, int firstShift, int count, Func<int, FitModel> model)
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
            if (taken.Exists(t => Math.Abs(t - shift) < Separation)) continue;
            taken.Add(shift);
            peaks.Add(new(model(shift), (firstShift + shift) * Cells.Step, value));
            if (peaks.Count == count) break;
        }

        return peaks;
    }
}
