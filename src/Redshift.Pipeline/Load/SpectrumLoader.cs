using Redshift.Pipeline.Observations;
using Redshift.Pipeline.Settings;

namespace Redshift.Pipeline.Load;

/// <summary>Finds the spectra in a file, whatever its layout.</summary>
public static class SpectrumLoader
{
    /// <summary>Reads all spectra of a file, lazily, in the order of their rows.</summary>
    /// <param name="path">Where the file is.</param>
    /// <param name="source">Its name in catalogues and messages.</param>
    /// <param name="settings">What the pipeline file says about reading.</param>
    /// <returns>An observation or a reject for each; at least one outcome, and never an exception for what a file holds.</returns>
    public static IEnumerable<LoadOutcome> Load(string path, string source, LoadSettings settings)
    {
        using var reading = new FileReading(source, settings);
        if (reading.Open(path) is { } refused)
        {
            yield return new(null, refused);
            yield break;
        }
        for (var row = 0; row < reading.Rows; row++) yield return reading.Read(row);
    }

    /// <summary>Says what a file holds and how it is read, for a person who wants to write a rule for it.</summary>
    /// <param name="path">Where the file is.</param>
    /// <param name="row">Which of its observations.</param>
    /// <param name="settings">What the pipeline file says about reading.</param>
    public static FileDescription Describe(string path, int row, LoadSettings settings)
    {
        using var reading = new FileReading(path, settings);
        var refused = reading.Open(path);
        return new(reading.Contents(), refused is null && row < reading.Rows ? reading.Rule(row) : null);
    }
}
