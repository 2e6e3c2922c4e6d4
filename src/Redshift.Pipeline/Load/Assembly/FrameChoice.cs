using Redshift.Physics.Units;
using Redshift.Pipeline.Load.Layouts;
using Redshift.Pipeline.Load.Metadata;
using Redshift.Pipeline.Settings;

namespace Redshift.Pipeline.Load.Assembly;

/// <summary>The frame of the wavelengths, in the order of trust: pipeline file, header, remarks.</summary>
internal static class FrameChoice
{
    /// <summary>Settles the frame of a layout.</summary>
    public static Setting<VelocityFrame> Make(Layout layout, LoadSettings settings, LoadRule? rule)
    {
        if ((rule?.Frame ?? settings.Frame) is { } given) return new(given, false, "the pipeline file");
        foreach (var remark in layout.Remarks)
            if (FrameFinder.FromText(remark) is { } frame) return new(frame, false, $"the remark '{remark.Trim()}'");
        foreach (var header in layout.WavelengthHeaders)
            if (FrameFinder.Find(header) is var (found, where)) return new(found, false, where);
        return new(VelocityFrame.Unknown, true, "nothing states it");
    }
}
