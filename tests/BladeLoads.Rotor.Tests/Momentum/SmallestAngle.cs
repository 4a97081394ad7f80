using BladeLoads.Rotor.Momentum;

namespace BladeLoads.Rotor.Tests.Momentum;

/// <summary>The search that leaves out most of the scan finds what the whole scan shows.</summary>
public sealed class SmallestAngle
{
    private const int Steps = SignChanges.Steps;

    [Theory]
    [InlineData(14, 8)]
    [InlineData(14, 0.5)]
    [InlineData(9, 0.01)]
    [InlineData(18, 2)]
    public void The_search_finds_every_sign_change_that_the_whole_scan_shows(double stallDeg, double dropWidthDeg)
    {
        var several = 0;
        Span<Bracket> found = stackalloc Bracket[SignChanges.Kept];
        var random = new Random(20260301);
        var table = InventedRotor.SectionByFormula("sharp", stallDeg, dropWidthDeg).Table;
        var other = InventedRotor.SectionByFormula("other", stallDeg + 1, dropWidthDeg / 2).Table;
        for (var i = 0; i < 500; i++)
        {
            var annulus = RandomAnnuli.One(random, table, other);
            foreach (var (from, to) in new[] { (1e-6, Math.PI / 2), (-Math.PI / 4, -1e-6), (Math.PI / 2, Math.PI - 1e-6) })
            {
                var expected = ScanWhole(annulus, from, to);
                var changes = SignChanges.Between(from, to, downwards: false, in annulus, found);
                Assert.Equal(expected.Count, changes.Count);
                for (var j = 0; j < expected.Count; j++)
                {
                    var middle = (expected[j].From + expected[j].To) / 2;
                    Assert.InRange(middle, found[j].Lower.InflowAngle, found[j].Upper.InflowAngle);
                }
                if (expected.Count > 1)
                    several++;
            }
        }
        // Sharp stall is what this test is about: it must have met some.
        if (dropWidthDeg < 1)
            Assert.True(several > 5, $"only {several} intervals with several sign changes");
    }

    [Fact]
    public void A_residual_proved_to_keep_its_sign_or_to_rise_does_so_wherever_one_looks()
    {
        var random = new Random(20260302);
        var table = InventedRotor.SectionByFormula("sharp", 12, 1).Table;
        var (kept, rose) = (0, 0);
        for (var i = 0; i < 20_000; i++)
        {
            var annulus = RandomAnnuli.One(random, table, table);
            var branch = random.Next(3);
            var (lo, hi) = branch == 0 ? (1e-4, Math.PI / 2) : branch == 1 ? (-Math.PI / 4, -1e-4) : (Math.PI / 2, Math.PI - 1e-4);
            var from = lo + (random.NextDouble() * (hi - lo));
            var to = from + (random.NextDouble() * random.NextDouble() * (hi - from));
            var (a, b) = (Residual.At(from, annulus), Residual.At(to, annulus));
            var range = annulus.CoefficientRange(from, to);
            var keeps = a.Residual > 0 == b.Residual > 0 && ResidualBounds.KeepOneSign(a, b, annulus, range);
            var rises = ResidualBounds.Rises(a, b, annulus, range);
            kept += keeps ? 1 : 0;
            rose += rises ? 1 : 0;
            var before = a.Residual;
            for (var j = 1; j < 40; j++)
            {
                var residual = Residual.At(from + ((to - from) * j / 40), annulus).Residual;
                if (keeps)
                    Assert.Equal(a.Residual > 0, residual > 0);
                if (rises)
                    Assert.True(residual >= before - (1e-12 * (1 + Math.Abs(before))));
                before = residual;
            }
        }
        Assert.True(kept > 2000 && rose > 500, $"{kept} kept, {rose} rose");
    }

    private static List<(double From, double To)> ScanWhole(in Annulus annulus, double from, double to)
    {
        var found = new List<(double, double)>();
        var before = Residual.At(from, annulus).Residual;
        for (var i = 1; i <= Steps; i++)
        {
            var angle = i == Steps ? to : from + (i * ((to - from) / Steps));
            var residual = Residual.At(angle, annulus).Residual;
            if (residual > 0 != before > 0)
                found.Add((from + ((i - 1) * ((to - from) / Steps)), angle));
            before = residual;
        }
        return found;
    }
}
