using BladeLoads.Rotor.Air;
using BladeLoads.Rotor.Energy;
using BladeLoads.Rotor.Operation;
using BladeLoads.Rotor.Sections;
using Xunit.Abstractions;
using static BladeLoads.Rotor.Tests.Published.PublishedRotor;

namespace BladeLoads.Rotor.Tests.Published;

/// <summary>Energies of published curves, as others summed them or as the standard's formula gives with other tools.</summary>
public sealed class PublishedEnergyTests(ITestOutputHelper output)
{
    private const double MegawattHour = 3.6e9;

    /// <summary>MWh; key iea3mw: energy of a year at the rotor for its steady curve, Weibull shape 2, mean 7.5 m/s, cut-in 4 m/s; read.</summary>
    private const double PublishedOf34MegawattTurbine = 14985.3;

    [Fact]
    public void Energies_of_two_published_curves_are_the_bin_sums_of_the_standard()
    {
        var small = PublishedTable.Read("nrel-5mw/steady-curve.csv");
        var large = PublishedTable.Read("energy/curve-10-mw.csv");
        foreach (var row in PublishedTable.Read("energy/bin-sums.csv").Rows)
        {
            var climate = new WindClimate.Weibull(row["mean_wind_speed_m_s"], 2);
            var energy = OfTable(small, "electrical_power_kW", 1, climate);
            // Half of the last digit printed.
            Assert.Equal(row["energy_5_MW_MWh"], energy, 0.006);
            Assert.Equal(row["capacity_factor_5_MW"], energy / (5 * AnnualEnergy.Hours), 6e-6);
            Assert.Equal(row["energy_10_MW_MWh"], OfTable(large, "rotor_power_kW", 0.94, climate), 0.006);
        }
    }

    /// <summary>
    /// The published curve through our sum. Its own bins are not stated, so 0.7 %: as much as a cut-in of 3 or 4 m/s makes.
    /// </summary>
    [Fact]
    public void The_energy_of_the_published_3_4_MW_curve_is_the_published_one()
    {
        var nodes = PublishedTable.Read("iea-3.4-130/steady-curve.csv").Rows.Where(r => r["wind_speed_m_s"] >= 4)
            .Select(r => (r["wind_speed_m_s"], r["rotor_power_kW"] * 1000, IsJoint: r["wind_speed_m_s"] == 9.8)).ToArray();
        AssertEnergyOf34MegawattTurbine(SteadyPower.FromNodes(nodes), 0.7);
    }

    /// <summary>
    /// Our curve, with the limits of the turbine and nothing else. 1.3 %: the 3 % allowed to its power below rated, on the 44 % of the energy
    /// that is made there. It does not reach 0.7 %; docs/published-curves.md says why.
    /// </summary>
    [Fact]
    public void The_energy_of_our_3_4_MW_curve_is_the_published_one_as_far_as_its_power_is()
        => AssertEnergyOf34MegawattTurbine(Our34MegawattCurve(tiltDeg: 0), 1.3);

    /// <summary>The same with the wind along the axis, as the tilt of 5 degrees leaves it (key iea3mw, read).</summary>
    [Fact]
    public void With_the_tilt_of_the_turbine_the_energy_of_our_3_4_MW_curve_is_the_published_one()
        => AssertEnergyOf34MegawattTurbine(Our34MegawattCurve(tiltDeg: 5), 0.7);

    private void AssertEnergyOf34MegawattTurbine(SteadyPower steady, double percent)
    {
        var year = EnergyYield.Of(steady, new Site(new WindClimate.Weibull(7.5, 2), 2, 1, []), null, 3.6e6).Rows[0].Steady!;
        var energy = year.Gross / MegawattHour;
        var difference = 100 * ((energy / PublishedOf34MegawattTurbine) - 1);
        output.WriteLine($"{energy:F1} MWh, published {PublishedOf34MegawattTurbine}, {difference:+0.00;-0.00} %");
        Assert.InRange(difference, -percent, percent);
        Assert.Equal(energy / (3.6 * 8760), year.CapacityFactor!.Value, 1e-12);
    }

    // The wind along a tilted axis is V cos t. Solved there, at the rotor speed of V, a row belongs to V.
    private static SteadyPower Our34MegawattCurve(double tiltDeg)
    {
        var (blade, sections) = WithBlendedSections("iea-3.4-130", "twist_deg");
        var along = Math.Cos(tiltDeg * Degree);
        double[] winds = [.. Enumerable.Range(8, 43).Select(i => 0.5 * i)];
        var control = new Control.VariableSpeed(
            8.54869 / along, 1.17283 * Degree, 3.76772 * Rpm, 11.753 * Rpm, SpeedLimitedPitch.Hold, 3.6e6, AboveRated.PitchToFeather,
            ThrustLimit: null);
        var curve = CaseSolver.Solve(
            new RotorCase(
                blade, sections, Augmentation.None, 3, 3 * Degree, new AirProperties(1.225, 1.81e-5, 340.29), [.. winds.Select(v => v * along)], control, 0,
                double.PositiveInfinity, Drivetrain.Constant(1), DefaultModel),
            CancellationToken.None);
        var rows = winds.Zip(curve.Points, (wind, point) => (wind, point.ElectricalPower, IsJoint: false));
        var rated = curve.DesignPoints.Single(d => d.Name == DesignPoint.RatedWindSpeed).Point;
        return SteadyPower.FromNodes(
            [.. rows.Append((curve.RatedWindSpeed!.Value / along, rated.ElectricalPower, IsJoint: true)).OrderBy(node => node.Item1)]);
    }

    private static double OfTable(PublishedTable table, string column, double efficiency, WindClimate climate) => AnnualEnergy.OfBins(
        table.Column("wind_speed_m_s"), [.. table.Column(column).Select(power => power * 1000 * efficiency)], climate) / MegawattHour;
}
