using BladeLoads.Rotor.Momentum;
using Xunit.Abstractions;
using static BladeLoads.Rotor.Tests.Published.PublishedRotor;

namespace BladeLoads.Rotor.Tests.Published;

/// <summary>Prandtl's factor and the relations of heavy loading against tables worked elsewhere; tolerances stand in the data files.</summary>
public sealed class LossAndLoadingTests(ITestOutputHelper output)
{
    [Fact]
    public void The_tip_loss_factor_has_the_printed_digits_of_its_table()
    {
        foreach (var row in PublishedTable.Read("momentum/prandtl-tip-loss.csv").Rows)
        {
            var reached = LossFactor.Tip((int)row["blade_count"], row["radius_ratio"], 1, row["inflow_angle_deg"] * Degree);
            output.WriteLine($"{row["blade_count"]} blades, {row["inflow_angle_deg"]} degrees, {row["radius_ratio"]} R: " +
                $"reached {reached:F8}, table {row.Text("loss_factor")}");
            EqualToDigits(7, row["loss_factor"], reached);
            Assert.Equal(reached, LossFactor.Tip((int)row["blade_count"], row["radius_ratio"], 1, -row["inflow_angle_deg"] * Degree));
        }
    }

    [Fact]
    public void The_hub_loss_factor_is_the_same_form_with_the_hub_in_the_denominator()
    {
        // Common practice, no source. By hand: B (r - Rh)/(2 Rh sin phi) of the hub is B (R - r)/(2 r sin phi) of a tip at R when r - Rh is
        // to Rh as R - r is to r; so a hub at 1 and an element at 1 + x meets a tip at 1 + x and an element at 1.
        foreach (var x in new[] { 0.001, 0.02, 0.1, 0.5 })
            foreach (var inflow in new[] { 0.05, 0.3, 1.0 })
                Assert.Equal(LossFactor.Tip(3, 1, 1 + x, inflow), LossFactor.Hub(3, 1 + x, 1, inflow), 1e-15);
    }

    [Theory]
    [InlineData(HeavyLoading.Glauert1935, "thrust_coefficient_glauert_1935")]
    [InlineData(HeavyLoading.Buhl2005, "thrust_coefficient_buhl_2005")]
    public void The_thrust_of_heavy_loading_has_the_printed_digits_of_its_table(HeavyLoading relation, string column)
    {
        foreach (var row in PublishedTable.Read("momentum/heavy-loading.csv").Rows)
        {
            var (f, a) = (row["loss_factor"], row["axial_induction"] == 0.33333 ? 1.0 / 3 : row["axial_induction"]);
            var expected = row[row.Has(column) ? column : "thrust_coefficient_momentum"];

            var reached = HighThrust.ThrustCoefficient(a, f, relation);
            output.WriteLine($"F = {f}, a = {a:G5}: reached {reached:F7}, table {expected}");
            EqualToDigits(6, expected, reached);
            if (a == 1)
                continue;
            // The way back, which is what a balance uses: k = CT/(4 F (1 - a)^2).
            var induction = 1 - 1 / HighThrust.InverseSpeedRatio(reached / (4 * f * (1 - a) * (1 - a)), f, relation);
            // Two roundings of numbers of order 1 to 100.
            Assert.Equal(a, induction, 1e-13);
        }
    }

    [Fact]
    public void The_published_root_of_buhl_2005_is_met_at_every_thrust()
    {
        foreach (var row in PublishedTable.Read("momentum/buhl-inverse.csv").Rows)
        {
            var (f, thrust, a) = (row["loss_factor"], row["thrust_coefficient"], row["axial_induction"]);
            if (a == 1)
                continue;
            // The printed a has seven digits; k rests on it, so compare the thrust of the a found with the printed thrust too.
            var k = thrust / (4 * f * (1 - a) * (1 - a));
            var reached = 1 - 1 / HighThrust.InverseSpeedRatio(k, f, HeavyLoading.Buhl2005);
            output.WriteLine($"F = {f}, CT = {thrust}: a reached {reached:F8}, published root {a}");
            EqualToDigits(7, a, reached);
            // dCT/da is below 4; half a digit of a is 5e-8.
            Assert.Equal(thrust, HighThrust.ThrustCoefficient(a, f, HeavyLoading.Buhl2005), 4 * 5e-8);
        }
    }

    [Fact]
    public void The_slope_of_glauert_1935_jumps_from_four_thirds_to_five_thirds_where_heavy_loading_begins()
    {
        var (before, after) = SlopesAt(1.0 / 3, k: 0.5, HeavyLoading.Glauert1935);
        output.WriteLine($"dCT/da at a = 1/3: {before:F6} below, {after:F6} above");
        // 4 - 8a and 4 - 10a + 9a^2 at 1/3, by hand. Differences over 1e-6 of numbers rounded at 1e-16 leave 1e-9; their curvature, 1e-5.
        Assert.Equal(4.0 / 3, before, 2e-5);
        Assert.Equal(5.0 / 3, after, 2e-5);
    }

    [Theory]
    [InlineData(1.0)]
    [InlineData(0.8)]
    [InlineData(0.5)]
    public void The_slope_of_buhl_2005_is_smooth_where_heavy_loading_begins(double lossFactor)
    {
        var (before, after) = SlopesAt(0.4, k: 2.0 / 3, HeavyLoading.Buhl2005, lossFactor);
        output.WriteLine($"F = {lossFactor}: dCT/da at a = 0.4: {before:F6} below, {after:F6} above");
        // 4F(1 - 2a) at 0.4, by hand.
        Assert.Equal(0.8 * lossFactor, before, 2e-5);
        Assert.Equal(0.8 * lossFactor, after, 2e-5);
    }

    /// <summary>dCT/da on either side of a loading k, of the relation as the balance uses it.</summary>
    private static (double Before, double After) SlopesAt(double induction, double k, HeavyLoading relation, double lossFactor = 1)
    {
        (double A, double Thrust) At(double loading)
        {
            var v = HighThrust.InverseSpeedRatio(loading, lossFactor, relation);
            return (1 - 1 / v, 4 * lossFactor * loading / (v * v));
        }
        var (below, middle, above) = (At(k * (1 - 1e-6)), At(k), At(k * (1 + 1e-6)));
        Assert.Equal(induction, middle.A, 1e-12);
        return ((middle.Thrust - below.Thrust) / (middle.A - below.A), (above.Thrust - middle.Thrust) / (above.A - middle.A));
    }

    /// <summary>Equal to half a unit of the last of so many significant digits.</summary>
    private static void EqualToDigits(int digits, double expected, double actual)
    {
        var unit = Math.Pow(10, Math.Floor(Math.Log10(Math.Abs(expected))) - digits + 1);
        // The thousandth more is for the decimal number that binary can only approach.
        Assert.Equal(expected, actual, 0.501 * unit);
    }
}
