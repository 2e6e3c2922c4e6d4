using Xunit;

namespace Redshift.Testing;

/// <summary>A test that compares with astropy; without it the test is reported as skipped, with the reason.</summary>
[AttributeUsage(AttributeTargets.Method)]
public sealed class AstropyFactAttribute : FactAttribute
{
    private static readonly Lazy<bool> IsThere = new(() =>
        ExternalTool.Exists(ExternalTool.Python) && ExternalTool.Run(ExternalTool.Python, "-c", "import astropy").ExitCode == 0);

    /// <summary>Looks for astropy.</summary>
    public AstropyFactAttribute()
    {
        if (!IsThere.Value) Skip = $"{ExternalTool.Python} cannot import astropy";
    }
}
