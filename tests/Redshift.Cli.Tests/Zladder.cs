using System.Diagnostics;

namespace Redshift.Cli.Tests;

/// <summary>Runs the built command as a process of its own.</summary>
internal static class Zladder
{
    /// <summary>What a run left behind.</summary>
    public sealed record Outcome(int Status, string Output, string Errors);

    /// <summary>Runs the command to its end.</summary>
    public static Outcome Run(params string[] arguments) => RunWith("", arguments);

    /// <summary>Runs the command with text on standard input.</summary>
    public static Outcome RunWith(string input, params string[] arguments)
    {
        using var process = Start(arguments);
        process.StandardInput.Write(input);
        process.StandardInput.Close();
        return Finish(process);
    }

    /// <summary>Starts the command.</summary>
    public static Process Start(params string[] arguments)
    {
        // Where tests run in the background, interrupts are ignored by inheritance; env gives the command the usual behaviour back.
        var start = new ProcessStartInfo(
            "env", ["--default-signal=INT", "dotnet", Path.Combine(AppContext.BaseDirectory, "zladder.dll"), .. arguments])
        {
            RedirectStandardInput = true,
            RedirectStandardOutput = true,
            RedirectStandardError = true,
        };
        // A language of the machine that writes numbers with commas must not matter.
        start.Environment["LC_ALL"] = "de_DE.UTF-8";
        return Process.Start(start) ?? throw new InvalidOperationException("the command did not start");
    }

    /// <summary>Waits for the end.</summary>
    public static Outcome Finish(Process process)
    {
        var errors = process.StandardError.ReadToEndAsync();
        var output = process.StandardOutput.ReadToEnd();
        process.WaitForExit();
        return new(process.ExitCode, output, errors.Result);
    }
}
