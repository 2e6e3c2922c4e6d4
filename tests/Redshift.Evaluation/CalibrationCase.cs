using System.Globalization;
using MathNet.Numerics.Distributions;

namespace Redshift.Evaluation;

/// <summary>What the pipeline knew of one answer, and whether the answer was right.</summary>
/// <param name="Kind">galaxy, quasar, or other.</param>
/// <param name="LnOdds">ln odds of the answer against its rivals.</param>
/// <param name="Misfit">How badly the best model fits.</param>
/// <param name="Within">Chance that the stated error keeps within the tolerance.</param>
/// <param name="Right">Whether the redshift was right.</param>
internal sealed record CalibrationCase(string Kind, double LnOdds, double Misfit, double Within, bool Right)
{
    private const double C = 299792.458;

    /// <summary>Reads the answers of files that were written with the option for features.</summary>
    public static IEnumerable<CalibrationCase> Read(string path) =>
        CsvTable.Read(path).Where(row => row["z"] is not null && row["ln_odds"] is not null).Select(From);

    private static CalibrationCase From(CsvRow row)
    {
        var kind = row["kind"]!;
        var tolerance = kind switch { "quasar" => 3000, "star" => Math.Max(100, 0.5 * C / Number(row, "resolution")), _ => 1000 };
        var sigma = C * Number(row, "z_err") / (1 + Number(row, "z"));
        return new(
            kind is "galaxy" or "quasar" ? kind : "other", Number(row, "ln_odds"), Number(row, "misfit"),
            2 * Normal.CDF(0, 1, tolerance / Math.Max(sigma, 1)) - 1, row["right"] == "1");
    }

    private static double Number(CsvRow row, string column) => double.Parse(row[column]!, CultureInfo.InvariantCulture);
}
