namespace Redshift.Pipeline.Load;

/// <summary>Looks for words in the free text of headers, whatever their case.</summary>
internal static class TextMatching
{
    /// <summary>Whether a text begins with one of the words.</summary>
    public static bool BeginsWithAny(this string text, params ReadOnlySpan<string> words)
    {
        foreach (var word in words)
            if (text.StartsWith(word, StringComparison.OrdinalIgnoreCase)) return true;
        return false;
    }

    /// <summary>Whether a text contains one of the words.</summary>
    public static bool ContainsAny(this string text, params ReadOnlySpan<string> words)
    {
        foreach (var word in words)
            if (text.Contains(word, StringComparison.OrdinalIgnoreCase)) return true;
        return false;
    }
}
