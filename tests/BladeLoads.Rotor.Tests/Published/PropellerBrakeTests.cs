using BladeLoads.Rotor.Air;
using BladeLoads.Rotor.Loads;
using BladeLoads.Rotor.Operation;
using Xunit.Abstractions;
using static BladeLoads.Rotor.Tests.Published.PublishedRotor;

namespace BladeLoads.Rotor.Tests.Published;

/// <summary>
/// A rotor that runs far too fast for the wind pushes air upwind through its outer annuli (Glauert 1935, propeller-brake state).
/// No measured figures: common practice, no source. What is checked is that the state is reached and obeys momentum theory.
/// </summary>
public sealed class PropellerBrakeTests(ITestOutputHelper output)
{
    [Theory]
    [InlineData(20)]
    [InlineData(25)]
    [InlineData(40)]
    public void A_runaway_rotor_has_elements_that_push_air_upwind(double tipSpeedRatio)
    {
        var (blade, sections) = WithNamedSections("nrel-5mw");
        var point = SolveAt(new OperatingPoint(5, tipSpeedRatio * 5 / blade.TipRadius, 0), blade, sections, 3, cone: 0,
            new AirProperties(1.225, 1.81e-5, 340.29), DefaultModel);

        var brake = point.Elements.Where(e => e.InflowAngle < 0).ToArray();
        output.WriteLine($"tip-speed ratio {tipSpeedRatio}: {brake.Length} of {point.Elements.Length} elements, induction to " +
            $"{point.Elements.Max(e => e.AxialInduction):F3}, {point.Elements.Count(e => e.Marks.HasFlag(ElementMarks.Unbalanced))} unbalanced, " +
            $"power coefficient {point.Loads?.PowerCoefficient:F3}, marks {point.Marks}");
        Assert.NotEmpty(brake);
        Assert.All(brake, e =>
        {
            Assert.True(e.AxialInduction > 1);
            // Air driven upwind at a - 1 times the wind and brought to rest twice over: CT = 4 F a (a - 1), k = a/(a - 1).
            var (sin, cos) = Math.SinCos(e.InflowAngle);
            var solidity = 3 * e.Chord / (2 * Math.PI * e.Radius);
            var blade = solidity * (e.LiftCoefficient * cos + e.DragCoefficient * sin) * Math.Pow((1 - e.AxialInduction) / sin, 2);
            // The angle is closed to 1e-12 rad and is no smaller than a thousandth.
            Assert.Equal(4 * e.LossFactor * e.AxialInduction * (e.AxialInduction - 1), blade, 1e-7);
        });
        Assert.All(point.Elements.Where(e => e.AxialInduction > 1), e => Assert.True(e.InflowAngle < 0));
    }

    [Theory]
    [InlineData(20)]
    [InlineData(25)]
    [InlineData(40)]
    public void Nothing_that_is_marked_in_a_runaway_rotor_is_hidden(double tipSpeedRatio)
    {
        var (blade, sections) = WithNamedSections("nrel-5mw");
        var point = SolveAt(new OperatingPoint(5, tipSpeedRatio * 5 / blade.TipRadius, 0), blade, sections, 3, cone: 0,
            new AirProperties(1.225, 1.81e-5, 340.29), DefaultModel);

        foreach (var mark in Enum.GetValues<ElementMarks>().Where(mark => mark != ElementMarks.None))
            Assert.Equal(point.Elements.Any(e => e.Marks.HasFlag(mark)), point.Marks.HasFlag(Enum.Parse<PointMarks>(mark.ToString())));
        Assert.Equal(point.Marks.HasFlag(PointMarks.Unbalanced), point.Loads is null);
        Assert.All(point.Elements, e => Assert.Equal(e.Marks.HasFlag(ElementMarks.Unbalanced), double.IsNaN(e.InflowAngle)));
    }
}
