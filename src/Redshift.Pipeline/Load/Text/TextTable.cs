namespace Redshift.Pipeline.Load.Text;

/// <summary>A table of numbers read from text.</summary>
/// <param name="Columns">The columns, all of one length.</param>
/// <param name="Names">Their names, empty where the text gives none.</param>
/// <param name="Units">Their units, empty where the text gives none.</param>
/// <param name="Remarks">The comment lines, without their marks.</param>
internal sealed record TextTable(
    IReadOnlyList<double[]> Columns,
    IReadOnlyList<string> Names,
    IReadOnlyList<string> Units,
    IReadOnlyList<string> Remarks);
