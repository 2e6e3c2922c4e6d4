using System.Globalization;
using Redshift.Pipeline.Match.Posterior;
using Redshift.Pipeline.Report;
using Redshift.Pipeline.Results;

namespace Redshift.Pipeline.Inject;

/// <summary>
/// The part of a pipeline file that states recalibrated confidences. It is begun before the long work, so that a path which cannot be written
/// is heard of at once, and gets its name when it is complete.
/// </summary>
public sealed class CalibrationFile : IDisposable
{
    private readonly string _path;
    private readonly string _unfinished;
    private readonly StreamWriter _writer;

    /// <summary>Begins the file.</summary>
    /// <exception cref="IOException">The file cannot be made.</exception>
    public CalibrationFile(string path)
    {
        _path = path;
        _unfinished = path + ".unfinished";
        _writer = new(_unfinished) { NewLine = "\n" };
    }

    /// <summary>Writes the maps that are not the program's own, and gives the file its name.</summary>
    /// <param name="maps">The maps.</param>
    /// <param name="origin">What they were fitted to, one line.</param>
    public void Complete(IEnumerable<RecalibratedMap> maps, string origin)
    {
        _writer.WriteLine("# Part of a pipeline file: confidences as 'zladder inject' found them. Use it with --pipeline, or copy its tables into your pipeline file.");
        _writer.WriteLine("# " + origin);
        foreach (var line in InjectionReport.Limits) _writer.WriteLine("# " + line);
        foreach (var map in maps) Write(map);
        _writer.Dispose();
        File.Move(_unfinished, _path, overwrite: true);
    }

    /// <summary>Drops the file where it was not completed.</summary>
    public void Dispose()
    {
        _writer.Dispose();
        File.Delete(_unfinished);
    }

    private void Write(RecalibratedMap map)
    {
        _writer.WriteLine();
        _writer.WriteLine($"# {Key(map.Kind)}: {Sample(map)}");
        if (map.Map == new ConfidenceMaps().Of(map.Kind)) return;
        _writer.WriteLine($"[calibration.{Key(map.Kind)}]");
        foreach (var (key, value) in new[] { ("offset", map.Map.Offset), ("near", map.Map.Near), ("far", map.Map.Far), ("misfit", map.Map.Misfit) })
            _writer.WriteLine(string.Create(CultureInfo.InvariantCulture, $"{key} = {value:0.000}"));
        // Rounded down: no more than the sample supports.
        _writer.WriteLine(string.Create(CultureInfo.InvariantCulture, $"greatest = {Math.Floor(1e4 * map.Map.Greatest) / 1e4:0.0000}"));
    }

    private static string Sample(RecalibratedMap map) => string.Create(CultureInfo.InvariantCulture, $"{map.Count} answers, {map.Right} right; ") + map.State switch
    {
        MapState.TooFew => "too few, or too few of either sort, to fit: kept as it was",
        MapState.Kept => $"a fit is no better (log score {Cell.Fixed(map.Before, 3).Text}, fitted {Cell.Fixed(map.After, 3).Text}): kept as it was",
        _ => $"log score {Cell.Fixed(map.Before, 3).Text} before, {Cell.Fixed(map.After, 3).Text} after, cross-validated, nats an answer",
    };

    private static string Key(ObjectKind kind) => kind == ObjectKind.Star ? "other" : Words.Of(kind);
}
