using System.Collections.Immutable;

namespace BladeLoads.Rotor.Sections;

/// <summary>The sections a blade is made of, by name, each prepared once for every rotor that uses it.</summary>
public sealed class SectionSet
{
    private readonly ImmutableDictionary<string, Section> _byName;

    private SectionSet(ImmutableDictionary<string, Section> byName, SectionFamily? family) => (_byName, Family) = (byName, family);

    public IEnumerable<string> Names => _byName.Keys.Order(StringComparer.Ordinal);

    /// <exception cref="KeyNotFoundException">No section has that name.</exception>
    public Section this[string name] => _byName[name];

    /// <summary>The same sections by thickness; null where they are not a family.</summary>
    public SectionFamily? Family { get; }

    public bool Contains(string name) => _byName.ContainsKey(name);

    /// <exception cref="ArgumentException">Two sections have one name.</exception>
    public static SectionSet Of(IEnumerable<Section> sections)
        => new(sections.ToImmutableDictionary(s => s.Name, StringComparer.Ordinal), family: null);

    public static SectionSet Of(SectionFamily family)
        => new(family.Members.ToImmutableDictionary(m => m.Section.Name, m => m.Section, StringComparer.Ordinal), family);
}
