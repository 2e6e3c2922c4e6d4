using Redshift.Pipeline.Report.Plots;
using Redshift.Pipeline.Results;
using Redshift.Testing;
using SkiaSharp;
using Xunit;

namespace Redshift.Pipeline.Tests.Report;

public sealed class SpectrumPictureTests
{
    [Fact]
    public void Picture_shows_data_model_letters_and_candidates()
    {
        using var picture = Draw(Examples.Drawn());

        Assert.Equal(1500, picture.Width);
        // Ink of the title, of the family names beside the rails, of the candidates: without a font these would be blank.
        Assert.True(Darkest(picture, new SKRectI(46, 10, 400, 40)) < 100);
        Assert.True(Darkest(picture, new SKRectI(120, 545, 262, picture.Height - 40)) < 160);
        Assert.True(Darkest(picture, new SKRectI(45, 120, 150, 500)) < 100);
    }

    [Fact]
    public void A_spectrum_without_fit_and_errors_is_drawn_too()
    {
        var full = Examples.Drawn();
        var spectrum = full.Observation.Spectra[0];
        var bare = new Pipeline.Observations.Spectrum
        {
            Wavelength = spectrum.Wavelength,
            Flux = spectrum.Flux,
            InverseVariance = [.. spectrum.Wavelength.Select((_, i) => i is > 500 and < 900 ? 0.0 : 1.0)],
            HasErrors = false,
        };
        using var picture = Draw(Examples.Nothing() with { Observation = full.Observation with { Spectra = [bare] } });

        Assert.True(Darkest(picture, new SKRectI(300, 150, 400, 450)) < 100);
    }

    [Fact]
    public void A_spectrum_of_one_pixel_or_none_usable_is_no_fault()
    {
        var observation = Examples.Drawn().Observation;
        foreach (var weight in new[] { 0.0, 1.0 })
        {
            var pixel = new Pipeline.Observations.Spectrum { Wavelength = [5000], Flux = [1], InverseVariance = [weight], HasErrors = true };
            using var picture = Draw(Examples.Nothing() with { Observation = observation with { Spectra = [pixel] } });
            Assert.Equal(1500, picture.Width);
        }
    }

    private static SKBitmap Draw(ObservationResult result)
    {
        using var folder = new TemporaryFolder();
        var path = Path.Combine(folder.Path, "new", "picture.png");
        SpectrumPicture.Save(result, path);
        return SKBitmap.Decode(path);
    }

    private static int Darkest(SKBitmap picture, SKRectI area)
    {
        var darkest = 255;
        for (var y = area.Top; y < area.Bottom; y++)
            for (var x = area.Left; x < area.Right; x++)
                darkest = Math.Min(darkest, (int)picture.GetPixel(x, y).Red);
        return darkest;
    }
}
