using System.Globalization;
using System.Text;

namespace Redshift.Pipeline.Report;

/// <summary>
/// Makes text from file headers and names harmless. A header can hold anything: control characters that drive a terminal,
/// letters outside ASCII, formulas that a spreadsheet would run.
/// </summary>
public static class HarmlessText
{
    private const string FormulaStarts = "=+-@";

    /// <summary>Printable ASCII on one line: everything else becomes an escape such as <c>\u00e9</c>; doing it twice changes nothing.</summary>
    public static string Printable(string text)
    {
        if (text.All(IsPrintable))
            return text;
        var builder = new StringBuilder(text.Length + 16);
        foreach (var letter in text)
        {
            if (IsPrintable(letter))
                builder.Append(letter);
            else
                builder.Append(CultureInfo.InvariantCulture, $"\\u{(int)letter:x4}");
        }

        return builder.ToString();
    }

    /// <summary>
    /// <see cref="Printable"/> without blanks at the ends, and with an apostrophe before what a spreadsheet would take for a formula.
    /// </summary>
    public static string ForTable(string text)
    {
        var clean = Printable(text.Trim());
        return clean.Length > 0 && FormulaStarts.Contains(clean[0], StringComparison.Ordinal) ? "'" + clean : clean;
    }

    private static bool IsPrintable(char letter) => letter is >= ' ' and <= '~';
}
