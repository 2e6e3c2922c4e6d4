using Redshift.Simulation;
using Xunit;

namespace Redshift.Pipeline.Tests.Simulation;

public class SimulatedSurveyTests
{
    [Fact]
    public void The_same_seed_draws_the_same_numbers_whatever_is_drawn_around()
    {
        var inOrder = SimulatedSurvey.Draw(7, 12, SurveyMix.Default).Last();
        var alone = SimulatedSurvey.Observe(7, 11, SurveyMix.Default);
        Assert.Equal(inOrder.ObjectClass, alone.ObjectClass);
        Assert.Equal(inOrder.Z, alone.Z);
        Assert.Equal(inOrder.Spectra[0].Flux, alone.Spectra[0].Flux);
    }

    [Fact]
    public void Other_seeds_draw_other_objects()
    {
        double?[] first = [.. SimulatedSurvey.Draw(1, 8, SurveyMix.Default).Select(o => o.Z)];
        double?[] second = [.. SimulatedSurvey.Draw(2, 8, SurveyMix.Default).Select(o => o.Z)];
        Assert.NotEqual(first, second);
    }

    public static TheoryData<string> Setups => [.. SurveyMix.Default.Entries.Select(entry => entry.Setup).Distinct()];

    [Theory]
    [MemberData(nameof(Setups))]
    public void Spectra_are_sound(string setup)
    {
        foreach (var observation in SimulatedSurvey.Draw(3, 6, SurveyMix.Default.Only([setup], [])))
        {
            Assert.Equal(setup, observation.Setup);
            Assert.Equal(observation.Kind == TruthKind.Blank || observation.ObjectClass is "supernova" or "blazar", observation.Z is null);
            Assert.All(observation.Spectra, CheckSpectrum);
        }
    }

    private static void CheckSpectrum(SimulatedSpectrum spectrum)
    {
        Assert.All(spectrum.Wavelength.Zip(spectrum.Wavelength.Skip(1)), pair => Assert.True(pair.Second > pair.First));
        Assert.All(spectrum.Flux, flux => Assert.True(double.IsFinite(flux)));
        Assert.All(spectrum.InverseVariance ?? [], value => Assert.True(double.IsFinite(value) && value >= 0));
        Assert.Equal(spectrum.Wavelength.Length, spectrum.Flux.Length);
        Assert.Contains(spectrum.Flux, flux => flux != 0);
    }

    [Fact]
    public void A_mix_without_entries_is_refused() =>
        Assert.Throws<ArgumentException>(() => SurveyMix.Default.Only(["no such set-up"], []));
}
