using BladeLoads.Rotor.Blades;
using BladeLoads.Rotor.Operation;
using BladeLoads.Rotor.Sections;

namespace BladeLoads.Rotor.Tests.Operation;

public sealed class BestOperationTests
{
    private static double Coefficient(RotorModel model, double ratio, double pitch)
        => model.Solve(new OperatingPoint(BestOperation.WindSpeed, ratio * BestOperation.WindSpeed / model.SweptRadius, pitch))!.PowerCoefficient;

    [Theory]
    [InlineData(10, 20)]
    [InlineData(12, 3)]
    [InlineData(8, 1)]
    public void The_best_pair_is_at_least_as_good_as_a_dense_grid(double stallDeg, double dropWidthDeg)
    {
        var rotorCase = InventedRotor.Case(
            InventedRotor.VariableSpeed(tipSpeedRatio: null, finePitchDeg: null), [8], stallDeg: stallDeg, dropWidthDeg: dropWidthDeg);
        var best = CaseSolver.Solve(rotorCase, default).Best!.Value;
        Assert.True(best.IsSearched);
        var model = new RotorModel(rotorCase);
        var (grid, where) = (0.0, "");
        for (var ratio = 1.0; ratio <= 12; ratio += 0.2)
            for (var deg = -6.0; deg <= 10; deg += 0.25)
                if (Coefficient(model, ratio, double.DegreesToRadians(deg)) is var there && there > grid)
                    (grid, where) = (there, $"{ratio:F2} {deg:F2}");
        Assert.True(best.PowerCoefficient >= grid - 1e-6, $"{best} at {double.RadiansToDegrees(best.Pitch)} below the grid's {grid} at {where}");
        Assert.Equal(Coefficient(model, best.TipSpeedRatio, best.Pitch), best.PowerCoefficient);
        // Within 1e-5: nothing near it is better by more.
        foreach (var (dr, dp) in new[] { (0.01, 0.0), (-0.01, 0), (0, 0.001), (0, -0.001), (0.01, 0.001), (-0.01, -0.001) })
            Assert.True(Coefficient(model, best.TipSpeedRatio + dr, best.Pitch + dp) <= best.PowerCoefficient + 1e-5);
    }

    [Fact]
    public void A_given_one_of_the_pair_stays_and_the_other_is_found()
    {
        var fixedRatio = CaseSolver.Solve(InventedRotor.Case(InventedRotor.VariableSpeed(tipSpeedRatio: 6, finePitchDeg: null), [8]), default);
        Assert.Equal(6, fixedRatio.Best!.Value.TipSpeedRatio);
        var fixedPitch = CaseSolver.Solve(InventedRotor.Case(InventedRotor.VariableSpeed(tipSpeedRatio: null, finePitchDeg: 3), [8]), default);
        Assert.Equal(double.DegreesToRadians(3), fixedPitch.Best!.Value.Pitch);
        var both = CaseSolver.Solve(
            InventedRotor.Case(InventedRotor.VariableSpeed(tipSpeedRatio: null, finePitchDeg: null), [8]), default).Best!.Value;
        Assert.True(both.PowerCoefficient >= fixedRatio.Best!.Value.PowerCoefficient - 1e-9);
        Assert.True(both.PowerCoefficient >= fixedPitch.Best!.Value.PowerCoefficient - 1e-9);
    }

    [Fact]
    public void On_a_rotor_with_two_peaks_the_higher_is_found()
    {
        // Lift of a section with two useful ranges of angle, the further one better, stepped over by a search that only climbs.
        var rotorCase = TwoPeaks();
        var model = new RotorModel(rotorCase);
        var peaks = new List<double>();
        double[] values = [.. Enumerable.Range(0, 241).Select(i => Coefficient(model, 7, double.DegreesToRadians(-12 + (0.1 * i))))];
        for (var i = 1; i < 240; i++)
            if (values[i] > values[i - 1] && values[i] >= values[i + 1] && values[i] > 0.2)
                peaks.Add(values[i]);
        Assert.True(peaks.Count >= 2, $"{peaks.Count} peaks");
        Assert.True(peaks.Max() > peaks.Min() + 0.01);
        var best = CaseSolver.Solve(rotorCase, default).Best!.Value;
        Assert.True(best.PowerCoefficient >= values.Max() - 1e-6, $"{best} below {values.Max()}");
    }

    private static RotorCase TwoPeaks()
    {
        // Drag has two buckets, at 2 and at 8 degrees, so that the best pitch at one tip-speed ratio has two valleys of loss.
        double[] angles = [.. Enumerable.Range(-180, 361).Select(i => (double)i)];
        double Drag(double deg)
        {
            var bucket = Math.Min(Math.Abs(deg - 1) / 1.5, Math.Abs(deg - 9) / 1.5);
            return 0.008 + (0.09 * Math.Min(1, Math.Max(0, bucket - 0.5))) + (1.2 * Math.Pow(Math.Sin(double.DegreesToRadians(deg)), 2));
        }
        double Lift(double deg) => Math.Abs(deg) < 12 ? 0.1 * (deg + 4) : Math.Sin(2 * double.DegreesToRadians(deg));
        var section = Section.FromPolars("two", [Polar.FromRows(
            double.NaN, [.. angles.Select(a => Math.Clamp(double.DegreesToRadians(a), -Math.PI, Math.PI))],
            [.. angles.Select(Lift)], [.. angles.Select(Drag)])]);
        var plain = InventedRotor.Case(InventedRotor.VariableSpeed(tipSpeedRatio: 7, finePitchDeg: null), [8]);
        return plain with
        {
            Blade = Blade.FromStations(plain.Blade.Stations.Select(s => s with { Section = "two" })),
            Sections = SectionSet.Of([section]),
        };
    }
}
