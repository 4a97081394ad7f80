using BladeLoads.Rotor.Operation;
using Xunit.Abstractions;
using static BladeLoads.Rotor.Tests.Operation.DeepStallRotor;

namespace BladeLoads.Rotor.Tests.Operation;

/// <summary>
/// The feather branch from the rated wind speed to cut-out in steps of 0.05 m/s, on rotors that at fine pitch stall and make less than rated
/// power at high wind: one pitch a wind speed, and no jump where power falls with pitch at the rated point. What it is held against are plain
/// solutions, a scan over pitch and slopes of power, that know nothing of the search.
/// </summary>
public sealed class FeatherBranchTests(ITestOutputHelper output)
{
    private const double Step = 0.05, CutOut = 25, ScanStepDeg = 0.05;

    private static readonly Machine[] _fallingAtRated = [new(0.75e6, 2, 1.1, 20), new(0.90e6, 3, 1.1, 20), new(2.00e6, 4, 1.4, 20)];
    private static readonly Machine[] _risingAtRated = [new(0.75e6, 0, 1.1, 20), new(0.75e6, -1, 1.1, 20)];
    private static readonly Machine[] _sharplyStalling = [new(0.60e6, 2, 1.1, 6), new(0.55e6, 2, 1.1, 4)];

    /// <summary>Power falls with pitch at the rated point: the branch starts at fine pitch.</summary>
    public static TheoryData<Machine> FallingAtRated => new(_fallingAtRated);

    /// <summary>Power rises with pitch at the rated point: the branch starts with a jump.</summary>
    public static TheoryData<Machine> RisingAtRated => new(_risingAtRated);

    /// <summary>So sharp a stall that an annulus has several balances over much of the branch.</summary>
    public static TheoryData<Machine> SharplyStalling => new(_sharplyStalling);

    [Theory]
    [MemberData(nameof(FallingAtRated))]
    [MemberData(nameof(RisingAtRated))]
    [MemberData(nameof(SharplyStalling))]
    public void At_high_wind_the_rotor_at_fine_pitch_makes_less_than_rated_and_the_branch_makes_rated(Machine machine)
    {
        var held = machine.Branch();
        var fine = CaseSolver.Solve(
            machine.CaseAt([.. held.Points.Select(p => p.Operation.WindSpeed)], machine.Control with { RatedPower = null }), default).Points;

        Assert.True(fine[^1].ElectricalPower < 0.9 * machine.RatedPower, $"{fine[^1].ElectricalPower} W at cut-out");
        Assert.Contains(fine, p => p.ElectricalPower > 1.04 * machine.RatedPower);
        foreach (var point in held.Points)
        {
            var isRated = point.Operation.WindSpeed >= held.RatedWindSpeed;
            Assert.Equal(isRated ? Region.RatedPower : Region.MaximumSpeed, point.Region);
            if (isRated)
                Assert.Equal(machine.RatedPower, point.ElectricalPower, 1e-7 * machine.RatedPower);
            else
                Assert.Equal(machine.Control.FinePitch, point.Operation.Pitch);
        }
    }

    [Theory]
    [MemberData(nameof(FallingAtRated))]
    public void Where_power_falls_with_pitch_at_rated_the_pitch_rises_from_fine_pitch_to_cut_out_without_a_jump(Machine machine)
    {
        var curve = machine.Branch();
        var start = machine.AtFinePitch(curve.RatedWindSpeed!.Value);
        Assert.True(PowerPerPitch(machine.Model(), start) < 0);

        Assert.Empty(JumpsFrom(start, curve, machine));
        Assert.Equal(PointMarks.None, curve.Marks);
        Assert.DoesNotContain(curve.Points, p => (p.Marks & (PointMarks.PitchJump | PointMarks.PowerJump)) != 0);
    }

    /// <summary>Every row of one machine, every tenth of the others: a row takes a thousand solutions.</summary>
    [Fact]
    public void No_pitch_above_the_branch_makes_rated_power_and_the_next_below_it_does()
    {
        Machine[] machines = [.. _fallingAtRated, .. _risingAtRated];
        var rows = machines.SelectMany((machine, i) => machine.RatedRows(i == 0 ? 1 : 10).Select(row => (machine, row))).ToArray();
        Assert.True(rows.Length > 400, $"{rows.Length} rows");
        Parallel.ForEach(rows, at => AssertLargestRatedPitch(at.machine.Model(), at.row, at.machine.RatedPower));
    }

    /// <summary>Here rated power may be made beside a jump only, on a stretch narrower than the steps of the scan.</summary>
    [Fact]
    public void In_sharp_stall_no_pitch_above_the_branch_makes_rated_power_either()
    {
        var rows = _sharplyStalling.SelectMany(machine => machine.RatedRows(10).Select(row => (machine, row))).ToArray();
        Assert.True(rows.Length > 60, $"{rows.Length} rows");
        Parallel.ForEach(rows, at => Assert.True(
            LargestRatedPitchDeg(at.machine.Model(), at.row, at.machine.RatedPower) <= (at.row.Pitch / Degree) + 1e-9, $"{at}"));
    }

    [Theory]
    [MemberData(nameof(RisingAtRated))]
    public void Where_power_rises_with_pitch_at_rated_the_first_row_of_the_branch_alone_is_marked_and_no_other_jumps(Machine machine)
    {
        var curve = machine.Branch();
        var model = machine.Model();
        var fine = machine.AtFinePitch(curve.RatedWindSpeed!.Value);
        Assert.True(PowerPerPitch(model, fine) > 0);

        var first = curve.Points.Select(p => p.Operation.WindSpeed).First(v => v >= fine.WindSpeed);
        Assert.Equal([first], curve.Points.Where(p => (p.Marks & PointMarks.PitchJump) != 0).Select(p => p.Operation.WindSpeed));
        Assert.Equal(PointMarks.PitchJump, curve.Marks);
        // At the rated wind speed itself the branch begins where the scan finds rated power, by a jump away from fine pitch.
        var beginning = CaseSolver.Solve(machine.CaseAt([fine.WindSpeed, CutOut]), default).Points[0].Operation;
        output.WriteLine($"{fine.WindSpeed:F4} m/s: from {fine.Pitch / Degree:F3} to {beginning.Pitch / Degree:F3} degrees");
        AssertLargestRatedPitch(model, beginning, machine.RatedPower);
        Assert.True(beginning.Pitch > fine.Pitch + Degree);

        Assert.Empty(JumpsFrom(beginning, curve, machine));
    }

    [Theory]
    [MemberData(nameof(RisingAtRated))]
    public void Pitch_followed_where_the_speed_is_limited_leaves_no_jump_to_mark(Machine machine)
    {
        var control = machine.Control with { SpeedLimitedPitch = SpeedLimitedPitch.Best };
        var rated = CaseSolver.Solve(machine.CaseAt([CutOut], control), default).RatedWindSpeed!.Value;
        // From the most power there is, pitch departs with the square root of the wind speed: a tenth of the distance, a third of the step.
        double[] winds = [rated - 1e-6, rated + 1e-6, rated + 1e-5, rated + 1e-4, rated + 1e-3, rated + 1, 16, CutOut];
        var curve = CaseSolver.Solve(machine.CaseAt(winds, control), default);
        Assert.Equal(PointMarks.None, curve.Marks);
        Assert.DoesNotContain(curve.Points, p => (p.Marks & PointMarks.PitchJump) != 0);
        Assert.Equal(Region.MaximumSpeed, curve.Points[0].Region);
        Assert.All(curve.Points[1..], p => Assert.Equal(Region.RatedPower, p.Region));
        var stepsDeg = curve.Points.Skip(1).Select(p => (p.Operation.Pitch - curve.Points[0].Operation.Pitch) / Degree).ToArray();
        output.WriteLine(string.Join(", ", stepsDeg.Select(s => $"{s:F4}")));
        Assert.InRange(stepsDeg[0], 0, 0.03);
        Assert.All(Enumerable.Range(1, 3), i => Assert.InRange(stepsDeg[i], stepsDeg[i - 1], 4 * stepsDeg[i - 1]));
        Assert.All(curve.Points[4..], p => AssertLargestRatedPitch(machine.Model(), p.Operation, machine.RatedPower));
    }

    [Theory]
    [MemberData(nameof(SharplyStalling))]
    public void In_sharp_stall_the_pitch_jumps_only_beside_rows_that_tell_of_several_balances(Machine machine)
    {
        var curve = machine.Branch();
        var jumps = JumpsFrom(machine.AtFinePitch(curve.RatedWindSpeed!.Value), curve, machine);
        Assert.NotEmpty(jumps);
        Assert.All(jumps, jump => Assert.True((jump.Marks & PointMarks.SeveralBalances) != 0, jump.Text));
    }

    private static void AssertLargestRatedPitch(RotorModel model, OperatingPoint row, double ratedPower)
    {
        var (pitchDeg, scannedDeg) = (row.Pitch / Degree, LargestRatedPitchDeg(model, row, ratedPower));
        Assert.True(
            pitchDeg >= scannedDeg - 1e-9 && pitchDeg < scannedDeg + ScanStepDeg,
            $"{row.WindSpeed} m/s: pitch {pitchDeg}, the scan makes rated power at {scannedDeg}");
    }

    /// <summary>Down from 90 degrees, the first pitch at which a plain solution makes rated power; NaN where none does.</summary>
    private static double LargestRatedPitchDeg(RotorModel model, OperatingPoint row, double ratedPower)
    {
        for (var i = 0; i <= 2000; i++)
            if (model.Solve(row with { Pitch = (90 - (ScanStepDeg * i)) * Degree })!.Power >= ratedPower * (1 - 1e-9))
                return 90 - (ScanStepDeg * i);
        return double.NaN;
    }

    /// <summary>
    /// The steps from row to row that the slopes of power at their two ends do not account for, to 5 %: slopes bend, most where the branch
    /// begins. With them the marks of either row.
    /// </summary>
    private static List<(PointMarks Marks, string Text)> JumpsFrom(OperatingPoint start, PowerCurve curve, Machine machine)
    {
        const double Bend = 0.05, Resolution = 0.01 * Degree;
        var jumps = new List<(PointMarks, string)>();
        var model = machine.Model();
        var (before, marksBefore) = (start, PointMarks.None);
        foreach (var row in curve.Points.Where(p => p.Operation.WindSpeed > start.WindSpeed))
        {
            var here = row.Operation;
            var wind = here.WindSpeed - before.WindSpeed;
            var (a, b) = (wind * PitchPerWind(model, before), wind * PitchPerWind(model, here));
            var step = here.Pitch - before.Pitch;
            if (step < (Math.Min(a, b) * (1 - Bend)) - Resolution || step > (Math.Max(a, b) * (1 + Bend)) + Resolution)
                jumps.Add((row.Marks | marksBefore,
                    $"{before.WindSpeed} to {here.WindSpeed} m/s: {step / Degree} degrees, by the slopes {a / Degree} to {b / Degree}"));
            (before, marksBefore) = (here, row.Marks);
        }
        Assert.Equal(CutOut, before.WindSpeed);
        return jumps;
    }

    private static double PitchPerWind(RotorModel model, OperatingPoint at)
    {
        const double Wind = 1e-4;
        var perWind = model.Solve(at with { WindSpeed = at.WindSpeed + Wind })!.Power - model.Solve(at with { WindSpeed = at.WindSpeed - Wind })!.Power;
        return -perWind / (2 * Wind) / PowerPerPitch(model, at);
    }

    private static double PowerPerPitch(RotorModel model, OperatingPoint at)
    {
        const double Pitch = 1e-5;
        return (model.Solve(at with { Pitch = at.Pitch + Pitch })!.Power - model.Solve(at with { Pitch = at.Pitch - Pitch })!.Power) / (2 * Pitch);
    }

    /// <summary>W; degrees; rad/s; degrees. Its rotor is at top speed long before it is at rated power.</summary>
    public sealed record Machine(double RatedPower, double FinePitchDeg, double MaxRotorSpeed, double DropWidthDeg)
    {
        internal Control.VariableSpeed Control => InventedRotor.VariableSpeed(RatedPower, FinePitchDeg, maxRotorSpeed: MaxRotorSpeed);

        internal OperatingPoint AtFinePitch(double windSpeed) => new(windSpeed, MaxRotorSpeed, Control.FinePitch!.Value);

        internal RotorCase CaseAt(double[] windSpeeds, Control? control = null) => Case(control ?? Control, windSpeeds, DropWidthDeg);

        internal RotorModel Model() => new(CaseAt([CutOut]));

        /// <summary>Every so many of the rows of the branch at rated power.</summary>
        internal OperatingPoint[] RatedRows(int every)
            => [.. Branch().Points.Where(p => p.Region == Region.RatedPower).Where((_, i) => i % every == 0).Select(p => p.Operation)];

        /// <summary>Three rows below the rated wind speed and all from there to cut-out, on multiples of the step.</summary>
        internal PowerCurve Branch()
        {
            var rated = CaseSolver.Solve(CaseAt([CutOut]), default).RatedWindSpeed!.Value;
            var first = (int)Math.Floor(rated / Step) - 2;
            double[] winds = [.. Enumerable.Range(first, (int)Math.Round(CutOut / Step) - first + 1).Select(i => Math.Round(Step * i, 2))];
            return CaseSolver.Solve(CaseAt(winds), default);
        }
    }
}
