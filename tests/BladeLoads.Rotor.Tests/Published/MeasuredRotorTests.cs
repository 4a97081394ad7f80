using BladeLoads.Rotor.Air;
using BladeLoads.Rotor.Loads;
using BladeLoads.Rotor.Operation;
using Xunit.Abstractions;
using static BladeLoads.Rotor.Tests.Published.PublishedRotor;

namespace BladeLoads.Rotor.Tests.Published;

/// <summary>
/// The two-bladed rotor of 10 m measured in a wind tunnel of 24 m by 37 m; sources and tolerances stand in the data files.
/// </summary>
public sealed class MeasuredRotorTests(ITestOutputHelper output)
{
    private const double Viscosity = 1.8e-5;

    [Theory]
    [InlineData(7, "S")]
    [InlineData(7, "H")]
    [InlineData(10, "H")]
    public void The_measured_rotor_gives_the_torque_of_the_tunnel(double windSpeed, string sequence)
    {
        var row = Record(windSpeed, sequence);
        var torque = Solve(row).Loads!.Torque;

        var difference = 100 * (torque / row["torque_Nm"] - 1);
        output.WriteLine($"{windSpeed} m/s, sequence {sequence}: torque reached {torque:F1} N m, measured {row["torque_Nm"]}, " +
            $"{difference:+0.00;-0.00} %");
        Assert.InRange(difference, -row["tolerance_percent"], row["tolerance_percent"]);
    }

    [Fact]
    public void The_measured_rotor_has_the_normal_force_coefficients_of_the_tunnel_at_mid_blade()
    {
        var elements = Solve(Record(7, "S")).Elements;
        var tipRadius = WithBlendedSections("phase-6", "section_angle_deg").Blade.TipRadius;
        foreach (var row in PublishedTable.Read("phase-6/measured-spanwise.csv").Rows)
        {
            var reached = NormalForceCoefficientAt(row["radius_ratio"] * tipRadius, elements);
            var difference = 100 * (reached / row["normal_force_coefficient"] - 1);
            output.WriteLine($"{row["radius_ratio"]} R: reached {reached:F4}, measured {row["normal_force_coefficient"]}, " +
                $"{difference:+0.00;-0.00} %{(row.Text("tested") == "yes" ? "" : ", for information")}");
            if (row.Text("tested") == "yes")
                Assert.InRange(difference, -5, 5);
        }
    }

    private static PublishedTable.Row Record(double windSpeed, string sequence) => PublishedTable.Read("phase-6/measured.csv").Rows
        .Single(row => row["wind_speed_m_s"] == windSpeed && row.Text("sequence") == sequence);

    private static CurvePoint Solve(PublishedTable.Row row)
    {
        var (blade, sections) = WithBlendedSections("phase-6", "section_angle_deg");
        var operation = new OperatingPoint(row["wind_speed_m_s"], row["rotor_speed_rpm"] * Rpm, Pitch: 0);
        return SolveAt(operation, blade, sections, bladeCount: 2, cone: 0, new AirProperties(row["density_kg_m3"], Viscosity, 340.29), DefaultModel);
    }

    /// <summary>Normal to the chord: cl cos alpha + cd sin alpha, linear between element middles.</summary>
    private static double NormalForceCoefficientAt(double radius, IReadOnlyList<ElementState> elements)
    {
        static double Normal(ElementState e)
            => e.LiftCoefficient * Math.Cos(e.AngleOfAttack) + e.DragCoefficient * Math.Sin(e.AngleOfAttack);
        var outer = elements.TakeWhile(e => e.Radius < radius).Count();
        var (a, b) = (elements[outer - 1], elements[outer]);
        return Normal(a) + (Normal(b) - Normal(a)) * (radius - a.Radius) / (b.Radius - a.Radius);
    }
}
