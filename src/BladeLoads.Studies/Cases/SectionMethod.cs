using System.Collections.Immutable;
using BladeLoads.Rotor.Sections;

namespace BladeLoads.Studies.Cases;

/// <summary>Names of what can be done to the tables of sections, as cases and commands give them.</summary>
public static class SectionMethod
{
    public const string Viterna = "viterna-1982";

    internal const string Snel = "snel-1993", DuSelig = "du-selig-1998", None = "none";

    /// <param name="augmentation">Not none.</param>
    public static string NameOf(Augmentation augmentation) => augmentation == Augmentation.Snel1993 ? Snel : DuSelig;

    /// <summary>The methods by which tables are augmented for rotation.</summary>
    public static ImmutableSortedDictionary<string, Augmentation> Augmentations { get; } = ImmutableSortedDictionary.CreateRange(
        StringComparer.Ordinal, [KeyValuePair.Create(DuSelig, Augmentation.DuSelig1998), KeyValuePair.Create(Snel, Augmentation.Snel1993)]);
}
