using System.Collections.Immutable;

namespace BladeLoads.EndToEnd.Documentation;

/// <summary>
/// A fenced block of a document with what its opening line says: <c>```toml file=example/study.toml</c> has the language
/// <c>toml</c> and the attribute <c>file</c>.
/// </summary>
internal sealed record CodeBlock(string Document, int Line, string Language, ImmutableDictionary<string, string> Attributes, string Text)
{
    private const string Fence = "```";

    public static ImmutableArray<CodeBlock> AllOf(string document)
    {
        var lines = Repository.Lines(document);
        var blocks = ImmutableArray.CreateBuilder<CodeBlock>();
        for (var i = 0; i < lines.Length; i++)
        {
            if (!lines[i].StartsWith(Fence, StringComparison.Ordinal))
                continue;
            var end = Array.FindIndex(lines, i + 1, line => line == Fence);
            if (end < 0)
                throw new FormatException($"{document}:{i + 1}: a code block without an end");
            var words = lines[i][Fence.Length..].Split(' ', StringSplitOptions.RemoveEmptyEntries);
            var attributes = words.Skip(1).Select(word => word.Split('=', 2)).ToImmutableDictionary(pair => pair[0], pair => pair[1]);
            var text = string.Concat(lines[(i + 1)..end].Select(line => line + "\n"));
            blocks.Add(new CodeBlock(document, i + 1, words.FirstOrDefault(""), attributes, text));
            i = end;
        }
        return blocks.ToImmutable();
    }
}
