namespace Redshift.Pipeline.Load;

/// <summary>Ends the reading of a file or of one of its spectra; becomes a reject and never leaves the loader.</summary>
internal sealed class LoadException(string place, string found, string expected)
    : Exception($"{place}: found {found}; expected {expected}")
{
    /// <summary>Where in the file.</summary>
    public string Place => place;

    /// <summary>What stands there.</summary>
    public string Found => found;

    /// <summary>What was expected.</summary>
    public string Expected => expected;
}
