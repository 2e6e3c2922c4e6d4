using System.Diagnostics;
using System.Runtime.Versioning;
using Redshift.Testing;
using Xunit;

namespace Redshift.Cli.Tests;

/// <summary>Runs the scripts of pipelines/slurm as the scheduler would, one after the other on this machine.</summary>
[UnsupportedOSPlatform("windows")]
public sealed class SlurmScriptTests : IDisposable
{
    private const string Parts = "2";

    private readonly SpectraFolder _folder = new();

    public void Dispose() => _folder.Dispose();

    [Fact]
    public void Parts_and_merge_give_the_catalogue_of_one_run()
    {
        var list = _folder.Out("list");
        File.WriteAllLines(list, Directory.GetFiles(_folder.Spectra, "*", SearchOption.AllDirectories));
        Zladder.Run("run", "--from", list, "--out", _folder.Out("whole"));

        Assert.Equal(0, Script("part.sh", "2", Parts, list, _folder.Out(), "--jobs", "1"));
        Assert.Equal(3, Script("merge.sh", "", Parts, _folder.Out()));
        Assert.Equal(0, Script("part.sh", "1", Parts, list, _folder.Out(), "--jobs", "1"));
        Assert.Equal(0, Script("part.sh", "2", Parts, list, _folder.Out(), "--jobs", "1"));
        Assert.Equal(0, Script("merge.sh", "", Parts, _folder.Out()));
        Assert.Equal(
            File.ReadAllBytes(Path.Combine(_folder.Out("whole"), "catalogue.csv")),
            File.ReadAllBytes(Path.Combine(_folder.Out(), "catalogue", "catalogue.csv")));
    }

    [Fact]
    public void Without_arguments_the_submission_explains_itself() => Assert.Equal(2, Script("submit.sh", ""));

    private int Script(string name, string task, params string[] arguments)
    {
        var command = _folder.Out("zladder");
        File.WriteAllText(command, $"#!/bin/sh\nexec dotnet '{Path.Combine(AppContext.BaseDirectory, "zladder.dll")}' \"$@\"\n");
        File.SetUnixFileMode(command, UnixFileMode.UserRead | UnixFileMode.UserWrite | UnixFileMode.UserExecute);
        var start = new ProcessStartInfo("bash", [Repository.PathOf("pipelines", "slurm", name), .. arguments])
        {
            RedirectStandardOutput = true,
            RedirectStandardError = true,
        };
        start.Environment["ZLADDER"] = command;
        start.Environment["SLURM_ARRAY_TASK_ID"] = task;
        using var process = Process.Start(start)!;
        return Zladder.Finish(process).Status;
    }
}
