using System.CommandLine;
using Redshift.Pipeline.Ledger;
using Redshift.Pipeline.Report;
using Redshift.Pipeline.Report.Conditions;
using Redshift.Pipeline.Report.Formats;

namespace Redshift.Cli;

/// <summary><c>zladder export</c>: the tables of a run in other formats.</summary>
internal sealed class ExportCommand
{
    private static readonly Dictionary<string, Func<LedgerFile, Table<string[]>>> Tables = new(StringComparer.Ordinal)
    {
        ["catalogue"] = LedgerTables.Catalogue,
        ["lines"] = LedgerTables.Lines,
    };

    private readonly Command _command = new("export", "Write the catalogue or the lines of a run in another format, or a part of them.");
    private readonly Argument<string> _folder = new("OUTFOLDER") { Description = "Output folder of a run" };
    private readonly Option<string?> _format = WordOption.Create("--format", "Format of the file", [.. TableFormats.Names]);
    private readonly Option<string?> _table = WordOption.Create("--table", "Which table; the catalogue unless given", Tables.Keys);

    private readonly Option<string?> _where = new("--where")
    {
        Description = "Only rows that meet a condition on columns, such as \"verdict = 'firm' and z > 2\"; needs --output",
        HelpName = "CONDITION",
    };

    private readonly Option<string?> _output = new("--output", "-o")
    {
        Description = "The file; OUTFOLDER/catalogue.fits and its like unless given",
        HelpName = "FILE",
    };

    private ExportCommand()
    {
        MistypedOption.Refuse(_folder);
        _command.Add(_folder);
        _format.Required = true;
        foreach (var option in new[] { _format, _table, _where, _output })
            _command.Add(option);
        _command.SetAction(RunAsync);
    }

    /// <summary>Makes the command.</summary>
    public static Command Build() => new ExportCommand()._command;

    private async Task<int> RunAsync(ParseResult parsed, CancellationToken token)
    {
        // From here on the caller's thread is free to wait for an interrupt.
        await Task.Yield();
        var folder = parsed.GetRequiredValue(_folder);
        if (!File.Exists(Path.Combine(folder, LedgerFile.Name)))
            throw new UsageException($"{folder}: found no {LedgerFile.Name}; expected the output folder of a run");
        // A run that ends meanwhile writes some of the same files.
        using var held = parsed.GetValue(_output) is null ? new OutputFolder(folder) : null;
        using var ledger = LedgerFile.OpenExisting(folder);
        var table = Tables[parsed.GetValue(_table) ?? "catalogue"](ledger).Until(token);
        if (parsed.GetValue(_where) is { } condition)
            table = table.Where(Test(condition, table));
        Write(table, parsed.GetValue(_format)!, Target(parsed, folder, table.Name));
        return ExitCode.Done;
    }

    private string Target(ParseResult parsed, string folder, string table) => parsed.GetValue(_output)
        ?? (parsed.GetValue(_where) is null
            ? Path.Combine(folder, TableFormats.FileName(table, parsed.GetValue(_format)!))
            : throw new UsageException("--where needs --output FILE: a part of the rows must not pass for the whole table"));

    private static Func<string[], bool> Test(string condition, Table<string[]> table)
    {
        try
        {
            return Condition.Parse(condition, table.Columns);
        }
        catch (ConditionException mistake)
        {
            throw new UsageException($"--where, {mistake.Message}");
        }
    }

    private static void Write(Table<string[]> table, string format, string path)
    {
        var rows = 0;
        TableFormats.Write(table with { Rows = Counted(table.Rows, count => rows = count) }, format, path);
        Console.WriteLine($"{HarmlessText.Printable(path)}: {rows} {(rows == 1 ? "row" : "rows")}");
    }

    // Some formats go through the rows several times; the last time counts.
    private static IEnumerable<string[]> Counted(IEnumerable<string[]> rows, Action<int> tell)
    {
        var count = 0;
        tell(count);
        foreach (var row in rows)
        {
            tell(++count);
            yield return row;
        }
    }
}
