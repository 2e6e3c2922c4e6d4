using System.CommandLine;
using System.CommandLine.Parsing;
using Redshift.Pipeline.Compare;
using Redshift.Pipeline.Report;

namespace Redshift.Cli;

/// <summary><c>zladder compare</c>: two catalogues, or one against known redshifts.</summary>
internal sealed class CompareCommand
{
    private const double UsualRadius = 2;
    private const double LargestRadius = 3600;

    private readonly Command _command = new("compare", "Compare two catalogues, or a catalogue with known redshifts.");
    private readonly Argument<string> _old = new("OLD") { Description = "Output folder, catalogue, or table of known redshifts (CSV or FITS)" };
    private readonly Argument<string> _new = new("NEW") { Description = "Output folder or catalogue that is held against OLD" };

    private readonly Option<string?> _by = WordOption.Create(
        "--by", "What pairs the rows; the first that both tables have unless given", [.. ComparisonReport.Pairings.Keys]);

    private readonly Option<double> _radius = new("--radius")
    {
        Description = "Radius for positions in arcseconds",
        HelpName = "ARCSEC",
        DefaultValueFactory = _ => UsualRadius,
        CustomParser = ParseRadius,
    };

    private readonly Option<string?> _csv = new("--csv") { Description = "Write all rows that differ", HelpName = "FILE" };
    private readonly Option<bool> _json = new("--json") { Description = "Print JSON" };

    private CompareCommand()
    {
        foreach (var argument in new[] { _old, _new })
        {
            MistypedOption.Refuse(argument);
            _command.Add(argument);
        }

        foreach (var option in new Option[] { _by, _radius, _csv, _json })
            _command.Add(option);
        _command.SetAction(Run);
    }

    /// <summary>Makes the command.</summary>
    public static Command Build() => new CompareCommand()._command;

    private int Run(ParseResult parsed)
    {
        using var old = ComparedTable.Open(parsed.GetRequiredValue(_old));
        using var now = ComparedTable.Open(parsed.GetRequiredValue(_new));
        var pairing = Choose(parsed.GetValue(_by), old, now);
        var comparison = Compare(parsed, old, now, pairing);
        var report = new ComparisonReport(comparison, old.Path, now.Path, pairing);
        if (parsed.GetValue(_json))
            Console.WriteLine(report.BuildJson());
        else
            report.WriteText(Console.Out);
        return comparison.Pairs > 0 ? ExitCode.Done : ExitCode.Unusable;
    }

    private Comparison Compare(ParseResult parsed, ComparedTable old, ComparedTable now, Pairing pairing)
    {
        Comparison To(Action<Difference> onDifference) =>
            Comparison.Of(old.Rows(), now.Rows(), pairing, parsed.GetValue(_radius), onDifference);
        if (parsed.GetValue(_csv) is not { } path)
            return To(_ => { });
        using var table = new CsvTable<Difference>(path, DifferenceColumns.All);
        var comparison = To(table.Add);
        table.Complete();
        return comparison;
    }

    private static Pairing Choose(string? asked, ComparedTable old, ComparedTable now)
    {
        if (asked is not null)
            return Check(ComparisonReport.Pairings[asked], asked, old, now);
        var both = old.Pairings.Intersect(now.Pairings).ToList();
        return both.Count > 0
            ? both[0]
            : throw new UsageException($"nothing pairs the rows of {old.Path} and {now.Path}: both need a column source, target, or ra_deg and dec_deg");
    }

    private static Pairing Check(Pairing pairing, string word, params ReadOnlySpan<ComparedTable> tables)
    {
        foreach (var table in tables)
        {
            if (!table.Pairings.Contains(pairing))
                throw new UsageException($"--by {word}: {table.Path} has no such column");
        }

        return pairing;
    }

    private static double ParseRadius(ArgumentResult result) => DecimalNumber.Parse(
        result, radius => radius is > 0 and <= LargestRadius,
        FormattableString.Invariant($"a radius in arcseconds, above 0 and up to {LargestRadius}"));
}
