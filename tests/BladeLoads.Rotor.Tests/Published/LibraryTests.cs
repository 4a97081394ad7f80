using System.Collections.Immutable;
using BladeLoads.Rotor.Air;
using BladeLoads.Rotor.Blades;
using BladeLoads.Rotor.Loads;
using BladeLoads.Rotor.Operation;
using BladeLoads.Rotor.Sections;
using BladeLoads.Rotor.Tests.Properties;
using MathNet.Numerics.Interpolation;
using MathNet.Numerics.RootFinding;
using Xunit.Abstractions;
using static BladeLoads.Rotor.Tests.Published.PublishedRotor;

namespace BladeLoads.Rotor.Tests.Published;

/// <summary>Against a general-purpose numerical library: key mathnet in docs/sources.md.</summary>
public sealed class LibraryTests(ITestOutputHelper output)
{
    [Theory]
    [InlineData("phase-6/polars/s809.csv")]
    [InlineData("iea-15-240/polars/FFA-W3-211.csv")]
    [InlineData("iea-15-240/polars/SNL-FFA-W3-500.csv")]
    [InlineData("nrel-5mw/polars/DU40_A17.csv")]
    [InlineData("nrel-5mw/polars/NACA64_A17.csv")]
    public void A_published_table_is_interpolated_as_by_the_library(string name)
        => output.WriteLine($"{name}: largest difference {LargestDifference(ReadPolar(name)):E1}");

    [Fact]
    public void Random_tables_are_interpolated_as_by_the_library()
    {
        var largest = 0.0;
        for (var i = 0; i < 300; i++)
            largest = Math.Max(largest, LargestDifference(PlausibleSections.Build("s", FixedSample.Draw(PlausibleSections.Shapes, i).Value).Polars[0]));
        output.WriteLine($"300 tables: largest difference {largest:E1}");
    }

    [Fact]
    public void Three_rows_and_turning_points_are_interpolated_as_by_the_library()
    {
        // Ends that the shape holds back: the first secant against the second, one of them flat, a peak, a plateau.
        double[][] lifts = [[0, 1, -1], [0, 1, 1], [1, 1, 0], [0, 1, 1.01], [1, 0, 8], [0, 0, 0], [-1, 5, 4.9]];
        foreach (var lift in lifts)
            LargestDifference(Polar.FromRows(double.NaN, [-0.4, 0.1, 0.3], lift, [0.3, 0.01, 0.2]));
    }

    [Fact]
    public void The_balance_is_where_the_librarys_root_finder_closes_on_the_first_sign_change_of_a_dense_scan()
    {
        const int trials = 1_500;
        var elements = 0;
        FixedSample.ForEach(PlausibleRotors.Trials, trials, trial =>
        {
            var solved = trial.Solve().Elements;
            for (var i = 0; i < solved.Length; i += 3)
            {
                var annulus = new IndependentAnnulus(trial.Rotor, trial.Operation, i);
                var brackets = DenseScan.Brackets(annulus);
                Assert.Equal(brackets.Count == 0, solved[i].Marks.HasFlag(ElementMarks.Unbalanced));
                if (brackets.Count == 0)
                    continue;
                var (low, high) = (Math.Min(brackets[0].Low, brackets[0].High), Math.Max(brackets[0].Low, brackets[0].High));
                var found = Brent.FindRoot(annulus.Residual, low, high, 1e-13, 200);
                // Both close to 1e-12 or better; the rest is rounding of the residual over its slope.
                Assert.True(Math.Abs(found - solved[i].InflowAngle) <= 1e-9, $"element {i}: {solved[i].InflowAngle:R}, the library {found:R}");
                Interlocked.Increment(ref elements);
            }
        });
        output.WriteLine($"{elements} elements of {trials} rotors agree to 1e-9 rad");
        Assert.True(elements > trials);
    }

    /// <summary>
    /// Lift and drag of our interpolation, through a rotor at rest, whose angle of attack is a quarter turn less its pitch; asserts that they
    /// are the library's.
    /// </summary>
    private static double LargestDifference(Polar polar)
    {
        var (first, last) = (polar.Angles[0], polar.Angles[^1]);
        const int count = 400;
        ImmutableArray<OperatingPoint> points = [.. Enumerable.Range(0, count).Select(i =>
            new OperatingPoint(i + 1, 0, Math.PI / 2 - (first + (last - first) * (i + 0.5) / count)))];
        var blade = Blade.FromStations([new BladeStation(1, 0.1, 0, "s"), new BladeStation(2, 0.1, 0, "s")]);
        var rotor = new RotorCase(blade, SectionSet.Of([Section.FromPolars("s", [polar])]), Augmentation.None, 1, 0, new AirProperties(1.2, 1.8e-5, 340.29),
            [.. points.Select(p => p.WindSpeed)], new Control.Schedule(points, RatedPower: null), 0, double.PositiveInfinity, Drivetrain.Constant(1),
            OneAnnulus.WithoutLoss);
        var (lift, drag) = (CubicSpline.InterpolatePchip(polar.Angles, polar.Lift), CubicSpline.InterpolatePchip(polar.Angles, polar.Drag));
        var largest = 0.0;
        foreach (var point in CaseSolver.Solve(rotor, CancellationToken.None).Points)
        {
            var element = Assert.Single(point.Elements);
            // Of numbers of order 1 to 20 with slopes of order 100: last digits, and that of the angle.
            Assert.Equal(lift.Interpolate(element.AngleOfAttack), element.LiftCoefficient, 1e-12);
            Assert.Equal(drag.Interpolate(element.AngleOfAttack), element.DragCoefficient, 1e-12);
            largest = Math.Max(largest, Math.Abs(lift.Interpolate(element.AngleOfAttack) - element.LiftCoefficient));
        }
        return largest;
    }
}
