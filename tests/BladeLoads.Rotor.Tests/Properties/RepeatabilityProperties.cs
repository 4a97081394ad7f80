using BladeLoads.Rotor.Operation;
using CsCheck;

namespace BladeLoads.Rotor.Tests.Properties;

/// <summary>The same case gives the same bytes, whatever else runs before or beside it.</summary>
public sealed class RepeatabilityProperties
{
    private const int Trials = 10_000;

    [Fact]
    public void Cases_solved_in_any_order_and_side_by_side_give_the_same_bytes()
    {
        const int together = 1_000;
        for (var first = 0; first < Trials; first += together)
        {
            var trials = Enumerable.Range(first, together).Select(i => FixedSample.Draw(PlausibleRotors.Trials, i).Value).ToArray();
            var inOrder = trials.Select(trial => Bytes(trial.Solve())).ToArray();
            var backwards = new byte[together][];
            for (var i = together - 1; i >= 0; i--)
                backwards[i] = Bytes(trials[i].Solve());
            var sideBySide = new byte[together][];
            Parallel.For(0, together, new ParallelOptions { MaxDegreeOfParallelism = 8 }, i => sideBySide[i] = Bytes(trials[i].Solve()));

            for (var i = 0; i < together; i++)
            {
                Assert.True(inOrder[i].AsSpan().SequenceEqual(backwards[i]), $"another order changes case {first + i}: {trials[i]}");
                Assert.True(inOrder[i].AsSpan().SequenceEqual(sideBySide[i]), $"company changes case {first + i}: {trials[i]}");
            }
        }
    }

    [Fact]
    public void A_wind_speed_alone_and_among_others_gives_the_same_bytes() => FixedSample.ForEach(
        Gen.Select(PlausibleRotors.Trials, Gen.Double[0.3, 0.95], Gen.Double[1.05, 3]), Trials, sample =>
    {
        var (trial, slower, faster) = sample;
        var wind = trial.Operation.WindSpeed;
        var among = CaseSolver.Solve(trial.Rotor with { WindSpeeds = [slower * wind, wind, faster * wind] }, CancellationToken.None);
        Assert.True(Bytes(trial.Solve()).AsSpan().SequenceEqual(Bytes(among.Points[1])), "its neighbours change the point");
    });

    [Fact]
    public void An_element_does_not_change_with_the_fate_of_its_neighbours() => FixedSample.ForEach(PlausibleRotors.Trials, Trials, trial =>
    {
        // One element of the blade stands alone when the rest is left out, which is only so without losses at root and tip.
        var rotor = trial.Rotor with { Model = trial.Rotor.Model with { TipLoss = false, HubLoss = false, Elements = 1 } };
        var alone = (trial with { Rotor = rotor }).Solve().Elements[0];
        var among = (trial with { Rotor = rotor with { Model = rotor.Model with { Elements = 3 } } }).Solve().Elements[1];
        // The middle of three is the middle of one, to the last digits of its two edges.
        Assert.True(Math.Abs(alone.Radius - among.Radius) <= 1e-14 * alone.Radius);
        Assert.Equal(alone.Marks, among.Marks);
        Assert.True(!(Math.Abs(alone.InflowAngle - among.InflowAngle) > 1e-9), $"{alone.InflowAngle:R}, among others {among.InflowAngle:R}");
    });

    private static byte[] Bytes(CurvePoint point)
    {
        using var stream = new MemoryStream();
        using var writer = new BinaryWriter(stream);
        foreach (var e in point.Elements)
        {
            foreach (var number in (ReadOnlySpan<double>)
                [
                    e.Radius, e.Chord, e.Twist, e.InflowAngle, e.AngleOfAttack, e.Reynolds, e.AxialInduction, e.TangentialInduction,
                    e.LossFactor, e.LiftCoefficient, e.DragCoefficient, e.NormalForcePerLength, e.TangentialForcePerLength, e.Residual,
                ])
                writer.Write(number);
            writer.Write(e.Section);
            writer.Write(e.Evaluations);
            writer.Write((int)e.Marks);
        }
        if (point.Loads is { } loads)
            foreach (var number in (ReadOnlySpan<double>)
                [
                    loads.Thrust, loads.Torque, loads.Power, loads.TipSpeed, loads.TipSpeedRatio, loads.PowerCoefficient,
                    loads.ThrustCoefficient, loads.TorqueCoefficient, loads.RootOutOfPlaneMoment, loads.RootInPlaneMoment,
                    loads.RootFlapwiseMoment, loads.RootEdgewiseMoment,
                ])
                writer.Write(number);
        writer.Write(point.ElectricalPower);
        writer.Write((int)point.Region);
        writer.Write((int)point.Marks);
        writer.Flush();
        return stream.ToArray();
    }
}
