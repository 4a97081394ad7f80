using BladeLoads.Rotor.Sections;
using BladeLoads.Rotor.Tests.Properties;
using BladeLoads.Rotor.Tests.Published;

namespace BladeLoads.Rotor.Tests.Sections;

/// <summary>
/// Scaled polars. There is no source to check them against: the definition (docs/theory.md, 1.7) is common practice. What it says is worked
/// out by hand below, and holds for the published tables of the tests and for random ones.
/// </summary>
public sealed class PolarScalingTests
{
    private const double Degree = Math.PI / 180;

    // Largest lift at 12 degrees, least at -12, least drag at 0.
    private static readonly Polar _invented = FromDegrees(
        (-40, -0.9, 0.8), (-20, -0.5, 0.2), (-12, -0.9, 0.05), (-6, -0.6, 0.012), (0, 0, 0.01), (6, 0.6, 0.011), (12, 1.2, 0.02), (18, 0.8, 0.15),
        (24, 0.7, 0.3), (40, 1.0, 0.8));

    [Fact]
    public void A_small_table_is_scaled_as_it_is_worked_out_by_hand()
    {
        var scaled = Scaled(_invented, new PolarFactors(0.9, 0.8, 0.75, 1.5));

        // At -6 degrees x = 2/3, q = 1/3: -0.54 + 0.15 0.9/9. At 18 degrees t = 0.4, A = 0.648; at 24 A = 0.104; at -20 t = 8/15, A = 0.4500741.
        AssertNear([-0.9, -0.44374074, -0.675, -0.525, 0, 0.54, 0.96, 0.69632, 0.68544, 1.0], scaled.Polar.Lift, 1e-8);
        AssertNear([0.8, 0.20225037, 0.055, 0.017, 0.015, 0.016, 0.025, 0.15324, 0.30052, 0.8], scaled.Polar.Drag, 1e-8);
        Assert.Equal((2, 6, true, true), (scaled.Range.First, scaled.Range.Last, scaled.Range.HasLeastLift, scaled.Range.HasLargestLift));
        Assert.Equal(4, scaled.LeastDrag);
        Assert.Equal((-27, 27), (Math.Round(scaled.UnchangedBelow / Degree, 9), Math.Round(scaled.UnchangedAbove / Degree, 9)));
    }

    [Fact]
    public void Lift_that_stays_above_its_new_largest_value_beyond_stall_is_held_there()
    {
        var flat = FromDegrees((-10, -0.8, 0.02), (0, 0.2, 0.01), (10, 1.2, 0.02), (14, 1.19, 0.05), (18, 1.15, 0.1), (24, 0.8, 0.3), (30, 0.7, 0.5));

        var scaled = Scaled(flat, new PolarFactors(1, 0.9, 0.9, 1));

        // Held to 18 degrees, faded to 33: at 24 t = 0.4, A = 0.648; at 30 t = 0.8, A = 0.104.
        AssertNear([-0.8, 0.2, 1.08, 1.071, 1.035, 0.74816, 0.69272], scaled.Polar.Lift, 1e-12);
        Assert.Equal(33, scaled.UnchangedAbove / Degree, 9);
    }

    [Fact]
    public void A_largest_lift_far_below_the_slope_bends_the_lift_line_sooner_and_keeps_it_rising()
    {
        // Factors 1 and 0.6: x1 = 0.2.
        var scaled = Scaled(FromDegrees((-5, -0.4, 0.01), (0, 0.1, 0.01), (2, 0.3, 0.01), (5, 0.6, 0.01), (10, 1.0, 0.02), (15, 0.5, 0.2)), new PolarFactors(1, 0.6, 0.6, 1));

        AssertNear([0.1, 0.29375, 0.5, 0.6], scaled.Polar.Lift.AsSpan(1, 4).ToArray(), 1e-12);
    }

    [Fact]
    public void Factors_of_1_give_back_every_digit()
    {
        foreach (var polar in Published())
            AssertSame(polar, Scaled(polar, new PolarFactors(1, 1, 1, 1)).Polar);
        FixedSample.ForEach(PlausibleSections.Shapes, 500, shape =>
        {
            foreach (var polar in PlausibleSections.Build("s", shape).Polars)
                if (PolarScaling.Of(polar, new PolarFactors(1, 1, 1, 1)) is PolarScaling.Scaled scaled)
                    AssertSame(polar, scaled.Polar);
        });
    }

    [Theory]
    [InlineData(0.95, 0.9, 1.4)]
    [InlineData(1, 0.8, 1)]
    [InlineData(0.9, 1, 2)]
    [InlineData(1.05, 1.1, 0.8)]
    public void The_published_sections_get_the_factors_that_are_stated_and_nothing_in_deep_stall(double slope, double largest, double drag)
    {
        foreach (var polar in Published())
        {
            var scaled = Scaled(polar, new PolarFactors(slope, largest, largest, drag));
            var (first, last) = (scaled.Range.First, scaled.Range.Last);

            Assert.Equal(largest * polar.Lift[last], scaled.Polar.Lift[last], 12);
            Assert.Equal(drag * polar.Drag[scaled.LeastDrag], scaled.Polar.Drag[scaled.LeastDrag], 12);
            for (var i = 0; i < polar.Angles.Length; i++)
            {
                if (i >= first && i <= last && polar.Lift[i] >= 0 && polar.Lift[i] <= 0.5 * polar.Lift[last])
                    Assert.Equal(slope * polar.Lift[i], scaled.Polar.Lift[i], 12);
                if (polar.Angles[i] <= scaled.UnchangedBelow || polar.Angles[i] >= scaled.UnchangedAbove)
                    Assert.Equal((polar.Lift[i], polar.Drag[i]), (scaled.Polar.Lift[i], scaled.Polar.Drag[i]));
                Assert.True(Math.Sign(scaled.Polar.Drag[i] - polar.Drag[i]) is var moved && (moved == 0 || moved == Math.Sign(drag - 1)));
            }
            Assert.True(scaled.UnchangedAbove <= polar.Angles[last] + (25 * Degree) + 1e-12);
        }
    }

    [Theory]
    [InlineData(0.95, 0.9)]
    [InlineData(1, 0.7)]
    [InlineData(1, 0.5)]
    [InlineData(1.1, 1.3)]
    public void More_lift_stays_more_lift_where_the_flow_is_attached(double slope, double largest) => FixedSample.ForEach(
        PlausibleSections.Shapes, 500, shape =>
        {
            foreach (var polar in PlausibleSections.Build("s", shape).Polars)
            {
                if (PolarScaling.Of(polar, new PolarFactors(slope, largest, largest, 1)) is not PolarScaling.Scaled scaled)
                    continue;
                for (var i = scaled.Range.First + 1; i <= scaled.Range.Last; i++)
                    Assert.True((polar.Lift[i] - polar.Lift[i - 1]) * (scaled.Polar.Lift[i] - scaled.Polar.Lift[i - 1]) >= -1e-15);
                // A table that begins in mid-flow has no least lift, and then nothing to compare.
                if (scaled.Range.HasLargestLift)
                    Assert.Equal(largest * polar.Lift[scaled.Range.Last], scaled.Polar.Lift.AsSpan()[scaled.Range.First..(scaled.Range.Last + 1)].ToArray().Max(), 12);
            }
        });

    [Fact]
    public void A_symmetric_section_stays_symmetric()
    {
        // Source: sheldahl-klimas1981, NACA 0015 at Reynolds number 160,000: some rows, mirrored as the report says.
        (double, double, double)[] above = [(2, 0.22, 0.012), (5, 0.55, 0.0142), (8, 0.7851, 0.0193), (10, 0.8322, 0.0233), (12, 0.5936, 0.0281), (14, 0.2371, 0.104), (20, 0.4575, 0.282), (30, 0.855, 0.57)];
        var polar = FromDegrees([.. above.Reverse().Select(row => (-row.Item1, -row.Item2, row.Item3)), (0, 0, 0.0115), .. above]);

        var scaled = Scaled(polar, new PolarFactors(0.95, 0.85, 0.85, 1.5)).Polar;

        for (var i = 0; i < polar.Angles.Length; i++)
        {
            Assert.Equal(scaled.Lift[i], -scaled.Lift[^(i + 1)]);
            Assert.Equal(scaled.Drag[i], scaled.Drag[^(i + 1)]);
        }
    }

    [Fact]
    public void A_section_that_does_not_lift_has_nothing_to_scale()
    {
        Assert.IsType<PolarScaling.WithoutLift>(PolarScaling.Of(FromDegrees((-180, 0, 0.6), (0, 0, 0.6), (180, 0, 0.6)), new PolarFactors(0.9, 0.9, 0.9, 2)));
        Assert.IsType<PolarScaling.WithoutLift>(PolarScaling.Of(FromDegrees((20, 1, 0.6), (30, 1, 0.6), (40, 1, 0.6)), new PolarFactors(0.9, 0.9, 0.9, 2)));
        Assert.IsType<PolarScaling.WithoutLift>(PolarScaling.Of(FromDegrees((-5, 1, 0.6), (0, 0.5, 0.6), (5, 0, 0.6), (10, -0.5, 0.6)), new PolarFactors(0.9, 0.9, 0.9, 2)));
    }

    [Fact]
    public void Lift_that_rises_to_the_end_has_no_largest_value_to_scale_but_a_slope()
    {
        var rising = FromDegrees((-2, -0.2, 0.01), (0, 0, 0.01), (4, 0.4, 0.01), (8, 0.8, 0.01));

        Assert.Equal(3, Assert.IsType<PolarScaling.WithoutLargestLift>(PolarScaling.Of(rising, new PolarFactors(1, 0.9, 1, 1))).Row);
        var scaled = Scaled(rising, new PolarFactors(0.9, 0.9, 0.9, 1));
        AssertNear([-0.18, 0, 0.36, 0.72], scaled.Polar.Lift, 1e-12);
        Assert.Equal((false, false), (scaled.Range.HasLeastLift, scaled.Range.HasLargestLift));
    }

    [Fact]
    public void Where_the_least_lift_is_not_in_the_table_the_slope_serves_alone_below_0()
        => AssertNear([-0.38, 0.095, 0.568, 0.9, 0.635936], Scaled(
            FromDegrees((-5, -0.4, 0.01), (0, 0.1, 0.01), (5, 0.6, 0.01), (10, 1.0, 0.02), (16, 0.68, 0.2)), new PolarFactors(0.95, 0.9, 0.5, 1)).Polar.Lift, 1e-12);

    [Theory]
    [InlineData(0.4, 1, 1, 1)]
    [InlineData(1.6, 1, 1, 1)]
    [InlineData(1, 0.4, 1, 1)]
    [InlineData(1, 1, 1.6, 1)]
    [InlineData(1, 1, 1, 0.4)]
    [InlineData(1, 1, 1, 11)]
    [InlineData(1.2, 0.55, 1, 1)]
    [InlineData(double.NaN, 1, 1, 1)]
    public void Factors_beyond_their_range_are_refused(double slope, double largest, double least, double drag)
        => Assert.Throws<ArgumentOutOfRangeException>(() => PolarScaling.Of(_invented, new PolarFactors(slope, largest, least, drag)));

    private static PolarScaling.Scaled Scaled(Polar polar, PolarFactors factors) => Assert.IsType<PolarScaling.Scaled>(PolarScaling.Of(polar, factors));

    private static IEnumerable<Polar> Published() =>
    [
        PublishedRotor.ReadPolar("phase-6/polars/s809.csv"),
        PublishedRotor.ReadPolar("iea-15-240/polars/FFA-W3-211.csv"), PublishedRotor.ReadPolar("iea-15-240/polars/FFA-W3-301.csv"),
        PublishedRotor.ReadPolar("iea-15-240/polars/FFA-W3-360.csv"), PublishedRotor.ReadPolar("nrel-5mw/polars/NACA64_A17.csv"),
        PublishedRotor.ReadPolar("iea-3.4-130/polars/DU91-W2-250.csv"),
    ];

    private static Polar FromDegrees(params (double Angle, double Lift, double Drag)[] rows) => Polar.FromRows(
        double.NaN, [.. rows.Select(row => row.Angle * Degree)], [.. rows.Select(row => row.Lift)], [.. rows.Select(row => row.Drag)]);

    private static void AssertSame(Polar one, Polar other)
    {
        Assert.Equal(one.Angles.ToArray(), other.Angles.ToArray());
        Assert.Equal(one.Lift.ToArray(), other.Lift.ToArray());
        Assert.Equal(one.Drag.ToArray(), other.Drag.ToArray());
    }

    private static void AssertNear(double[] expected, IEnumerable<double> actual, double tolerance)
    {
        Assert.Equal(expected.Length, actual.Count());
        foreach (var (one, other) in expected.Zip(actual))
            Assert.Equal(one, other, tolerance);
    }
}
