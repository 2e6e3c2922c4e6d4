using System.Text;
using Redshift.Pipeline.Observations;

namespace Redshift.Pipeline.Load;

/// <summary>How a file was read, in the words of a pipeline file.</summary>
public static class LayoutDescription
{
    private static readonly string[] RuleKeys = ["wavelength", "wavelength_unit", "flux", "error", "inverse_variance", "mask", "medium", "frame"];

    /// <summary>A <c>[[load]]</c> rule that reads the file as it was read, to be pasted into a pipeline file and changed there.</summary>
    /// <param name="observation">What was read.</param>
    /// <returns>TOML; several arms or orders are described by the first.</returns>
    public static string Rule(Observation observation)
    {
        var toml = new StringBuilder("[[load]]\n");
        if (observation.Instrument.Length > 0) toml.Append("when = { INSTRUME = ").Append(Quoted(observation.Instrument)).Append(" }\n");
        foreach (var note in observation.Notes)
            if (RuleKeys.Contains(note.Role) && note.Choice is not ("none" or "unknown" or ""))
                toml.Append(note.Role).Append(" = ").Append(Quoted(note.Choice)).Append('\n');
        return toml.ToString();
    }

    private static string Quoted(string text)
    {
        var quoted = new StringBuilder("\"");
        foreach (var character in text)
        {
            if (character is '"' or '\\') quoted.Append('\\');
            quoted.Append(char.IsControl(character) ? ' ' : character);
        }
        return quoted.Append('"').ToString();
    }
}
