using Redshift.Pipeline.Report;

namespace Redshift.Pipeline.Settings;

/// <summary>Reads a table <c>[[load]]</c> of a pipeline file with its arms.</summary>
internal static class LoadRuleReader
{
    private static readonly Dictionary<string, AngleUnit> AngleUnits = new()
    {
        ["degree"] = AngleUnit.Degree,
        ["hour"] = AngleUnit.Hour,
        ["radian"] = AngleUnit.Radian,
    };

    /// <summary>Reads a rule.</summary>
    /// <exception cref="SettingsException">It says something that cannot be used.</exception>
    public static LoadRule Read(SectionReader section)
    {
        var rule = (LoadRule)WithRoles(section, new LoadRule
        {
            When = section.Pairs("when"),
            Hdus = section.TextsOrIntegers("hdu"),
            Medium = section.Choice("medium", Words.Media),
            Frame = section.Choice("frame", Words.Frames),
            Target = section.Text("target"),
            Ra = section.Text("ra"),
            Dec = section.Text("dec"),
            AngleUnit = section.Choice("angle_unit", AngleUnits),
            Fibre = section.Text("fibre"),
            Arms = [.. section.Sections("arm").Select(ReadArm)],
        });
        section.Together("ra", "dec");
        section.RejectOthers();
        return rule;
    }

    private static ArmRule ReadArm(SectionReader section)
    {
        var arm = (ArmRule)WithRoles(section, new ArmRule { Name = section.Text("name") ?? "" });
        section.RejectOthers();
        return arm;
    }

    // A copy keeps the type of the rule that is given.
    private static SpectrumRule WithRoles(SectionReader section, SpectrumRule rule)
    {
        var (power, place) = section.NumberOrText("resolution", PipelineFile.LowestResolution, PipelineFile.HighestResolution);
        var roles = rule with
        {
            Wavelength = section.Text("wavelength"),
            WavelengthUnit = section.Text("wavelength_unit"),
            WavelengthStep = section.Text("wavelength_step"),
            Flux = section.Text("flux"),
            FluxUnit = section.Text("flux_unit"),
            Error = section.Text("error"),
            Variance = section.Text("variance"),
            InverseVariance = section.Text("inverse_variance"),
            Mask = section.Text("mask"),
            Good = section.Text("good"),
            Resolution = power,
            ResolutionPlace = place,
            FwhmA = section.Number("fwhm_a", PipelineFile.LowestFwhmA, PipelineFile.HighestFwhmA),
            Fwhm = section.Text("fwhm"),
            Sigma = section.Text("sigma"),
            WidthUnit = section.Text("width_unit"),
            Order = section.Text("order"),
        };
        section.NotBoth("error", "variance", "inverse_variance");
        section.NotBoth("mask", "good");
        section.NotBoth("resolution", "fwhm_a", "fwhm", "sigma");
        return roles;
    }
}
