using System.Globalization;

namespace Redshift.Pipeline.Load.Metadata;

/// <summary>Exposure time and the middle of the exposure.</summary>
internal static class ExposureTime
{
    private static readonly string[] ExposureKeywords =
        ["EXPTIME", "EXPOSURE", "EXP_TIME", "ITIME", "TEXPTIME", "EXPOSED", "TELAPSE", "XPOSURE", "EXPTOT"];

    private static readonly DateTime ModifiedJulianZero = new(1858, 11, 17, 0, 0, 0, DateTimeKind.Utc);
    private const DateTimeStyles Universal = DateTimeStyles.AssumeUniversal | DateTimeStyles.AdjustToUniversal;
    private const double JulianDateOfModifiedZero = 2400000.5;

    /// <summary>Exposure time in seconds.</summary>
    public static double? Seconds(HeaderScope header) =>
        header.Number(ExposureKeywords) is { } seconds and > 0 and < 1e7 ? seconds : null;

    /// <summary>Middle of the exposure in UTC: stated, between beginning and end, or half the exposure behind the beginning.</summary>
    public static DateTime? Middle(HeaderScope header)
    {
        if (Stated(header) is { } stated) return stated;
        if (Begin(header) is not { } begin) return null;
        if (MeansMiddle(header.Find("DATE-OBS")?.Comment)) return begin;
        if (Date(header.Text("DATE-END", "DATE_END")) is { } end && end >= begin && end - begin < TimeSpan.FromDays(1) && !MeansLocal(header.Find("DATE-END")?.Comment))
            return begin + (end - begin) / 2;
        return begin + TimeSpan.FromSeconds(Math.Min(Seconds(header) ?? 0, 86400) / 2);
    }

    private static DateTime? Stated(HeaderScope header)
    {
        if (header.Number("MJD-AVG", "MJD-MID", "MJD_MID", "MJDMID", "TMID", "MJDMEAN") is { } mjd && FromModifiedJulian(mjd) is { } byMjd)
            return byMjd;
        if (header.Number("JD-MID", "JD_MID", "JDMID") is { } jd && FromModifiedJulian(jd - JulianDateOfModifiedZero) is { } byJd)
            return byJd;
        if (header.Number("TAI-BEG") is { } begin && header.Number("TAI-END") is { } end && AtomicTime.ToUtc((begin + end) / 2) is { } byTai)
            return byTai;
        return Date(header.Text("DATE-AVG", "DATE-MID", "DATEMID", "BAS_MEX"));
    }

    private static DateTime? Begin(HeaderScope header)
    {
        var date = header.Text("DATE-OBS", "DATE_OBS", "DATEOBS", "DATE-BEG", "UTDATE", "UT-DATE");
        if (date is not null && HasTime(date) && Date(date) is { } full) return full;
        if (header.Number("MJD-OBS", "MJD_OBS", "MJD-BEG") is { } mjd && FromModifiedJulian(mjd) is { } byMjd) return byMjd;
        if (Date(date) is not { } day)
            return header.Number("JD", "JD-OBS") is { } jd ? FromModifiedJulian(jd - JulianDateOfModifiedZero) : null;
        var time = header.Text("UTSTART", "TIME-OBS", "UT-START", "UTC-OBS", "UT", "UTC", "TIME-BEG", "UTOBS");
        return TimeOfDay(time) is { } ofDay ? day + ofDay : day;
    }

    private static bool MeansMiddle(string? comment) =>
        comment is not null && comment.ContainsAny("mid", "median", "mean");

    private static bool MeansLocal(string? comment) => comment?.ContainsAny("local") == true;

    private static bool HasTime(string date) =>
        date.Contains('T', StringComparison.Ordinal) || date.Contains(':', StringComparison.Ordinal);

    private static DateTime? FromModifiedJulian(double mjd) => mjd is > 1 and < 100_000 ? ModifiedJulianZero.AddDays(mjd) : null;

    // The standard's form, also with missing leading zeros; before 1999 DD/MM/YY (FITS Standard 4.0, section 4.4.2.1).
    private static DateTime? Date(string? text)
    {
        if (text is null) return null;
        if (text.Length == 8 && text[2] == '/' && DateTime.TryParseExact(text, "dd/MM/yy", CultureInfo.InvariantCulture, DateTimeStyles.None, out _))
            return DateTime.ParseExact(text[..6] + "19" + text[6..], "dd/MM/yyyy", CultureInfo.InvariantCulture, Universal);
        var (day, time) = text.IndexOfAny(['T', ' ']) is > 0 and var at ? (text[..at], text[(at + 1)..]) : (text, "");
        if (!DateTime.TryParseExact(day.Replace('/', '-'), ["yyyy-M-d"], CultureInfo.InvariantCulture, Universal, out var date))
            return null;
        if (date.Year is < 1800 or > 2200) return null;
        return date + (TimeOfDay(time) ?? TimeSpan.Zero);
    }

    private static TimeSpan? TimeOfDay(string? text)
    {
        var words = text?.Trim().TrimEnd('Z', 'z').Split(':') ?? [];
        if (words.Length is < 2 or > 3) return null;
        double seconds = 0, scale = 3600;
        foreach (var word in words)
        {
            if (!double.TryParse(word, NumberStyles.Float, CultureInfo.InvariantCulture, out var part) || part is < 0 or > 60) return null;
            seconds += part * scale;
            scale /= 60;
        }
        return seconds <= 86400 ? TimeSpan.FromSeconds(seconds) : null;
    }
}
