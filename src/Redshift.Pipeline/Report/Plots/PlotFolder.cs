using System.Globalization;
using Redshift.Pipeline.Results;

namespace Redshift.Pipeline.Report.Plots;

/// <summary>The folder <c>plots</c> of a report: one picture an observation, named by source and row.</summary>
/// <param name="report">The folder of the report.</param>
/// <param name="complain">Takes a message about a picture that could not be drawn; must be safe to call from several threads.</param>
public sealed class PlotFolder(string report, Action<string> complain)
{
    /// <summary>Draws one result; safe to call from several threads.</summary>
    /// <exception cref="IOException">The picture cannot be written.</exception>
    public void Draw(ObservationResult result)
    {
        try
        {
            SpectrumPicture.Save(result, PathOf(result.Observation.Source, result.Observation.Row));
        }
        catch (Exception problem) when (problem is not (IOException or UnauthorizedAccessException))
        {
            // A fault of ours in a picture must not cost the answer.
            complain($"no picture of {result.Observation.Source}: a fault of this program ({problem.GetType().Name}: {problem.Message})");
        }
    }

    /// <summary>Whether the picture of a spectrum is there.</summary>
    public bool Has(string source, int row) => File.Exists(PathOf(source, row));

    private string PathOf(string source, int row) =>
        Path.Combine(report, "plots", string.Create(CultureInfo.InvariantCulture, $"{string.Concat(source.Select(Plain))}.{row}.png"));

    // Only letters that every file system and every shell takes as they are.
    private static char Plain(char letter) => char.IsAsciiLetterOrDigit(letter) || letter is '/' or '.' or '-' or '_' ? letter : '_';
}
