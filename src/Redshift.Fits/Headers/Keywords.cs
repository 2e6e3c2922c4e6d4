using System.Globalization;

namespace Redshift.Fits;

/// <summary>Reading keywords that the standard requires, and saying what is wrong when they are not as it says.</summary>
internal static class Keywords
{
    /// <summary>An indexed keyword such as NAXIS2.</summary>
    public static string Indexed(string stem, int index) => string.Create(CultureInfo.InvariantCulture, $"{stem}{index}");

    public static long RequireInteger(this Header header, string keyword, long least, long most, FitsLocation where)
    {
        if (header.GetInteger(keyword) is { } value && value >= least && value <= most) return value;
        var expected = string.Create(CultureInfo.InvariantCulture, $"an integer from {least} to {most}");
        throw new FitsHeaderException(where with { Keyword = keyword }, expected, header.Describe(keyword));
    }

    public static long IntegerOr(this Header header, string keyword, long least, long absent, FitsLocation where) =>
        header.Contains(keyword) ? header.RequireInteger(keyword, least, long.MaxValue, where) : absent;

    public static string RequireString(this Header header, string keyword, FitsLocation where) =>
        header.GetString(keyword)
        ?? throw new FitsHeaderException(where with { Keyword = keyword }, "a character string", header.Describe(keyword));

    public static string Describe(this Header header, string keyword) =>
        header.Find(keyword) is { } card ? $"'{card.Value.Literal}'" : "no such card";
}
