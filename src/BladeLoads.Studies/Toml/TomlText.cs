using System.Collections.Immutable;
using System.Globalization;
using BladeLoads.Studies.Files;
using Tomlyn;
using Tomlyn.Parsing;
using Tomlyn.Syntax;

namespace BladeLoads.Studies.Toml;

/// <summary>Reads TOML into a tree that knows the place of every key and value.</summary>
internal static class TomlText
{
    private const int MostSyntaxErrors = 20;

    /// <summary>The top table of the file; null when it is not TOML, and then every syntax error is reported.</summary>
    public static TomlValue.Table? Parse(InputText input, Findings findings)
    {
        var text = input.Text;
        if (Document(input.File, text, validate: true) is not { } document)
        {
            findings.Error(new Place(input.File, LineThatBreaksTheParser(input.File, text), 0),
                "cannot be read as TOML; look at the quotes, backslashes and brackets here");
            return null;
        }
        var isSound = !document.HasErrors;
        if (!isSound && HasSyntaxErrors(input.File, text, findings))
            return null;
        var reading = new Reading(input.File, findings);
        reading.Read(document);
        if (reading.Failed)
            return null;

        // What the tree does not refuse and TOML does: rare, and told in the parser's own words.
        foreach (var diagnostic in document.Diagnostics.Where(d => d.Kind == DiagnosticMessageKind.Error))
            findings.Error(PlaceOf(input.File, diagnostic.Span), SyntaxSentence.Of(diagnostic.Message, ""));
        return isSound ? reading.Top : null;
    }

    // Null where the parser throws, which Tomlyn 2.10.2 does at nesting beyond its limit and at some unfinished escapes.
    private static DocumentSyntax? Document(string file, string text, bool validate)
    {
        try
        {
            return SyntaxParser.Parse(text, file, validate);
        }
        catch (Exception e) when (e is TomlException or ArgumentException or InvalidOperationException or NullReferenceException
            or IndexOutOfRangeException or FormatException or OverflowException)
        {
            return null;
        }
    }

    // The parser reads forward, so the text up to a line breaks it if and only if that line or one before it does.
    private static int LineThatBreaksTheParser(string file, string text)
    {
        var lines = text.Split('\n');
        var (sound, broken) = (0, lines.Length);
        while (broken - sound > 1)
        {
            var middle = (sound + broken) / 2;
            if (Document(file, string.Join('\n', lines[..middle]), validate: false) is null)
                broken = middle;
            else
                sound = middle;
        }
        return broken;
    }

    // A line whose mistake can be named is taken out and reading goes on: one mistake never shows as five, nor five as one.
    private static bool HasSyntaxErrors(string file, string text, Findings findings)
    {
        var lines = text.Split('\n');
        for (var errors = 0; errors < MostSyntaxErrors; errors++)
        {
            // Null: taking out a line has made what follows unreadable; what was found before stands.
            var first = Document(file, string.Join('\n', lines), validate: false)?.Diagnostics
                .Where(d => d.Kind == DiagnosticMessageKind.Error)
                .OrderBy(d => d.Span.Start.Line).ThenBy(d => d.Span.Start.Column).FirstOrDefault();
            if (first is null)
                return errors > 0;
            var line = Math.Clamp(first.Span.Start.Line, 0, lines.Length - 1);
            if (SyntaxSentence.ForLine(lines[line]) is not { } known)
            {
                findings.Error(PlaceOf(file, first.Span), SyntaxSentence.Of(first.Message, lines[line]));
                return true;
            }
            findings.Error(new Place(file, line + 1, known.Column), known.Sentence);
            lines[line] = "";
        }
        return true;
    }

    private static Place PlaceOf(string file, SourceSpan span) => new(file, span.Start.Line + 1, span.Start.Column + 1);

    private sealed class Reading(string file, Findings findings)
    {
        private readonly Dictionary<TomlValue.Table, Place> _headers = [];
        private readonly HashSet<TomlValue.Table> _closed = [];

        public TomlValue.Table Top { get; } = new(new Place(file, 0, 0));

        public bool Failed { get; private set; }

        public void Read(DocumentSyntax document)
        {
            foreach (var keyValue in document.KeyValues)
                Add(Top, keyValue);
            foreach (var tableSyntax in document.Tables)
            {
                var names = NamesOf(tableSyntax.Name!);
                var at = At(tableSyntax.Name!);
                if (tableSyntax.Kind == SyntaxKind.TableArray)
                {
                    Refuse(at, $"[[{Dotted(names)}]] is a list of tables; write [{Dotted(names)}], once");
                    continue;
                }
                if (Descend(Top, names) is not { } table)
                    continue;
                if (_headers.TryGetValue(table, out var first))
                    Refuse(at,
                        $"table [{Dotted(names)}] is there twice, first in line {Number(first.Line)}; put its keys together");
                _headers.TryAdd(table, at);
                foreach (var keyValue in tableSyntax.Items)
                    Add(table, keyValue);
            }
        }

        private void Add(TomlValue.Table table, KeyValueSyntax syntax)
        {
            var names = NamesOf(syntax.Key!);
            if (Descend(table, names[..^1]) is not { } holder)
                return;
            var (name, at) = names[^1];
            var entry = new TomlEntry(name, names[0].At, ValueOf(syntax.Value!));
            if (!holder.TryAdd(entry))
                Refuse(at, $"key '{name}' is given twice, first in line {Number(holder.Find(name)!.Key.Line)}; keep one");
        }

        private TomlValue.Table? Descend(TomlValue.Table from, ImmutableArray<(string Name, Place At)> names)
        {
            foreach (var (name, at) in names)
            {
                if (from.Find(name) is not { } entry)
                {
                    entry = new TomlEntry(name, at, new TomlValue.Table(at));
                    from.TryAdd(entry);
                }
                if (entry.Value is not TomlValue.Table table || _closed.Contains(table))
                {
                    Refuse(at, $"key '{name}' is given twice, first in line {Number(entry.Key.Line)}; keep one");
                    return null;
                }
                from = table;
            }
            return from;
        }

        private TomlValue ValueOf(ValueSyntax syntax)
        {
            var at = At(syntax);
            switch (syntax)
            {
                case IntegerValueSyntax whole:
                    return new TomlValue.Number(at, whole.Value, true);
                case FloatValueSyntax number:
                    return new TomlValue.Number(at, number.Value + 0.0, false);
                case StringValueSyntax text:
                    return new TomlValue.Text(at, text.Value ?? "");
                case BooleanValueSyntax truth:
                    return new TomlValue.Truth(at, truth.Value);
                case ArraySyntax list:
                    return new TomlValue.List(at, [.. list.Items.Select(item => ValueOf(item.Value!))]);
                case InlineTableSyntax inline:
                    var table = new TomlValue.Table(at);
                    foreach (var item in inline.Items)
                        Add(table, item.KeyValue!);
                    _closed.Add(table);
                    return table;
                default:
                    return new TomlValue.Moment(at);
            }
        }

        private ImmutableArray<(string Name, Place At)> NamesOf(KeySyntax key)
            => [(NameOf(key.Key!), At(key.Key!)), .. key.DotKeys.Select(dot => (NameOf(dot.Key!), At(dot.Key!)))];

        private static string Dotted(ImmutableArray<(string Name, Place At)> names)
            => string.Join('.', names.Select(n => n.Name));

        private static string NameOf(BareKeyOrStringValueSyntax key)
            => key is StringValueSyntax quoted ? quoted.Value ?? "" : ((BareKeySyntax)key).Key!.Text ?? "";

        private Place At(SyntaxNode node) => PlaceOf(file, node.Span);

        private void Refuse(Place at, string text)
        {
            Failed = true;
            findings.Error(at, text);
        }

        private static string Number(int line) => line.ToString(CultureInfo.InvariantCulture);
    }
}
