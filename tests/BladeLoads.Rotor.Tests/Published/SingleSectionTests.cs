using BladeLoads.Rotor.Momentum;
using BladeLoads.Rotor.Operation;
using Xunit.Abstractions;
using static BladeLoads.Rotor.Tests.Published.PublishedRotor;

namespace BladeLoads.Rotor.Tests.Published;

/// <summary>One section worked to machine precision elsewhere; what it is stands in the data file.</summary>
public sealed class SingleSectionTests(ITestOutputHelper output)
{
    [Fact]
    public void A_section_worked_elsewhere_is_reproduced_to_six_digits()
    {
        var section = OneAnnulus.StraightLift(0.4, 0.1 / Degree, drag: 0.008);
        foreach (var row in PublishedTable.Read("momentum/single-section.csv").Rows)
        {
            // From 18 m to the tip at 31 m: the middle of the one element is 24.5 m.
            var model = OneAnnulus.WithoutLoss with { TipLoss = row.Text("loss") == "prandtl", HeavyLoading = HeavyLoading.Buhl2005 };
            var e = OneAnnulus.Solve(18, 31, 1.5, row["section_angle_deg"] * Degree, section, 3,
                new OperatingPoint(row["wind_speed_m_s"], row["rotor_speed_rad_s"], 0), model);

            var (sin, cos) = Math.SinCos(e.InflowAngle);
            var solidity = 3 * 1.5 / (2 * Math.PI * 24.5);
            var thrust = Math.Pow((1 - e.AxialInduction) / sin, 2) * solidity * (e.LiftCoefficient * cos + e.DragCoefficient * sin);
            output.WriteLine($"{row["wind_speed_m_s"]} m/s, {row["section_angle_deg"]} degrees, loss {row.Text("loss")}:");
            Compare("inflow_angle_deg", e.InflowAngle / Degree);
            Compare("angle_of_attack_deg", e.AngleOfAttack / Degree);
            Compare("axial_induction", e.AxialInduction);
            Compare("tangential_induction", e.TangentialInduction);
            Compare("loss_factor", e.LossFactor);
            Compare("local_thrust_coefficient", thrust);
            Compare("normal_force_N_per_m", e.NormalForcePerLength);
            Compare("tangential_force_N_per_m", e.TangentialForcePerLength);

            void Compare(string column, double reached)
            {
                output.WriteLine($"  {column}: reached {reached:G9}, worked elsewhere {row.Text(column)}");
                Assert.Equal(1, reached / row[column], 1e-6);
            }
        }
    }
}
