using BladeLoads.Rotor.Air;
using BladeLoads.Rotor.Blades;
using BladeLoads.Rotor.Momentum;
using BladeLoads.Rotor.Operation;
using BladeLoads.Rotor.Sections;
using CsCheck;
using Xunit.Abstractions;
using static BladeLoads.Rotor.Tests.Properties.PlausibleSections;

namespace BladeLoads.Rotor.Tests.Properties;

/// <summary>
/// More elements do not move the answer. The domain is what forty elements are meant for: blades that somebody designed, so chord and twist without
/// jumps and a lift coefficient near the design's, at tip-speed ratios 5 to 11 in attached flow; a rotor that
/// is stalled anywhere outside its inner third is left out.
/// </summary>
public sealed class RefinementProperties(ITestOutputHelper output)
{
    private const double Degree = Math.PI / 180;
    private const int Rotors = 10_000;

    private sealed record Design(
        int Blades, double HubShare, double DesignRatio, double Ratio, double Lift, double LargestChord, double Pitch,
        ElementSpacing Spacing, HeavyLoading HeavyLoading, PlausibleSections.Shape Shape);

    private static readonly Gen<Design> _designs =
        from blades in Gen.Int[1, 4]
        from hub in Between(0.02, 0.1)
        from designRatio in Between(5, 11)
        from ratio in Between(5, 11)
        from lift in Between(0.5, 0.9)
        from chord in Between(0.06, 0.2)
        from pitch in Between(-1, 5)
        from spacing in Gen.Const(ElementSpacing.Cosine)
        from heavy in Gen.Enum<HeavyLoading>()
        from shape in PlausibleSections.Shapes
        select new Design(blades, hub, designRatio, ratio, lift, chord, pitch, spacing, heavy, shape with
        {
            StallAngle = Math.Max(11, shape.StallAngle),
            StallDrop = 0.2,
            StallWidth = 8,
            DragNoise = 0,
            Range = null,
            Reynolds = [double.NaN],
        });

    [Fact]
    public void Eighty_elements_in_place_of_forty_move_the_power_coefficient_by_less_than_a_thousandth()
    {
        var (compared, largest) = (0, 0.0);
        var exclusive = new Lock();
        FixedSample.ForEach(_designs, Rotors, design =>
        {
            var (forty, eighty) = (Solve(design, 40), Solve(design, 80));
            if (!IsAttached(forty, design) || !IsAttached(eighty, design))
                return;
            var moved = Math.Abs(forty.Loads!.PowerCoefficient - eighty.Loads!.PowerCoefficient);
            lock (exclusive)
                (compared, largest) = (compared + 1, Math.Max(largest, moved));
            Assert.True(moved < 0.001, $"power coefficient moves by {moved:F6}, from {forty.Loads.PowerCoefficient:F6}");
        });
        output.WriteLine($"{compared} of {Rotors} rotors in attached flow; the power coefficient moves by {largest:F6} at most");
        Assert.True(compared > Rotors / 3, $"only {compared} rotors in attached flow");
    }

    private static bool IsAttached(CurvePoint point, Design design) => point.Loads is not null
        && point.Elements.Where(e => e.Radius > 1.0 / 3).All(e => e.AngleOfAttack < design.Shape.StallAngle * Degree && e.AngleOfAttack > -5 * Degree);

    /// <summary>A blade for the design tip-speed ratio by the rules of an optimum rotor, its chord held at the root; radius 1 m.</summary>
    private static CurvePoint Solve(Design design, int elements)
    {
        var liftSlope = 2 * Math.PI * design.Shape.LiftSlope;
        var angleOfAttack = design.Lift / liftSlope + design.Shape.ZeroLiftAngle * Degree;
        var stations = Enumerable.Range(0, 101).Select(i =>
        {
            var radius = design.HubShare + (1 - design.HubShare) * i / 100;
            var inflow = 2.0 / 3 * Math.Atan(1 / (design.DesignRatio * radius));
            var chord = 8 * Math.PI * radius * (1 - Math.Cos(inflow)) / (design.Blades * design.Lift);
            return new BladeStation(radius, Math.Min(design.LargestChord, chord), inflow - angleOfAttack, "s");
        });
        var sections = SectionSet.Of([PlausibleSections.Build("s", design.Shape)]);
        var model = new BalanceModel(elements, design.Spacing, TipLoss: true, HubLoss: true, design.HeavyLoading, BalanceWith.LiftAndDrag);
        const double wind = 8;
        var rotor = new RotorCase(Blade.FromStations(stations), sections, Augmentation.None, design.Blades, 0, new AirProperties(1.225, 1.8e-5, 340.29), [wind],
            new Control.FixedSpeed(design.Ratio * wind, design.Pitch * Degree, RatedPower: null), 0, double.PositiveInfinity, Drivetrain.Constant(1), model);
        return Assert.Single(CaseSolver.Solve(rotor, CancellationToken.None).Points);
    }
}
