using BladeLoads.Rotor.Operation;
using BladeLoads.Rotor.Sections;

namespace BladeLoads.Rotor.Tests.Sections;

/// <summary>Where augmentation applies and how it is blended; its factors are held to tabled ones in Published/AugmentationTests.</summary>
public sealed class RotationalAugmentationTests
{
    private static double Rad(double deg) => double.DegreesToRadians(deg);

    // Lift 5.5 a radian through -2 degrees to 10 degrees, then 0.8; drag 0.01 at zero lift.
    private static Polar Stalled(params double[] anglesDeg) => Polar.FromRows(
        1e6, [.. anglesDeg.Select(Rad)], [.. anglesDeg.Select(a => a <= 10 ? 5.5 * Rad(a + 2) : 0.8)],
        [.. anglesDeg.Select(a => 0.01 + (a == -2 ? 0 : 0.002 * Math.Abs(a)))]);

    [Fact]
    public void Lift_goes_its_share_towards_potential_lift_and_drag_towards_that_at_zero_lift()
    {
        double[] angles = [-12, -6, -2, 2, 6, 10, 20, 30, 40, 45, 50, 60];
        var polar = Stalled(angles);
        var augmented = RotationalAugmentation.Augment(polar, new AugmentationFactors(0.5, 0.25));
        for (var i = 0; i < angles.Length; i++)
        {
            // By hand: full from zero lift to 30 degrees, half at 40, a quarter at 45, none at 50 and beyond, and none below zero lift.
            var share = angles[i] < -2 ? 0 : angles[i] switch { <= 30 => 1, 40 => 0.5, 45 => 0.25, _ => 0.0 };
            var potential = 5.5 * Math.Sin(Rad(angles[i] + 2));
            Assert.Equal(polar.Lift[i] + (share * 0.5 * (potential - polar.Lift[i])), augmented.Lift[i], 1e-3);
            Assert.Equal(polar.Drag[i] - (share * 0.25 * (polar.Drag[i] - 0.01)), augmented.Drag[i], 1e-12);
        }
    }

    [Fact]
    public void Attached_flow_and_flow_below_zero_lift_stay_what_they_are()
    {
        double[] angles = [-12, -6, -4, -2, 0, 2, 4];
        var polar = Stalled(angles);
        var augmented = RotationalAugmentation.Augment(polar, AugmentationFactors.Full);
        for (var i = 0; i < angles.Length; i++)
            // The sine of 6 degrees is 0.2 % short of its angle.
            Assert.Equal(polar.Lift[i], augmented.Lift[i], 0.002 * Math.Abs(polar.Lift[i]) + 1e-12);
        Assert.Equal(polar.Lift.Take(3), augmented.Lift.Take(3));
        Assert.Equal(polar.Drag.Take(3), augmented.Drag.Take(3));
    }

    [Fact]
    public void A_round_section_is_not_augmented()
    {
        var round = Polar.FromRows(double.NaN, [-Math.PI, 0, Math.PI], [0, 0, 0], [1, 1, 1]);
        Assert.Same(round, RotationalAugmentation.Augment(round, AugmentationFactors.Full));
    }

    [Fact]
    public void The_end_value_of_a_short_table_is_no_more_augmented_beyond_50_degrees()
    {
        var table = Section.FromPolars("short", [Stalled(-12, -2, 4, 10, 20)]).Table;
        var place = table.Place(Math.Log(1e6));
        Assert.Equal(5.5 * Math.Sin(Rad(32)), table.Augmented.At(Rad(30), place).Lift, 1e-3);
        Assert.Equal(table.At(Rad(50), place).Lift, table.Augmented.At(Rad(50), place).Lift, 1e-12);
        Assert.Equal(table.At(Rad(100), place).Lift, table.Augmented.At(Rad(100), place).Lift, 1e-12);
    }

    [Theory]
    [InlineData(Augmentation.None, 0.3, 0.5, 0.98)]
    [InlineData(Augmentation.Snel1993, 0.3, 0.81, 0.98)]
    [InlineData(Augmentation.DuSelig1998, 0.3, 0.81, 0.98)]
    [InlineData(Augmentation.Snel1993, 0.3, 0.5, 0)]
    [InlineData(Augmentation.DuSelig1998, 0.3, 0.5, 0)]
    public void Nothing_is_augmented_beyond_four_fifths_of_the_radius_nor_at_rest(
        Augmentation method, double chordRatio, double radiusRatio, double tipSpeedShare)
        => Assert.True(RotationalAugmentation.Factors(method, chordRatio, radiusRatio, tipSpeedShare).IsNone);

    [Fact]
    public void Factors_lie_between_nothing_and_all_for_any_chord()
    {
        foreach (var method in new[] { Augmentation.Snel1993, Augmentation.DuSelig1998 })
            foreach (var chordRatio in new[] { 1e-9, 0.01, 0.3, 0.6, 0.9, 1, 1.5, 40 })
                foreach (var radiusRatio in new[] { 0.001, 0.1, 0.5, 0.8 })
                    foreach (var share in new[] { 1e-6, 0.1, 0.9, 1 })
                    {
                        var (lift, drag) = RotationalAugmentation.Factors(method, chordRatio, radiusRatio, share);
                        Assert.InRange(lift, 0, 1);
                        Assert.InRange(drag, 0, 1);
                    }
        Assert.Equal(1, RotationalAugmentation.Factors(Augmentation.Snel1993, 0.7, 0.3, 0.9).Lift);
    }

    [Fact]
    public void A_rotor_has_the_factors_of_each_element_at_each_operating_point()
    {
        var plain = InventedRotor.Case(new Control.FixedSpeed(1.5, 0, null), [12]);
        var augmented = plain with { Augmentation = Augmentation.DuSelig1998 };
        var model = new RotorModel(augmented);
        foreach (var wind in new[] { 8.0, 20 })
        {
            model.Solve(new OperatingPoint(wind, 1.5, 0));
            for (var i = 0; i < model.Elements.Length; i++)
            {
                var element = model.Elements[i];
                var expected = RotationalAugmentation.Factors(
                    Augmentation.DuSelig1998, element.Chord / element.Radius, element.Radius / 40,
                    RotationalAugmentation.TipSpeedShare(wind, 1.5 * 40));
                Assert.Equal(expected.Lift, model.Annuli[i].Augmentation.Lift, 1e-12);
                Assert.Equal(expected.Drag, model.Annuli[i].Augmentation.Drag, 1e-12);
            }
            Assert.Contains(model.Annuli.ToArray(), annulus => annulus.Augmentation.Lift > 0.1);
        }
        model.Solve(new OperatingPoint(12, 0, 0));
        Assert.All(model.Annuli.ToArray(), annulus => Assert.True(annulus.Augmentation.IsNone));
        var unaugmented = new RotorModel(plain);
        unaugmented.Solve(new OperatingPoint(20, 1.5, 0));
        Assert.All(unaugmented.Annuli.ToArray(), annulus => Assert.True(annulus.Augmentation.IsNone));
    }
}
