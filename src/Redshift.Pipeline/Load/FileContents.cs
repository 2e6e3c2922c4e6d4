using System.Globalization;
using Redshift.Fits;
using Redshift.Pipeline.Load.Images;
using Redshift.Pipeline.Load.Roles;
using Redshift.Pipeline.Load.Tables;
using Redshift.Pipeline.Observations;

namespace Redshift.Pipeline.Load;

/// <summary>What a FITS file holds, in the words of a load rule, with what each part was taken for.</summary>
internal static class FileContents
{
    // Tables of catalogues have hundreds of columns.
    private const int MostColumns = 60;

    /// <summary>A note for each image and each column of a table.</summary>
    public static IReadOnlyList<ReadingNote> Of(FitsFile file) => [.. file.Hdus.SelectMany(Of)];

    private static IReadOnlyList<ReadingNote> Of(Hdu hdu)
    {
        var place = $"HDU {hdu.Index} {hdu.Name}".TrimEnd();
        try
        {
            return hdu switch
            {
                ImageHdu { Count: > 0 } image => [new(place, $"image of {string.Join(" x ", image.Shape)}", Meaning(ImageFamily.LabelOf(image)))],
                TableHdu table => [new(place, Size(table), ""), .. table.Columns.Take(MostColumns).Select(Of)],
                _ => [],
            };
        }
        catch (FitsException damage)
        {
            return [new(place, "damaged", damage.Message)];
        }
    }

    private static string Size(TableHdu table) =>
        string.Create(CultureInfo.InvariantCulture, $"table of {table.RowCount} rows and {table.Columns.Count} columns");

    private static ReadingNote Of(TableColumn column)
    {
        var type = column.Type.ToString().ToLowerInvariant();
        var cell = column.IsVariableLength ? $"lists of {type}"
            : column.Repeat == 1 || column.IsText ? type
            : string.Create(CultureInfo.InvariantCulture, $"{column.Repeat} of {type}");
        return new(TableUnits.PlaceOf(column), cell, Meaning(TableUnits.LabelOf(column)));
    }

    private static string WordOf(Role role) => role == Role.InverseVariance ? "inverse variance" : role.ToString().ToLowerInvariant();

    private static string Meaning(Label label)
    {
        var guess = RoleGuesser.Of(label);
        var role = guess.Role == Role.Other ? "" : $"looks like {WordOf(guess.Role)} by {guess.Why}";
        return label.Unit.Length == 0 ? role : $"{role}, in {label.Unit}".TrimStart(',', ' ');
    }
}
