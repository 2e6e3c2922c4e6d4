using System.Globalization;
using Redshift.Testing;

namespace Redshift.Benchmarks.Runs;

/// <summary>Times whole runs and baselines, and prints a table for the docs.</summary>
/// <param name="zladder">The command.</param>
/// <param name="jobs">Workers.</param>
internal sealed class RunHarness(MeasuredCommand zladder, int jobs)
{
    private const int CorrelatedSpectra = 20;

    // Opens each file and reads all of its arrays, as a first step of any analysis would.
    private const string Astropy = """
        import sys
        import numpy as np
        from astropy.io import fits
        for path in sys.argv[1:]:
            with fits.open(path) as file:
                for unit in file:
                    if unit.data is None: continue
                    if unit.is_image: np.array(unit.data, dtype='f8')
                    else: [np.array(unit.data[name], dtype='f8') for name in unit.data.names]
        """;

    /// <summary>Measures and prints.</summary>
    public void Measure(int spectra, int files, TextWriter output)
    {
        using var folder = new TemporaryFolder();
        var inputs = new BenchmarkInputs(Math.Max(spectra, files));
        var stacks = inputs.WriteStacks(folder.File("stacks"), spectra);
        var tables = inputs.WriteTables(folder.File("tables"), files);
        inputs.WriteMixedTables(folder.File("mixed"), files);
        var one = inputs.WriteTables(folder.File("one"), 1);
        output.WriteLine(Machine.Describe());
        output.WriteLine(FormattableString.Invariant($"{DateTime.UtcNow:yyyy-MM-dd}, {BenchmarkInputs.Pixels} pixels, survey spectra of mixed kinds, {jobs} worker(s)"));
        output.WriteLine();
        output.WriteLine("| whole process | spectra | wall s | spectra/s | CPU s | CPU ms a spectrum | after start-up | peak MB |");
        output.WriteLine("| --- | ---: | ---: | ---: | ---: | ---: | ---: | ---: |");
        var start = Zladder(folder.File("out-one"), folder.File("one"));
        Print(output, "zladder, one file (start-up)", 1, start, start);
        Print(output, "zladder, stacks", spectra, Zladder(folder.File("out-stacks"), folder.File("stacks")), start);
        Print(output, "zladder, single tables", files, Zladder(folder.File("out-tables"), folder.File("tables")), start);
        Print(output, "zladder, single tables of forty resolutions", files, Zladder(folder.File("out-mixed"), folder.File("mixed")), start);
        MeasureAstropy(output, spectra, stacks, files, tables, one);
        output.WriteLine();
        PrintCorrelation(output);
    }

    private static void MeasureAstropy(TextWriter output, int spectra, List<string> stacks, int files, List<string> tables, List<string> one)
    {
        if (!ExternalTool.Exists(ExternalTool.Python) || ExternalTool.Run(ExternalTool.Python, "-c", "import astropy").ExitCode != 0)
        {
            output.WriteLine($"| astropy: left out, {ExternalTool.Python} cannot import it | | | | | | | |");
            return;
        }

        var start = Python(one);
        Print(output, "astropy reading one file (start-up)", 1, start, start);
        Print(output, "astropy reading the stacks", spectra, Python(stacks), start);
        Print(output, "astropy reading the single tables", files, Python(tables), start);
    }

    private static void PrintCorrelation(TextWriter output)
    {
        var time = CrossCorrelation.TimePerSpectrum(CorrelatedSpectra);
        output.WriteLine(string.Create(
            CultureInfo.InvariantCulture,
            $"Textbook cross-correlation by FFT over {CrossCorrelation.TemplateCount} templates, in this process: {time.TotalMilliseconds:F2} ms CPU a spectrum."));
    }

    private MeasuredProcess Zladder(string output, string input) =>
        zladder.Run("run", input, "--out", output, "--max-rejects", "0", "--jobs", jobs.ToString(CultureInfo.InvariantCulture));

    private static MeasuredProcess Python(IReadOnlyList<string> files) => MeasuredProcess.Run(ExternalTool.Python, ["-c", Astropy, .. files]);

    private static void Print(TextWriter output, string what, int spectra, MeasuredProcess cost, MeasuredProcess start)
    {
        var after = spectra > 1 ? ((cost.Processor - start.Processor).TotalMilliseconds / (spectra - 1)).ToString("F2", CultureInfo.InvariantCulture) : "";
        output.WriteLine(string.Create(
            CultureInfo.InvariantCulture,
            $"| {what} | {spectra} | {cost.Wall.TotalSeconds:F2} | {spectra / cost.Wall.TotalSeconds:F0} | {cost.Processor.TotalSeconds:F2} | {cost.Processor.TotalMilliseconds / spectra:F2} | {after} | {cost.PeakMegabytes:F0} |"));
    }
}
