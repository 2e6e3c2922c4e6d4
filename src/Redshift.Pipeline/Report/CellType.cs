namespace Redshift.Pipeline.Report;

/// <summary>What the cells of a column hold; formats with types need to know it even where all cells are empty.</summary>
public enum CellType
{
    /// <summary>Plain printable ASCII.</summary>
    Text,

    /// <summary>Whole numbers.</summary>
    Whole,

    /// <summary>Numbers with decimals.</summary>
    Real,
}
