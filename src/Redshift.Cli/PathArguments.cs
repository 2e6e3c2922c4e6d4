using System.CommandLine;

namespace Redshift.Cli;

/// <summary>Files and folders given on the command line, in a list, or on standard input.</summary>
internal sealed class PathArguments
{
    private readonly Argument<string[]> _paths = new("PATH")
    {
        Description = "Files and folders with spectra; folders are searched to the bottom",
        Arity = ArgumentArity.ZeroOrMore,
    };

    private readonly Option<string?> _list = new("--from")
    {
        Description = "File with one path a line, or - for standard input",
        HelpName = "LIST",
    };

    /// <summary>Makes the argument and the option and adds them to a command.</summary>
    public PathArguments(Command command)
    {
        MistypedOption.Refuse(_paths);
        command.Add(_paths);
        command.Add(_list);
    }

    /// <summary>All paths.</summary>
    /// <exception cref="UsageException">There is none, or the list cannot be read.</exception>
    public IReadOnlyList<string> Read(ParseResult parsed)
    {
        var paths = parsed.GetValue(_paths)!.ToList();
        if (parsed.GetValue(_list) is { } list)
            paths.AddRange(ReadList(list).Where(line => line.Length > 0));
        return paths.Count > 0 ? paths : throw new UsageException("no paths given: name files or folders, or a list with --from");
    }

    private static List<string> ReadList(string list)
    {
        try
        {
            using var reader = list == "-" ? Console.In : new StreamReader(list);
            return [.. reader.ReadToEnd().Split('\n').Select(line => line.TrimEnd('\r'))];
        }
        catch (Exception problem) when (problem is IOException or UnauthorizedAccessException)
        {
            throw new UsageException($"--from: found no list that can be opened at {list}; expected a file with one path a line, or - for standard input");
        }
    }
}
