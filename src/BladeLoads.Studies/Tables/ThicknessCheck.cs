using BladeLoads.Rotor.Sections;
using BladeLoads.Studies.Fingerprints;

namespace BladeLoads.Studies.Tables;

/// <summary>Whether the thicknesses of a blade and of a set of polars go together.</summary>
internal static class ThicknessCheck
{
    // Half a percent of chord: blade tables give thickness in percent, rounded.
    private const double Rounding = 0.005;

    /// <param name="set">Null where the set says nothing of its tables, or its file cannot be read, which is reported already.</param>
    /// <param name="hasFile">Whether there is a file.</param>
    /// <param name="sections">Those that can be used, as they serve.</param>
    /// <param name="folder">The set's folder as messages name it.</param>
    public static bool IsSound(
        BladeTable blade, SetFile? set, bool hasFile, IReadOnlyList<Section> sections, string folder, Findings findings)
    {
        if (blade.Blade is not { IsByThickness: true })
        {
            if (set is not null)
                DoubtDifferences(blade, set, folder, findings);
            return true;
        }
        var at = blade.Thicknesses[0].At with { Line = 0, Column = 0 };
        if (set is null)
        {
            if (!hasFile)
                findings.Error(at, $"gives thickness_ratio in place of sections, and {folder}/ has no {SetFile.Name}; "
                    + "name there the thickness of each table under [thickness_ratio]: tip-18 = 0.18");
            return false;
        }
        if (!set.IsSound)
            return false;
        if (set.Thicknesses.IsEmpty)
        {
            findings.Error(new Place(set.Input.File, 0, 0), "names no thickness; give that of each table under [thickness_ratio]: tip-18 = 0.18");
            return false;
        }
        DoubtBeyond(blade, set, findings);
        return HaveCommonAngles(set, sections, findings);
    }

    private static void DoubtDifferences(BladeTable blade, SetFile set, string folder, Findings findings)
    {
        foreach (var row in blade.Thicknesses)
            if (set.Thicknesses.FirstOrDefault(t => t.Section == row.Section) is { } table
                && Math.Abs(table.ThicknessRatio - row.ThicknessRatio) > Rounding)
                findings.Doubt(row.At, $"thickness_ratio is {CanonicalText.Of(row.ThicknessRatio)}, and section '{row.Section}' is "
                    + $"{CanonicalText.Of(table.ThicknessRatio)} thick by {folder}/{SetFile.Name}; the section is used");
    }

    private static void DoubtBeyond(BladeTable blade, SetFile set, Findings findings)
    {
        var (thinnest, thickest) = (set.Thicknesses[0], set.Thicknesses[^1]);
        foreach (var row in blade.Thicknesses)
            if (row.ThicknessRatio < thinnest.ThicknessRatio - Rounding)
                findings.Doubt(row.At, Beyond(row, "below the thinnest", thinnest));
            else if (row.ThicknessRatio > thickest.ThicknessRatio + Rounding)
                findings.Doubt(row.At, Beyond(row, "above the thickest", thickest));
    }

    private static string Beyond(RowThickness row, string side, TableThickness end)
        => $"thickness_ratio is {CanonicalText.Of(row.ThicknessRatio)}, {side} table of the set, '{end.Section}' with "
            + $"{CanonicalText.Of(end.ThicknessRatio)}, which serves alone";

    private static bool HaveCommonAngles(SetFile set, IReadOnlyList<Section> sections, Findings findings)
    {
        var polars = sections.SelectMany(section => section.Polars).ToArray();
        if (polars.Length == 0)
            return false;
        var (first, last) = (polars.Max(p => p.Angles[0]), polars.Min(p => p.Angles[^1]));
        if (polars.SelectMany(p => p.Angles).Where(a => a >= first && a <= last).Distinct().Count() >= PolarLimits.FewestRows)
            return true;
        findings.Error(new Place(set.Input.File, 0, 0),
            "its tables have hardly an angle in common; coefficients can be interpolated in thickness only at angles that all of them reach");
        return false;
    }
}
