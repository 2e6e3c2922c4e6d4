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
        var name = string.Concat(result.Observation.Source.Select(Plain));
        var path = Path.Combine(report, "plots", $"{name}.{result.Observation.Row}.png");
        try
        {
            SpectrumPicture.Save(result, path);
        }
        catch (Exception problem) when (problem is not (IOException or UnauthorizedAccessException))
        {
            // A fault of ours in a picture must not cost the answer.
            complain($"no picture of {result.Observation.Source}: a fault of this program ({problem.GetType().Name}: {problem.Message})");
        }
    }

    // Only letters that every file system and every shell takes as they are.
    private static char Plain(char letter) => char.IsAsciiLetterOrDigit(letter) || letter is '/' or '.' or '-' or '_' ? letter : '_';
}
