using System.Collections.Immutable;
using BladeLoads.Rotor.Sections;
using static BladeLoads.Studies.Tables.RecordText;

namespace BladeLoads.Studies.Tables;

/// <summary>How a case has the polars of its sections carried on to +-180 degrees.</summary>
/// <param name="AspectRatio">Above 0.</param>
internal sealed record SectionExtension(double AspectRatio, ExtensionJoin Join)
{
    /// <param name="table">One without errors.</param>
    public ExtendedSection Of(PolarTable table)
    {
        var section = table.Section!;
        var polars = new List<Polar>();
        var record = ImmutableArray.CreateBuilder<string>();
        InputFinding? doubt = null;
        for (var i = 0; i < section.Polars.Length; i++)
        {
            var at = table.PolarsAt[i];
            if (!PolarExtension.CanExtend(section.Polars[i]))
                return new ExtendedSection(null, [], null, at);
            var extended = PolarExtension.Extend(section.Polars[i], AspectRatio, Join);
            polars.Add(extended.Polar);
            record.Add(section.Name + ": " + At(section.Polars[i].Reynolds) + ExtensionText.Of(extended));
            if (ExtensionDoubts.Of(section.Polars[i], extended).FirstOrDefault() is { } text)
                doubt ??= new InputFinding(at.File, at.Line, at.Column, text);
        }
        return new ExtendedSection(Section.FromPolars(section.Name, polars), record.ToImmutable(), doubt, null);
    }
}

/// <summary>What became of a section.</summary>
/// <param name="Section">Null where a polar cannot be extended.</param>
/// <param name="Record">What was done at each Reynolds number, a line each.</param>
/// <param name="Doubt">The first polar whose extension rests on a guess.</param>
/// <param name="Obstacle">Where the polar begins that cannot be extended.</param>
internal sealed record ExtendedSection(Section? Section, ImmutableArray<string> Record, InputFinding? Doubt, Place? Obstacle);
