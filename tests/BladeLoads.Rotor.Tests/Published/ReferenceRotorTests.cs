using BladeLoads.Rotor.Air;
using BladeLoads.Rotor.Operation;
using Xunit.Abstractions;
using static BladeLoads.Rotor.Tests.Published.PublishedRotor;

namespace BladeLoads.Rotor.Tests.Published;

/// <summary>Two reference rotors whose performance others computed and published; sources and tolerances stand in the data files.</summary>
public sealed class ReferenceRotorTests(ITestOutputHelper output)
{
    private static readonly AirProperties Air = new(1.225, 1.81e-5, 340.29);

    [Fact]
    public void The_15_MW_rotor_reaches_its_published_power_and_thrust_coefficient_at_tip_speed_ratio_9()
    {
        var (blade, sections) = WithBlendedSections("iea-15-240", "twist_deg");
        var row = Assert.Single(PublishedTable.Read("iea-15-240/operating.csv").Rows);

        var point = SolveAt(Operation(row), blade, sections, bladeCount: 3, cone: 4 * Degree, Air, DefaultModel);

        var loads = Assert.IsType<Loads.RotorLoads>(point.Loads);
        output.WriteLine($"{row["wind_speed_m_s"]} m/s, tip-speed ratio {loads.TipSpeedRatio:F4} ({point.Marks})");
        Within(1, row["power_coefficient"], loads.PowerCoefficient, "power coefficient");
        Within(1, row["thrust_coefficient"], loads.ThrustCoefficient, "thrust coefficient");
    }

    // Thickness of each section by its name; between two of them the published blade blends linearly, a family by its cubic. 0.5 %: no source;
    // the two ways differ by how drag of the thick root is interpolated.
    [Fact]
    public void The_15_MW_rotor_by_thickness_makes_what_it_makes_by_sections()
    {
        var row = Assert.Single(PublishedTable.Read("iea-15-240/operating.csv").Rows);
        var (blade, sections) = WithBlendedSections("iea-15-240", "twist_deg");
        var (byThickness, family) = ByThickness("iea-15-240",
            ("circular", 1), ("SNL-FFA-W3-500", 0.5), ("FFA-W3-360", 0.36), ("FFA-W3-330blend", 0.33), ("FFA-W3-301", 0.301),
            ("FFA-W3-270blend", 0.27), ("FFA-W3-241", 0.241), ("FFA-W3-211", 0.211));

        var named = SolveAt(Operation(row), blade, sections, bladeCount: 3, cone: 4 * Degree, Air, DefaultModel).Loads!;
        var thick = SolveAt(Operation(row), byThickness, family, bladeCount: 3, cone: 4 * Degree, Air, DefaultModel).Loads!;

        Within(0.5, named.PowerCoefficient, thick.PowerCoefficient, "power coefficient by thickness against by sections");
        Within(0.5, named.ThrustCoefficient, thick.ThrustCoefficient, "thrust coefficient by thickness against by sections");
        Within(1, row["power_coefficient"], thick.PowerCoefficient, "power coefficient by thickness");
    }

    [Theory]
    [InlineData(8)]
    [InlineData(15)]
    [InlineData(20)]
    public void The_5_MW_rotor_makes_its_published_power_and_thrust_on_its_schedule(double windSpeed)
    {
        var (blade, sections) = WithNamedSections("nrel-5mw");
        var row = PublishedTable.Read("nrel-5mw/operating.csv").Rows.Single(r => r["wind_speed_m_s"] == windSpeed);

        var point = SolveAt(Operation(row), blade, sections, bladeCount: 3, cone: 2.5 * Degree, Air, DefaultModel);

        var loads = Assert.IsType<Loads.RotorLoads>(point.Loads);
        output.WriteLine($"{windSpeed} m/s ({point.Marks})");
        Within(3, row["rotor_power_kW"], loads.Power / 1000, "rotor power kW");
        Within(3, row["thrust_kN"], loads.Thrust / 1000, "thrust kN");
    }

    private static OperatingPoint Operation(PublishedTable.Row row)
        => new(row["wind_speed_m_s"], row["rotor_speed_rpm"] * Rpm, row["pitch_deg"] * Degree);

    private void Within(double percent, double published, double reached, string what)
    {
        var difference = 100 * (reached / published - 1);
        output.WriteLine($"  {what}: reached {reached:F4}, published {published}, {difference:+0.00;-0.00} %");
        Assert.InRange(difference, -percent, percent);
    }
}
