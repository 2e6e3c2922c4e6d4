using System.CommandLine;
using System.CommandLine.Parsing;
using Redshift.Pipeline.Compare;
using Redshift.Pipeline.Report;
using Redshift.Pipeline.Settings;

namespace Redshift.Cli;

/// <summary>The whole command: parsing, and the one place where an exception becomes a line of text and an exit status.</summary>
internal static class CommandLine
{
    // After an interrupt a command ends by itself at once, unless it waits for standard input.
    private static readonly TimeSpan Patience = TimeSpan.FromSeconds(3);

    /// <summary>Runs the command.</summary>
    public static async Task<int> InvokeAsync(string[] args)
    {
        var parsed = Root().Parse(args);
        if (parsed.Errors.Count > 0)
            return Refuse(parsed);
        try
        {
            return await parsed.InvokeAsync(new() { EnableDefaultExceptionHandler = false, ProcessTerminationTimeout = Patience })
                .ConfigureAwait(false);
        }
        catch (Exception problem)
        {
            var (status, message) = Judge(problem);
            Console.Error.WriteLine("zladder: " + HarmlessText.Printable(message));
            return status;
        }
    }

    private static RootCommand Root()
    {
        var root = new RootCommand("From raw spectra in FITS to a catalogue of redshifts and velocities, with reasons.")
        {
            RunCommand.Build(),
            WatchCommand.Build(),
            ExplainCommand.Build(),
            LinesCommand.Build(),
            ExportCommand.Build(),
            MergeCommand.Build(),
            CompareCommand.Build(),
            InjectCommand.Build(),
        };
        root.SetAction((Action<ParseResult>)(_ => throw new UsageException("no command given; see zladder --help")));
        return root;
    }

    private static int Refuse(ParseResult parsed)
    {
        foreach (var error in parsed.Errors)
            Console.Error.WriteLine("zladder: " + HarmlessText.Printable(error.Message));
        Console.Error.WriteLine($"See {Path(parsed.CommandResult)} --help.");
        return ExitCode.Usage;
    }

    private static string Path(CommandResult command) =>
        command.Parent is CommandResult ? "zladder " + command.Command.Name : "zladder";

    private static (int Status, string Message) Judge(Exception problem) => problem switch
    {
        OperationCanceledException => (ExitCode.Interrupted, "interrupted"),
        UsageException or SettingsException or TableFileException => (ExitCode.Usage, problem.Message),
        FolderInUseException => (ExitCode.FolderInUse, problem.Message),
        IOException or UnauthorizedAccessException => (ExitCode.Stopped, "could not go on: " + problem.Message),
        _ => (ExitCode.Stopped, $"a fault of this program ({problem.GetType().Name}: {problem.Message}); please report it"),
    };
}
