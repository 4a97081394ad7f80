using System.Collections.Immutable;
using BladeLoads.Rotor.Sections;
using BladeLoads.Screen;
using BladeLoads.Studies;
using BladeLoads.Studies.Cases;
using BladeLoads.Studies.Tables;
using static BladeLoads.Studies.Tables.RecordText;

namespace BladeLoads.Commands.Polar;

/// <summary>Where on a rotor a table is to serve, and by which method it is augmented.</summary>
/// <param name="ChordRatio">Chord over radius, c/r, above 0.</param>
/// <param name="RadiusRatio">Radius over tip radius, r/R, above 0 to 1.</param>
/// <param name="TipSpeedRatio">Above 0; NaN where the method does not depend on it.</param>
internal sealed record AugmentationAsked(Augmentation Method, double ChordRatio, double RadiusRatio, double TipSpeedRatio)
{
    public AugmentationFactors Factors => RotationalAugmentation.Factors(
        Method, ChordRatio, RadiusRatio, double.IsNaN(TipSpeedRatio) ? 1 : RotationalAugmentation.TipSpeedShare(1, TipSpeedRatio));
}

/// <summary>A polar table augmented for rotation. Rows that do not move keep all their digits, and all keep their moments.</summary>
internal static class AugmentedTable
{
    /// <summary>Refused where the table is augmented already.</summary>
    /// <param name="file">As findings name it.</param>
    public static TableChange Of(StoredPolars table, string file, AugmentationAsked asked)
    {
        if (table.Augmented is var (line, text))
            return new TableChange.Refused([new InputFinding(file, line, 0,
                $"the table is augmented already: '{text}'; give the table as it was before, or choose others with --only")]);
        var factors = asked.Factors;
        var polars = table.Section.Polars;
        var augmented = polars.Select(polar => RotationalAugmentation.Augment(polar, factors)).ToList();
        if (polars.Zip(augmented).All(pair => ReferenceEquals(pair.First, pair.Second)))
            return new TableChange.Copied($"{WithoutLift(polars[0])}, copied");
        return new TableChange.Changed(
            [.. table.Polars.Zip(augmented, Exchanged)], "augmented", How(factors, asked),
            [.. table.Polars.Zip(polars, augmented).Select(t => At(t.First.Reynolds) + Told(t.Second, t.Third))]);
    }

    private static PolarRows Exchanged(PolarRows rows, Rotor.Sections.Polar augmented) => rows with
    {
        Rows = [.. augmented.Angles.Select((angle, i) => i < rows.Rows.Length
            ? rows.Rows[i].With(augmented.Lift[i], augmented.Drag[i])
            : new PolarRow(
                TwelveDigits.Of(double.RadiansToDegrees(angle)), TwelveDigits.Of(augmented.Lift[i]), TwelveDigits.Of(augmented.Drag[i]),
                rows.Rows[^1].Moment))],
    };

    private static ImmutableArray<string> How(AugmentationFactors factors, AugmentationAsked asked) =>
    [
        $"{StoredPolars.AugmentedNote}: {SectionMethod.NameOf(asked.Method)}, "
            + $"c/r {Brief(asked.ChordRatio)}, r/R {Brief(asked.RadiusRatio)}"
            + (double.IsNaN(asked.TipSpeedRatio) ? "" : $", tip-speed ratio {Brief(asked.TipSpeedRatio)}"),
        $"lift goes {Brief(factors.Lift)} of the way to potential lift, drag {Brief(factors.Drag)} of the way to that at zero lift; "
            + "fades from 30 to 50 deg; moments as they were",
    ];

    private static string Told(Rotor.Sections.Polar old, Rotor.Sections.Polar now)
    {
        if (ReferenceEquals(old, now))
            return $"as it was: {WithoutLift(old)}";
        var added = now.Angles.Length - old.Angles.Length;
        return $"{Most("lift", old.Lift, now.Lift, now)}; {Most("drag", old.Drag, now.Drag, now)}"
            + (added == 0
                ? ""
                : $"; {Count.Of(added, "row")} added up to 50 deg, where the end value fades back");
    }

    // In rows that were added, the end value of the old table stood before.
    private static string Most(string what, ImmutableArray<double> old, ImmutableArray<double> now, Rotor.Sections.Polar polar)
    {
        double Before(int row) => old[Math.Min(row, old.Length - 1)];
        var most = Enumerable.Range(0, now.Length).MaxBy(row => Math.Abs(now[row] - Before(row)));
        return Before(most) == now[most]
            ? $"{what} as it was"
            : $"{what} {Brief(Before(most))} -> {Brief(now[most])} at {Degrees(polar.Angles[most])} deg, where it moves most";
    }

    private static string WithoutLift(Rotor.Sections.Polar polar)
        => polar.IsRound ? "no lift to augment" : "lift does not rise through 0 within 20 deg of 0";
}
