using System.Globalization;

namespace Redshift.Pipeline.Ledger;

/// <summary>
/// Joins the ledgers of all parts of a run. The result depends on nothing but the answers in them: not on their order, nor on parts that
/// were done twice.
/// </summary>
public static class LedgerMerge
{
    private const string Differences =
        """
        SELECT p.source, a.row FROM part.file p
        JOIN main.file m ON m.source = p.source
        JOIN part.outcome a ON a.file = p.id
        JOIN main.outcome b ON b.file = m.id AND b.row = a.row
        WHERE p.listed = 1 AND (a.state <> b.state OR a.cells <> b.cells OR a.lines <> b.lines)
        LIMIT 1
        """;

    // Of large files a part knows only those that it had spectra of.
    private const string OtherFiles =
        """
        SELECT p.source FROM part.file p JOIN main.file m ON m.source = p.source
        WHERE p.listed = 1 AND EXISTS (SELECT 1 FROM part.outcome o WHERE o.file = p.id) AND (p.size <> m.size OR p.hash <> m.hash)
        LIMIT 1
        """;

    private const string Union =
        """
        INSERT OR IGNORE INTO main.file (source, path, listed, size, modified, hash, fingerprint, complete)
        SELECT source, path, 1, size, modified, hash, fingerprint, complete FROM part.file p
        WHERE listed = 1 AND EXISTS (SELECT 1 FROM part.outcome o WHERE o.file = p.id) ORDER BY source;
        INSERT OR IGNORE INTO main.outcome (file, row, state, milliseconds, cells, lines)
        SELECT m.id, o.row, o.state, o.milliseconds, o.cells, o.lines
        FROM part.file p CROSS JOIN main.file m ON m.source = p.source CROSS JOIN part.outcome o ON o.file = p.id
        WHERE p.listed = 1 ORDER BY p.source, o.row;
        """;

    /// <summary>Writes the joined ledger; it takes the place of an older one when it is complete.</summary>
    /// <param name="folders">The output folders of the parts; parts that were done twice must agree.</param>
    /// <param name="into">The output folder, which exists and is none of these.</param>
    /// <param name="token">Ends the merge and leaves the older ledger as it was.</param>
    /// <returns>The parts that were given more than once, as (part, number of times).</returns>
    /// <exception cref="LedgerException">Parts are missing, not finished, or do not fit together.</exception>
    /// <exception cref="OperationCanceledException">The token ended the merge.</exception>
    public static IReadOnlyList<(Shard Part, int Times)> Write(IReadOnlyList<string> folders, string into, CancellationToken token = default)
    {
        var parts = folders.Select(Open).ToList();
        CheckTogether(parts);
        var path = Path.Combine(Path.GetFullPath(into), LedgerFile.Name);
        var unfinished = path + ".unfinished";
        File.Delete(unfinished);
        try
        {
            using (var joined = LedgerDatabase.OpenOrCreate(unfinished))
            {
                foreach (var part in parts)
                {
                    token.ThrowIfCancellationRequested();
                    Add(joined, part.Path);
                }

                (parts[0].Setup with { Shard = Shard.Whole }).Write(joined);
            }

            Replace(path, unfinished);
        }
        finally
        {
            File.Delete(unfinished);
        }

        return [.. parts.GroupBy(static part => part.Shard).Where(static same => same.Count() > 1).Select(static same => (same.Key, same.Count()))];
    }

    // The log that a killed run left beside an older ledger must not be taken for the new one's.
    private static void Replace(string path, string unfinished)
    {
        foreach (var log in LedgerDatabase.Logs)
            File.Delete(path + log);
        File.Move(unfinished, path, overwrite: true);
    }

    private static Part Open(string folder)
    {
        using var ledger = LedgerFile.OpenExisting(folder);
        if (ledger.Setup is not { Finished: true } setup)
            throw new LedgerException(ledger.Path, "a run that is not finished", "a finished one", "give its command again, then merge");
        return new(ledger.Path, setup, setup.Shard);
    }

    private static void CheckTogether(List<Part> parts)
    {
        var first = parts[0];
        foreach (var part in parts.Skip(1))
        {
            Require(part, first.Shard.Count == part.Shard.Count, $"part {part.Shard} beside part {first.Shard} in {first.Path}");
            Require(part, first.Setup.Inputs == part.Setup.Inputs, $"another list of inputs than in {first.Path}");
            Require(part, first.Setup.Fingerprint == part.Setup.Fingerprint, $"other settings or another engine than in {first.Path}");
        }

        var missing = Enumerable.Range(1, first.Shard.Count).Except(parts.Select(static part => part.Shard.Index)).ToList();
        if (missing.Count > 0)
        {
            var named = string.Join(", ", missing.Select(index => new Shard(index, first.Shard.Count)));
            throw new LedgerException(first.Path, $"no ledger beside it for part {named}", "all parts", "run these, then merge");
        }
    }

    private static void Require(Part part, bool holds, string found)
    {
        if (!holds)
            throw new LedgerException(part.Path, found, "parts of one run", "run the parts again with the same list, pipeline file and release");
    }

    private static void Add(LedgerDatabase joined, string path)
    {
        joined.Guarded(() =>
        {
            using var attach = joined.Command("ATTACH @path AS part");
            attach.Parameters.AddWithValue("@path", path);
            return attach.ExecuteNonQuery();
        });
        foreach (var source in joined.Query(OtherFiles, static reader => reader.GetString(0)))
            throw new LedgerException(path, $"another content of {source} than in the parts before", "files that stay as they are", "run the parts that read it again");
        foreach (var (source, row) in joined.Query(Differences, static reader => (reader.GetString(0), reader.GetInt32(1))))
            throw new LedgerException(path, Another(source, row), "equal answers of parts that were done twice", "merge them without one of the two");
        joined.Execute("BEGIN;" + Union + "COMMIT;");
        joined.Execute("DETACH part");
    }

    private static string Another(string source, int row) =>
        string.Create(CultureInfo.InvariantCulture, $"another answer for {source}{(row >= 0 ? $" row {row}" : "")} than in the parts before");

    private sealed record Part(string Path, LedgerSetup Setup, Shard Shard);
}
