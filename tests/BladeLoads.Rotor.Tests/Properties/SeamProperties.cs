using BladeLoads.Rotor.Air;
using BladeLoads.Rotor.Blades;
using BladeLoads.Rotor.Loads;
using BladeLoads.Rotor.Momentum;
using BladeLoads.Rotor.Operation;
using BladeLoads.Rotor.Sections;
using CsCheck;
using static BladeLoads.Rotor.Tests.Properties.PlausibleSections;

namespace BladeLoads.Rotor.Tests.Properties;

/// <summary>
/// Blades set so far round that the angle of attack passes a half turn while the balance is sought, with tables that end long before
/// it: beyond their ends the last value serves, so lift and drag jump at the seam, and the residual with them.
/// </summary>
public sealed class SeamProperties
{
    private const int Trials = 10_000;

    private static readonly Gen<Polar> _tables =
        from first in Between(-0.5, -0.2)
        from last in Between(0.2, 0.6)
        from liftBefore in Between(-1.5, 1.5)
        from lift in Between(-1, 1)
        from liftBeyond in Between(-1.5, 1.5)
        from dragBefore in Between(0, 1)
        from dragBeyond in Between(0, 1)
        select Polar.FromRows(double.NaN, [first, 0, last], [liftBefore, lift, liftBeyond], [dragBefore, 0.01, dragBeyond]);

    private static readonly Gen<Trial> _trials =
        from table in _tables
        from angle in Gen.OneOf(Between(1.75, 3.05), Between(-3.05, -1.75))
        from chord in Between(0.1, 3)
        from speedRatio in Between(0.05, 3)
        from blades in Gen.Int[1, 4]
        from relation in Gen.Enum<HeavyLoading>()
        select Build(table, angle, chord, speedRatio, blades, relation);

    [Fact]
    public void A_jump_of_the_residual_is_never_shown_as_a_balance() => FixedSample.ForEach(_trials, Trials, trial =>
    {
        var element = Assert.Single(trial.Solve().Elements);
        if (element.Marks.HasFlag(ElementMarks.Unbalanced))
            return;
        var residual = new IndependentAnnulus(trial.Rotor, trial.Operation, 0).Residual(element.InflowAngle);
        Assert.True(Math.Abs(residual) < 1e-6, $"residual {residual} at {element}");
    });

    [Fact]
    public void No_smaller_angle_is_missed_where_the_angle_of_attack_passes_a_half_turn() => FixedSample.ForEach(_trials, Trials, trial =>
    {
        var element = Assert.Single(trial.Solve().Elements);
        var balances = DenseScan.Balances(new IndependentAnnulus(trial.Rotor, trial.Operation, 0));
        Assert.Equal(balances.Count == 0, element.Marks.HasFlag(ElementMarks.Unbalanced));
        if (balances.Count == 0)
            return;
        Assert.True(Math.Abs(balances[0] - element.InflowAngle) <= 1e-9, $"the scan finds {string.Join(" ", balances)}, not {element}");
        Assert.True(balances.Count > 1 == element.Marks.HasFlag(ElementMarks.SeveralBalances),
            $"the scan finds {string.Join(" ", balances)}, {element}");
    });

    private static Trial Build(Polar table, double angle, double chord, double speedRatio, int blades, HeavyLoading relation)
    {
        var blade = Blade.FromStations([new BladeStation(1, chord, 0, "s"), new BladeStation(2, chord, 0, "s")]);
        var operation = new OperatingPoint(8, speedRatio * 8 / 1.5, angle);
        var rotor = new RotorCase(blade, SectionSet.Of([Section.FromPolars("s", [table])]), Augmentation.None, blades, 0, new AirProperties(1.2, 1.8e-5, 340.29), [8],
            new Control.FixedSpeed(operation.RotorSpeed, angle, RatedPower: null), 0, double.PositiveInfinity, Drivetrain.Constant(1),
            new BalanceModel(1, ElementSpacing.Uniform, TipLoss: false, HubLoss: false, relation, BalanceWith.LiftAndDrag));
        return new Trial(rotor, operation, [], 0);
    }
}
