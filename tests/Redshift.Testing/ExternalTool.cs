using System.Diagnostics;

namespace Redshift.Testing;

/// <summary>A program outside the project that serves as a second opinion in tests.</summary>
public static class ExternalTool
{
    /// <summary>Debian's own python, the one for which Debian's astropy is installed; another python may come first on PATH.</summary>
    public const string Python = "/usr/bin/python3";

    /// <summary>Runs a program to its end.</summary>
    /// <returns>Exit code and all it said.</returns>
    public static (int ExitCode, string Output) Run(string program, params string[] arguments)
    {
        var start = new ProcessStartInfo(program, arguments) { RedirectStandardOutput = true, RedirectStandardError = true };
        using var process = Process.Start(start) ?? throw new InvalidOperationException($"{program} did not start");
        var errors = process.StandardError.ReadToEndAsync();
        var output = process.StandardOutput.ReadToEnd();
        process.WaitForExit();
        return (process.ExitCode, output + errors.Result);
    }

    /// <summary>Runs a python script, which must succeed, and returns what it printed.</summary>
    public static string RunPython(string script, params string[] arguments)
    {
        var (exitCode, output) = Run(Python, ["-c", script, .. arguments]);
        return exitCode == 0 ? output : throw new InvalidOperationException($"python failed: {output}");
    }

    /// <summary>Whether a program of this name is on PATH, or at this absolute path.</summary>
    public static bool Exists(string program) =>
        (Environment.GetEnvironmentVariable("PATH") ?? "").Split(Path.PathSeparator).Any(folder => File.Exists(Path.Combine(folder, program)));
}
