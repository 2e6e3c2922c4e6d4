using System.Globalization;
using System.Text.RegularExpressions;
using CsvHelper;
using Redshift.Physics.Units;
using Redshift.Testing;
using Xunit;

namespace Redshift.Cli.Tests;

/// <summary>Runs the first command of the README on the sample spectra and holds its catalogue against their truth.</summary>
public sealed partial class SampleSpectraTests : IClassFixture<SampleSpectraTests.ReadmeRun>
{
    private readonly ReadmeRun _run;

    /// <summary>Takes the one run that all tests share.</summary>
    public SampleSpectraTests(ReadmeRun run) => _run = run;

    [Fact]
    public void The_command_of_the_readme_succeeds() => Assert.Equal(0, _run.Outcome.Status);

    [Fact]
    public void Every_spectrum_is_in_the_catalogue_and_nothing_else() =>
        Assert.Equal(_run.Truth.Keys.Order(), _run.Catalogue.Keys.Order());

    [Fact]
    public void What_is_no_spectrum_is_rejected() => Assert.Equal(
        ["README.md", "slit/interrupted.fits", "truth.csv"],
        _run.Outcome.Errors.Split('\n').Where(line => line.StartsWith("rejected: ", StringComparison.Ordinal)).Select(line => line.Split(' ')[1].TrimEnd(':')));

    [Fact]
    public void Redshifts_are_right_in_three_of_four_at_least()
    {
        // The sample holds faint and ambiguous spectra on purpose; those are measured by the evaluation, not here.
        var known = _run.Truth.Where(pair => pair.Value["kind"] is "star" or "galaxy" or "quasar" or "nebula").ToList();
        var wrong = known.Where(pair => !IsRight(pair.Value, _run.Catalogue[pair.Key])).Select(pair => pair.Key).ToList();

        Assert.True(wrong.Count <= known.Count / 4, "wrong: " + string.Join(", ", wrong));
    }

    [Theory]
    [InlineData("export")]
    [InlineData("compare")]
    public void The_readme_goes_on_with_commands_that_work(string command)
    {
        var outcome = Zladder.Run(_run.Next(command));

        Assert.Equal((0, ""), (outcome.Status, outcome.Errors));
        Assert.Contains("34 rows", outcome.Output, StringComparison.Ordinal);
    }

    // The tolerances of the column confidence: 100 km/s for stars, 1000 for galaxies and nebulae, 3000 for quasars.
    private static bool IsRight(Dictionary<string, string> truth, Dictionary<string, string> row)
    {
        if (!double.TryParse(row["z_file"], CultureInfo.InvariantCulture, out var z))
            return false;
        var offset = Velocity.Between(RedshiftValue.FromZ(z), RedshiftValue.FromZ(double.Parse(truth["z"], CultureInfo.InvariantCulture)));
        return Math.Abs(offset.KmS) < (truth["kind"] switch { "star" => 100, "quasar" => 3000, _ => 1000 });
    }

    /// <summary>The run of the README's command.</summary>
    public sealed partial class ReadmeRun : IDisposable
    {
        private readonly TemporaryFolder _folder = new();
        private readonly string _readme = File.ReadAllText(Repository.PathOf("README.md"));

        /// <summary>Runs the command as the README has it, but into a temporary folder.</summary>
        public ReadmeRun()
        {
            var command = Command().Match(_readme);
            Assert.True(command.Success, "the README has no run command");
            Outcome = Zladder.Run("run", Repository.PathOf(command.Groups["input"].Value), "--out", _folder.Path);
            Catalogue = Read(_folder.File("catalogue.csv"));
            Truth = Read(Repository.PathOf("sample-spectra", "truth.csv"));
        }

        internal Zladder.Outcome Outcome { get; }

        internal Dictionary<string, Dictionary<string, string>> Catalogue { get; }

        internal Dictionary<string, Dictionary<string, string>> Truth { get; }

        /// <summary>The arguments of the README's line with another command, its folders in the right place.</summary>
        public string[] Next(string command)
        {
            var line = _readme.Split('\n').First(line => line.StartsWith($"zladder {command} ", StringComparison.Ordinal)).Split('#')[0];
            return [.. line.Split(' ', StringSplitOptions.RemoveEmptyEntries).Skip(1).Select(Placed)];
        }

        /// <inheritdoc/>
        public void Dispose() => _folder.Dispose();

        private string Placed(string word) => word == "out" ? _folder.Path : word.StartsWith("sample-spectra", StringComparison.Ordinal) ? Repository.PathOf(word) : word;

        private static Dictionary<string, Dictionary<string, string>> Read(string path)
        {
            using var reader = CsvReader.FromFile(path, new CsvReaderOptions { Separator = ',' });
            var rows = new Dictionary<string, Dictionary<string, string>>();
            while (reader.Read())
            {
                var row = Enumerable.Range(0, reader.Headers.Count).ToDictionary(i => reader.Headers[i], reader.GetString);
                rows[$"{row["source"]} {row["row"]}"] = row;
            }

            return rows;
        }

        [GeneratedRegex(@"^dotnet run --project src/Redshift\.Cli .*-- run (?<input>\S+) --out \S+$", RegexOptions.Multiline)]
        private static partial Regex Command();
    }
}
