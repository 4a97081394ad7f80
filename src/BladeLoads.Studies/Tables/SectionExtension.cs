using BladeLoads.Rotor.Sections;
using BladeLoads.Studies.Fingerprints;

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
        InputFinding? doubt = null;
        for (var i = 0; i < section.Polars.Length; i++)
        {
            var at = table.PolarsAt[i];
            if (!PolarExtension.CanExtend(section.Polars[i]))
                return new ExtendedSection(null, null, at);
            var extended = PolarExtension.Extend(section.Polars[i], AspectRatio, Join);
            polars.Add(extended.Polar);
            if (ExtensionDoubt.Of(extended) is { } text)
                doubt ??= new InputFinding(at.File, at.Line, at.Column, text);
        }
        return new ExtendedSection(Section.FromPolars(section.Name, polars), doubt, null);
    }
}

/// <summary>What became of a section.</summary>
/// <param name="Section">Null where a polar cannot be extended.</param>
/// <param name="Doubt">The first polar whose extension rests on a guess.</param>
/// <param name="Obstacle">Where the polar begins that cannot be extended.</param>
internal sealed record ExtendedSection(Section? Section, InputFinding? Doubt, Place? Obstacle);

/// <summary>What is doubtful about an extension, wherever it is made.</summary>
public static class ExtensionDoubt
{
    /// <summary>The table says that it is augmented.</summary>
    public const string AugmentedBefore = "the table is augmented for rotation already; extend it as it was before, and augment then";

    /// <summary>Null where nothing is.</summary>
    public static string? Of(ExtendedPolar extended)
        => extended.Above is { Kind: ExtensionKind.FromEnd, ShowsStall: false, JoinAngle: var angle }
            ? $"lift still rises at the last angle, {CanonicalText.Of(Math.Round(double.RadiansToDegrees(angle), 9))} deg; "
                + "extended from there, the section stalls at that angle"
            : null;
}
