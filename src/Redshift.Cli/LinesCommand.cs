using System.CommandLine;
using System.CommandLine.Parsing;
using System.Globalization;
using Redshift.Physics.Air;
using Redshift.Physics.Lines;
using Redshift.Physics.Units;
using Redshift.Pipeline.Report;
using Redshift.Pipeline.Report.Explain;

namespace Redshift.Cli;

/// <summary><c>zladder lines</c>: where the lines of the program fall at a redshift.</summary>
internal sealed class LinesCommand
{
    private readonly Command _command = new("lines", "List spectral lines and where they fall at a redshift.");

    private readonly Option<double> _z = new("--z")
    {
        Description = "Redshift; 0 unless given",
        HelpName = "Z",
        CustomParser = ParseRedshift,
    };

    private readonly Option<bool> _air = new("--air") { Description = "Observed wavelengths in air" };
    private readonly Option<bool> _vacuum = new("--vacuum") { Description = "Observed wavelengths in vacuum, which is the default" };

    private readonly Option<string?> _kind = WordOption.Create("--kind", "Only lines commonly met in one kind of object", Uses.Keys);

    private readonly Option<(double Low, double High)?> _range = new("--range")
    {
        Description = "Only lines observed between two wavelengths in Angstrom",
        HelpName = "LO,HI",
        CustomParser = result => NumberPair.Parse(result, 0, 1e9),
    };

    private readonly Option<bool> _json = new("--json") { Description = "Print JSON" };

    private LinesCommand()
    {
        foreach (var option in new Option[] { _z, _air, _vacuum, _kind, _range, _json })
            _command.Add(option);
        _command.SetAction(Run);
    }

    private static Dictionary<string, LineUses> Uses { get; } = new()
    {
        ["star"] = LineUses.Star,
        ["galaxy"] = LineUses.Galaxy,
        ["quasar"] = LineUses.Quasar,
        ["nebula"] = LineUses.Nebula,
    };

    /// <summary>Makes the command.</summary>
    public static Command Build() => new LinesCommand()._command;

    private int Run(ParseResult parsed)
    {
        if (parsed.GetValue(_air) && parsed.GetValue(_vacuum))
            throw new UsageException("--air and --vacuum exclude each other");
        var columns = Columns(RedshiftValue.FromZ(parsed.GetValue(_z)), parsed.GetValue(_air));
        var lines = Choose(parsed, columns[^1]).ToList();
        if (parsed.GetValue(_json))
            Console.WriteLine(CellsJson.Build(writer => CellsJson.WriteRows(writer, columns, lines)));
        else
            Print(columns, lines);
        return ExitCode.Done;
    }

    private IEnumerable<SpectralLine> Choose(ParseResult parsed, Column<SpectralLine> observed)
    {
        var lines = parsed.GetValue(_kind) is { } kind ? LineList.For(Uses[kind]) : LineList.All;
        if (parsed.GetValue(_range) is not var (low, high))
            return lines;
        return lines.Where(line =>
            double.Parse(observed.Value(line).Text, CultureInfo.InvariantCulture) is var wavelength && wavelength >= low && wavelength <= high);
    }

    private static Column<SpectralLine>[] Columns(RedshiftValue redshift, bool air) =>
    [
        new("line", "", "", "Name", CellType.Text, line => Cell.Of(line.Name)),
        new("family", "", "", "Family", CellType.Text, line => Cell.Of(Lower(line.Family.ToString()))),
        new("side", "", "", "Absorption, emission or both", CellType.Text, line => Cell.Of(Lower(line.Kind.ToString()))),
        new("rest_vacuum_a", "Angstrom", "", "At rest in vacuum", CellType.Real, line => Cell.Fixed(line.VacuumAngstrom, 4)),
        new("rest_air_a", "Angstrom", "", "At rest in air", CellType.Real, line => line.VacuumAngstrom < AirRefraction.ShortestVacuumAngstrom
            ? Cell.Empty : Cell.Fixed(line.AirAngstrom, 4)),
        new(air ? "observed_air_a" : "observed_vacuum_a", "Angstrom", "", "Observed", CellType.Real, line => Cell.Fixed(Observed(line, redshift, air), 4)),
    ];

    // Below 2000 A nobody observes in air and wavelengths are given in vacuum (the convention of AirRefraction).
    private static double Observed(SpectralLine line, RedshiftValue redshift, bool air)
    {
        var vacuum = line.VacuumAngstrom * (1 + redshift.Z);
        return air ? AirRefraction.ToAir(vacuum) : vacuum;
    }

    private static void Print(Column<SpectralLine>[] columns, List<SpectralLine> lines)
    {
        var table = new TextTable();
        table.AddWords([.. columns.Select(column => column.Name)]);
        foreach (var line in lines)
            table.Add([.. columns.Select(column => column.Value(line))]);
        table.Write(Console.Out, "");
    }

    private static string Lower(string word) => word.ToLowerInvariant();

    private static double ParseRedshift(ArgumentResult result) =>
        DecimalNumber.Parse(result, static z => z > -1 && double.IsFinite(z), "a redshift greater than -1, such as 0.158");
}
