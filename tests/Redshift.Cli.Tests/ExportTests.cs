using Redshift.Fits;
using Redshift.Pipeline.Report;
using Redshift.Testing;
using Xunit;

namespace Redshift.Cli.Tests;

public sealed class ExportTests : IClassFixture<ExportTests.OneRun>, IDisposable
{
    private readonly OneRun _run;
    private readonly TemporaryFolder _folder = new();

    public ExportTests(OneRun run) => _run = run;

    public void Dispose() => _folder.Dispose();

    [Theory]
    [InlineData("csv", "catalogue.csv")]
    [InlineData("fits", "catalogue.fits")]
    [InlineData("parquet", "catalogue.parquet")]
    [InlineData("votable", "catalogue.vot")]
    public void The_catalogue_is_written_beside_the_others_and_again_with_the_same_bytes(string format, string name)
    {
        var outcome = Zladder.Run("export", _run.Out, "--format", format);
        Zladder.Run("export", _run.Out, "--format", format, "--output", _folder.File("again"));

        Assert.Equal((0, $"{_run.Out}/{name}: 2 rows\n", ""), (outcome.Status, outcome.Output, outcome.Errors));
        Assert.Equal(File.ReadAllBytes(Path.Combine(_run.Out, name)), File.ReadAllBytes(_folder.File("again")));
    }

    [Fact]
    public void Csv_has_the_bytes_of_the_run()
    {
        foreach (var table in new[] { "catalogue", "lines" })
        {
            Zladder.Run("export", _run.Out, "--format", "csv", "--table", table, "-o", _folder.File(table));
            Assert.Equal(File.ReadAllBytes(Path.Combine(_run.Out, table + ".csv")), File.ReadAllBytes(_folder.File(table)));
        }
    }

    [Fact]
    public void Lines_are_exported_too()
    {
        var path = _folder.File("lines.fits");
        Zladder.Run("export", _run.Out, "--format", "fits", "--table", "lines", "-o", path);
        using var file = FitsFile.Open(path);
        var table = Assert.IsType<TableHdu>(file.Hdus[1]);

        Assert.Equal("LINES", table.Name);
        Assert.Equal(File.ReadAllLines(Path.Combine(_run.Out, "lines.csv")).Length - 1, table.RowCount);
    }

    [Fact]
    public void A_condition_picks_rows()
    {
        var some = Zladder.Run("export", _run.Out, "--format", "csv", "--where", "source contains 'b' and row = 0", "-o", _folder.File("some"));
        var none = Zladder.Run("export", _run.Out, "--format", "votable", "--where", "z > 9", "-o", _folder.File("none"));

        Assert.Equal($"{_folder.File("some")}: 1 row\n", some.Output);
        Assert.StartsWith("sub/b.txt,0,", File.ReadAllLines(_folder.File("some"))[1], StringComparison.Ordinal);
        Assert.Equal($"{_folder.File("none")}: 0 rows\n", none.Output);
    }

    [Fact]
    public void Wrong_usage_is_said_in_one_line_with_status_2()
    {
        Check("--where, at letter 1: found 'zz'; expected a column, perhaps z", _run.Out, "--format", "csv", "--where", "zz > 1", "-o", _folder.File("x"));
        Check("--where needs --output FILE: a part of the rows must not pass for the whole table", _run.Out, "--format", "csv", "--where", "z > 1");
        Check($"{_folder.Path}: found no ledger.db; expected the output folder of a run", _folder.Path, "--format", "csv");
        Check("--format: found 'xml'; expected one of csv, fits, parquet, votable", _run.Out, "--format", "xml");
        Check("Option '--format' is required.", _run.Out);
        Assert.Empty(Directory.GetFiles(_folder.Path));
    }

    [Fact]
    public void A_folder_that_is_being_written_is_left_alone_but_can_be_read()
    {
        using var held = new OutputFolder(_run.Out);

        Assert.Equal(5, Zladder.Run("export", _run.Out, "--format", "csv").Status);
        Assert.Equal(0, Zladder.Run("export", _run.Out, "--format", "csv", "-o", _folder.File("elsewhere")).Status);
    }

    [Fact]
    public void A_file_that_cannot_be_written_is_status_3()
    {
        var outcome = Zladder.Run("export", _run.Out, "--format", "csv", "-o", _folder.File("no/such/folder"));

        Assert.Equal(3, outcome.Status);
        Assert.StartsWith("zladder: could not go on: ", outcome.Errors, StringComparison.Ordinal);
    }

    private static void Check(string message, params string[] arguments)
    {
        var outcome = Zladder.Run(["export", .. arguments]);

        Assert.Equal((2, ""), (outcome.Status, outcome.Output));
        Assert.Equal("zladder: " + message, outcome.Errors.Split('\n')[0]);
    }

    /// <summary>The output folder of a run over two spectra.</summary>
    public sealed class OneRun : IDisposable
    {
        private readonly SpectraFolder _spectra = new();

        /// <summary>Runs.</summary>
        public OneRun() => Assert.Equal(0, Zladder.Run("run", _spectra.Spectra, "--out", Out).Status);

        /// <summary>The folder.</summary>
        public string Out => _spectra.Out();

        /// <inheritdoc/>
        public void Dispose() => _spectra.Dispose();
    }
}
