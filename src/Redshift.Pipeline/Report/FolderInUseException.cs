namespace Redshift.Pipeline.Report;

/// <summary>Another run writes into the output folder.</summary>
/// <param name="folder">The folder.</param>
public sealed class FolderInUseException(string folder)
    : Exception($"another run is writing into {HarmlessText.Printable(folder)}; wait for it or choose another folder with --out");
