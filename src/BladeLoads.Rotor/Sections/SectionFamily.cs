using System.Collections.Immutable;

namespace BladeLoads.Rotor.Sections;

/// <summary>
/// Sections of rising thickness, between which coefficients are interpolated. Holds one member or more; thickness ratios lie above 0 to
/// 1 and rise strictly; names differ. Equality is by reference.
/// </summary>
public sealed class SectionFamily
{
    private static readonly double Hair = double.DegreesToRadians(1e-3);

    private SectionFamily(ImmutableArray<FamilyMember> members) => Members = members;

    public ImmutableArray<FamilyMember> Members { get; }

    /// <param name="members">In the order of their thickness.</param>
    /// <exception cref="ArgumentException">No member, or one that breaks what the type promises.</exception>
    public static SectionFamily Of(IEnumerable<FamilyMember> members)
    {
        var all = members.ToImmutableArray();
        if (all.IsEmpty)
            throw new ArgumentException("a family needs a member", nameof(members));
        for (var i = 0; i < all.Length; i++)
            if (!(all[i].ThicknessRatio is > 0 and <= 1) || (i > 0 && !(all[i].ThicknessRatio > all[i - 1].ThicknessRatio)))
                throw new ArgumentException($"member {i}: thickness ratios lie above 0 to 1 and rise", nameof(members));
        return new SectionFamily(all);
    }

    /// <summary>
    /// The section of a thickness: at every angle that one of the tables around it has, and at every Reynolds number, lift and drag are
    /// interpolated in thickness with the slopes of <see cref="Pchip"/>. Beyond the thinnest and the thickest member that one serves.
    /// </summary>
    /// <remarks>
    /// Four members count at most: the two that the thickness lies between and their neighbours. The table has the angles and Reynolds
    /// numbers that all of them reach, so that a use beyond is marked; a member without a Reynolds number serves at all.
    /// </remarks>
    /// <param name="thicknessRatio">Above 0 to 1.</param>
    public Section At(double thicknessRatio)
    {
        var after = Members.Count(m => m.ThicknessRatio <= thicknessRatio);
        if (after == 0)
            return Members[0].Section;
        if (after == Members.Length || Members[after - 1].ThicknessRatio == thicknessRatio)
            return Members[after - 1].Section;
        var around = Members[Math.Max(0, after - 2)..Math.Min(Members.Length, after + 2)];
        var angles = AnglesOf(around);
        var name = string.Join('/', Members[after - 1].Section.Name, Members[after].Section.Name);
        return Section.FromPolars(name, ReynoldsNumbersOf(around).Select(reynolds => PolarAt(thicknessRatio, around, reynolds, angles)));
    }

    private static Polar PolarAt(double thicknessRatio, ImmutableArray<FamilyMember> around, double reynolds, double[] angles)
    {
        var places = around.Select(m => m.Section.Table.Place(Math.Log(reynolds))).ToArray();
        var (lift, drag) = (new double[angles.Length], new double[angles.Length]);
        Span<double> thickness = stackalloc double[around.Length];
        Span<double> lifts = stackalloc double[around.Length];
        Span<double> drags = stackalloc double[around.Length];
        for (var row = 0; row < angles.Length; row++)
        {
            for (var i = 0; i < around.Length; i++)
            {
                thickness[i] = around[i].ThicknessRatio;
                (lifts[i], drags[i]) = around[i].Section.Table.At(angles[row], places[i]);
            }
            lift[row] = Pchip.ValueAt(thickness, lifts, thicknessRatio);
            // Between rows without drag a cubic may be below 0 by its last digit.
            drag[row] = Math.Max(0, Pchip.ValueAt(thickness, drags, thicknessRatio));
        }
        return Polar.FromRows(reynolds, angles, lift, drag);
    }

    // Angles a hair apart are one angle printed twice; both would make a needle of a slope.
    private static double[] AnglesOf(ImmutableArray<FamilyMember> around)
    {
        var polars = around.SelectMany(m => m.Section.Polars).ToArray();
        var (first, last) = (polars.Max(p => p.Angles[0]), polars.Min(p => p.Angles[^1]));
        var angles = new List<double>();
        foreach (var angle in polars.SelectMany(p => p.Angles).Where(a => a >= first && a <= last).Order())
            if (angles.Count == 0 || angle - angles[^1] > Hair)
                angles.Add(angle);
        angles[^1] = last;
        return [.. angles];
    }

    private static SortedSet<double> ReynoldsNumbersOf(ImmutableArray<FamilyMember> around)
    {
        var stated = around.Where(m => !double.IsNaN(m.Section.Polars[0].Reynolds)).ToArray();
        if (stated.Length == 0)
            return [double.NaN];
        var (first, last) = (stated.Max(m => m.Section.Polars[0].Reynolds), stated.Min(m => m.Section.Polars[^1].Reynolds));
        return first > last
            ? [Math.Sqrt(first * last)]
            : new SortedSet<double>(stated.SelectMany(m => m.Section.Polars).Select(p => p.Reynolds).Where(r => r >= first && r <= last));
    }
}

/// <param name="ThicknessRatio">Thickness over chord, above 0 to 1.</param>
public sealed record FamilyMember(double ThicknessRatio, Section Section);
