using System.Collections.Immutable;
using BladeLoads.Studies.Fingerprints;
using BladeLoads.Studies.Toml;

namespace BladeLoads.Studies.Cases;

/// <summary>A quantity that varies with another, written as a list of pairs: <c>[[0.1, 0.85], [1, 0.94]]</c>.</summary>
/// <param name="Key">As messages name it.</param>
/// <param name="First">What rises, and what it may be.</param>
/// <param name="Second">What varies with it.</param>
/// <param name="Example">Pairs as a case file writes them.</param>
internal sealed record Pairs(string Key, (string Noun, Bounds Bounds) First, (string Noun, Bounds Bounds) Second, string Example)
{
    /// <summary>In file order, rising; empty where they are wrong, and then everything wrong is reported at its pair.</summary>
    public ImmutableArray<(double First, double Second)> Read(CaseValues values, TomlValue.List list)
    {
        var isSound = true;
        if (list.Items.IsEmpty)
            Refuse(list.At, $"is an empty list; give one pair or more: {Example}");
        var rows = ImmutableArray.CreateBuilder<(double First, double Second)>(list.Items.Length);
        foreach (var item in list.Items)
        {
            if (item is not TomlValue.List { Items: [TomlValue.Number first, TomlValue.Number second] })
            {
                Refuse(item.At, $"holds {item.Found}; give pairs of {First.Noun} and {Second.Noun}: {Example}");
                continue;
            }
            if (!IsWithin(first, First) | !IsWithin(second, Second))
                continue;
            if (rows.Count > 0 && first.Value <= rows[^1].First)
                Refuse(first.At, first.Value == rows[^1].First
                    ? $"has {First.Noun} {first.Found} twice; each {First.Noun} once"
                    : $"falls from {First.Noun} {CanonicalText.Of(rows[^1].First)} to {first.Found}; {First.Noun}s must rise");
            rows.Add((first.Value, second.Value));
        }
        return isSound ? rows.ToImmutable() : [];

        bool IsWithin(TomlValue.Number number, (string Noun, Bounds Bounds) wanted)
        {
            if (double.IsFinite(number.Value) && wanted.Bounds.Contain(number.Value))
                return true;
            Refuse(number.At, $"has {wanted.Noun} {number.Found}; {wanted.Bounds.Refusal(number.Value)}");
            return false;
        }

        void Refuse(Place at, string found)
        {
            isSound = false;
            values.Refuse(at, $"{Key} {found}");
        }
    }

    public static string Canonical(IEnumerable<(double First, double Second)> rows)
        => string.Join(',', rows.Select(row => $"{CanonicalText.Of(row.First)}:{CanonicalText.Of(row.Second)}"));
}
