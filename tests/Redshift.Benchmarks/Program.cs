using System.CommandLine;
using BenchmarkDotNet.Running;
using Redshift.Benchmarks.Runs;
using Redshift.Benchmarks.Stages;

var spectra = Number("--spectra", "Spectra in the stacks", 2000);
var files = Number("--files", "Single table files", 500);
var jobs = Number("--jobs", "Workers of zladder", 1);
var program = new Option<string>("--zladder")
{
    Description = "The command to measure, such as a published one; the one built with this project unless given",
    DefaultValueFactory = _ => Path.Combine(AppContext.BaseDirectory, "zladder.dll"),
};

var runs = new Command("runs", "Times whole runs of zladder from stacks and from single files, beside two baselines on the same files")
{
    spectra, files, jobs, program,
};
runs.SetAction(parsed => new RunHarness(new(parsed.GetValue(program)!), parsed.GetValue(jobs))
    .Measure(parsed.GetValue(spectra), parsed.GetValue(files), Console.Out));

var counts = new Option<int[]>("--spectra")
{
    Description = "Numbers of spectra, the last of which is also run in parts and merged",
    AllowMultipleArgumentsPerToken = true,
    DefaultValueFactory = _ => [1000, 3000, 10000],
};
var parts = Number("--parts", "Number of parts", 7);
var scale = new Command("scale", "Measures how cost, memory and output of zladder grow with the number of spectra") { counts, parts, program };
scale.SetAction(parsed => new ScaleHarness(new(parsed.GetValue(program)!), parsed.GetValue(parts)).Measure(parsed.GetValue(counts)!, Console.Out));

var rest = new Argument<string[]>("arguments") { Description = "Arguments of BenchmarkDotNet, such as --filter *Fits*", Arity = ArgumentArity.ZeroOrMore };
var stages = new Command("stages", "Times the stages of the pipeline and the decoding of FITS files in this process") { rest };
stages.TreatUnmatchedTokensAsErrors = false;
stages.SetAction(parsed =>
{
    string[] arguments = [.. parsed.GetValue(rest) ?? [], .. parsed.UnmatchedTokens];
    BenchmarkSwitcher.FromAssembly(typeof(StageBenchmarks).Assembly).Run(arguments.Length > 0 ? arguments : ["--filter", "*"], new QuietConfig());
});

return new RootCommand("What the pipeline costs") { runs, scale, stages }.Parse(args).Invoke();

static Option<int> Number(string name, string description, int usual) => new(name) { Description = description, DefaultValueFactory = _ => usual };
