using System.Collections.Immutable;
using BladeLoads.Rotor.Sections;

namespace BladeLoads.Rotor.Blades;

/// <param name="Section">Name of a section table.</param>
/// <param name="Share">Above 0 to 1; those of an element make 1.</param>
public readonly record struct SectionShare(string Section, double Share);

/// <summary>Which tables an element takes its coefficients from, and how much of each.</summary>
public static class SectionShares
{
    /// <summary>
    /// One table, or the two that are blended. By thickness: the two that the thickness lies between, by distance; that the cubic looks at
    /// their neighbours too, for its slopes, counts for nothing here.
    /// </summary>
    public static ImmutableArray<SectionShare> Of(in BladeElement element, SectionSet sections)
    {
        if (element.ThicknessRatio is { } thickness)
            return ByThickness(thickness, sections.Family!.Members);
        if (element.OuterWeight == 0)
            return [new SectionShare(element.InnerSection, 1)];
        return [new SectionShare(element.InnerSection, 1 - element.OuterWeight), new SectionShare(element.OuterSection, element.OuterWeight)];
    }

    private static ImmutableArray<SectionShare> ByThickness(double thickness, ImmutableArray<FamilyMember> members)
    {
        var after = members.Count(m => m.ThicknessRatio <= thickness);
        if (after == 0 || after == members.Length || members[after - 1].ThicknessRatio == thickness)
            return [new SectionShare(members[Math.Max(0, after - 1)].Section.Name, 1)];
        var (thinner, thicker) = (members[after - 1], members[after]);
        var share = (thickness - thinner.ThicknessRatio) / (thicker.ThicknessRatio - thinner.ThicknessRatio);
        return [new SectionShare(thinner.Section.Name, 1 - share), new SectionShare(thicker.Section.Name, share)];
    }
}
