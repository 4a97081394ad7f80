using System.Runtime.Intrinsics;
using BladeLoads.Rotor.Momentum;
using BladeLoads.Rotor.Momentum.Lanes;

namespace BladeLoads.Rotor.Tests.Momentum.Lanes;

/// <summary>The scalar definition is the specification; the kernel says the same, eight at a time.</summary>
public sealed class LanesAgainstScalar
{
    private static readonly Balance Guard = new(12345, 12345, 12345, default, SeveralBalances: true);

    [Fact]
    public void Every_count_of_annuli_gives_the_scalar_balances_and_writes_no_other()
    {
        var random = new Random(20260401);
        for (var count = 0; count <= 25; count++)
        {
            var annuli = SomeAnnuli(random, count);
            var balances = Enumerable.Repeat(Guard, count + 2).ToArray();
            BalanceLanes.Solve(annuli, balances.AsSpan(1, count));
            Assert.Equal(Guard, balances[0]);
            Assert.Equal(Guard, balances[^1]);
            for (var i = 0; i < count; i++)
                AssertSame(MomentumBalance.Solve(annuli[i]), balances[i + 1]);
        }
    }

    [Fact]
    public void Many_random_annuli_give_the_scalar_balances()
    {
        var random = new Random(20260402);
        for (var round = 0; round < 300; round++)
        {
            var annuli = SomeAnnuli(random, 40);
            var balances = new Balance[40];
            BalanceLanes.Solve(annuli, balances);
            for (var i = 0; i < annuli.Length; i++)
                AssertSame(MomentumBalance.Solve(annuli[i]), balances[i]);
        }
    }

    [Fact]
    public void An_annulus_gives_the_same_digits_whatever_its_neighbours_and_place()
    {
        var random = new Random(20260403);
        for (var round = 0; round < 200; round++)
        {
            var annuli = SomeAnnuli(random, 11);
            var balances = new Balance[11];
            BalanceLanes.Solve(annuli, balances);
            var reversed = annuli.Reverse().ToArray();
            var backwards = new Balance[11];
            BalanceLanes.Solve(reversed, backwards);
            for (var i = 0; i < 11; i++)
            {
                var alone = new Balance[1];
                BalanceLanes.Solve([annuli[i]], alone);
                // Evaluations are counted for the group that an annulus was solved in.
                Assert.Equal(alone[0] with { Evaluations = 0 }, balances[i] with { Evaluations = 0 });
                Assert.Equal(alone[0] with { Evaluations = 0 }, backwards[10 - i] with { Evaluations = 0 });
            }
        }
    }

    [Fact]
    public void The_arc_cosine_is_right_to_two_units_in_the_last_place()
    {
        var values = new List<double> { 0, double.Epsilon, 1e-300, 1e-17, 0.5, Math.BitIncrement(0.5), Math.BitDecrement(1), 1 };
        for (var x = 1e-6; x < 1; x += 0.000937)
            values.Add(x);
        foreach (var x in values)
        {
            var (expected, actual) = (Math.Acos(x), TrigonometryLanes.AcosOfPositive(Vector512.Create(x))[3]);
            Assert.InRange(actual, expected - (2 * Math.Abs(Math.BitIncrement(expected) - expected)), expected + (2 * (Math.BitIncrement(expected) - expected)));
        }
    }

    [Fact]
    public void Sine_and_cosine_are_right_to_two_units_of_one()
    {
        var values = new List<double> { 0, 1e-300, 1e-6, Math.PI / 4, Math.BitIncrement(Math.PI / 4), Math.PI / 2, Math.PI };
        for (var x = 1e-6; x < Math.PI; x += 0.00137)
            values.Add(x);
        foreach (var x in values)
        {
            var (sine, cosine) = TrigonometryLanes.SinCos(Vector512.Create(x));
            Assert.Equal(Math.Sin(x), sine[5], 4.4e-16);
            Assert.Equal(Math.Cos(x), cosine[5], 4.4e-16);
        }
    }

    [Fact]
    public void The_loss_factor_is_the_scalar_one_in_every_lane()
    {
        double[] exponents = [double.NegativeInfinity, -1e9, -40.0001, -39.9999, -3, -0.1, -1e-9, 0];
        var sines = Vector512.Create(0.3);
        var lanes = LossFactorLanes.Of(Vector512.Create<double>(exponents), sines);
        for (var i = 0; i < 8; i++)
        {
            var expected = LossFactor.Of(exponents[i], 0.3);
            // A unit in the last place of the exponential moves the factor by that over the factor itself.
            var tolerance = expected == 0 ? 0 : 1e-15 + (1.2e-16 / expected);
            Assert.Equal(expected, lanes[i], tolerance);
            Assert.Equal(expected, LossFactorLanes.Of(Vector512.Create(exponents[i]), sines)[i], tolerance);
        }
    }

    [Theory]
    [InlineData(HeavyLoading.Glauert1935)]
    [InlineData(HeavyLoading.Buhl2005)]
    public void The_heavy_loading_relation_is_the_scalar_one_in_every_lane(HeavyLoading relation)
    {
        var random = new Random(20260404);
        Span<double> k = stackalloc double[8];
        Span<double> F = stackalloc double[8];
        for (var round = 0; round < 2000; round++)
        {
            for (var i = 0; i < 8; i++)
                (k[i], F[i]) = (random.Next(5) switch
                {
                    0 => -3 * random.NextDouble(),
                    1 => random.NextDouble(),
                    2 => 0.5,
                    3 => 20 * random.NextDouble(),
                    _ => Math.Exp(25 * random.NextDouble()),
                }, 0.01 + (0.99 * random.NextDouble()));
            var lanes = HighThrustLanes.InverseSpeedRatio(Vector512.Create<double>(k), Vector512.Create<double>(F), relation);
            for (var i = 0; i < 8; i++)
            {
                var expected = HighThrust.InverseSpeedRatio(k[i], F[i], relation);
                // Near k = -1 the value passes through 0; the terms are of size 1.
                Assert.Equal(expected, lanes[i], 1e-14 * (1 + Math.Abs(expected)));
            }
        }
    }

    private static void AssertSame(in Balance expected, in Balance actual)
    {
        Assert.Equal(expected.IsBalanced, actual.IsBalanced);
        Assert.Equal(expected.SeveralBalances, actual.SeveralBalances);
        if (!expected.IsBalanced)
            return;
        // Both are closed to the tolerance of the search, each on its own side.
        Assert.Equal(expected.InflowAngle, actual.InflowAngle, 2 * MomentumBalance.Tolerance);
        Assert.Equal(expected.Induction.Axial, actual.Induction.Axial, 1e-7 * (1 + Math.Abs(expected.Induction.Axial)));
    }

    private static Annulus[] SomeAnnuli(Random random, int count)
    {
        var tables = new[] { (12.0, 0.5), (14, 8), (10, 20), (16, 2) }
            .Select((s, i) => InventedRotor.SectionByFormula($"s{i}", s.Item1, s.Item2).Table).ToArray();
        var annuli = Enumerable.Range(0, count)
            .Select(_ => RandomAnnuli.One(random, tables[random.Next(4)], tables[random.Next(4)])).ToArray();
        // A rotor has one relation and one way of balancing.
        return [.. annuli.Select(a => a with { HeavyLoading = annuli[0].HeavyLoading, DragInBalance = annuli[0].DragInBalance })];
    }
}
