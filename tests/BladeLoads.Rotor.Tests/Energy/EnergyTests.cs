using BladeLoads.Rotor.Energy;
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

    [Fact]
    public void A_histogram_is_spread_evenly_within_its_bins()
    {
        var climate = new WindClimate.Histogram([0, 4, 8, 12], [0.25, 0.5, 0.25]);
        Assert.Equal([0, 0.125, 0.25, 0.5, 0.75, 1, 1], new[] { 0, 2, 4, 6, 8.0, 12, 30 }.Select(climate.Cumulative));
    }

    [Fact]
    public void A_curve_is_brought_to_multiples_of_half_a_metre_a_second()
    {
        var (speeds, powers) = AnnualEnergy.Resample([3.2, 4.2, 5.1], [0, 10, 19]);
        Assert.Equal([3.5, 4, 4.5, 5], speeds);
        Assert.Equal([3, 8, 13, 18], powers.Select(p => Math.Round(p, 9)));
    }

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
