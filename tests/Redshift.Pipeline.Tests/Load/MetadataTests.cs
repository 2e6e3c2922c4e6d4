using Redshift.Fits;
using Redshift.Physics.Units;
using Redshift.Pipeline.Observations;
using Xunit;

namespace Redshift.Pipeline.Tests.Load;

public sealed class MetadataTests : IDisposable
{
    private readonly LoadBench _bench = new();

    public void Dispose() => _bench.Dispose();

    [Theory]
    [InlineData("12:30:00", "-05:15:00", 187.5, -5.25)]
    [InlineData("12 30 00.0", "-05 15 00", 187.5, -5.25)]
    [InlineData("12h30m00s", "-05d15m00s", 187.5, -5.25)]
    [InlineData("00:00:36", "-00:00:36", 0.15, -0.01)]
    [InlineData("187.5", "-5.25", 187.5, -5.25)]
    public void Positions_in_any_notation_become_degrees(string ra, string dec, double raDeg, double decDeg)
    {
        var observation = Observe(Card.Of("RA", ra), Card.Of("DEC", dec));
        Assert.Equal(raDeg, observation.RaDeg!.Value, 1e-9);
        Assert.Equal(decDeg, observation.DecDeg!.Value, 1e-9);
    }

    [Theory]
    [InlineData(12.5, "[hours]", 187.5)]
    [InlineData(12.5, "RA in hours", 187.5)]
    [InlineData(187.5, "[hh:mm:ss] 12:30:00", 187.5)]
    [InlineData(1.5, "[rad] right ascension", 85.943669)]
    [InlineData(12.5, "right ascension", 12.5)]
    public void Unit_of_a_plain_right_ascension_is_taken_from_its_comment(double value, string comment, double expected) =>
        Assert.Equal(expected, Observe(Card.Of("RA", value, comment), Card.Of("DEC", 1.0)).RaDeg!.Value, 1e-6);

    [Fact]
    public void Position_of_the_target_wins_over_the_telescope() =>
        Assert.Equal(10, Observe(Card.Of("RA", 99.0), Card.Of("DEC", 9.0), Card.Of("PLUG_RA", 10.0), Card.Of("PLUG_DEC", 1.0)).RaDeg);

    [Theory]
    [InlineData("2022-10-14T21:34:00", "", "", 720, "2022-10-14T21:40:00")]
    [InlineData("2022-10-14T21:34:00", "", "The observation median UTC", 720, "2022-10-14T21:34:00")]
    [InlineData("2022-10-14", "21:34:00", "", 720, "2022-10-14T21:40:00")]
    [InlineData("2003-01-06T03:17:0.5", "", "", 0, "2003-01-06T03:17:00.5")]
    [InlineData("14/10/97", "21:34:00", "", 720, "1997-10-14T21:40:00")]
    public void Middle_of_the_exposure_is_computed(string date, string time, string comment, double exposure, string expected)
    {
        List<Card> cards = [Card.Of("DATE-OBS", date, comment), Card.Of("EXPTIME", exposure)];
        if (time.Length > 0) cards.Add(Card.Of("UT", time));
        Assert.Equal(DateTime.Parse(expected, System.Globalization.CultureInfo.InvariantCulture), Observe([.. cards]).MidTimeUtc!.Value, TimeSpan.FromMilliseconds(1));
    }

    [Fact]
    public void Middle_between_beginning_and_end_is_taken() => Assert.Equal(new DateTime(2022, 10, 14, 21, 45, 0, DateTimeKind.Utc),
        Observe(Card.Of("DATE-OBS", "2022-10-14T21:30:00"), Card.Of("DATE-END", "2022-10-14T22:00:00"), Card.Of("EXPTIME", 600.0)).MidTimeUtc);

    [Fact]
    public void Stated_middle_wins() =>
        Assert.Equal(new DateTime(2017, 12, 26, 12, 0, 0, DateTimeKind.Utc), Observe(Card.Of("DATE-OBS", "2017-12-26T08:00:01"), Card.Of("TMID", 58113.5)).MidTimeUtc);

    // 2011-10-09 00:00:34 TAI is midnight UTC, since TAI - UTC was 34 s (IERS Bulletin C 36); MJD 55843.
    [Fact]
    public void Atomic_time_becomes_universal() => Assert.Equal(new DateTime(2011, 10, 9, 0, 0, 0, DateTimeKind.Utc),
        Observe(Card.Of("TAI-BEG", 55843 * 86400.0 + 34 - 450), Card.Of("TAI-END", 55843 * 86400.0 + 34 + 450)).MidTimeUtc);

    [Theory]
    [InlineData("SPECSYS", "BARYCENT", VelocityFrame.Barycentric)]
    [InlineData("SPECSYS", "HELIOCENTER", VelocityFrame.Heliocentric)]
    [InlineData("SPECSYS", "TOPOCENT", VelocityFrame.Topocentric)]
    [InlineData("SPECSYS", "LSRK", VelocityFrame.LocalStandardOfRest)]
    [InlineData("SPECSYS", "SOURCE", VelocityFrame.Rest)]
    [InlineData("HISTORY", "wavelengths corrected to the barycentric frame", VelocityFrame.Barycentric)]
    [InlineData("HISTORY", "heliocentric correction not applied", VelocityFrame.Unknown)]
    [InlineData("OBSERVER", "A. Helios", VelocityFrame.Unknown)]
    public void Frame_is_what_a_card_says_was_done(string keyword, string text, VelocityFrame expected)
    {
        var card = keyword == "HISTORY" ? Card.Commentary(keyword, text) : Card.Of(keyword, text);
        var observation = Observe(card);
        Assert.Equal(expected, observation.Frame);
        Assert.Equal(expected == VelocityFrame.Unknown, observation.Cautions.Contains("check-frame"));
    }

    [Theory]
    [InlineData(0, VelocityFrame.Topocentric)]
    [InlineData(-12.5, VelocityFrame.Heliocentric)]
    public void Applied_correction_of_amateur_archives_gives_the_frame(double applied, VelocityFrame expected) =>
        Assert.Equal(expected, Observe(Card.Of("BSS_VHEL", applied)).Frame);

    [Fact]
    public void Value_of_a_correction_alone_says_nothing() =>
        Assert.Equal(VelocityFrame.Unknown, Observe(Card.Of("BERV", 12.3), Card.Of("VHELIO", 12.3)).Frame);

    [Theory]
    [InlineData("AIRORVAC", "vac", WavelengthMedium.Vacuum)]
    [InlineData("AIRORVAC", "air", WavelengthMedium.Air)]
    [InlineData("COMMENT", "All wavelengths are in vacuum.", WavelengthMedium.Vacuum)]
    [InlineData("HISTORY", "wavelengths converted to air", WavelengthMedium.Air)]
    [InlineData("HISTORY", "vacuum wavelengths", WavelengthMedium.Vacuum)]
    public void Medium_is_taken_from_cards_and_remarks(string keyword, string text, WavelengthMedium expected)
    {
        var card = keyword is "HISTORY" or "COMMENT" ? Card.Commentary(keyword, text) : Card.Of(keyword, text);
        var observation = Observe(card);
        Assert.Equal((expected, false), (observation.Medium, observation.MediumAssumed));
    }

    [Theory]
    [InlineData("COMMENT", "airmass at the wavelength of the filter")]
    [InlineData("COMMENT", "dewar vacuum 1e-6 mbar")]
    [InlineData("COMMENT", "temperature of the air")]
    public void Talk_of_air_and_vacuum_elsewhere_is_not_taken_for_it(string keyword, string text) =>
        Assert.True(Observe(Card.Commentary(keyword, text)).MediumAssumed);

    [Theory]
    [InlineData(5000, 1, 0, WavelengthMedium.Air)]
    [InlineData(1150, 30, 0, WavelengthMedium.Vacuum)]
    [InlineData(1150, 150, 0, WavelengthMedium.Air)]
    [InlineData(11000, 5, 0, WavelengthMedium.Vacuum)]
    [InlineData(3.58, 1e-4, 1, WavelengthMedium.Vacuum)]
    public void Medium_that_nobody_states_follows_the_default_with_a_caution(double crval, double cdelt, long flag, WavelengthMedium expected)
    {
        var observation = _bench.One(writer => writer.WriteImage("", LoadBench.Flux(), [LoadBench.Pixels], LoadBench.Axis(crval, cdelt, Card.Of("DC-FLAG", flag))));
        Assert.Equal((expected, true), (observation.Medium, observation.MediumAssumed));
        Assert.Contains("check-medium", observation.Cautions);
    }

    [Fact]
    public void Spectrum_below_2000_angstrom_is_in_vacuum_by_convention()
    {
        var observation = _bench.One(static writer => writer.WriteImage("", LoadBench.Flux(), [LoadBench.Pixels], LoadBench.Axis(1150, 1)));
        Assert.Equal((WavelengthMedium.Vacuum, false), (observation.Medium, observation.MediumAssumed));
        Assert.Equal(1150, observation.Spectra[0].Wavelength[0]);
    }

    [Theory]
    [InlineData("SPEC_RES", 5400, 5400)]
    [InlineData("BSS_ITRP", 435, 435)]
    [InlineData("SPE_RPOW", 0, 0)]
    [InlineData("RESOLUT", 1e9, 0)]
    [InlineData("R", 4000, 0)]
    public void Resolving_power_of_a_keyword_is_used_when_plausible(string keyword, double value, double expected)
    {
        var spectrum = Observe(Card.Of(keyword, value)).Spectra[0];
        if (expected == 0) Assert.Null(spectrum.FwhmKmS);
        else Assert.Equal(299792.458 / expected, spectrum.FwhmKmS![5], 1e-3);
        Assert.Equal(expected == 0 ? ResolutionSource.Estimate : ResolutionSource.Keyword, spectrum.ResolutionFrom);
    }

    [Fact]
    public void Names_exposure_and_kept_cards_are_passed_on()
    {
        using var bench = new LoadBench { Settings = new() { Keep = ["AIRMASS", "SEEING"] } };
        var observation = bench.One(static writer => writer.WriteImage("", LoadBench.Flux(), [LoadBench.Pixels],
            LoadBench.Axis(5000, 1, Card.Of("OBJECT", "field star"), Card.Of("INSTRUME", "Alpy 600"), Card.Of("EXPTIME", 900.0), Card.Of("AIRMASS", 1.25))));
        Assert.Equal(("field star", "Alpy 600", 900.0), (observation.Target, observation.Instrument, observation.ExposureS));
        Assert.Equal([KeyValuePair.Create("AIRMASS", "1.25"), KeyValuePair.Create("SEEING", "")], observation.Kept);
        Assert.Equal(("night/spectrum.fits", 0), (observation.Source, observation.Row));
    }

    private Observation Observe(params Card[] cards) =>
        _bench.One(writer => writer.WriteImage("", LoadBench.Flux(), [LoadBench.Pixels], LoadBench.Axis(5000, 1, cards)));
}
