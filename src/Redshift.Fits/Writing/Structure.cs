using System.Text.RegularExpressions;

namespace Redshift.Fits;

/// <summary>Keywords that say how a unit is stored, which the writer alone decides.</summary>
internal static partial class Structure
{
    public static bool Describes(Card card) => Pattern().IsMatch(card.Keyword);

    [GeneratedRegex(
        @"^(SIMPLE|XTENSION|BITPIX|NAXIS\d*|EXTEND|PCOUNT|GCOUNT|GROUPS|THEAP|TFIELDS|T(FORM|TYPE|UNIT|SCAL|ZERO|NULL|DIM|BCOL|UCD|COMM)\d+|TUTYP\d+|END|LONGSTRN|CHECKSUM|DATASUM|Z(IMAGE|TABLE))$",
        RegexOptions.IgnoreCase | RegexOptions.CultureInvariant)]
    private static partial Regex Pattern();
}
