using System.CommandLine;
using Redshift.Evaluation;
using Redshift.Simulation;
using Redshift.Simulation.Samples;

var count = new Option<int>("--count") { Description = "Number of simulated observations", DefaultValueFactory = _ => 300 };
var seed = new Option<ulong>("--seed") { Description = "Seed; the same seed draws the same observations", DefaultValueFactory = _ => 1 };
var setups = new Option<string[]>("--setups") { Description = "Only these set-ups", AllowMultipleArgumentsPerToken = true };
var kinds = new Option<string[]>("--kinds") { Description = "Only these classes or first parts of classes, e.g. star quasar-bal", AllowMultipleArgumentsPerToken = true };
var jobs = new Option<int>("--jobs") { Description = "Threads", DefaultValueFactory = _ => Environment.ProcessorCount };
var worst = new Option<int>("--worst") { Description = "How many of the most confident errors to list", DefaultValueFactory = _ => 20 };
var features = new Option<string?>("--features") { Description = "Also write what the pipeline knew of each answer to this CSV file" };
var output = new Option<string>("--output") { Description = "Folder for the text files", DefaultValueFactory = _ => "simulated" };
var folder = new Argument<string>("folder") { Description = "Folder with spectra" };
var truth = new Option<string>("--truth") { Description = "Truth table", Required = true };
var catalogue = new Option<string?>("--catalogue") { Description = "Judge this catalogue instead of running the pipeline" };

var simulate = new Command("simulate", "Runs the pipeline on simulated observations and prints what its answers are worth") { count, seed, setups, kinds, jobs, worst, features };
simulate.SetAction(parse =>
{
    using var file = parse.GetValue(features) is { } path ? new FeatureFile(path) : null;
    var judgements = SimulationRun.Judge(parse.GetValue(seed), parse.GetValue(count), Mix(parse), parse.GetValue(jobs), file is null ? null : file.Add);
    new Report(Console.Out).Print(judgements, parse.GetValue(worst));
});

var judge = new Command("folder", "Runs the pipeline on a folder of files with known truth") { folder, truth, catalogue, jobs, worst, features };
judge.SetAction(parse =>
{
    var truths = TruthTable.Read(parse.GetValue(truth)!);
    using var file = parse.GetValue(features) is { } path ? new FeatureFile(path) : null;
    var judgements = parse.GetValue(catalogue) is { } existing
        ? FolderRun.Judge(existing, truths)
        : FolderRun.Judge(parse.GetValue(folder)!, truths, parse.GetValue(jobs), file is null ? null : file.Add);
    new Report(Console.Out).Print(judgements, parse.GetValue(worst));
});

var dump = new Command("dump", "Writes simulated spectra as text files") { count, seed, setups, kinds, output };
dump.SetAction(parse =>
{
    foreach (var observation in SimulatedSurvey.Draw(parse.GetValue(seed), parse.GetValue(count), Mix(parse)))
        SpectrumDump.Write(observation, parse.GetValue(output)!);
});

var answers = new Argument<string[]>("files") { Description = "CSV files that simulate wrote with --features" };
var calibrate = new Command("calibrate", "Fits the map from evidence to confidence anew") { answers };
calibrate.SetAction(parse => CalibrationTable.Print([.. parse.GetValue(answers)!.SelectMany(CalibrationTable.Read)], Console.Out));

var samples = new Command("samples", "Writes the sample spectra anew") { folder };
samples.SetAction(parse => SampleNight.WriteTo(parse.GetValue(folder)!));

return new RootCommand("Measures the pipeline against known truth") { simulate, judge, dump, calibrate, samples }.Parse(args).Invoke();

SurveyMix Mix(ParseResult parse) => SurveyMix.Default.Only(parse.GetValue(setups) ?? [], parse.GetValue(kinds) ?? []);
