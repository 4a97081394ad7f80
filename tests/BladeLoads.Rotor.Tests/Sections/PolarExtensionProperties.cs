using BladeLoads.Rotor.Sections;

namespace BladeLoads.Rotor.Tests.Sections;

public sealed class PolarExtensionProperties
{
    private static double Rad(double deg) => Math.Clamp(double.DegreesToRadians(deg), -Math.PI, Math.PI);

    [Fact]
    public void Every_table_that_can_be_extended_goes_round_once_and_leaves_its_join_on_the_relation()
    {
        var random = new Random(20260501);
        var extendedTables = 0;
        for (var i = 0; i < 5000; i++)
        {
            var low = -180 * random.NextDouble() * random.NextDouble();
            var high = 180 * random.NextDouble() * random.NextDouble();
            double[] angles = [.. Enumerable.Range(0, random.Next(3, 40)).Select(_ => Rad(low + ((high - low) * random.NextDouble()))).Distinct().Order()];
            if (angles.Length < 3)
                continue;
            var polar = Polar.FromRows(
                random.Next(2) == 0 ? double.NaN : 1e6, angles, [.. angles.Select(_ => (random.NextDouble() * 3) - 1)], [.. angles.Select(_ => random.NextDouble())]);
            if (!PolarExtension.CanExtend(polar))
                continue;
            extendedTables++;
            var whole = PolarExtension.Extend(polar, 1 + (60 * random.NextDouble()), (ExtensionJoin)random.Next(2));
            var extended = whole.Polar;
            Assert.Equal((-Math.PI, Math.PI), (extended.Angles[0], extended.Angles[^1]));
            Assert.Equal((extended.Lift[0], extended.Drag[0]), (extended.Lift[^1], extended.Drag[^1]));
            AssertOnTheRelation(whole);
            // Rows of the table may lie as near as they like; what is added keeps its distance.
            for (var row = 1; row < extended.Angles.Length; row++)
                if (!angles.Contains(extended.Angles[row]) && !angles.Contains(extended.Angles[row - 1]))
                    Assert.True(extended.Angles[row] - extended.Angles[row - 1] > Rad(0.4));
        }
        Assert.True(extendedTables > 3000, $"only {extendedTables} tables");
    }

    // The first added row beyond each join that lies below 90 degrees.
    private static void AssertOnTheRelation(ExtendedPolar whole)
    {
        var polar = whole.Polar;
        foreach (var (side, sign, liftFactor) in new[] { (whole.Above, 1, 1.0), (whole.Below, -1, -0.7) })
        {
            if (side.Kind is not (ExtensionKind.FromEnd or ExtensionKind.FromStall) || sign * side.JoinAngle is <= 0 or >= 1.5)
                continue;
            var join = polar.Angles.IndexOf(side.JoinAngle);
            var relation = DeepStall.Through(sign * side.JoinAngle, polar.Lift[join] / liftFactor, polar.Drag[join], whole.LargestDrag).At(sign * polar.Angles[join + sign]);
            Assert.Equal(liftFactor * relation.Lift, polar.Lift[join + sign], 1e-9);
            Assert.Equal(Math.Max(relation.Drag, PlateFriction.Laminar(polar.Reynolds)), polar.Drag[join + sign], 1e-9);
        }
    }
}
