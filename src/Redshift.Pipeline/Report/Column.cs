namespace Redshift.Pipeline.Report;

/// <summary>One column of a report: its name, its meaning and its values in one place.</summary>
/// <param name="Name">Name in the header.</param>
/// <param name="Unit">Unit in the spelling of the IVOA's VOUnits 1.1, empty for none.</param>
/// <param name="Ucd">Unified content descriptor (IVOA, UCD1+ 1.5).</param>
/// <param name="Description">One sentence.</param>
/// <param name="Type">What its cells hold, where they are not empty.</param>
/// <param name="Value">The cell of a row.</param>
/// <typeparam name="TRow">What a row is made from.</typeparam>
public sealed record Column<TRow>(string Name, string Unit, string Ucd, string Description, CellType Type, Func<TRow, Cell> Value);
