using BladeLoads.Rotor.Energy;
using Xunit.Abstractions;

namespace BladeLoads.Rotor.Tests.Published;

/// <summary>Energies of published curves, as others summed them or as the standard's formula gives with other tools.</summary>
public sealed class PublishedEnergyTests(ITestOutputHelper output)
{
    private const double MegawattHour = 3.6e9;

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
    /// key iea3mw: the data set states 14985.3 MWh a year at the rotor and 13936.4 MWh electrical for its steady curve, Weibull shape 2, mean 7.5
    /// m/s, cut-in 4 m/s; read. Its own bins are not stated, so 0.7 %: as much as a cut-in of 3 or 4 m/s makes.
    /// </summary>
    [Fact]
    public void The_energy_of_the_3_4_MW_turbine_is_the_published_one()
    {
        var nodes = PublishedTable.Read("iea-3.4-130/steady-curve.csv").Rows.Where(r => r["wind_speed_m_s"] >= 4)
            .Select(r => (r["wind_speed_m_s"], r["rotor_power_kW"] * 1000, IsJoint: r["wind_speed_m_s"] == 9.8)).ToArray();
        var site = new Site(new WindClimate.Weibull(7.5, 2), 2, 1, []);
        var year = EnergyYield.Of(SteadyPower.FromNodes(nodes), site, null, 3.6e6).Rows[0].Steady!;
        var energy = year.Gross / MegawattHour;
        output.WriteLine($"{energy:F1} MWh, published 14985.3, {100 * ((energy / 14985.3) - 1):+0.00;-0.00} %");
        Assert.InRange(energy, 14985.3 * 0.993, 14985.3 * 1.007);
        Assert.Equal(energy / (3.6 * 8760), year.CapacityFactor!.Value, 1e-12);
    }

    private static double OfTable(PublishedTable table, string column, double efficiency, WindClimate climate) => AnnualEnergy.OfBins(
        table.Column("wind_speed_m_s"), [.. table.Column(column).Select(power => power * 1000 * efficiency)], climate) / MegawattHour;
}
