using Microsoft.Data.Sqlite;
using Redshift.Pipeline.Ledger;
using Redshift.Pipeline.Observations;
using Redshift.Pipeline.Report;
using Redshift.Pipeline.Tests.Report;
using Redshift.Testing;
using Xunit;

namespace Redshift.Pipeline.Tests.Ledger;

public sealed class DamagedLedgerTests : IDisposable
{
    private readonly TemporaryFolder _folder = new();

    private string Path => _folder.File("ledger.db");

    public void Dispose() => _folder.Dispose();

    [Fact]
    public void A_file_that_is_no_database_is_refused_and_left_alone()
    {
        File.WriteAllText(Path, new string('x', 5000));

        Assert.Equal(
            $"{Path}: found a file that is no database; expected a ledger; "
            + "move it away to start anew, or bring back a copy; the tables beside it are untouched",
            Refusal().Message);
        Assert.Equal(new string('x', 5000), File.ReadAllText(Path));
    }

    [Fact]
    public void The_database_of_another_program_is_refused()
    {
        Execute("CREATE TABLE stamps (country TEXT)");

        Assert.StartsWith($"{Path}: found a database of another program; expected a ledger; ", Refusal().Message, StringComparison.Ordinal);
    }

    [Fact]
    public void A_ledger_of_another_release_is_refused()
    {
        LedgerFile.Open(_folder.Path).Dispose();
        Execute("PRAGMA user_version=99");

        Assert.StartsWith(
            $"{Path}: found a ledger of version 99; expected version 1, which this release writes; ", Refusal().Message, StringComparison.Ordinal);
    }

    [Fact]
    public void A_ledger_that_is_cut_short_is_refused()
    {
        Fill(200);
        using (var file = File.OpenWrite(Path))
            file.SetLength(file.Length / 2);

        Assert.StartsWith($"{Path}: found a damaged database; expected a sound ledger; ", Refusal().Message, StringComparison.Ordinal);
    }

    [Fact]
    public void Damage_in_the_middle_is_told_where_it_is_met()
    {
        Fill(200);
        using (var file = File.OpenWrite(Path))
        {
            file.Position = 3 * 4096;
            file.Write(new byte[(int)file.Length - 4 * 4096]);
        }

        using var ledger = LedgerFile.OpenExisting(_folder.Path);
        var problem = Assert.Throws<LedgerException>(() => ledger.Catalogue().Count());
        Assert.StartsWith($"{Path}: found a damaged database; expected a sound ledger; ", problem.Message, StringComparison.Ordinal);
    }

    [Fact]
    public void An_empty_file_is_what_a_crash_at_the_start_leaves_and_is_filled()
    {
        File.WriteAllText(Path, "");
        Fill(1);

        using var ledger = LedgerFile.OpenExisting(_folder.Path);
        Assert.Single(ledger.Catalogue());
    }

    [Fact]
    public void A_folder_without_a_ledger_is_told() => Assert.Equal(
        $"{Path}: found nothing; expected a ledger; name the output folder of a run",
        Assert.Throws<LedgerException>(() => LedgerFile.OpenExisting(_folder.Path)).Message);

    [Fact]
    public void A_full_disk_ends_the_writing_and_keeps_what_was_committed()
    {
        Fill(5);
        using (var ledger = LedgerFile.Open(_folder.Path))
        {
            Assert.Single(ledger.Database.Query("PRAGMA max_page_count = 1", static reader => reader.GetInt32(0)));
            var problem = Assert.Throws<LedgerException>(() => FilledLedger.Fill(ledger, [], Answers(500)));
            Assert.StartsWith($"{Path}: found no room left on the disk; expected room for the ledger; ", problem.Message, StringComparison.Ordinal);
        }

        using var read = LedgerFile.OpenExisting(_folder.Path);
        Assert.Equal(5, read.Catalogue().Count());
    }

    private static object[] Answers(int count) =>
        [.. Enumerable.Range(0, count).Select(row => Examples.Full() with { Observation = Examples.Observation("stack.fits", row) })];

    private void Fill(int count)
    {
        using var ledger = LedgerFile.Open(_folder.Path);
        FilledLedger.Fill(ledger, [], Answers(count));
    }

    private LedgerException Refusal() => Assert.Throws<LedgerException>(() => LedgerFile.Open(_folder.Path));

    private void Execute(string sql)
    {
        using var connection = new SqliteConnection($"Data Source={Path};Pooling=False");
        connection.Open();
        using var command = connection.CreateCommand();
        command.CommandText = sql;
        command.ExecuteNonQuery();
    }
}
