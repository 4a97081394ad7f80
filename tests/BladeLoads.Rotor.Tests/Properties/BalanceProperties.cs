using System.Globalization;
using BladeLoads.Rotor.Loads;
using BladeLoads.Rotor.Operation;
using Xunit.Abstractions;

namespace BladeLoads.Rotor.Tests.Properties;

/// <summary>What the balance of every plausible rotor owes its reader.</summary>
public sealed class BalanceProperties(ITestOutputHelper output)
{
    private const int Trials = 10_000;

    // Of the residual, a ratio of speeds of order 1, at an angle closed to 1e-12 rad: a slope of 1e6 would still pass.
    private const double ClosedResidual = 1e-6;

    private static string List(IEnumerable<double> angles)
        => string.Join(", ", angles.Select(angle => angle.ToString("R", CultureInfo.InvariantCulture)));

    [Fact]
    public void Every_element_has_an_answer_or_an_explicit_mark() => FixedSample.ForEach(PlausibleRotors.Trials, Trials, trial =>
    {
        var point = trial.Solve();
        Assert.Equal(trial.Rotor.Model.Elements, point.Elements.Length);
        var marks = PointMarks.None;
        foreach (var element in point.Elements)
        {
            double[] numbers =
            [
                element.InflowAngle, element.AngleOfAttack, element.AxialInduction, element.TangentialInduction, element.LossFactor,
                element.LiftCoefficient, element.DragCoefficient, element.NormalForcePerLength, element.TangentialForcePerLength,
            ];
            if (element.Marks.HasFlag(ElementMarks.Unbalanced))
                Assert.All(numbers, number => Assert.True(double.IsNaN(number), "an unbalanced element shows a number"));
            else
                Assert.All(numbers, number => Assert.True(double.IsFinite(number), "an element without a mark lacks a number"));
            if (element.Marks.HasFlag(ElementMarks.Unbalanced))
                marks |= PointMarks.Unbalanced;
            if (element.Marks.HasFlag(ElementMarks.SeveralBalances))
                marks |= PointMarks.SeveralBalances;
            if (element.Marks.HasFlag(ElementMarks.OutsideAngles))
                marks |= PointMarks.OutsideAngles;
            if (element.Marks.HasFlag(ElementMarks.OutsideReynolds))
                marks |= PointMarks.OutsideReynolds;
        }
        Assert.Equal(marks, point.Marks);
        Assert.Equal(marks.HasFlag(PointMarks.Unbalanced), point.Loads is null);
    });

    [Fact]
    public void A_dense_scan_finds_no_smaller_angle_and_the_same_marks()
    {
        int balanced = 0, several = 0, brake = 0, beyond = 0, unbalanced = 0;
        FixedSample.ForEach(PlausibleRotors.Trials, Trials, trial =>
        {
            var index = trial.Pick % trial.Rotor.Model.Elements;
            var element = trial.Solve().Elements[index];
            var annulus = new IndependentAnnulus(trial.Rotor, trial.Operation, index);
            var balances = DenseScan.Balances(annulus);
            Assert.Equal(balances.Count == 0, element.Marks.HasFlag(ElementMarks.Unbalanced));
            if (balances.Count == 0)
            {
                Interlocked.Increment(ref unbalanced);
                return;
            }
            // 1e-9 rad: both close to 1e-12 or better; the rest is rounding of the residual over its slope.
            Assert.True(Math.Abs(balances[0] - element.InflowAngle) <= 1e-9,
                $"element {index}: inflow angle {element.InflowAngle:R}, the scan finds {List(balances)}");
            Assert.True(balances.Count > 1 == element.Marks.HasFlag(ElementMarks.SeveralBalances),
                $"element {index}: {element.Marks}, the scan finds {List(balances)}");
            Interlocked.Increment(ref balanced);
            if (balances.Count > 1)
                Interlocked.Increment(ref several);
            if (balances[0] < 0)
                Interlocked.Increment(ref brake);
            if (balances[0] > Math.PI / 2)
                Interlocked.Increment(ref beyond);
        });
        output.WriteLine($"{balanced} elements balanced, {several} of them at several angles, {brake} in the propeller-brake state, " +
            $"{beyond} beyond pi/2; {unbalanced} marked unbalanced");
        // A sample without these would show nothing about them.
        Assert.All([several, brake, beyond], count => Assert.True(count > 20, $"only {count} of a kind"));
    }

    [Fact]
    public void Every_balance_is_closed_and_its_numbers_belong_to_it() => FixedSample.ForEach(PlausibleRotors.Trials, Trials, trial =>
    {
        var elements = trial.Solve().Elements;
        for (var i = 0; i < elements.Length; i++)
        {
            var element = elements[i];
            var annulus = new IndependentAnnulus(trial.Rotor, trial.Operation, i);
            Near(annulus.Radius, element.Radius, 1e-12 * annulus.Radius, "radius");
            Near(annulus.Chord, element.Chord, 1e-12 * annulus.Chord, "chord");
            Near(annulus.Twist, element.Twist, 1e-12, "twist");
            Near(annulus.Reynolds, element.Reynolds, 1e-11 * annulus.Reynolds, "Reynolds number");
            if (element.Marks.HasFlag(ElementMarks.Unbalanced))
                continue;
            var (lift, drag) = annulus.Coefficients(element.InflowAngle - annulus.Twist - trial.Operation.Pitch);
            // 1e-9: an angle off by its last digit times the steepest slope of a table, some hundreds a radian.
            Near(lift, element.LiftCoefficient, 1e-9, "lift");
            Near(drag, element.DragCoefficient, 1e-9, "drag");
            Near(annulus.LossFactor(element.InflowAngle), element.LossFactor, 1e-9, "loss factor");
            Near(0, annulus.Residual(element.InflowAngle), ClosedResidual, "residual");
            Assert.True(annulus.IsFlow(element.InflowAngle), $"element {i}: air does not flow as the inflow angle says");
        }

        static void Near(double expected, double actual, double tolerance, string what)
            => Assert.True(Math.Abs(expected - actual) <= tolerance, $"{what}: {actual:R}, from the case {expected:R}");
    });
}
