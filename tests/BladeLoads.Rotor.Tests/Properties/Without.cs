using System.Collections.Immutable;
using BladeLoads.Rotor.Sections;

namespace BladeLoads.Rotor.Tests.Properties;

/// <summary>The same rotor without something that its sections have.</summary>
internal static class Without
{
    public static Trial Drag(Trial trial) => WithSections(trial, section => Section.FromPolars(section.Name,
        section.Polars.Select(p => Polar.FromRows(p.Reynolds, p.Angles.AsSpan(), p.Lift.AsSpan(), new double[p.Drag.Length]))));

    public static Trial ReynoldsNumbers(Trial trial) => WithSections(trial, section =>
    {
        var p = section.Polars[0];
        return Section.FromPolars(section.Name, [Polar.FromRows(double.NaN, p.Angles.AsSpan(), p.Lift.AsSpan(), p.Drag.AsSpan())]);
    });

    private static Trial WithSections(Trial trial, Func<Section, Section> change) => trial with
    {
        Rotor = trial.Rotor with
        {
            Sections = SectionSet.Of(trial.Rotor.Sections.Names.Select(name => change(trial.Rotor.Sections[name])).ToImmutableArray()),
        },
    };
}
