using CsCheck;
using Redshift.Pipeline.Compare;
using Xunit;

namespace Redshift.Pipeline.Tests.Compare;

public sealed class ComparisonTests
{
    private const double C = 299792.458;

    [Theory]
    [InlineData("galaxy", null, 999.9, false)]
    [InlineData("galaxy", null, 1000.1, true)]
    [InlineData("nebula", null, -1000.1, true)]
    [InlineData("unknown", null, 999.9, false)]
    [InlineData("quasar", null, -2999.9, false)]
    [InlineData("quasar", null, 3000.1, true)]
    [InlineData("star", 10000.0, 99.9, false)]
    [InlineData("star", 10000.0, 100.1, true)]
    // Half a resolution element, c / (2 R), where that is wider.
    [InlineData("star", 500.0, 299.7, false)]
    [InlineData("star", 500.0, 299.9, true)]
    public void Outliers_are_judged_by_the_kind_of_the_answer(string kind, double? resolution, double offset, bool outlier)
    {
        const double old = 0.25;
        var now = Row("a") with { Kind = kind, Resolution = resolution, Z = old + offset / C * (1 + old) };
        var difference = new Difference(Row("a") with { Z = old }, now);

        Assert.Equal(offset, difference.OffsetKmS!.Value, 1e-6);
        Assert.Equal(outlier, difference.IsOutlier);
    }

    [Fact]
    public void Statistics_are_those_of_the_offsets()
    {
        // Offsets of -10, 20, 30, 5000 km/s: the median is 25; deviations from it 35, 5, 5, 4975 have the median 20.
        var comparison = Compare([-10, 20, 30, 5000], out _);

        Assert.Equal((4, 1, 25.0), (comparison.All.Pairs, comparison.All.Outliers, comparison.All.OutlierPercent));
        Assert.Equal(25, comparison.All.MedianKmS!.Value, 1e-6);
        Assert.Equal(1.4826 * 20, comparison.All.NmadKmS!.Value, 1e-3);
        Assert.Equal((3, 0), (comparison.Verdicts["firm"].Pairs, comparison.Verdicts["firm"].Outliers));
        Assert.Equal((1, 1), (comparison.Verdicts["unsettled"].Pairs, comparison.Verdicts["unsettled"].Outliers));
        Assert.Equal("s3", Assert.Single(comparison.WorstOutliers).New!.Source);
    }

    [Fact]
    public void Tables_without_pairs_have_no_statistics()
    {
        var comparison = Comparison.Of([Row("a")], [Row("b")], Pairing.Source, 1, _ => { });

        Assert.Equal((0, 0, null, null, null), (
            comparison.Pairs, comparison.All.Pairs, comparison.All.MedianKmS, comparison.All.NmadKmS, comparison.All.OutlierPercent));
    }

    [Fact]
    public void Every_change_is_told()
    {
        ComparedRow[] old =
        [
            Row("same", 0.1, "galaxy", "firm"), Row("moved", 0.1, "galaxy", "firm"), Row("kind", 0.1, "galaxy", "firm"),
            Row("lost", 0.1, "galaxy", "firm"), Row("gained", null, "unknown", "nothing"), Row("gone", 0.1, "galaxy", "firm"),
        ];
        ComparedRow[] now =
        [
            Row("kind", 0.9, "quasar", "likely"), Row("same", 0.1, "galaxy", "firm"), Row("moved", 0.1001, "galaxy", "firm"),
            Row("fresh", 0.1, "star", "firm"), Row("lost", null, "galaxy", "firm"), Row("gained", 0.3, "galaxy", "firm"),
        ];
        var told = new List<string>();
        var comparison = Comparison.Of(old, now, Pairing.Source, 1, d => told.Add($"{(d.New ?? d.Old)!.Source}: {string.Join(';', d.Changes)}"));

        Assert.Equal(
            ["kind: outlier;kind;verdict", "moved: moved", "fresh: added", "lost: z-lost", "gained: z-gained;kind;verdict", "gone: missing"], told);
        Assert.Equal((6, 6, 5), (comparison.OldRows, comparison.NewRows, comparison.Pairs));
        Assert.Equal((1, 2, 2), (comparison.Count("added"), comparison.Count("kind"), comparison.Count("verdict")));
        Assert.Equal([(("galaxy", "quasar"), 1), (("unknown", "galaxy"), 1)], comparison.KindChanges.Select(pair => (pair.Key, pair.Value)));
        Assert.Equal([(("firm", "likely"), 1), (("nothing", "firm"), 1)], comparison.VerdictChanges.Select(pair => (pair.Key, pair.Value)));
    }

    [Fact]
    public void A_table_that_says_nothing_of_kinds_changes_none()
    {
        var changes = new Difference(Row("a", 0.1, "", ""), Row("a", 0.1, "galaxy", "firm")).Changes;

        Assert.Empty(changes);
    }

    [Fact]
    public void Names_are_the_same_whatever_their_blanks_and_capitals()
    {
        ComparedRow[] old = [Row("x") with { Target = "M 31", Z = -0.001 }, Row("y") with { Target = "" }, Row("z") with { Target = "m31", Z = 5 }];
        ComparedRow[] now = [Row("p") with { Target = "m31", Z = -0.001 }, Row("q") with { Target = "" }];
        var comparison = Comparison.Of(old, now, Pairing.Target, 1, _ => { });

        Assert.Equal((1, 0, 1, 2), (comparison.Pairs, comparison.All.Outliers, comparison.Count("added"), comparison.Count("missing")));
        Assert.Equal(1, comparison.OldDoubled);
    }

    [Fact]
    public void Rows_of_one_file_are_told_apart()
    {
        ComparedRow[] rows = [Row("a", 0.1), Row("a", 0.2) with { Row = 1 }];

        Assert.Equal(0, Comparison.Of(rows, rows.Reverse(), Pairing.Source, 1, _ => { }).Count("outlier"));
    }

    [Fact]
    public void The_nearest_position_is_the_one_that_looking_at_all_finds() =>
        Gen.Select(Gen.Select(Gen.Double[359.99, 360.01], Gen.Double[-90, -89.99]).Array[1, 30], Gen.Double[1, 60]).Sample((places, radius) =>
        {
            var rows = places.Select(place => Row("") with { RaDeg = place.Item1 % 360, DecDeg = place.Item2 }).ToArray();
            var (probe, others) = (rows[0], rows[1..]);
            var distances = Array.ConvertAll(others, row => Separation(probe, row));
            var nearest = distances.Length == 0 ? -1 : Array.IndexOf(distances, distances.Min());
            var expected = nearest >= 0 && distances[nearest] <= radius ? nearest : -1;
            Assert.Equal(expected, RowFinder.Create(Pairing.Position, others, radius).Find(probe));
        });

    [Fact]
    public void Positions_pair_across_zero_hours_and_not_without_a_position()
    {
        ComparedRow[] old = [Row("a") with { RaDeg = 359.9999, DecDeg = 10 }, Row("b")];

        Assert.Equal(0, RowFinder.Create(Pairing.Position, old, 1).Find(Row("c") with { RaDeg = 0.0001, DecDeg = 10.0001 }));
        Assert.Equal(-1, RowFinder.Create(Pairing.Position, old, 1).Find(Row("d") with { RaDeg = 0.0003, DecDeg = 10 }));
        Assert.Equal(-1, RowFinder.Create(Pairing.Position, old, 1).Find(Row("e")));
    }

    // The angle between unit vectors by their difference: another way to the same number, in arcseconds.
    private static double Separation(ComparedRow a, ComparedRow b)
    {
        static (double X, double Y, double Z) Vector(ComparedRow row)
        {
            var (ra, dec) = (row.RaDeg!.Value * Math.PI / 180, row.DecDeg!.Value * Math.PI / 180);
            return (Math.Cos(dec) * Math.Cos(ra), Math.Cos(dec) * Math.Sin(ra), Math.Sin(dec));
        }

        var (u, v) = (Vector(a), Vector(b));
        var chord = Math.Sqrt(Math.Pow(u.X - v.X, 2) + Math.Pow(u.Y - v.Y, 2) + Math.Pow(u.Z - v.Z, 2));
        return 2 * Math.Asin(chord / 2) * 180 / Math.PI * 3600;
    }

    private static Comparison Compare(double[] offsets, out List<Difference> differences)
    {
        var told = differences = [];
        return Comparison.Of(
            offsets.Select((_, i) => Row($"s{i}", 0)), offsets.Select((offset, i) => Row($"s{i}", offset / C, "galaxy", offset > 1000 ? "unsettled" : "firm")),
            Pairing.Source, 1, told.Add);
    }

    private static ComparedRow Row(string source, double? z = null, string kind = "", string verdict = "") =>
        new() { Source = source, Z = z, Kind = kind, Verdict = verdict };
}
