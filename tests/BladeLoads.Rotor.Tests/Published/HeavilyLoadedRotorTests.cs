using BladeLoads.Rotor.Air;
using BladeLoads.Rotor.Momentum;
using BladeLoads.Rotor.Operation;
using BladeLoads.Rotor.Sections;
using Xunit.Abstractions;
using static BladeLoads.Rotor.Tests.Published.PublishedRotor;

namespace BladeLoads.Rotor.Tests.Published;

/// <summary>
/// Why the 5 MW rotor makes more than its published power at low wind. Key nrel5mw: schedule, efficiency 0.944, cone 2.5 and tilt 5 degrees, from
/// memory. What is found stands in docs/published-curves.md.
/// </summary>
public sealed class HeavilyLoadedRotorTests(ITestOutputHelper output)
{
    private const double Efficiency = 0.944, TiltDeg = 5, ConeDeg = 2.5;

    private static readonly OperatingPoint[] _schedule =
        [new(4, 7.183 * Rpm, 0), new(5, 7.506 * Rpm, 0), new(6, 7.942 * Rpm, 0), new(7, 8.469 * Rpm, 0), new(8, 9.156 * Rpm, 0)];

    /// <summary>So no loss at part load hides in the comparison. Power at 3 m/s is printed to 1.2e-4 of itself.</summary>
    [Fact]
    public void The_published_curve_of_the_5_MW_turbine_has_one_efficiency_at_every_load()
    {
        var model = Model(HeavyLoading.Glauert1935);
        foreach (var row in PublishedTable.Read("nrel-5mw/steady-curve.csv").Rows)
        {
            var wind = row["wind_speed_m_s"];
            var rotorPower = row["power_coefficient"] * 0.5 * 1.225 * wind * wind * wind * model.Area;
            var electrical = Drivetrain.Constant(Efficiency).Electrical(rotorPower) / 1000;
            Assert.Equal(row["electrical_power_kW"], electrical, 1.2e-4 * electrical);
        }
    }

    /// <summary>
    /// Tilt is the wind along the axis, V cos 5: an average round the turn, with the wind in the rotor's plane, is the same within 0.02 %.
    /// </summary>
    [Theory]
    [InlineData(HeavyLoading.Glauert1935, false, 6, 3)]
    [InlineData(HeavyLoading.Buhl2005, false, 3, 3)]
    [InlineData(HeavyLoading.Glauert1935, true, 4, 3)]
    [InlineData(HeavyLoading.Buhl2005, true, 2, 2)]
    public void The_5_MW_rotor_at_low_wind_with_either_relation_for_heavy_loading_without_and_with_tilt(
        HeavyLoading relation, bool tilted, double powerPercent, double thrustPercent)
    {
        foreach (var (wind, power, thrust) in Differences(relation, tilted))
        {
            output.WriteLine($"{wind} m/s: power {power:+0.00;-0.00} %, thrust {thrust:+0.00;-0.00} %");
            Assert.InRange(power, -powerPercent, powerPercent);
            Assert.InRange(thrust, -thrustPercent, thrustPercent);
        }
    }

    /// <summary>
    /// The difference grows from 8 to 4 m/s with the relation of glauert-1935, and not with that of buhl-2005: the outer annuli pass an induction of
    /// 1/3, where the two part.
    /// </summary>
    [Fact]
    public void What_grows_towards_low_wind_is_the_distance_between_the_two_relations()
    {
        var glauert = Differences(HeavyLoading.Glauert1935, tilted: false);
        var buhl = Differences(HeavyLoading.Buhl2005, tilted: false);
        double[] apart = [.. glauert.Zip(buhl).Select(pair => pair.First.Power - pair.Second.Power)];
        output.WriteLine(string.Join(", ", apart.Select(d => $"{d:F2}")));
        Assert.Equal(apart.OrderDescending(), apart);
        Assert.True(glauert[0].Power - glauert[^1].Power > 3, "from 8 to 4 m/s with glauert-1935");
        Assert.InRange(buhl[0].Power - buhl[^1].Power, -2, 0);

        var model = Model(HeavyLoading.Glauert1935);
        double[] inductions = [.. _schedule.Select(point =>
        {
            model.Solve(point);
            return model.Elements.ToArray().MinBy(e => Math.Abs(e.Radius - (0.75 * 63)))!.AxialInduction;
        })];
        output.WriteLine($"axial induction at three quarters of the radius: {string.Join(", ", inductions.Select(a => $"{a:F3}"))}");
        Assert.All(inductions[..^1], a => Assert.True(a > 1.0 / 3));
        Assert.True(inductions[^1] < 1.0 / 3);
    }

    /// <summary>Reached less published, percent, one a wind speed of the schedule.</summary>
    private static (double Wind, double Power, double Thrust)[] Differences(HeavyLoading relation, bool tilted)
    {
        var model = Model(relation);
        var rows = PublishedTable.Read("nrel-5mw/steady-curve.csv").Rows;
        return [.. _schedule.Select(point =>
        {
            var row = rows.Single(r => r["wind_speed_m_s"] == point.WindSpeed);
            var loads = model.Solve(tilted ? point with { WindSpeed = point.WindSpeed * Math.Cos(TiltDeg * Degree) } : point)!;
            return (
                point.WindSpeed, 100 * ((Efficiency * loads.Power / 1000 / row["electrical_power_kW"]) - 1),
                100 * ((loads.Thrust / 1000 / row["thrust_kN"]) - 1));
        })];
    }

    private static RotorModel Model(HeavyLoading relation)
    {
        var (blade, sections) = WithNamedSections("nrel-5mw");
        return new RotorModel(new RotorCase(
            blade, sections, Augmentation.None, 3, ConeDeg * Degree, new AirProperties(1.225, 1.81e-5, 340.29), [8],
            new Control.FixedSpeed(1, 0, RatedPower: null), 0, double.PositiveInfinity, Drivetrain.Constant(1),
            DefaultModel with { HeavyLoading = relation }));
    }
}
