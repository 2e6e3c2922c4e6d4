namespace Redshift.Pipeline.Compare;

/// <summary>A table that cannot be used: what stands where, and what was expected.</summary>
/// <param name="path">The file.</param>
/// <param name="place">Where in the file, or empty for the whole of it.</param>
/// <param name="found">What stands there.</param>
/// <param name="expected">What would be right.</param>
public sealed class TableFileException(string path, string place, string found, string expected)
    : Exception($"{path}{(place.Length > 0 ? ", " + place : "")}: found {found}; expected {expected}");
