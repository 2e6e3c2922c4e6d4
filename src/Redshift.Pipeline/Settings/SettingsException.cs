namespace Redshift.Pipeline.Settings;

/// <summary>A pipeline file that cannot be used: what stands where, and what was expected.</summary>
public sealed class SettingsException : Exception
{
    /// <summary>Makes the error.</summary>
    /// <param name="file">The pipeline file.</param>
    /// <param name="line">1-based line, or 0 where the whole file is meant.</param>
    /// <param name="column">1-based column, or 0.</param>
    /// <param name="found">What stands there.</param>
    /// <param name="expected">What would be right.</param>
    public SettingsException(string file, int line, int column, string found, string expected)
        : base($"{file}{(line > 0 ? $":{line}:{column}" : "")}: found {found}; expected {expected}")
    {
        File = file;
        Line = line;
        Column = column;
    }

    /// <summary>The pipeline file.</summary>
    public string File { get; }

    /// <summary>1-based line, or 0 where the whole file is meant.</summary>
    public int Line { get; }

    /// <summary>1-based column, or 0 where the whole file is meant.</summary>
    public int Column { get; }
}
