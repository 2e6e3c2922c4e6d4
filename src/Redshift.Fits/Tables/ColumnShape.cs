namespace Redshift.Fits;

/// <summary>What a column's format says of its cells.</summary>
/// <param name="Type">Element type.</param>
/// <param name="Repeat">Elements of a cell.</param>
/// <param name="IsVariable">Whether cells are arrays in the heap.</param>
/// <param name="SubstringLength">Length of each of several strings in a cell, or 0.</param>
internal readonly record struct ColumnShape(ColumnType Type, int Repeat, bool IsVariable, int SubstringLength);
