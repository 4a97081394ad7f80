using BladeLoads.Rotor.Sections;
using MathNet.Numerics.Interpolation;

namespace BladeLoads.Rotor.Tests.Sections;

public sealed class SectionFamilyTests
{
    private static readonly double[] Thicknesses = [0.18, 0.24, 0.30, 0.40, 1.0];

    private static SectionFamily Family(params double[] thicknesses) => SectionFamily.Of(thicknesses.Select(t => new FamilyMember(t, Member(t))));

    // Invented: the thicker, the less and the later lift, the more drag.
    private static Section Member(double thickness) => Section.FromPolars($"t{thickness}",
    [
        InventedRotor.PolarByFormula(1e6, stallDeg: 8 + (10 * thickness), zeroLiftDeg: -4 * (1 - thickness), drag: 0.006 + (0.1 * thickness)),
        InventedRotor.PolarByFormula(6e6, stallDeg: 9 + (10 * thickness), zeroLiftDeg: -4 * (1 - thickness), drag: 0.005 + (0.1 * thickness)),
    ]);

    [Theory]
    [InlineData(0.19)]
    [InlineData(0.27)]
    [InlineData(0.35)]
    [InlineData(0.7)]
    public void Coefficients_between_members_are_those_of_the_shape_preserving_cubic_of_a_library(double thickness)
    {
        var family = Family(Thicknesses);
        var section = family.At(thickness);
        Assert.Equal([1e6, 6e6], section.Polars.Select(p => p.Reynolds));
        // MathNet's PCHIP through the four members around it, or three at an end; the farther ones do not count.
        var after = Thicknesses.Count(t => t <= thickness);
        var around = Thicknesses[Math.Max(0, after - 2)..Math.Min(Thicknesses.Length, after + 2)];
        foreach (var polar in section.Polars)
            for (var row = 0; row < polar.Angles.Length; row += 7)
            {
                var place = family.Members[0].Section.Table.Place(Math.Log(polar.Reynolds));
                var members = around.Select(t => family.Members.Single(m => m.ThicknessRatio == t).Section.Table.At(polar.Angles[row], place)).ToArray();
                Assert.Equal(
                    CubicSpline.InterpolatePchip(around, members.Select(m => m.Lift)).Interpolate(thickness), polar.Lift[row], 1e-12);
                Assert.Equal(
                    CubicSpline.InterpolatePchip(around, members.Select(m => m.Drag)).Interpolate(thickness), polar.Drag[row], 1e-12);
            }
    }

    [Fact]
    public void A_thickness_of_a_member_is_that_member_and_beyond_the_ends_the_end_serves()
    {
        var family = Family(Thicknesses);
        Assert.All(family.Members, m => Assert.Same(m.Section, family.At(m.ThicknessRatio)));
        Assert.Same(family.Members[0].Section, family.At(0.12));
        var thin = Family(0.18, 0.3);
        Assert.Same(thin.Members[^1].Section, thin.At(0.5));
        var alone = Family(0.21);
        Assert.Same(alone.Members[0].Section, alone.At(0.05));
        Assert.Same(alone.Members[0].Section, alone.At(0.9));
    }

    // Published tables have no drag at 180 degrees: the 3.4 MW reference rotor's (key iea-3.4-130 in docs/sources.md).
    [Fact]
    public void Rows_without_drag_stay_without()
    {
        Section Thin(double thickness) => Section.FromPolars("t", [Polar.FromRows(
            1e6, [-Math.PI, -0.3, 0.1, 3, Math.PI], [0, -1, 0.4, 0.5, 0], [0, thickness, 0.01, 0.2 * thickness, 0])]);
        foreach (var thickness in new[] { 0.19, 0.27, 0.35, 0.7 })
        {
            var polar = SectionFamily.Of(Thicknesses.Select(t => new FamilyMember(t, Thin(t)))).At(thickness).Polars[0];
            Assert.All(polar.Drag, drag => Assert.True(drag >= 0));
            Assert.Equal(0, polar.Drag[^1], 1e-12);
        }
    }

    [Fact]
    public void Two_members_are_blended_by_their_distance()
    {
        var family = Family(0.2, 0.4);
        var (thin, thick, between) = (family.Members[0].Section.Polars[0], family.Members[1].Section.Polars[0], family.At(0.25).Polars[0]);
        var at = Array.FindIndex([.. between.Angles], a => Math.Abs(a) < 1e-9);
        Assert.Equal((0.75 * LiftAtZero(thin)) + (0.25 * LiftAtZero(thick)), between.Lift[at], 1e-12);

        static double LiftAtZero(Polar p) => p.Lift[Array.FindIndex([.. p.Angles], a => Math.Abs(a) < 1e-9)];
    }

    [Fact]
    public void Only_angles_and_Reynolds_numbers_that_all_members_around_reach_are_in_the_table()
    {
        static Polar Part(double reynolds, double fromDeg, double toDeg) => Polar.FromRows(reynolds,
            [.. Enumerable.Range(0, 21).Select(i => double.DegreesToRadians(fromDeg + ((toDeg - fromDeg) * i / 20)))],
            [.. Enumerable.Range(0, 21).Select(i => 0.1 * i)], [.. Enumerable.Range(0, 21).Select(_ => 0.01)]);
        var family = SectionFamily.Of(
        [
            new FamilyMember(0.2, Section.FromPolars("thin", [Part(1e6, -20, 30), Part(3e6, -20, 30)])),
            new FamilyMember(0.4, Section.FromPolars("thick", [Part(2e6, -180, 180), Part(9e6, -180, 180)])),
            new FamilyMember(1.0, Section.FromPolars("round", [Part(double.NaN, -180, 180)])),
        ]);
        var between = family.At(0.3);
        Assert.Equal([2e6, 3e6], between.Polars.Select(p => p.Reynolds));
        Assert.Equal(double.DegreesToRadians(-20), between.Polars[0].Angles[0], 1e-12);
        Assert.Equal(double.DegreesToRadians(30), between.Polars[0].Angles[^1], 1e-12);
    }

    [Theory]
    [InlineData(new[] { 0.3, 0.2 })]
    [InlineData(new[] { 0.2, 0.2 })]
    [InlineData(new[] { 0.0, 0.2 })]
    [InlineData(new[] { 0.2, 1.2 })]
    [InlineData(new double[0])]
    public void Thicknesses_that_make_no_family_are_refused(double[] thicknesses)
        => Assert.Throws<ArgumentException>(() => Family(thicknesses));
}
