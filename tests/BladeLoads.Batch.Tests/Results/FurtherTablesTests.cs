using System.Text;
using BladeLoads.Batch.Tests.Building;
using BladeLoads.Results.Tables;
using BladeLoads.Rotor.Energy;
using BladeLoads.Rotor.Loads;
using BladeLoads.Rotor.Operation;
using BladeLoads.Studies;

namespace BladeLoads.Batch.Tests.Results;

/// <summary>Tables beside the power curve; the numbers are invented or worked by hand.</summary>
public sealed class FurtherTablesTests : IDisposable
{
    private readonly TemporaryFolder _folder = new();

    public void Dispose() => _folder.Dispose();

    [Fact]
    public void A_design_point_stands_with_its_name_before_the_columns_of_the_curve()
    {
        var curve = new PowerCurve(
            [], null, null, [new DesignPoint("largest thrust", FellRotor.Point(2, marks: PointMarks.ThrustNotHeld))], PointMarks.None, 1);

        var lines = Lines(DesignPointsTable.Write(curve, null));

        Assert.StartsWith("point,wind_speed_m_s,rotor_speed_rpm,", lines[0], StringComparison.Ordinal);
        Assert.Equal("largest thrust,2,30,1,15.5,31,0.38,0.8,0.05,2,1.8,4,0.3,7,-0.1,5.8,0.05,fixed speed,thrust-not-held,-0.1,2,5,7.5,0.25,", lines[1]);
    }

    [Fact]
    public void A_surface_marks_its_best_pair_and_leaves_an_unbalanced_one_blank()
    {
        var surface = new CoefficientSurface(
            [
                new SurfacePoint(7, -Math.PI / 90, null, ElementMarks.Unbalanced),
                new SurfacePoint(7, 0, FellRotor.Loads(2), ElementMarks.OutsideReynolds),
            ], 1);

        Assert.Equal(
            [
                "tip_speed_ratio,pitch_deg,power_coefficient,thrust_coefficient,torque_coefficient,best,status",
                "7,-2,,,,,unbalanced", "7,0,0.38,0.8,0.05,yes,outside-reynolds",
            ],
            Lines(SurfaceTable.Write(surface)));
    }

    [Fact]
    public void Energies_are_in_megawatt_hours_and_hours()
    {
        var year = new YearOfEnergy(7.2e12, 3.6e12, 0.25);
        var energy = new EnergyYield([], [new(new WindClimate.Weibull(7.5, 2.1), year, null), new(new WindClimate.Weibull(4, 2.1), year, year)]);

        Assert.Equal(
            [
                "climate,mean_wind_speed_m_s,weibull_shape,gross_energy_MWh,net_energy_MWh,capacity_factor,full_load_hours,"
                    + "turbulent_gross_energy_MWh,turbulent_net_energy_MWh,turbulent_capacity_factor,turbulent_full_load_hours,status",
                "site,7.5,2.1,2000,1000,0.25,2190,,,,,",
                "mean wind speed,4,2.1,2000,1000,0.25,2190,2000,1000,0.25,2190,",
            ],
            Lines(EnergyTable.Write(energy, FellRotor.Curve(FellRotor.Rotor()))));
    }

    [Fact]
    public void Bins_that_are_missing_are_named_and_the_energy_is_blank()
    {
        var energy = new EnergyYield([11.5, 12], [new(new WindClimate.Histogram([0, 20], [1]), null, null)]);

        Assert.Equal("site,10,,,,,,,,,,missing-bins:11.5/12", Lines(EnergyTable.Write(energy, FellRotor.Curve(FellRotor.Rotor())))[1]);
    }

    [Fact]
    public void A_year_of_points_that_break_what_the_case_asks_for_says_so()
    {
        var energy = new EnergyYield([], [new(new WindClimate.Histogram([0, 20], [1]), new YearOfEnergy(3.6e9, 3.6e9, null), null)]);
        var curve = FellRotor.Curve(FellRotor.Rotor(), PointMarks.ExceedsRated | PointMarks.OutsideReynolds);

        Assert.Equal("site,10,,1,1,,,,,,,exceeds-rated", Lines(EnergyTable.Write(energy, curve))[1]);
    }

    [Fact]
    public void A_curve_stands_at_another_density_by_three_ways()
    {
        // Power is 900 V: at half the density the same power comes at V/2^(1/3), and a row at V reads 900 V 2^(1/3).
        PowerCurve Curve(double factor) => new(
            [.. new[] { 4.0, 5, 6, 30 }.Select(v => FellRotor.Point(v, marks: v > 25 ? PointMarks.AboveCutOut : PointMarks.None) with
            {
                ElectricalPower = factor * 900 * v,
            })],
            null, null, [], PointMarks.None, 1);

        var rows = Lines(NormalisationTable.Write(Curve(1), 0.6, Curve(2.1), 1.2)).Select(line => line.Split(',')).ToList();

        Assert.Equal(4, rows.Count); // a header, and no row for a rotor at rest
        Assert.Equal(["4", "3.6", "7.2"], rows[1][..3]);
        Assert.Equal(4 / Math.Cbrt(2), double.Parse(rows[1][3], System.Globalization.CultureInfo.InvariantCulture), 1e-10);
        Assert.Equal(3.6 * Math.Cbrt(2), double.Parse(rows[1][4], System.Globalization.CultureInfo.InvariantCulture), 1e-6);
        Assert.Equal(("", "11.34"), (rows[3][4], rows[3][5])); // 6 m/s reads the curve at 7.56 m/s, beyond its end
    }

    [Fact]
    public void A_case_that_asks_for_everything_has_every_table_and_its_energy_in_the_receipt()
    {
        var asked = FellRotor.Case("all") with
        {
            Further = new FurtherResults(
                new SurfaceGrid([5, 6], [0, 0.1], 8), new Site(new WindClimate.Weibull(2, 2), 2, 1, []), TurbulenceIntensity.Constant(0.1), 1.1),
        };
        var densities = new List<double>();
        var results = Runs.Results(_folder);

        Runs.Solve(results, [asked], (rotor, _) =>
        {
            densities.Add(rotor.Air.Density);
            return FellRotor.Curve(rotor);
        });

        Assert.Equal([1.225, 1.1], densities);
        Assert.Equal(
            [
                "annual-energy.csv", "case.log", "coefficient-surface.csv", "density-normalisation.csv", "design-points.csv", "power-curve.csv",
                "receipt.json", "spanwise.csv",
            ],
            Directory.EnumerateFiles(results.Case("all")).Select(Path.GetFileName).Order(StringComparer.Ordinal));
        Assert.Contains("\"annual_energy_J\"", File.ReadAllText(Path.Join(results.Case("all"), "receipt.json")), StringComparison.Ordinal);
        Assert.DoesNotContain(Lines(File.ReadAllBytes(Path.Join(results.Case("all"), "power-curve.csv"))).Skip(1), line => line.EndsWith(','));
    }

    private static string[] Lines(byte[] table) => Encoding.UTF8.GetString(table).TrimEnd('\n').Split('\n');
}
