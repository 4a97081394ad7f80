using BladeLoads.Rotor.Sections;
using CsCheck;

namespace BladeLoads.Rotor.Tests.Properties;

/// <summary>
/// Random section tables that a tunnel or a supplier might have sent: a straight lift line, a stall anywhere between soft and a drop
/// within less than a degree, a flat plate beyond, drag with or without noise, the full circle or a part of it, one to three Reynolds numbers.
/// </summary>
internal static class PlausibleSections
{
    private const double Degree = Math.PI / 180;

    /// <summary>Angles in degrees.</summary>
    internal sealed record Shape(
        double LiftSlope, double ZeroLiftAngle, double StallAngle, double StallDrop, double StallWidth, double LeastDrag,
        double DragAcross, double DragNoise, int NoiseSeed, double Step, Range? Range, double[] Reynolds);

    internal sealed record Range(double From, double To);

    private static readonly Gen<Range?> _ranges = Gen.OneOf(
        Gen.Const((Range?)null), Gen.Select(Between(-40, -4), Between(12, 90), (low, high) => (Range?)new Range(low, high)));

    private static readonly Gen<double[]> _reynoldsNumbers = Gen.OneOf(
        Gen.Const(new[] { double.NaN }),
        Between(5, 7).Select(log => new[] { Math.Pow(10, log) }),
        Gen.Select(Between(4.7, 5.8), Between(5.9, 7.2), (a, b) => new[] { Math.Pow(10, a), Math.Pow(10, b) }),
        Gen.Select(Between(4.7, 5.6), Between(5.7, 6.3), Between(6.4, 7.2),
            (a, b, c) => new[] { Math.Pow(10, a), Math.Pow(10, b), Math.Pow(10, c) }));

    public static Gen<Shape> Shapes { get; } =
        from slope in Between(0.85, 1.1)
        from zeroLift in Between(-6, 0)
        from stall in Between(7, 20)
        from drop in Between(0, 0.65)
        from width in Gen.OneOf(Between(0.1, 1.0), Between(1, 10))
        from drag in Between(0.005, 0.03)
        from across in Between(1.1, 2.1)
        from noise in Gen.OneOf(Gen.Const(0.0), Between(0, 0.8))
        from seed in Gen.Int[0, 1_000_000]
        from step in Between(0.5, 2.5)
        from range in _ranges
        from reynolds in _reynoldsNumbers
        select new Shape(slope, zeroLift, stall, drop, width, drag, across, noise, seed, step, range, reynolds);

    /// <summary>Anywhere between, and as often a number with few digits or an end, which is where faults like to hide.</summary>
    public static Gen<double> Between(double from, double to)
        => Gen.OneOf(Gen.Double[from, to], Gen.Double.Unit.Select(unit => from + (to - from) * unit));

    public static Section Build(string name, Shape shape)
        => Section.FromPolars(name, shape.Reynolds.Select((reynolds, i) => Table(shape, reynolds, i)));

    private static Polar Table(Shape shape, double reynolds, int order)
    {
        var random = new Random(shape.NoiseSeed + order);
        // A higher Reynolds number stalls later and drags less.
        var (stall, leastDrag) = (shape.StallAngle + 0.6 * order, shape.LeastDrag * (1 - 0.15 * order));
        var angles = new SortedSet<double> { stall, stall + shape.StallWidth, -0.8 * stall };
        for (var angle = -180.0; angle <= 180; angle += Math.Abs(angle) >= 40 ? 10 : shape.Step)
            angles.Add(angle);
        angles.Add(180);
        var (from, to) = shape.Range ?? new Range(-180, 180);
        var kept = new List<double>();
        foreach (var angle in angles.Where(angle => angle >= from && angle <= to))
            if (kept.Count == 0 || angle - kept[^1] > 0.05)
                kept.Add(angle);
        if (shape.Range is null)
            kept[^1] = 180;
        var lift = kept.Select(angle => Lift(angle)).ToArray();
        var drag = kept.Select(angle => Math.Max(0, Drag(angle) * (1 + shape.DragNoise * (random.NextDouble() - 0.5)))).ToArray();
        if (shape.Range is null)
            drag[^1] = drag[0];
        return Polar.FromRows(reynolds, [.. kept.Select(angle => Math.Clamp(angle * Degree, -Math.PI, Math.PI))], lift, drag);

        double Drag(double angle) => leastDrag + shape.DragAcross * Math.Pow(Math.Sin(angle * Degree), 2);

        double Lift(double angle)
        {
            if (angle < -0.8 * stall)
                return -0.7 * Beyond(-angle, 0.8 * stall, -Line(-0.8 * stall) / 0.7);
            return angle <= stall ? Line(angle) : Beyond(angle, stall, Line(stall));
        }

        double Line(double angle) => 2 * Math.PI * shape.LiftSlope * (angle - shape.ZeroLiftAngle) * Degree;

        double Beyond(double angle, double from, double largest)
        {
            var end = from + shape.StallWidth;
            var least = largest * (1 - shape.StallDrop);
            if (angle <= end)
                return largest + (least - largest) * (angle - from) / shape.StallWidth;
            var plate = Math.Max(40, end + 5);
            return angle < plate
                ? least + (FlatPlate(plate) - least) * (angle - end) / (plate - end)
                : FlatPlate(angle);
        }

        double FlatPlate(double angle) => shape.DragAcross / 2 * Math.Sin(2 * angle * Degree);
    }
}
