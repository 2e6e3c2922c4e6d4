using Redshift.Pipeline.Match.Models;

namespace Redshift.Pipeline.Match.Fit;

/// <summary>Integrates columns out one after the other: mixtures with their normal priors, groups where they gain, each paying for its freedom.</summary>
internal sealed class ColumnSelection(FitColumns columns)
{
    private readonly List<int> _chosen = [];
    private readonly List<int> _left = [];

    /// <summary>Takes the columns and finds their amplitudes; returns their part of the ln evidence.</summary>
    public double Take()
    {
        _chosen.Clear();
        _left.Clear();
        for (var c = 0; c < columns.Count; c++) _left.Add(c);
        var evidence = TakeMixtures() + SelectGroups();
        BackSubstitute();
        return evidence;
    }

    /// <summary>Normal priors of both signs: the integrals are exact.</summary>
    private double TakeMixtures()
    {
        double total = 0;
        for (var c = 0; c < columns.Count; c++)
        {
            if (columns[c].Group is not null) continue;
            Condition(c, 0, columns[c].Spread);
            ref var column = ref columns[c];
            total += 0.5 * column.PivotGradient * column.PivotGradient / column.Pivot - 0.5 * Math.Log(column.Pivot * column.Spread * column.Spread);
        }

        return total;
    }

    /// <summary>Takes the groups in the order of what they gain, conditioning the rest on each.</summary>
    private double SelectGroups()
    {
        double total = 0;
        while (_left.Count > 0)
        {
            var best = Best();
            ref var column = ref columns[best];
            var group = column.Group!;
            double spread = group.Spread * column.Level, mean = group.Mean * column.Level;
            var bayes = HalfNormalEvidence.LnBayesFactor(column.Gradient, columns.Curvature(best), mean, spread);
            total += HalfNormalEvidence.LnMixture(bayes, group.Absent);
            if (bayes < Math.Log(group.Absent + 1e-9)) _left.Remove(best);
            else Condition(best, mean, spread);
        }

        return total;
    }

    private int Best()
    {
        var best = _left[0];
        var most = Gain(best);
        foreach (var c in _left)
        {
            var gain = Gain(c);
            if (gain > most) (best, most) = (c, gain);
        }

        return best;
    }

    private double Gain(int c)
    {
        var gradient = columns[c].Gradient;
        return gradient <= 0 ? gradient : gradient * gradient / Math.Max(columns.Curvature(c), 1e-30);
    }

    private void Condition(int taken, double mean, double spread)
    {
        _left.Remove(taken);
        _chosen.Add(taken);
        ref var column = ref columns[taken];
        var precision = 1 / (spread * spread);
        column.Pivot = columns.Curvature(taken) + precision;
        column.PivotGradient = column.Gradient + mean * precision;
        var own = columns.Products(taken);
        foreach (var g in _left)
        {
            var products = columns.Products(g);
            var factor = products[taken] / column.Pivot;
            if (factor == 0) continue;
            columns[g].Gradient -= factor * column.PivotGradient;
            foreach (var h in _left) products[h] -= factor * own[h];
        }
    }

    private void BackSubstitute()
    {
        for (var i = _chosen.Count - 1; i >= 0; i--)
        {
            ref var column = ref columns[_chosen[i]];
            var products = columns.Products(_chosen[i]);
            var value = column.PivotGradient;
            for (var j = i + 1; j < _chosen.Count; j++) value -= products[_chosen[j]] * columns[_chosen[j]].Amplitude;
            column.Amplitude = column.Group is null ? value / column.Pivot : Math.Max(0, value / column.Pivot);
        }
    }
}
