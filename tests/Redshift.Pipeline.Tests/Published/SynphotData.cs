using Redshift.Physics.Units;
using Redshift.Pipeline.Load;
using Redshift.Pipeline.Observations;
using Redshift.Pipeline.Settings;
using Redshift.Testing;
using Xunit;

namespace Redshift.Pipeline.Tests.Published;

/// <summary>Spectra of the package's folder synphot/tests/data (BSD-3).</summary>
internal static class SynphotData
{
    public const string Missing = "Debian's package python3-synphot is not installed";

    /// <summary>The package computes in vacuum (its documentation), whether a file says so or not.</summary>
    private static readonly LoadSettings Settings = new() { Medium = WavelengthMedium.Vacuum };

    private const string Marker = "/grw_70d5824_stisnic_005.fits";

    /// <summary>Where the package put its data, or null where it is not installed.</summary>
    public static string? Folder { get; } = Find();

    /// <summary>Reads a file that holds one spectrum.</summary>
    /// <param name="name">Name of the file.</param>
    /// <param name="fwhmA">Width of a sharp line in Å, where more is known of it than the file says.</param>
    public static Observation Read(string name, double? fwhmA = null)
    {
        var outcome = Assert.Single(SpectrumLoader.Load(Path.Combine(Folder!, name), name, Settings with { FwhmA = fwhmA }));
        Assert.True(outcome.Observation is not null, outcome.Reject?.ToString());
        return outcome.Observation;
    }

    private static string? Find()
    {
        if (!ExternalTool.Exists("dpkg")) return null;
        var (exitCode, files) = ExternalTool.Run("dpkg", "-L", "python3-synphot");
        var data = exitCode == 0 ? files.Split('\n').FirstOrDefault(file => file.EndsWith(Marker, StringComparison.Ordinal)) : null;
        return File.Exists(data) ? Path.GetDirectoryName(data) : null;
    }
}
