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

    private const double KmSPerLn = Velocity.SpeedOfLightKmS;

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
        if (_settings.Expect is null) peaks.AddRange(_library.Comets.Select(m => new Peak(m, 0, 0)));
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
            peaks.AddRange(Highest(evidence, from, 1, 2, _ => model));
        }

        return [.. peaks.OrderByDescending(p => p.LnEvidence).Take(10)];
    }

    private List<Peak> Galaxies()
    {
        var best = new float[_shifts];
        var which = new short[_shifts];
        Array.Fill(best, float.NegativeInfinity);
        var scan = new TemplateScan(_cells, TemplateLength);
        for (var t = 0; t < _library.Galaxies.Count; t++) Take(scan, _library.Galaxies[t], t, best, which);
        AddNarrowGroups(_library.Galaxies[0], best, _firstShift);
        return Highest(best, _firstShift, 1, 14, s => _library.Galaxies[which[s]]);
    }

    /// <summary>Scans a template without the forest up to where the forest matters, then with the forest's depth of each range.</summary>
    private void Take(TemplateScan scan, FitModel model, int index, float[] best, short[] which)
    {
        TakeRange(scan, CellTemplate.For(model.Template!, _cells.SigmaLn), index, double.NegativeInfinity, Math.Min(model.GreatestLnShift, Forest.Ranges[0].From), best, which);
        foreach (var (from, to, middle) in Forest.Ranges)
            TakeRange(scan, CellTemplate.For(model.Template!, _cells.SigmaLn, middle), index, from, Math.Min(model.GreatestLnShift, to), best, which);
    }

    private void TakeRange(TemplateScan scan, CellTemplate template, int index, double from, double to, float[] best, short[] which)
    {
        int first = (int)Math.Max(0, Math.Ceiling(from / Cells.Step) - _firstShift), last = (int)Math.Min(_shifts, Math.Ceiling(to / Cells.Step) - _firstShift);
        if (last > first) scan.Take(template, index, _firstShift + first, best.AsSpan(first, last - first), which.AsSpan(first, last - first));
    }

    /// <summary>The step at Lyman alpha that the forest makes in a featureless continuum, at every shift.</summary>
    private float[] ForestSteps()
    {
        var best = new float[_shifts];
        var scan = new TemplateScan(_cells, TemplateLength);
        foreach (var (from, to, middle) in Forest.Ranges)
            TakeRange(scan, CellTemplate.For(ModelLibrary.Flat, _cells.SigmaLn, middle), 0, from, to, best, new short[_shifts]);
        return best;
    }

    /// <summary>Template cells that any shift of the grid brings onto the data.</summary>
    private int TemplateLength => Math.Clamp(_cells.First + _cells.Count - Cells.Margin - _firstShift, 1, CellTemplate.Length);

    private List<Peak> Quasars()
    {
        var peaks = new List<Peak>();
        var steps = ForestSteps();
        foreach (var width in _library.Quasars.Where(m => m.Template is null).GroupBy(m => m.BroadKmS))
        {
            // Steps of a fifth of the line's σ lose nothing; narrow lines are left to the exact fits.
            var stride = Math.Max(1, (int)(0.2 * width.Key / KmSPerLn / Cells.Step));
            var broad = new LineScan(_cells, Width(width.Key), stride);
            foreach (var model in width)
            {
                var total = new float[_shifts / stride];
                for (var s = 0; s < total.Length; s++) total[s] = steps[s * stride];
                foreach (var group in model.Groups.Where(g => g.Broad)) broad.Add(group, _firstShift, total);
                peaks.AddRange(Highest(total, _firstShift, stride, 8, _ => model));
            }
        }

        return [.. peaks.OrderByDescending(p => p.LnEvidence).Take(14)];
    }

    private List<Peak> Nebulae()
    {
        var reach = (int)Math.Ceiling(600 / KmSPerLn / Cells.Step);
        var total = new float[2 * reach + 1];
        AddNarrowGroups(_library.Nebulae[0], total, -reach);
        return Highest(total, -reach, 1, 2, _ => _library.Nebulae[0]);
    }

    private void AddNarrowGroups(FitModel model, float[] total, int firstShift)
    {
        var narrow = new LineScan(_cells, Width(model.NarrowKmS));
        foreach (var group in model.Groups) narrow.Add(group, firstShift, total);
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
            peaks.Add(new(model(shift), (firstShift + shift * stride) * Cells.Step, value));
            if (peaks.Count == count) break;
        }

        return peaks;
    }
}
