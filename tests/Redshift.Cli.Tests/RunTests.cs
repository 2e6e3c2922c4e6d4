using System.Text.Json;
using Redshift.Pipeline.Report;
using Xunit;

namespace Redshift.Cli.Tests;

public sealed class RunTests : IDisposable
{
    private readonly SpectraFolder _folder = new();

    public void Dispose() => _folder.Dispose();

    [Fact]
    public void A_folder_gives_a_catalogue_pictures_and_a_list_of_rejects()
    {
        var outcome = Zladder.Run("run", _folder.Spectra, "--out", _folder.Out(), "--plots");

        Assert.Equal(0, outcome.Status);
        Assert.Equal(["a.txt,0", "sub/b.txt,0"], Catalogue().Select(FirstTwo));
        Assert.Equal(["plots/a.txt.0.png", "plots/sub/b.txt.0.png"], Pictures());
        Assert.Contains("2 spectra: ", outcome.Output, StringComparison.Ordinal);
        Assert.Contains("; 1 reject\n", outcome.Output, StringComparison.Ordinal);
        Assert.Single(outcome.Errors.Split('\n'), line => line.StartsWith("rejected: notes.md: ", StringComparison.Ordinal));
    }

    [Fact]
    public void Neither_workers_nor_order_nor_repetition_change_a_byte()
    {
        for (var i = 0; i < 12; i++)
            _folder.WriteText($"many/{i}.txt", seed: i + 3);
        _folder.WriteFits("f.fits");
        Zladder.Run("run", _folder.Spectra, "--out", _folder.Out("one"), "--jobs", "1");
        Zladder.RunWith(
            string.Join('\n', _folder.At("many"), _folder.At("notes.md"), _folder.At("sub/b.txt"), _folder.At("f.fits"), _folder.At("many/7.txt")),
            "run", _folder.At("sub"), _folder.At("a.txt"), "--from", "-", "--out", _folder.Out("two"), "--jobs", "3");

        foreach (var file in new[] { "catalogue.csv", "lines.csv", "rejects.csv", "columns.csv" })
            Assert.Equal(File.ReadAllBytes(Path.Combine(_folder.Out("one"), file)), File.ReadAllBytes(Path.Combine(_folder.Out("two"), file)));
        Assert.Equal(15, Catalogue("one").Length);
    }

    [Fact]
    public void Earlier_reports_inside_the_input_are_no_input()
    {
        var night = Path.GetDirectoryName(_folder.At("night/clouds.txt"))!;
        File.WriteAllText(_folder.At("night/clouds.txt"), "no spectra tonight\n");
        var reports = _folder.At("night/reports");
        Zladder.Run("run", night, "--out", reports);
        var first = File.ReadAllBytes(Path.Combine(reports, "rejects.csv"));
        Zladder.Run("run", night, "--out", reports);

        Assert.Equal(first, File.ReadAllBytes(Path.Combine(reports, "rejects.csv")));
    }

    [Fact]
    public void Hostile_headers_are_harmless_in_tables_and_on_the_terminal()
    {
        _folder.WriteFits("evil/evil.fits", "OBJECT  = '=cmd|''/c calc''!A1'", "INSTRUME= '@SUM(1)'", "OBSERVER= '\u001b]0;gone\u0007, \"x\"'");
        var pipeline = _folder.Out("keep.toml");
        File.WriteAllText(pipeline, "[read]\nkeep = [\"CRPIX1\", \"OBSERVER\"]\n");
        var outcome = Zladder.Run("run", _folder.At("evil"), "--out", _folder.Out(), "--pipeline", pipeline);
        var explained = Zladder.Run("explain", _folder.At("evil/evil.fits"), "--pipeline", pipeline, "--layout");

        Assert.DoesNotContain(outcome.Errors + outcome.Output + explained.Errors + explained.Output, c => char.IsControl(c) && c != '\n');
        var tables = Directory.GetFiles(_folder.Out(), "*.csv").Select(File.ReadAllText).ToList();
        Assert.All(tables, text => Assert.DoesNotContain(text, c => c is not '\n' and (< ' ' or > '~')));
        Assert.DoesNotContain(",=", string.Concat(tables), StringComparison.Ordinal);
        Assert.DoesNotContain(",@", string.Concat(tables), StringComparison.Ordinal);
        Assert.EndsWith(
            ",cautions,CRPIX1,OBSERVER", File.ReadLines(Path.Combine(_folder.Out(), "catalogue.csv")).First(), StringComparison.Ordinal);
    }

    [Fact]
    public void Json_summary_counts_and_too_many_rejects_are_status_4()
    {
        var outcome = Zladder.Run("run", _folder.Spectra, "--out", _folder.Out(), "--json", "--max-rejects", "0");
        using var json = JsonDocument.Parse(outcome.Output);
        int Number(string name) => json.RootElement.GetProperty(name).GetInt32();

        Assert.Equal(4, outcome.Status);
        Assert.Equal((2, 1), (Number("spectra"), Number("rejects")));
        Assert.Equal(2, Number("firm") + Number("likely") + Number("unsettled") + Number("nothing"));
        Assert.Equal(2, Catalogue().Length);
    }

    [Fact]
    public void Nothing_usable_is_status_4()
    {
        var outcome = Zladder.Run("run", _folder.At("notes.md"), _folder.At("missing.fits"), "--out", _folder.Out());

        Assert.Equal(4, outcome.Status);
        Assert.Contains("rejected: missing.fits: path: found nothing at this path; expected a file or folder\n", outcome.Errors, StringComparison.Ordinal);
        Assert.Empty(Catalogue());
    }

    [Fact]
    public void A_folder_that_cannot_be_made_is_status_3()
    {
        var outcome = Zladder.Run("run", _folder.Spectra, "--out", _folder.At("a.txt"));

        Assert.Equal(3, outcome.Status);
        Assert.Equal($"zladder: could not go on: {_folder.At("a.txt")}: found a file; expected a folder to write to, or a name for a new one\n", outcome.Errors);
    }

    [Theory]
    [InlineData("/proc/zladder", "a place where no folder may be made")]
    [InlineData("/proc/1", "a folder that may not be written to")]
    public void A_folder_that_cannot_be_written_is_named(string folder, string obstacle)
    {
        var outcome = Zladder.Run("run", _folder.Spectra, "--out", folder);

        Assert.Equal(3, outcome.Status);
        Assert.Equal($"zladder: could not go on: {folder}: found {obstacle}; expected a folder to write to, or a name for a new one\n", outcome.Errors);
    }

    [Fact]
    public void A_file_that_is_cut_short_says_where_and_by_how_much()
    {
        _folder.WriteFits("cut/whole.fits");
        var bytes = File.ReadAllBytes(_folder.At("cut/whole.fits"));
        File.WriteAllBytes(_folder.At("cut/data.fits"), bytes[..2980]);
        File.WriteAllBytes(_folder.At("cut/header.fits"), bytes[..500]);
        var outcome = Zladder.Run("run", _folder.At("cut"), "--out", _folder.Out());

        Assert.Equal(0, outcome.Status);
        Assert.Matches("(?m)^rejected: data.fits: HDU 0: found 100 bytes: the file is cut short; expected [0-9]+ bytes of data$", outcome.Errors);
        Assert.Matches("(?m)^rejected: header.fits: HDU 0: found the end of the file: the file is cut short; expected an END card$", outcome.Errors);
    }

    [Fact]
    public void A_folder_in_use_is_status_5()
    {
        using var busy = new OutputFolder(_folder.Out());
        var outcome = Zladder.Run("run", _folder.Spectra, "--out", _folder.Out());

        Assert.Equal(5, outcome.Status);
        Assert.StartsWith("zladder: another run is writing into ", outcome.Errors, StringComparison.Ordinal);
    }

    [Fact]
    public void An_interrupt_is_status_130_and_leaves_no_half_report()
    {
        using var process = Zladder.Start("run", "--from", "-", "--out", _folder.Out());
        Thread.Sleep(1500);
        using (var kill = System.Diagnostics.Process.Start("kill", ["-INT", process.Id.ToString(System.Globalization.CultureInfo.InvariantCulture)]))
            kill.WaitForExit();

        if (!process.WaitForExit(TimeSpan.FromSeconds(30)))
            process.Kill();
        Assert.Equal(130, Zladder.Finish(process).Status);
        Assert.False(File.Exists(Path.Combine(_folder.Out(), "catalogue.csv")));
    }

    private string[] Catalogue(string folder = "out") =>
        [.. File.ReadLines(Path.Combine(_folder.Out(folder), "catalogue.csv")).Skip(1)];

    private string[] Pictures() =>
        [.. Directory.GetFiles(_folder.Out(), "*.png", SearchOption.AllDirectories)
            .Select(file => Path.GetRelativePath(_folder.Out(), file).Replace('\\', '/')).Order(StringComparer.Ordinal)];

    private static string FirstTwo(string row) => string.Join(',', row.Split(',').Take(2));
}
