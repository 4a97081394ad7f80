using BladeLoads.Rotor.Loads;
using BladeLoads.Rotor.Momentum;
using CsCheck;

namespace BladeLoads.Rotor.Tests.Properties;

/// <summary>
/// What blades take from the air and what the air has lost are one thing, in every balanced annulus of every plausible rotor.
/// Tolerances: an angle closed to 1e-12 rad leaves a residual, which bends the triangle of speeds by that much; each identity rests on the
/// square of a side of it, so four times the residual, and the last digits of some ten operations.
/// </summary>
public sealed class ConservationProperties
{
    private const int Trials = 10_000;

    [Fact]
    public void Blade_thrust_is_the_momentum_that_the_annulus_loses() => ForEachBalanced(PlausibleRotors.Trials, (trial, annulus, e) =>
    {
        var (a, f) = (e.AxialInduction, e.LossFactor);
        var momentum = 4 * f * a * (1 - a);
        if (e.InflowAngle < 0)
            momentum = 4 * f * a * (a - 1);
        else if (trial.Rotor.Model.HeavyLoading == HeavyLoading.Glauert1935 && a > 1.0 / 3)
            momentum = 4 * f * a * (1 - a * (5 - 3 * a) / 4);
        else if (trial.Rotor.Model.HeavyLoading == HeavyLoading.Buhl2005 && a > 0.4)
            momentum = 8.0 / 9 + (4 * f - 40.0 / 9) * a + (50.0 / 9 - 4 * f) * a * a;

        // The force along the blade's normal that counts in the balance, over rho Vn^2/2 and the annulus.
        var dragCounts = trial.Rotor.Model.BalanceWith == BalanceWith.LiftAndDrag;
        var coefficient = e.LiftCoefficient * Math.Cos(e.InflowAngle) + (dragCounts ? e.DragCoefficient * Math.Sin(e.InflowAngle) : 0);
        var (normal, tangential) = (annulus.NormalWind * (1 - a), annulus.TangentialWind * (1 + e.TangentialInduction));
        var blade = annulus.Solidity * coefficient * (normal * normal + tangential * tangential) / (annulus.NormalWind * annulus.NormalWind);

        return ("thrust coefficient of the annulus", momentum, blade, Math.Max(1, Math.Abs(momentum)));
    });

    [Fact]
    public void Lift_leaves_behind_exactly_the_swirl_that_its_torque_asks_for() => ForEachBalanced(PlausibleRotors.Trials, (trial, annulus, e) =>
    {
        var (a, swirl) = (e.AxialInduction, e.TangentialInduction);
        // The mass flow through the annulus is abs(1 - a), whichever way it goes.
        var wake = 4 * e.LossFactor * swirl * Math.Abs(1 - a) * annulus.NormalWind * annulus.TangentialWind;
        var (normal, tangential) = (annulus.NormalWind * (1 - a), annulus.TangentialWind * (1 + swirl));
        var blade = annulus.Solidity * e.LiftCoefficient * Math.Sin(e.InflowAngle) * (normal * normal + tangential * tangential);
        return ("torque of lift", wake, blade, Math.Max(Math.Abs(wake), annulus.NormalWind * annulus.TangentialWind));
    });

    [Fact]
    public void Lift_alone_gives_back_exactly_the_power_it_takes_from_the_wind()
        => ForEachBalanced(PlausibleRotors.Trials.Select(trial => Without.Drag(trial)), (trial, annulus, e) =>
    {
        // Lift is square to the relative wind, so Fn Vn (1 - a) = Ft Vt (1 + a'): what the wind gives, swirl left behind included.
        var taken = e.NormalForcePerLength * annulus.NormalWind * (1 - e.AxialInduction);
        var given = e.TangentialForcePerLength * annulus.TangentialWind * (1 + e.TangentialInduction);
        var scale = Math.Abs(e.NormalForcePerLength * annulus.NormalWind) + Math.Abs(e.TangentialForcePerLength * annulus.TangentialWind);
        return ("power per length", taken, given, scale);
    });

    [Fact]
    public void The_rotor_is_the_sum_of_its_elements() => FixedSample.ForEach(PlausibleRotors.Trials, Trials, trial =>
    {
        var point = trial.Solve();
        if (point.Loads is not { } loads)
            return;
        var (rotor, wind) = (trial.Rotor, trial.Operation.WindSpeed);
        var (cos, tip, count) = (Math.Cos(rotor.Cone), rotor.Blade.TipRadius, rotor.BladeCount);
        double thrust = 0, torque = 0, outOfPlane = 0, inPlane = 0, size = 0, momentSize = 0;
        for (var i = 0; i < point.Elements.Length; i++)
        {
            var (element, annulus) = (point.Elements[i], new IndependentAnnulus(rotor, trial.Operation, i));
            var (normal, tangential) = (element.NormalForcePerLength * annulus.Length, element.TangentialForcePerLength * annulus.Length);
            var arm = annulus.Radius - rotor.Blade.HubRadius;
            thrust += count * normal * cos;
            torque += count * tangential * annulus.Radius * cos;
            outOfPlane += normal * arm;
            inPlane += tangential * arm;
            size += count * Math.Abs(normal);
            momentSize += count * (Math.Abs(normal) + Math.Abs(tangential)) * annulus.Radius;
        }
        var area = Math.PI * tip * tip * cos * cos;
        var dynamicPressure = rotor.Air.Density * wind * wind / 2;
        var (sinPitch, cosPitch) = Math.SinCos(trial.Operation.Pitch);
        var power = torque * trial.Operation.RotorSpeed;
        Near(thrust, loads.Thrust, size);
        Near(torque, loads.Torque, momentSize);
        Near(power, loads.Power, momentSize * trial.Operation.RotorSpeed);
        Near(trial.Operation.RotorSpeed * tip * cos, loads.TipSpeed, loads.TipSpeed);
        Near(trial.Operation.RotorSpeed * tip * cos / wind, loads.TipSpeedRatio, loads.TipSpeedRatio);
        Near(thrust / (dynamicPressure * area), loads.ThrustCoefficient, size / (dynamicPressure * area));
        Near(torque / (dynamicPressure * area * tip * cos), loads.TorqueCoefficient, momentSize / (dynamicPressure * area * tip * cos));
        Near(power / (dynamicPressure * wind * area), loads.PowerCoefficient,
            momentSize * trial.Operation.RotorSpeed / (dynamicPressure * wind * area));
        Near(outOfPlane, loads.RootOutOfPlaneMoment, momentSize);
        Near(inPlane, loads.RootInPlaneMoment, momentSize);
        Near(outOfPlane * cosPitch + inPlane * sinPitch, loads.RootFlapwiseMoment, momentSize);
        Near(inPlane * cosPitch - outOfPlane * sinPitch, loads.RootEdgewiseMoment, momentSize);

        // Sums of at most twelve numbers: a few last digits of the largest.
        static void Near(double expected, double actual, double scale)
            => Assert.True(Math.Abs(expected - actual) <= 1e-12 * scale, $"{actual:R}, from the elements {expected:R}");
    });

    private static void ForEachBalanced(
        Gen<Trial> trials,
        Func<Trial, IndependentAnnulus, ElementState, (string What, double Expected, double Actual, double Scale)> identity)
        => FixedSample.ForEach(trials, Trials, trial =>
        {
            var elements = trial.Solve().Elements;
            for (var i = 0; i < elements.Length; i++)
            {
                if (elements[i].Marks.HasFlag(ElementMarks.Unbalanced))
                    continue;
                var annulus = new IndependentAnnulus(trial.Rotor, trial.Operation, i);
                var (what, expected, actual, scale) = identity(trial, annulus, elements[i]);
                var bend = annulus.Residual(elements[i].InflowAngle) * (1 - elements[i].AxialInduction) / Math.Sin(elements[i].InflowAngle);
                // The residual itself is held to account in BalanceProperties.
                var tolerance = scale * (1e-11 + 4 * Math.Abs(bend));
                Assert.True(Math.Abs(expected - actual) <= tolerance, $"element {i} ({elements[i]}): {what} {actual:R}, expected {expected:R}");
            }
        });
}
