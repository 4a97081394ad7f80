namespace BladeLoads.Studies.Files;

/// <summary>The lines of a text, as every reader of tables counts them: each ends in CR, LF or CRLF.</summary>
internal static class TextLines
{
    /// <summary>Without their ends; one more, empty, behind a last line end.</summary>
    // Not as .NET ends lines: a form feed or U+2028 stands within a line for the reader of rows.
    public static string[] Of(string text) => WithLineFeeds(text).Split('\n');

    /// <summary>The text with LF at the end of every line.</summary>
    public static string WithLineFeeds(string text)
        => text.Replace("\r\n", "\n", StringComparison.Ordinal).Replace('\r', '\n');
}
