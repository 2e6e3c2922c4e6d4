using Xunit;

namespace Redshift.Testing;

/// <summary>A test that needs an external program; without it the test is reported as skipped, with the reason.</summary>
[AttributeUsage(AttributeTargets.Method)]
public sealed class ToolFactAttribute : FactAttribute
{
    /// <summary>Names the program.</summary>
    public ToolFactAttribute(string program)
    {
        Program = program;
        if (!ExternalTool.Exists(program)) Skip = $"{program} is not installed";
    }

    /// <summary>The program needed.</summary>
    public string Program { get; }
}
