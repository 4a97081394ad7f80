using BladeLoads.Batch.Logs;
using BladeLoads.Batch.Tests.Building;
using BladeLoads.Rotor.Operation;

namespace BladeLoads.Batch.Tests.Logs;

/// <summary>What a case's log says of a machine that does not do what its case asks for.</summary>
public sealed class CaseEventsTests : IDisposable
{
    private readonly TemporaryFolder _folder = new();

    public void Dispose() => _folder.Dispose();

    [Fact]
    public void Rated_power_that_is_never_made_is_a_warning_with_the_most_and_what_to_look_at()
        => Assert.Contains(
            "WRN Case clean never makes its rated power of 5000 kW: the most is 2.7 kW, at 3 m/s, and the row with the most is marked "
            + "'rated-not-reached'; see which of rated power, rotor-speed limit, fine pitch, thrust limit and efficiency is not meant so",
            Lines(curve => curve with { RatedWindSpeed = null, Marks = PointMarks.RatedNotReached }));

    [Fact]
    public void A_thrust_limit_that_is_not_held_is_a_warning_with_what_would_do()
        => Assert.Contains(
            "WRN Case clean: at 1 of 3 points thrust is above its limit even with the blades feathered; they are marked 'thrust-not-held' and "
            + "stand at the pitch with the least thrust; raise thrust_limit_kN, or lower the cut-out wind speed",
            Lines(curve => curve with { Points = curve.Points.SetItem(2, FellRotor.Point(3, marks: PointMarks.ThrustNotHeld)) }));

    [Fact]
    public void A_case_without_a_rated_power_is_told_without_a_warning()
    {
        var lines = Lines(curve => curve with { RatedWindSpeed = null }).ToList();
        Assert.Contains("INF Case clean has no rated wind speed", lines);
        Assert.DoesNotContain(lines, line => line.StartsWith("WRN", StringComparison.Ordinal));
    }

    // Each line without its time.
    private IEnumerable<string> Lines(Func<PowerCurve, PowerCurve> change)
    {
        var results = Runs.Results(_folder);
        var rotor = FellRotor.Rotor() with { Control = new Control.FixedSpeed(2, 0, 5e6) };
        Assert.Equal(1, Runs.Solve(results, [FellRotor.Case("clean", rotor)], (r, _) => change(FellRotor.Curve(r))).Solved);
        return File.ReadAllLines(Path.Join(results.Case("clean"), CaseLog.FileName)).Select(line => line["2026-12-01 21:04:55.000 +00:00 ".Length..]);
    }
}
