using BladeLoads.Rotor.Energy;
using MathNet.Numerics;
using Xunit.Abstractions;

namespace BladeLoads.Rotor.Tests.Energy;

public sealed class EnergyTests(ITestOutputHelper output)
{
    /// <summary>key rayleigh in docs/sources.md: F = 1 - exp(-pi/4 (V/Vave)^2), worked to eight digits.</summary>
    [Theory]
    [InlineData(6, 2, 0.083567132)]
    [InlineData(6, 25, 0.9999988)]
    [InlineData(7.5, 8, 0.59082346)]
    [InlineData(10, 15, 0.82918016)]
    public void Weibull_of_shape_2_is_the_distribution_of_Rayleigh(double mean, double windSpeed, double cumulative)
        => Assert.Equal(cumulative, new WindClimate.Weibull(mean, 2).Cumulative(windSpeed), 5e-9);

    [Theory]
    [InlineData(1.5)]
    [InlineData(2)]
    [InlineData(3.2)]
    public void The_mean_of_a_Weibull_climate_is_the_mean_asked_for(double shape)
    {
        var climate = new WindClimate.Weibull(7.5, shape);
        var mean = 0.0;
        for (var v = 0.0; v < 80; v += 0.001)
            mean += (v + 0.0005) * (climate.Cumulative(v + 0.001) - climate.Cumulative(v));
        Assert.Equal(7.5, mean, 1e-5);
    }

    [Fact]
    public void The_bin_sum_of_a_straight_line_is_its_closed_form()
    {
        // P = c V from 0.5 to V_n in bins; with P linear in each bin the sum is that of F by parts, worked by hand below.
        var climate = new WindClimate.Weibull(8, 2);
        double[] speeds = [.. Enumerable.Range(1, 50).Select(i => 0.5 * i)];
        double[] powers = [.. speeds.Select(v => 1000 * v)];
        // Sum of (F_i - F_(i-1)) (V_(i-1) + V_i)/2 = F_n (V_n - 1/4) - 1/2 sum of F_i below n, by Abel's summation with equal steps.
        var below = speeds[..^1].Sum(climate.Cumulative);
        var closed = 1000 * ((climate.Cumulative(25) * (25 - 0.25)) - (0.5 * below));
        Assert.Equal(8760.0 * 3600 * closed, AnnualEnergy.OfBins(speeds, powers, climate), 1e-6 * closed * 8760 * 3600);
    }

    /// <summary>
    /// The integral of c V f(V) from 0 to n = 25 m/s is c Vm erf(x) - c n exp(-x^2), x = sqrt(pi)/2 n/Vm, by parts; error function of key mathnet. The
    /// sum in bins of width h differs from it by c h^2 f(n)/12 and terms of h^4.
    /// </summary>
    [Theory]
    [InlineData(5)]
    [InlineData(7.5)]
    [InlineData(10)]
    public void The_bin_sum_of_a_straight_line_is_its_integral_over_the_distribution_of_Rayleigh(double mean)
    {
        const double PowerPerWind = 1000, Last = 25;
        double[] speeds = [.. Enumerable.Range(1, 50).Select(i => 0.5 * i)];
        var x = Math.Sqrt(Math.PI) / 2 * Last / mean;
        var integral = PowerPerWind * ((mean * SpecialFunctions.Erf(x)) - (Last * Math.Exp(-x * x)));
        var summed = AnnualEnergy.OfBins(speeds, [.. speeds.Select(v => PowerPerWind * v)], new WindClimate.Weibull(mean, 2));
        output.WriteLine($"{summed / (8760 * 3600 * integral) - 1:E2}");
        Assert.Equal(8760.0 * 3600 * integral, summed, 1e-5 * summed);
    }

    /// <summary>The same for another shape: c A g(1 + 1/k, (n/A)^k), g the lower incomplete gamma function of key mathnet.</summary>
    [Theory]
    [InlineData(1.8)]
    [InlineData(2.5)]
    [InlineData(3)]
    public void The_bin_sum_of_a_straight_line_is_its_integral_over_a_Weibull_climate(double shape)
    {
        const double PowerPerWind = 1000, Last = 25, Mean = 7.5;
        double[] speeds = [.. Enumerable.Range(1, 50).Select(i => 0.5 * i)];
        var scale = Mean / SpecialFunctions.Gamma(1 + (1 / shape));
        var integral = PowerPerWind * scale * SpecialFunctions.GammaLowerIncomplete(1 + (1 / shape), Math.Pow(Last / scale, shape));
        var summed = AnnualEnergy.OfBins(speeds, [.. speeds.Select(v => PowerPerWind * v)], new WindClimate.Weibull(Mean, shape));
        output.WriteLine($"{summed / (8760 * 3600 * integral) - 1:E2}");
        Assert.Equal(8760.0 * 3600 * integral, summed, 2e-5 * summed);
    }

    [Fact]
    public void A_histogram_is_spread_evenly_within_its_bins()
    {
        var climate = new WindClimate.Histogram([0, 4, 8, 12], [0.25, 0.5, 0.25]);
        Assert.Equal([0, 0.125, 0.25, 0.5, 0.75, 1, 1], new[] { 0, 2, 4, 6, 8.0, 12, 30 }.Select(climate.Cumulative));
    }

    [Fact]
    public void A_curve_is_brought_to_multiples_of_half_a_metre_a_second()
    {
        var (speeds, powers) = Steady((3.2, 0), (4.2, 10), (5.1, 19)).Bins();
        Assert.Equal([3.5, 4, 4.5, 5], speeds);
        Assert.Equal([3, 8, 13, 18], powers.Select(p => Math.Round(p, 9)));
    }

    [Fact]
    public void Between_its_rows_a_cubic_curve_is_followed_and_a_kink_stays_a_kink()
    {
        (double, double, bool)[] rows = [.. Enumerable.Range(6, 40).Select(i => 0.5 * i)
            .Select(v => (v, Math.Min(v * v * v, 1331), v == 11))];
        var steady = SteadyPower.FromNodes(rows);
        // A straight line between the rows would miss the cubic by 0.1 to 1 %.
        foreach (var v in new[] { 4.25, 6.1, 8.75, 9.9 })
            Assert.Equal(v * v * v, steady.At(v), 2e-4 * v * v * v);
        Assert.Equal(1331, steady.At(11.2), 1e-9);
        Assert.Equal([3, 11, 22.5], steady.Joints.ToArray());
    }

    [Fact]
    public void Outside_its_wind_speeds_a_machine_makes_nothing_below_and_its_last_power_in_a_gust_above()
    {
        var steady = Steady((4, 10), (5, 20));
        Assert.Equal((0, 20), (steady.At(3.99), steady.At(30)));
    }

    [Fact]
    public void Beside_a_point_without_a_balance_no_power_is_known_and_its_bins_are_named()
    {
        var steady = Steady((4, 10), (4.5, 20), (5, 30), (5.5, double.NaN), (6, 50), (6.5, 60), (7, 70));
        Assert.Equal([30, double.NaN, double.NaN, 50], new[] { 4.999999999, 5.2, 5.7, 6 }.Select(v => Math.Round(steady.At(v), 6)));
        var energy = EnergyYield.Of(steady, new Site(new WindClimate.Weibull(7, 2), 2, 1, []), TurbulenceIntensity.Constant(0.1), 70);
        Assert.Equal([5, 5.5], energy.MissingBins.ToArray());
        Assert.All(energy.Rows, row => Assert.Equal((null, null), (row.Steady, row.Turbulent)));
    }

    [Fact]
    public void A_year_is_that_of_the_site_and_of_eight_mean_wind_speeds()
    {
        var steady = Steady((4, 1e5), (12, 2e6), (25, 2e6));
        var site = new Site(new WindClimate.Histogram([0, 10, 20], [0.6, 0.4]), 2, 0.9, [("wakes", 0.1), ("grid", 0.5)]);
        var energy = EnergyYield.Of(steady, site, null, 2e6);
        Assert.Equal([9, 4, 5, 6, 7, 8, 9, 10, 11], energy.Rows.Select(row => row.Climate.Mean));
        var year = energy.Rows[0].Steady!;
        Assert.Equal(year.Gross * 0.9 * 0.9 * 0.5, year.Net, 1e-6 * year.Net);
        Assert.Equal(year.Net / 2e6, year.FullLoadTime!.Value, 1e-6 * year.Net / 2e6);
        Assert.Null(EnergyYield.Of(steady, site, null, null).Rows[0].Steady!.CapacityFactor);
    }

    [Fact]
    public void Turbulence_intensity_is_linear_between_its_rows()
    {
        var turbulence = new TurbulenceIntensity([(5, 0.2), (15, 0.1)]);
        Assert.Equal([0.2, 0.2, 0.15, 0.1, 0.1], new[] { 2, 5, 10.0, 15, 30 }.Select(v => Math.Round(turbulence.At(v), 12)));
    }

    private static SteadyPower Steady(params (double, double)[] rows) => SteadyPower.FromNodes([.. rows.Select(r => (r.Item1, r.Item2, false))]);

    [Theory]
    [InlineData(0.05)]
    [InlineData(0.15)]
    [InlineData(0.25)]
    public void Turbulence_raises_an_unlimited_cubic_by_three_times_its_square(double intensity)
    {
        var mean = TurbulentPower.Mean(v => v * v * v, [], 9, intensity);
        // Wind below 0 is left out; at these intensities it is beyond 4 deviations, some 1e-5 of the time, with little power.
        Assert.Equal(729 * (1 + (3 * intensity * intensity)), mean, 729 * 1e-6);
        output.WriteLine($"intensity {intensity}: {mean} against {729 * (1 + (3 * intensity * intensity))}");
    }

    [Fact]
    public void Turbulence_rounds_the_knee_of_a_curve_and_no_turbulence_leaves_it()
    {
        static double Curve(double v) => Math.Min(v * v * v, 1000);
        Assert.Equal(1000, TurbulentPower.Mean(Curve, [10], 10, 0));
        // At the knee half the time is at 1000 and half below: the mean of the lower half by the integral of the normal distribution.
        var mean = TurbulentPower.Mean(Curve, [10], 10, 0.1);
        const double Sigma = 1;
        var half = 0.5 * ((10 * 10 * 10) + (3 * 10 * Sigma * Sigma));
        var first = Sigma / Math.Sqrt(2 * Math.PI) * ((3 * 10 * 10) + (2 * Sigma * Sigma));
        Assert.Equal(500 + half - first, mean, 1e-6);
    }

    [Fact]
    public void Both_ways_to_another_density_are_those_of_the_standard()
    {
        // key iec61400-12-1, from memory.
        Assert.Equal(1100 * 1.225 / 1.1, DensityNormalisation.Power(1100, 1.1, 1.225), 1e-12);
        Assert.Equal(10 * Math.Pow(1.1 / 1.225, 1.0 / 3), DensityNormalisation.WindSpeed(10, 1.1, 1.225), 1e-12);
    }
}
