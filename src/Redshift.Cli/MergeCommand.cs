using System.CommandLine;
using System.Diagnostics;
using Redshift.Pipeline.Ledger;
using Redshift.Pipeline.Report;

namespace Redshift.Cli;

/// <summary><c>zladder merge</c>: the parts of a run on several machines to one catalogue.</summary>
internal sealed class MergeCommand
{
    private readonly Command _command = new("merge", "Join the parts of a run that was shared out with run --shard, and write the catalogue.");

    private readonly Argument<string[]> _folders = new("OUTFOLDER")
    {
        Description = "Output folders of all parts; a part that was done twice may be given twice",
        Arity = ArgumentArity.OneOrMore,
    };

    private readonly Option<string> _out = OutputOptions.Out();

    private readonly Option<bool> _json = OutputOptions.Json();

    private MergeCommand()
    {
        MistypedOption.Refuse(_folders);
        _command.Add(_folders);
        _command.Add(_out);
        _command.Add(_json);
        _command.SetAction(RunAsync);
    }

    /// <summary>Makes the command.</summary>
    public static Command Build() => new MergeCommand()._command;

    private async Task<int> RunAsync(ParseResult parsed, CancellationToken token)
    {
        var watch = Stopwatch.StartNew();
        // From here on the caller's thread is free to wait for an interrupt.
        await Task.Yield();
        var parts = parsed.GetRequiredValue(_folders).Select(Path.GetFullPath).Select(Path.TrimEndingDirectorySeparator).Distinct().ToList();
        using var folder = new OutputFolder(parsed.GetRequiredValue(_out));
        if (parts.Contains(Path.TrimEndingDirectorySeparator(Path.GetFullPath(folder.Path))))
            throw new UsageException($"--out {folder.Path}: expected a folder that is none of the parts");
        foreach (var (part, times) in LedgerMerge.Write(parts, folder.Path, token))
            Console.Error.WriteLine($"part {part} is there {times} times, with equal answers");
        using var ledger = LedgerFile.Open(folder.Path);
        CatalogueFiles.Write(ledger, folder.Path, token);
        var tally = Tally.Of(ledger);
        Summary.Print(tally, measured: null, folder.Path, watch.Elapsed, parsed.GetValue(_json));
        return tally.Results == 0 ? ExitCode.Unusable : ExitCode.Done;
    }
}
