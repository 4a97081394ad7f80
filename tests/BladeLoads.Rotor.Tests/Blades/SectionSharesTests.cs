using BladeLoads.Rotor.Blades;
using BladeLoads.Rotor.Momentum;
using BladeLoads.Rotor.Sections;

namespace BladeLoads.Rotor.Tests.Blades;

public sealed class SectionSharesTests
{
    private static Section Round(string name) => Section.FromPolars(name, [Polar.FromRows(double.NaN, [-1, 0, 1], [0, 0, 0], [1, 1, 1])]);

    private static readonly SectionSet Named = SectionSet.Of([Round("root"), Round("tip")]);

    private static readonly SectionSet ByThickness = SectionSet.Of(SectionFamily.Of(
        [new FamilyMember(0.2, Round("thin")), new FamilyMember(0.4, Round("thick")), new FamilyMember(1, Round("round"))]));

    [Fact]
    public void Between_two_sections_an_element_uses_both_by_its_place()
    {
        var blade = Blade.FromStations([new(1, 1, 0, "root"), new(3, 1, 0, "root"), new(7, 1, 0, "tip"), new(9, 1, 0, "tip")]);
        // Of four elements of 2 m the second has its middle at 4 m, a quarter of the way from 3 to 7 m, the third at 6 m.
        var shares = BladeElements.Of(blade, 4, ElementSpacing.Uniform).Select(e => SectionShares.Of(e, Named)).ToArray();
        Assert.Equal([new SectionShare("root", 1)], shares[0].ToArray());
        Assert.Equal([new SectionShare("root", 0.75), new SectionShare("tip", 0.25)], shares[1].ToArray());
        Assert.Equal([new SectionShare("root", 0.25), new SectionShare("tip", 0.75)], shares[2].ToArray());
        Assert.Equal([new SectionShare("tip", 1)], shares[3].ToArray());
    }

    [Theory]
    [InlineData(0.1, "thin 1")]
    [InlineData(0.2, "thin 1")]
    [InlineData(0.25, "thin 0.75 thick 0.25")]
    [InlineData(0.4, "thick 1")]
    [InlineData(0.7, "thick 0.5 round 0.5")]
    [InlineData(1, "round 1")]
    public void By_thickness_an_element_uses_the_two_tables_around_it(double thickness, string expected)
    {
        var element = new BladeElement(1, 1, 1, 0, "", "", 0) { ThicknessRatio = thickness };
        var shares = SectionShares.Of(element, ByThickness);
        Assert.Equal(expected, string.Join(' ', shares.Select(s => FormattableString.Invariant($"{s.Section} {Math.Round(s.Share, 12)}"))));
        Assert.Equal(1, shares.Sum(s => s.Share), 1e-15);
    }
}
