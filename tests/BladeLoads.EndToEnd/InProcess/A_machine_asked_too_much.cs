using BladeLoads.Batch.Tests.Building;
using BladeLoads.Commands;
using BladeLoads.EndToEnd.Program;
using BladeLoads.Results.Publishing;
using BladeLoads.Rotor.Operation;
using BladeLoads.Studies;

namespace BladeLoads.EndToEnd.InProcess;

/// <summary>Cases that can be read and not be met: their curves are made where that is honest, and say where they are not met.</summary>
public sealed class A_machine_asked_too_much : IDisposable
{
    private readonly TemporaryFolder _folder = new();
    private readonly string _study;

    public A_machine_asked_too_much()
    {
        _study = Path.Join(_folder.Path, "beck");
        BeckStudy.Write(_study);
        // A machine of variable speed; the starting values are those of a fixed speed.
        var start = Path.Join(_study, "study.toml");
        File.WriteAllText(start, File.ReadAllText(start)
            .Replace("strategy        = \"fixed-speed\"\nrotor_speed_rpm = 34\npitch_deg       = 0.0\n", "", StringComparison.Ordinal)
            .Replace("baseline = \"clean\"\n", "", StringComparison.Ordinal));
        foreach (var name in new[] { "clean", "thin-air", "slow" })
            File.Delete(Path.Join(_study, "cases", $"{name}.toml"));
    }

    public void Dispose() => _folder.Dispose();

    [Theory]
    [InlineData("rated_power_kW = 5000", "rated-not-reached", "Case asked never makes its rated power of 5000 kW: the most is ")]
    [InlineData("rated_power_kW = 200\nthrust_limit_kN = 10", "rated-not-reached", "Case asked never makes its rated power of 200 kW: the most is ")]
    public void Rated_power_that_is_never_made_is_marked_where_the_rotor_comes_nearest(string keys, string mark, string warning)
    {
        var (code, error) = Run("max_rotor_speed_rpm = 34\n" + keys);
        Assert.Equal(0, code);
        Assert.Contains(warning, error, StringComparison.Ordinal);
        var rows = Table("power-curve.csv");
        var marked = Assert.Single(rows, r => r["status"].Split(' ').Contains(mark));
        Assert.Equal(rows.Max(r => Number(r, "electrical_power_kW")), Number(marked, "electrical_power_kW"));
        Assert.Contains(mark + ":1", File.ReadAllText(Path.Join(_folder.Path, "results", "beck", "summary.csv")), StringComparison.Ordinal);
        Assert.All(Table("annual-energy.csv"), r => Assert.Contains(mark, r["status"].Split(' ')));
    }

    [Fact]
    public void A_thrust_limit_below_what_feathered_blades_take_is_marked_at_the_wind_speeds_where_it_is_not_held()
    {
        // A rotor that hardly turns, so that its feathered blades take some drag and hold nothing back.
        var (code, error) = Run("max_rotor_speed_rpm = 0.5\nrated_power_kW = 200\nthrust_limit_kN = 0.05");
        Assert.Equal(0, code);
        var rows = Table("power-curve.csv");
        Assert.All(rows, r => Assert.Equal(Number(r, "thrust_kN") > 0.05 * (1 + 1e-6), r["status"].Split(' ').Contains("thrust-not-held")));
        var marked = rows.Count(r => r["status"].Contains("thrust-not-held", StringComparison.Ordinal));
        Assert.InRange(marked, 1, rows.Count - 1);
        Assert.Contains(
            $"Case asked: at {marked} of {rows.Count} points thrust is above its limit even with the blades feathered; they are marked 'thrust-not-held' "
            + "and stand at the pitch with the least thrust; raise thrust_limit_kN, or lower the cut-out wind speed\n",
            error, StringComparison.Ordinal);
    }

    [Fact]
    public void The_largest_thrust_has_one_place_in_every_table_that_names_it()
    {
        Run("max_rotor_speed_rpm = 34\nrated_power_kW = 200\nthrust_limit_kN = 20");
        var summary = Assert.Single(TableOf(Path.Join(_folder.Path, "results", "beck", "summary.csv")));
        var point = Table("design-points.csv").Single(r => r["point"] == "largest thrust");
        Assert.Equal(point["wind_speed_m_s"], summary["largest_thrust_wind_speed_m_s"]);
        Assert.Equal(point["thrust_kN"], summary["largest_thrust_kN"]);
        Assert.True(Table("power-curve.csv").Count(r => Math.Abs(Number(r, "thrust_kN") - 20) < 1e-6) > 1);
    }

    [Fact]
    public void An_edit_of_the_altitude_is_told_by_the_plan_as_it_was_written()
    {
        const string Control = "strategy = \"variable-speed\"\ntip_speed_ratio = 7\nfine_pitch_deg = 0";
        BeckStudy.Case(_study, "asked", $"[control]\n{Control}\n[air]\naltitude_m = 300");
        Assert.Equal(0, Command("run").Code);
        BeckStudy.Case(_study, "asked", $"[control]\n{Control}\n[air]\naltitude_m = 500");
        Assert.StartsWith(
            "asked  out of date: air.altitude_m 300 -> 500; so density 1.19 -> 1.167 kg/m3, viscosity 1.78e-05 -> 1.774e-05 Pa s, "
            + "speed of sound 339.1 -> 338.4 m/s\n",
            Command("plan").Out, StringComparison.Ordinal);
        using var json = System.Text.Json.JsonDocument.Parse(Command("plan", "--json").Out);
        var reasons = json.RootElement.GetProperty("cases")[0].GetProperty("reasons").EnumerateArray().ToList();
        Assert.Equal(["value-changed", "air-followed"], reasons.Select(r => r.GetProperty("kind").GetString()));
        Assert.Equal(
            ["air.density_kg_m3", "air.dynamic_viscosity_Pa_s", "air.speed_of_sound_m_s"],
            reasons[1].GetProperty("values").EnumerateArray().Select(v => v.GetProperty("key").GetString()));
    }

    private (int Code, string Error) Run(string keys)
    {
        BeckStudy.Case(
            _study, "asked", "[control]\nstrategy = \"variable-speed\"\ntip_speed_ratio = 7\nfine_pitch_deg = 0\n" + keys + "\n[site]\nmean_wind_speed_m_s = 7");
        var (code, _, error) = Command("run");
        return (code, error);
    }

    private (int Code, string Out, string Error) Command(string command, params string[] options)
    {
        using var output = new StringWriter { NewLine = "\n" };
        using var error = new StringWriter { NewLine = "\n" };
        var surroundings = new Surroundings(
            output, error, false, false, StudyReader.Read, CaseSolver.Solve, new Disk(), TimeProvider.System, _ => { });
        var code = CommandLine.Run([command, _study, "--results", Path.Join(_folder.Path, "results"), .. options], surroundings);
        return (code, output.ToString(), error.ToString());
    }

    private List<Dictionary<string, string>> Table(string name) => TableOf(Path.Join(_folder.Path, "results", "beck", "asked", name));

    // No cell of these tables holds a comma.
    private static List<Dictionary<string, string>> TableOf(string path)
    {
        var lines = File.ReadAllLines(path);
        var columns = lines[0].Split(',');
        return [.. lines[1..].Select(line => columns.Zip(line.Split(',')).ToDictionary(c => c.First, c => c.Second, StringComparer.Ordinal))];
    }

    private static double Number(Dictionary<string, string> row, string column)
        => double.Parse(row[column], System.Globalization.CultureInfo.InvariantCulture);
}
