using System.Globalization;
using Redshift.Physics.Statistics;
using Redshift.Physics.Units;
using Redshift.Pipeline.Inject;
using Redshift.Pipeline.Match.Posterior;
using Redshift.Pipeline.Results;

namespace Redshift.Evaluation;

/// <summary>Fits the map from evidence to confidence anew, kind by kind: the numbers for the pipeline's calibration.</summary>
internal static class CalibrationTable
{
    /// <summary>With so wide priors the answers alone decide.</summary>
    private const double Latitude = 10;

    /// <summary>Prints the coefficients of each kind, with the score that they reach and that of answers left out of the fit.</summary>
    public static void Print(IReadOnlyList<CalibrationCase> cases, TextWriter writer)
    {
        writer.WriteLine("kind         n   offset     near      far   misfit    score  cross-validated");
        foreach (var kind in cases.GroupBy(c => c.MapKind).OrderBy(g => g.Key))
        {
            var all = kind.ToList();
            var fit = new CalibrationFit(new ConfidenceMaps().Of(kind.Key), Latitude);
            var map = fit.Fit(all);
            writer.WriteLine(FormattableString.Invariant(
                $"{Answer.Lower(kind.Key),-8}{all.Count,6}{map.Offset,9:0.00}{map.Near,9:0.00}{map.Far,9:0.00}{map.Misfit,9:0.00}{Measures.LogLoss([.. all.Select(c => c.Forecast(map))]),9:0.000}{Measures.LogLoss(fit.CrossValidated(all)),17:0.000}"));
        }
    }

    /// <summary>Reads the answers of a file that was written with the option for features.</summary>
    public static IEnumerable<CalibrationCase> Read(string path) =>
        CsvTable.Read(path).Where(row => row["z"] is not null && row["ln_odds"] is not null).Select(From);

    private static CalibrationCase From(CsvRow row)
    {
        var kind = Enum.Parse<ObjectKind>(row["kind"]!, ignoreCase: true);
        var sigma = Velocity.SpeedOfLightKmS * Number(row, "z_err") / (1 + Number(row, "z"));
        var within = Calibration.Within(sigma, PosteriorSum.ToleranceKmS(kind, Number(row, "resolution")));
        return new(kind, Number(row, "ln_odds"), Number(row, "misfit"), within, row["right"] == "1");
    }

    private static double Number(CsvRow row, string column) => double.Parse(row[column]!, CultureInfo.InvariantCulture);
}
