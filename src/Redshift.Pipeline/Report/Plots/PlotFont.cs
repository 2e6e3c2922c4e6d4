using ScottPlot;
using SkiaSharp;

namespace Redshift.Pipeline.Report.Plots;

/// <summary>The one font of all pictures, carried inside the program: a machine without fonts would draw no letters at all.</summary>
internal sealed class PlotFont : IFontResolver
{
    /// <summary>Name under which the charting library asks for it.</summary>
    public const string Name = "DejaVu Sans";

    private static readonly SKTypeface Typeface = Read();

    static PlotFont()
    {
        ScottPlot.Fonts.FontResolvers.Insert(0, new PlotFont());
        ScottPlot.Fonts.Default = Name;
    }

    private PlotFont()
    {
    }

    /// <summary>The font in a size in pixels.</summary>
    public static SKFont Sized(float size) => new(Typeface, size) { Edging = SKFontEdging.Antialias };

    /// <summary>Makes the charting library use the font.</summary>
    public static void Register() => System.Runtime.CompilerServices.RuntimeHelpers.RunClassConstructor(typeof(PlotFont).TypeHandle);

    /// <inheritdoc/>
    public SKTypeface? CreateTypeface(string fontName, FontWeight weight, FontSlant slant, FontSpacing spacing) =>
        fontName == Name ? Typeface : null;

    /// <inheritdoc/>
    public SKTypeface? CreateTypeface(string fontName, bool bold, bool italic) => fontName == Name ? Typeface : null;

    private static SKTypeface Read()
    {
        using var stream = typeof(PlotFont).Assembly.GetManifestResourceStream("DejaVuSans.ttf")!;
        return SKTypeface.FromStream(stream);
    }
}
