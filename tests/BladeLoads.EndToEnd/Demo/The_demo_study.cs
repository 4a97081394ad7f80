using System.Globalization;
using System.Text;
using System.Text.RegularExpressions;
using BladeLoads.EndToEnd.Documentation;
using BladeLoads.Results.Tables;
using BladeLoads.Rotor.Operation;
using BladeLoads.Studies;

namespace BladeLoads.EndToEnd.Demo;

/// <summary>What must hold in every row that the demo study writes, for one case of each of its files: every strategy is among them.</summary>
public sealed partial class The_demo_study
{
    private static readonly Study _study = StudyReader.Read(Path.Combine(Repository.Root, "inputs", "tarn-valley"));

    // Numbers are written with 12 digits, and a product of two of them is right to 1e-11.
    private const double Digits = 2e-11;

    public static TheoryData<string> OneOfEachFile => new(_study.Cases.GroupBy(c => c.File).Select(file => file.First().Name));

    [Theory]
    [MemberData(nameof(OneOfEachFile))]
    public void Writes_rows_whose_torque_times_rotor_speed_is_power_and_that_keep_their_limits(string name)
    {
        var rotor = _study.Cases.Single(c => c.Name == name).Rotor;
        var rows = Rows(Encoding.UTF8.GetString(CurveTable.Write(CaseSolver.Solve(rotor, CancellationToken.None))));
        Assert.Equal(rotor.WindSpeeds.Length, rows.Count);
        foreach (var row in rows)
        {
            double Number(string column) => double.Parse(row[column], CultureInfo.InvariantCulture);
            var where = $"{name}, {row["wind_speed_m_s"]} m/s";
            var power = Number("rotor_power_kW");
            Within(power, Number("torque_kNm") * Number("rotor_speed_rpm") * Math.PI / 30, Digits * Math.Abs(power), $"{where}: rotor power");
            var coefficient = Number("power_coefficient");
            Within(
                coefficient, Number("torque_coefficient") * Number("tip_speed_ratio"), Digits * Math.Abs(coefficient),
                $"{where}: power coefficient");
            var electrical = Number("electrical_power_kW");
            Within(rotor.Drivetrain.Electrical(1000 * power) / 1000, electrical, Digits * electrical, $"{where}: electrical power");
            if (rotor.Control.RatedPower / 1000 is { } rated && !row["status"].Contains("exceeds-rated", StringComparison.Ordinal))
                Assert.True(electrical <= rated * (1 + 1e-7), $"{where}: {electrical} kW above rated");
            if (rotor.Control is Control.VariableSpeed { ThrustLimit: { } limit } && !row["status"].Contains("thrust-not-held", StringComparison.Ordinal))
                Assert.True(Number("thrust_kN") <= limit / 1000 * (1 + 1e-6), $"{where}: {row["thrust_kN"]} kN above the limit");
        }
    }

    [Fact]
    public void Holds_rated_power_by_stall_from_its_rated_wind_speed_to_cut_out()
    {
        var rotor = _study.Cases.Single(c => c.Name == "active-stall").Rotor;
        var curve = CaseSolver.Solve(rotor, CancellationToken.None);
        var rated = curve.Points.Where(p => p.Operation.WindSpeed >= curve.RatedWindSpeed).ToArray();
        Assert.Equal(25, rated[^1].Operation.WindSpeed);
        Assert.All(rated, p =>
        {
            Assert.Equal((Region.RatedPower, PointMarks.None), (p.Region, p.Marks));
            Assert.Equal(2e6, p.ElectricalPower, 2e6 * 1e-7);
            // On the side of stall: less pitch, less power.
            Assert.True(p.Margins!.PowerPerPitch > 0);
        });
    }

    [Fact]
    public void Has_as_many_cases_as_its_documents_say()
    {
        var stated = InventedCases().Match(File.ReadAllText(Path.Combine(Repository.Root, "README.md")));
        Assert.Equal(_study.Cases.Length, int.Parse(stated.Groups[1].Value, CultureInfo.InvariantCulture));

        var table = Repository.Lines(Path.Combine("inputs", "tarn-valley", "README.md")).Select(line => CaseRow().Match(line)).Where(m => m.Success)
            .Select(m => (m.Groups[1].Value, int.Parse(m.Groups[2].Value, CultureInfo.InvariantCulture))).Order();
        Assert.Equal(_study.Cases.GroupBy(c => c.File).Select(file => (file.Key, file.Count())).Order(), table);
    }

    [GeneratedRegex(@"with (\d+) invented rotor cases")]
    private static partial Regex InventedCases();

    [GeneratedRegex(@"^\| `(cases/[^`]+)` \| (\d+) \|")]
    private static partial Regex CaseRow();

    private static void Within(double expected, double found, double tolerance, string what)
        => Assert.True(Math.Abs(found - expected) <= tolerance, $"{what} is {found} where {expected} was expected");

    private static List<Dictionary<string, string>> Rows(string table)
    {
        var lines = table.Split('\n', StringSplitOptions.RemoveEmptyEntries).Select(line => line.Split(',')).ToList();
        return [.. lines.Skip(1).Select(cells => lines[0].Zip(cells).ToDictionary(pair => pair.First, pair => pair.Second))];
    }
}
