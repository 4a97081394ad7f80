using System.Collections.Immutable;
using BladeLoads.Rotor.Operation;
using BladeLoads.Rotor.Sections;
using MathNet.Numerics.Interpolation;

namespace BladeLoads.Rotor.Tests.Operation;

/// <summary>
/// The stall margin against the largest lift of the table, found on a fine grid over MathNet's own shape-preserving cubic of the rows.
/// </summary>
public sealed class StallMarginTests
{
    private const double GridStep = 1e-5;  // rad

    [Theory]
    [InlineData(10, 20)]
    [InlineData(12, 5)]
    [InlineData(8, 40)]
    public void Stall_margin_is_the_distance_to_the_largest_lift_of_the_table(double stallDeg, double dropWidthDeg)
    {
        var rotorCase = InventedRotor.Case(InventedRotor.VariableSpeed(), [4, 8, 13], stallDeg: stallDeg, dropWidthDeg: dropWidthDeg);
        AssertMargins(rotorCase, InventedRotor.PolarByFormula(stallDeg: stallDeg, dropWidthDeg: dropWidthDeg));
    }

    [Fact]
    public void Between_two_Reynolds_numbers_it_is_that_of_the_blended_table()
    {
        // Their largest lifts stand at different angles, 8 and 12 degrees.
        ImmutableArray<Polar> polars =
        [
            InventedRotor.PolarByFormula(reynolds: 1e6, stallDeg: 8, dropWidthDeg: 60),
            InventedRotor.PolarByFormula(reynolds: 1e7, stallDeg: 12, dropWidthDeg: 30),
        ];
        var plain = InventedRotor.Case(InventedRotor.VariableSpeed(), [6, 7, 8, 9, 10, 12]);
        AssertMargins(
            plain with { Sections = SectionSet.Of([Section.FromPolars("inboard", polars), Section.FromPolars("outboard", polars)]) }, [.. polars]);
    }

    private static void AssertMargins(RotorCase rotorCase, params Polar[] polars)
    {
        IInterpolation[] lifts = [.. polars.Select(p => CubicSpline.InterpolatePchipSorted([.. p.Angles], [.. p.Lift]))];
        foreach (var point in InventedRotor.Solve(rotorCase))
        {
            // The outer half, without the root; both sections have the same tables.
            var margins = point.Elements.Where(e => e.Radius >= 20)
                .Select(e => (Margin: AngleOfLargestLift(e.Reynolds) - e.AngleOfAttack, e.Radius)).ToArray();
            var (least, radius) = margins.MinBy(m => m.Margin);
            Assert.Equal(least, point.Margins!.StallMargin, GridStep);
            Assert.Equal(least, margins.Single(m => m.Radius == point.Margins.StallRadius).Margin, GridStep);
            if (polars.Length == 1)
            {
                // A single table is largest at one of its rows, and that to the last digits.
                Assert.Equal(polars[0].Angles[polars[0].Lift.IndexOf(polars[0].Lift.Max())] - AngleAt(radius), point.Margins.StallMargin, 1e-12);
                Assert.Equal(radius, point.Margins.StallRadius);
            }

            double AngleAt(double r) => point.Elements.Single(e => e.Radius == r).AngleOfAttack;
        }

        double AngleOfLargestLift(double reynolds)
        {
            var share = polars.Length == 1 ? 0
                : Math.Clamp((Math.Log(reynolds) - Math.Log(polars[0].Reynolds)) / Math.Log(polars[1].Reynolds / polars[0].Reynolds), 0, 1);
            double Lift(double angle)
                => lifts[0].Interpolate(angle) + (share == 0 ? 0 : share * (lifts[1].Interpolate(angle) - lifts[0].Interpolate(angle)));
            // Coarsely over what a blade meets, then finely about the best.
            var about = Enumerable.Range(-900, 1801).Select(i => double.DegreesToRadians(0.1 * i)).MaxBy(Lift);
            return Enumerable.Range(-200, 401).Select(i => about + (i * GridStep)).MaxBy(Lift);
        }
    }
}
