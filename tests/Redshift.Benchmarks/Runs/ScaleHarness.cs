using System.Globalization;
using Redshift.Pipeline.Ledger;
using Redshift.Testing;

namespace Redshift.Benchmarks.Runs;

/// <summary>Measures how cost, memory and output grow with the number of spectra, and what sharing out and joining cost.</summary>
/// <param name="zladder">The command.</param>
/// <param name="parts">Number of parts for the joining.</param>
internal sealed class ScaleHarness(MeasuredCommand zladder, int parts)
{
    /// <summary>Measures and prints.</summary>
    /// <param name="counts">Numbers of spectra; the last of them is also run in parts.</param>
    /// <param name="output">Takes the tables.</param>
    public void Measure(IReadOnlyList<int> counts, TextWriter output)
    {
        using var folder = new TemporaryFolder();
        var inputs = new BenchmarkInputs(counts.Max());
        output.WriteLine(Machine.Describe());
        output.WriteLine(FormattableString.Invariant($"{DateTime.UtcNow:yyyy-MM-dd}, {BenchmarkInputs.Pixels} pixels, survey spectra of mixed kinds in stacks, 1 worker"));
        output.WriteLine();
        output.WriteLine("| spectra | input MB | wall s | CPU s | CPU ms a spectrum | peak MB | ledger bytes a spectrum | catalogue bytes | lines bytes |");
        output.WriteLine("| ---: | ---: | ---: | ---: | ---: | ---: | ---: | ---: | ---: |");
        foreach (var count in counts)
        {
            var (stacks, whole) = (folder.File($"stacks-{count}"), folder.File($"whole-{count}"));
            inputs.WriteStacks(stacks, count);
            Print(output, count, stacks, whole, Run(stacks, whole));
        }

        var last = counts[^1];
        PrintJoining(output, folder.File($"stacks-{last}"), folder.File($"whole-{last}"), folder.File("part-"), folder.File("joined"));
    }

    private MeasuredProcess Run(string stacks, string folder, params string[] more) => zladder.Run(["run", stacks, "--out", folder, "--jobs", "1", .. more]);

    private void PrintJoining(TextWriter output, string stacks, string whole, string part, string joined)
    {
        var folders = Enumerable.Range(1, parts).Select(index => $"{part}{index}").ToList();
        var shared = folders.Select((folder, index) => Run(stacks, folder, "--shard", new Shard(index + 1, parts).ToString())).ToList();
        var merge = zladder.Run(["merge", .. folders, "--out", joined]);
        var same = new[] { "catalogue.csv", "lines.csv" }.All(table =>
            File.ReadAllBytes(Path.Combine(whole, table)).AsSpan().SequenceEqual(File.ReadAllBytes(Path.Combine(joined, table))));
        output.WriteLine();
        output.WriteLine(string.Create(
            CultureInfo.InvariantCulture,
            $"The last in {parts} parts: CPU {shared.Sum(cost => cost.Processor.TotalSeconds):F1} s together, at most {shared.Max(cost => cost.PeakMegabytes):F0} MB; merge: wall {merge.Wall.TotalSeconds:F1} s, CPU {merge.Processor.TotalSeconds:F1} s, {merge.PeakMegabytes:F0} MB; {(same ? "the same bytes" : "OTHER BYTES")} as in one run."));
    }

    private static void Print(TextWriter output, int spectra, string stacks, string folder, MeasuredProcess cost)
    {
        double Share(string file) => new FileInfo(Path.Combine(folder, file)).Length / (double)spectra;
        var input = new DirectoryInfo(stacks).EnumerateFiles().Sum(static file => file.Length) / 1e6;
        output.WriteLine(string.Create(
            CultureInfo.InvariantCulture,
            $"| {spectra} | {input:F0} | {cost.Wall.TotalSeconds:F1} | {cost.Processor.TotalSeconds:F1} | {cost.Processor.TotalMilliseconds / spectra:F2} | {cost.PeakMegabytes:F0} | {Share(LedgerFile.Name):F0} | {Share("catalogue.csv"):F0} | {Share("lines.csv"):F0} |"));
    }
}
