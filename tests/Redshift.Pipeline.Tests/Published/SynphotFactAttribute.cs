using Xunit;

namespace Redshift.Pipeline.Tests.Published;

/// <summary>A test of open data that Debian's package python3-synphot carries; without them the test is reported as skipped, with the reason.</summary>
[AttributeUsage(AttributeTargets.Method)]
internal sealed class SynphotFactAttribute : FactAttribute
{
    public SynphotFactAttribute()
    {
        if (SynphotData.Folder is null) Skip = SynphotData.Missing;
    }
}

/// <summary>The same for a test with rows.</summary>
[AttributeUsage(AttributeTargets.Method)]
internal sealed class SynphotTheoryAttribute : TheoryAttribute
{
    public SynphotTheoryAttribute()
    {
        if (SynphotData.Folder is null) Skip = SynphotData.Missing;
    }
}
