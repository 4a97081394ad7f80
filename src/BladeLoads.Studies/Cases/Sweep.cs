using System.Collections.Immutable;
using System.Globalization;
using System.Text;
using BladeLoads.Studies.Fingerprints;
using BladeLoads.Studies.Toml;

namespace BladeLoads.Studies.Cases;

/// <summary>One combination of a sweep's values.</summary>
/// <param name="Name">Folder name: the case's, then <c>~key-value</c> for each key.</param>
/// <param name="Title">What to add to the case's title; empty for a case without a sweep.</param>
/// <param name="Entries">The case's values with those of the combination in their place.</param>
internal sealed record Variant(string Name, string Title, ImmutableDictionary<string, CaseEntry> Entries);

/// <summary>Every combination of the values under [sweep], the last key running fastest.</summary>
internal static class Sweep
{
    private const int MostVariants = 10_000;
    private const int LongestName = 200; // a folder name holds 255 bytes, and results add to it

    /// <summary>The case alone where it sweeps nothing; null, with the reason reported, where variants cannot be named.</summary>
    public static ImmutableArray<Variant>? Variants(string caseName, CaseFile file, Findings findings)
    {
        if (file.Sweep.IsEmpty)
            return [new Variant(caseName, "", file.Entries)];
        var count = file.Sweep.Aggregate(1L, (product, sweep) => Math.Min(product * sweep.Values.Items.Length, int.MaxValue));
        if (count > MostVariants)
        {
            var counts = string.Join(" x ", file.Sweep.Select(s => s.Values.Items.Length.ToString(CultureInfo.InvariantCulture)));
            findings.Error(file.Sweep[0].Key, $"[sweep] gives {counts} variants; at most 10,000 are made from one case");
            return null;
        }
        if (!HaveDistinctNames(file, findings))
            return null;

        IEnumerable<Variant> variants = [new Variant(caseName, "", file.Entries)];
        foreach (var sweep in file.Sweep)
            variants = variants.SelectMany(variant => sweep.Values.Items.Select(value => With(variant, sweep, value)));
        var all = variants.Select(variant => variant with { Title = $" ({variant.Title})" }).ToImmutableArray();
        if (all.FirstOrDefault(variant => Encoding.UTF8.GetByteCount(variant.Name) > LongestName) is not { } tooLong)
            return all;
        var length = tooLong.Name.Length.ToString(CultureInfo.InvariantCulture);
        findings.Error(file.Sweep[0].Key,
            $"[sweep] makes folder names of {length} characters; sweep fewer keys at once, or shorten names");
        return null;
    }

    // Names of two variants coincide only where those of two values of one key do: '~', which no value holds, parts them.
    private static bool HaveDistinctNames(CaseFile file, Findings findings)
    {
        var distinct = true;
        foreach (var sweep in file.Sweep)
        {
            // Some file systems take capitals for small letters.
            var seen = new Dictionary<string, TomlValue>(StringComparer.OrdinalIgnoreCase);
            foreach (var value in sweep.Values.Items)
            {
                var name = NameOf(value);
                if (seen.TryGetValue(name, out var first))
                {
                    distinct = false;
                    findings.Error(value.At, first.Found == value.Found
                        ? $"{sweep.Known.Name} has {value.Found} twice; each value once"
                        : $"{sweep.Known.Name} has {first.Found} and {value.Found}, "
                            + $"whose variants would both be named '{sweep.Known.Name}-{name}'; rename one");
                }
                seen.TryAdd(name, value);
            }
        }
        return distinct;
    }

    private static Variant With(Variant variant, SweepEntry sweep, TomlValue value)
    {
        var name = NameOf(value);
        return new Variant(
            $"{variant.Name}~{sweep.Known.Name}-{name}",
            $"{variant.Title}{(variant.Title.Length == 0 ? "" : ", ")}{sweep.Known.Name} {name}",
            variant.Entries.SetItem(sweep.Known.Path, new CaseEntry(sweep.Known, value.At, value, true)));
    }

    private static string NameOf(TomlValue value)
    {
        var text = value switch
        {
            TomlValue.Number number => CanonicalText.Of(number.Value),
            TomlValue.Text written => LastPart(written.Value),
            _ => value.Found,
        };
        var safe = string.Concat(text.Select(c => char.IsAsciiLetterOrDigit(c) || c is '.' or '_' or '-' ? c : '-'));
        return safe.Length == 0 ? "-" : safe;
    }

    private static string LastPart(string path)
    {
        var last = path.TrimEnd('/', '\\').Split('/', '\\')[^1];
        return last.EndsWith(".csv", StringComparison.OrdinalIgnoreCase) ? last[..^4] : last;
    }
}
