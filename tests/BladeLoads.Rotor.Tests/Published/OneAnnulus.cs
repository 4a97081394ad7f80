using System.Collections.Immutable;
using BladeLoads.Rotor.Air;
using BladeLoads.Rotor.Blades;
using BladeLoads.Rotor.Loads;
using BladeLoads.Rotor.Momentum;
using BladeLoads.Rotor.Operation;
using BladeLoads.Rotor.Sections;

namespace BladeLoads.Rotor.Tests.Published;

/// <summary>A blade of one element, so that the rotor is one annulus; and lift laws that are straight lines, which tables give exactly.</summary>
internal static class OneAnnulus
{
    public static BalanceModel WithoutLoss { get; } =
        new(1, ElementSpacing.Uniform, TipLoss: false, HubLoss: false, HeavyLoading.Glauert1935, BalanceWith.LiftAndDrag);

    /// <summary>Lift = <paramref name="atZero"/> + <paramref name="slope"/> x angle (rad), all round; drag the same everywhere.</summary>
    public static Section StraightLift(double atZero, double slope, double drag) => Section.FromPolars("straight",
        [Polar.FromRows(double.NaN, [-Math.PI, 0, Math.PI], [atZero - slope * Math.PI, atZero, atZero + slope * Math.PI], [drag, drag, drag])]);

    /// <summary>The one element of a blade from <paramref name="hubRadius"/> to <paramref name="tipRadius"/> with one chord and twist.</summary>
    public static ElementState Solve(
        double hubRadius, double tipRadius, double chord, double twist, Section section, int bladeCount, OperatingPoint point, BalanceModel model)
    {
        ImmutableArray<BladeStation> stations =
            [new(hubRadius, chord, twist, section.Name), new(tipRadius, chord, twist, section.Name)];
        return Assert.Single(PublishedRotor.SolveAt(point, Blade.FromStations(stations), SectionSet.Of([section]), bladeCount, cone: 0,
            new AirProperties(1.225, 1.8e-5, 340.29), model).Elements);
    }
}
