using System.Diagnostics;
using System.Globalization;
using BladeLoads.Rotor.Operation;
using BladeLoads.Studies;

namespace BladeLoads.Benchmarks;

/// <summary>A grid of tip-speed ratio and pitch at 9 m/s, solved on one core.</summary>
internal static class OperatingGrid
{
    private const string Use = "grid <case.toml> tsr0 tsr1 n_tsr pitch0_deg pitch1_deg n_pitch [print]";
    private const double WindSpeed = 9;

    /// <summary>Prints solves, seconds, nanoseconds an element and a checksum, the sum of all power and thrust coefficients.</summary>
    public static int Solve(string[] args)
    {
        if (args.Length < 7)
        {
            Console.Error.WriteLine(Use);
            return 2;
        }
        double Number(int i) => double.Parse(args[i], CultureInfo.InvariantCulture);
        var rotorCase = StudyReader.Read(args[0]).Cases.Single().Rotor;
        var (ratios, pitches) = (Steps(Number(1), Number(2), (int)Number(3)), Steps(Number(4), Number(5), (int)Number(6)));
        var model = new RotorModel(rotorCase);
        // The first rounds are for the compiler.
        for (var round = 0; round < 3; round++)
            Sum(model, ratios, pitches, print: false);
        var watch = Stopwatch.StartNew();
        var checksum = Sum(model, ratios, pitches, print: args.Length > 7);
        var seconds = watch.Elapsed.TotalSeconds;
        var solves = (long)ratios.Length * pitches.Length * rotorCase.Model.Elements;
        Console.Error.WriteLine(FormattableString.Invariant(
            $"solves {solves} seconds {seconds:F4} ns_per_solve {1e9 * seconds / solves:F1} checksum {checksum:F9}"));
        return 0;
    }

    private static double Sum(RotorModel model, double[] ratios, double[] pitches, bool print)
    {
        var sum = 0.0;
        foreach (var ratio in ratios)
            foreach (var pitchDeg in pitches)
            {
                var point = new OperatingPoint(WindSpeed, ratio * WindSpeed / model.SweptRadius, double.DegreesToRadians(pitchDeg));
                if (model.Solve(point) is not { } loads)
                    continue;
                sum += loads.PowerCoefficient + loads.ThrustCoefficient;
                if (print)
                    Console.WriteLine(FormattableString.Invariant(
                        $"{ratio:F6} {pitchDeg:F6} {loads.PowerCoefficient:F9} {loads.ThrustCoefficient:F9}"));
            }
        return sum;
    }

    private static double[] Steps(double from, double to, int count)
        => [.. Enumerable.Range(0, count).Select(i => count > 1 ? from + ((to - from) * i / (count - 1)) : from)];
}
