using Redshift.Pipeline.Observations;
using Redshift.Pipeline.Results;

namespace Redshift.Pipeline.Report;

/// <summary>The output folder of a run: catalogue, lines and rejects grow row by row and appear together when the run is complete.</summary>
public sealed class ReportFolder : IDisposable
{
    private const string CatalogueName = "catalogue.csv";
    private const string LinesName = "lines.csv";
    private const string RejectsName = "rejects.csv";

    private readonly FileStream _lock;
    private readonly CsvTable<ObservationResult> _catalogue;
    private readonly CsvTable<LineRow> _lines;
    private readonly CsvTable<Reject> _rejects;
    private readonly CsvTable<ColumnGuide> _guide;

    /// <summary>Opens the folder, making it where it does not exist.</summary>
    /// <param name="path">The folder.</param>
    /// <param name="keep">Header cards that become further columns of the catalogue.</param>
    /// <exception cref="FolderInUseException">Another run writes there.</exception>
    /// <exception cref="IOException">The folder cannot be written.</exception>
    /// <exception cref="UnauthorizedAccessException">The folder cannot be written.</exception>
    public ReportFolder(string path, IReadOnlyList<string> keep)
    {
        Directory.CreateDirectory(path);
        Path = path;
        _lock = Lock(path);
        var columns = CatalogueColumns.With(keep);
        _catalogue = new(File(CatalogueName), columns);
        _lines = new(File(LinesName), LineColumns.All);
        _rejects = new(File(RejectsName), RejectColumns.All);
        _guide = new(File("columns.csv"), ColumnGuide.Columns);
        foreach (var row in Guide(columns))
            _guide.Add(row);
    }

    /// <summary>The folder.</summary>
    public string Path { get; }

    /// <summary>Adds an answer and its lines. Answers come in the order of source and row.</summary>
    public void Add(ObservationResult result)
    {
        _catalogue.Add(result);
        foreach (var line in result.Lines)
            _lines.Add(new(result.Observation, line));
    }

    /// <summary>Adds a reject.</summary>
    public void Add(Reject reject) => _rejects.Add(reject);

    /// <summary>Gives all files their names.</summary>
    public void Complete()
    {
        _lines.Complete();
        _rejects.Complete();
        _guide.Complete();
        _catalogue.Complete();
    }

    /// <inheritdoc/>
    public void Dispose()
    {
        _catalogue.Dispose();
        _lines.Dispose();
        _rejects.Dispose();
        _guide.Dispose();
        _lock.Dispose();
    }

    private static IEnumerable<ColumnGuide> Guide(IReadOnlyList<Column<ObservationResult>> catalogue) =>
        ColumnGuide.Of(CatalogueName, catalogue)
            .Concat(ColumnGuide.Of(LinesName, LineColumns.All))
            .Concat(ColumnGuide.Of(RejectsName, RejectColumns.All));

    private static FileStream Lock(string folder)
    {
        var path = System.IO.Path.Combine(folder, ".in-use");
        try
        {
            return new(path, FileMode.OpenOrCreate, FileAccess.Write, FileShare.None, 1, FileOptions.DeleteOnClose);
        }
        catch (IOException) when (System.IO.File.Exists(path))
        {
            throw new FolderInUseException(folder);
        }
    }

    private string File(string name) => System.IO.Path.Combine(Path, name);
}
