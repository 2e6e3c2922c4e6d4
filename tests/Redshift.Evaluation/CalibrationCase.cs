using System.Globalization;
using Redshift.Physics.Units;
using Redshift.Pipeline.Match.Posterior;
using Redshift.Pipeline.Results;

namespace Redshift.Evaluation;

/// <summary>What the pipeline knew of one answer, and whether the answer was right.</summary>
/// <param name="Kind">galaxy, quasar, or other.</param>
/// <param name="LnOdds">ln odds of the answer against its rivals.</param>
/// <param name="Misfit">How badly the best model fits.</param>
/// <param name="Within">Chance that the stated error keeps within the tolerance.</param>
/// <param name="Right">Whether the redshift was right.</param>
internal sealed record CalibrationCase(string Kind, double LnOdds, double Misfit, double Within, bool Right)
{
    /// <summary>Reads the answers of files that were written with the option for features.</summary>
    public static IEnumerable<CalibrationCase> Read(string path) =>
        CsvTable.Read(path).Where(row => row["z"] is not null && row["ln_odds"] is not null).Select(From);

    private static CalibrationCase From(CsvRow row)
    {
        var kind = Enum.Parse<ObjectKind>(row["kind"]!, ignoreCase: true);
        var sigma = Velocity.SpeedOfLightKmS * Number(row, "z_err") / (1 + Number(row, "z"));
        return new(
            kind is ObjectKind.Galaxy or ObjectKind.Quasar ? row["kind"]! : "other", Number(row, "ln_odds"), Number(row, "misfit"),
            Calibration.Within(sigma, PosteriorSum.ToleranceKmS(kind, Number(row, "resolution"))), row["right"] == "1");
    }

    private static double Number(CsvRow row, string column) => double.Parse(row[column]!, CultureInfo.InvariantCulture);
}
