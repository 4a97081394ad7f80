using BladeLoads.Rotor.Momentum;

namespace BladeLoads.Rotor.Tests.Momentum;

public sealed class HighThrustTests
{
    [Theory]
    [InlineData(HeavyLoading.Glauert1935)]
    [InlineData(HeavyLoading.Buhl2005)]
    public void The_induction_found_for_a_loading_gives_that_loading_back(HeavyLoading relation)
    {
        foreach (var F in new[] { 0.02, 0.1, 0.25, 1.0 / 3, 0.4, 0.7, 1 })
            for (var k = -0.9; k < 1e6; k = k < 5 ? k + 0.037 : k * 1.7)
            {
                var inverse = HighThrust.InverseSpeedRatio(k, F, relation);
                var throughDisc = 1 / inverse;
                var thrust = HighThrust.ThrustCoefficient(1 - throughDisc, F, relation);
                // CT = 4 F k (1 - a)^2; the subtraction 1 - a costs digits as a nears 1.
                Assert.Equal(4 * F * k * throughDisc * throughDisc, thrust, 1e-9 * (1 + Math.Abs(thrust)));
            }
    }

    [Fact]
    public void The_root_of_buhl_2005_passes_smoothly_where_its_published_form_is_nought_by_nought()
    {
        const double F = 0.2;
        var k = 4.0 / 9 / (2 * F);
        Assert.True(k > 2.0 / 3);
        var (below, at, above) = (
            HighThrust.InverseSpeedRatio(k * (1 - 1e-9), F, HeavyLoading.Buhl2005),
            HighThrust.InverseSpeedRatio(k, F, HeavyLoading.Buhl2005),
            HighThrust.InverseSpeedRatio(k * (1 + 1e-9), F, HeavyLoading.Buhl2005));
        Assert.InRange(at, below, above);
        Assert.Equal(below, above, 1e-8);
        // a = (4/3 - 2F)/(7/3 - 2F), by l'Hopital's rule from either form.
        Assert.Equal(1 / (1 - (((4.0 / 3) - (2 * F)) / ((7.0 / 3) - (2 * F)))), at, 1e-12);
    }
}
