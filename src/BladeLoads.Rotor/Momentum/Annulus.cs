using System.Runtime.CompilerServices;
using BladeLoads.Rotor.Sections;

namespace BladeLoads.Rotor.Momentum;

/// <summary>
/// The annulus of one blade element at one operating point: all that its momentum balance depends on but the inflow angle.
/// </summary>
internal readonly struct Annulus
{
    /// <summary>Blade chords over the circumference: <c>B c / (2 pi r cos cone)</c>.</summary>
    public double Solidity { get; init; }

    /// <summary>Undisturbed wind across the element over its speed of rotation: Vn / Vt, above 0.</summary>
    public double SpeedRatio { get; init; }

    /// <summary>Twist and pitch, rad: angle of attack = inflow angle - this.</summary>
    public double SectionAngle { get; init; }

    /// <summary>See <see cref="LossFactor.TipExponent"/>; minus infinity where the loss is left out.</summary>
    public double TipExponent { get; init; }

    /// <summary>See <see cref="LossFactor.HubExponent"/>; minus infinity where the loss is left out.</summary>
    public double HubExponent { get; init; }

    public SectionTable Inner { get; init; }

    public SectionTable Outer { get; init; }

    /// <summary>Weight of <see cref="Outer"/>, 0 to 1; 0 where one section serves alone.</summary>
    public double OuterWeight { get; init; }

    public ReynoldsPlace InnerPlace { get; init; }

    public ReynoldsPlace OuterPlace { get; init; }

    /// <summary>How far the coefficients go from those of the tables to those of <see cref="SectionTable.Augmented"/>.</summary>
    public AugmentationFactors Augmentation { get; init; }

    public HeavyLoading HeavyLoading { get; init; }

    /// <summary>1 where drag counts in the axial balance, 0 where lift alone does.</summary>
    public double DragInBalance { get; init; }

    /// <summary>Angle of attack, rad, wrapped into +-pi.</summary>
    public double AngleOfAttack(double inflowAngle)
    {
        var angle = inflowAngle - SectionAngle;
        if (Math.Abs(angle) <= Math.PI)
            return angle;
        return Math.Clamp(Math.IEEERemainder(angle, 2 * Math.PI), -Math.PI, Math.PI);
    }

    public Coefficients CoefficientsAt(double angleOfAttack)
    {
        var inner = Inner.At(angleOfAttack, InnerPlace);
        if (OuterWeight == 0)
            return Augmentation.IsNone ? inner : Augmented(inner, angleOfAttack);
        var outer = Outer.At(angleOfAttack, OuterPlace);
        var plain = new Coefficients(
            inner.Lift + (OuterWeight * (outer.Lift - inner.Lift)), inner.Drag + (OuterWeight * (outer.Drag - inner.Drag)));
        return Augmentation.IsNone ? plain : Augmented(plain, angleOfAttack);
    }

    /// <summary>Bounds of the coefficients over inflow angles from one to another, rad, not falling.</summary>
    public CoefficientRange CoefficientRange(double fromInflowAngle, double toInflowAngle)
    {
        var (from, to) = (AngleOfAttack(fromInflowAngle), AngleOfAttack(toInflowAngle));
        // The range passes from pi to -pi: two ranges, that meet there.
        return from <= to
            ? BlendedRange(from, to)
            : Sections.CoefficientRange.Hull(BlendedRange(from, Math.PI), BlendedRange(-Math.PI, to));
    }

    /// <summary>
    /// The angle of attack with the largest lift between -90 and 90 degrees, rad, of the tables as they serve here; NaN where nothing lifts.
    /// Of one table it is a row; of a blend it may lie between rows, and is right to 1e-7 rad.
    /// </summary>
    public double AngleOfLargestLift()
    {
        var (largest, at) = (0.0, double.NaN);
        for (var side = 0; side < (OuterWeight == 0 ? 1 : 2); side++)
            foreach (var angle in KnotsOf(side == 0 ? Inner : Outer))
                if (Math.Abs(angle) <= Math.PI / 2 && CoefficientsAt(angle).Lift is var lift && lift > largest)
                    (largest, at) = (lift, angle);
        // A shape-preserving cubic is largest at a row; a blend of two, each of them falling while the other rises, need not be.
        return double.IsNaN(at) || (OuterWeight == 0 && InnerPlace.Weight == 0 && Augmentation.IsNone) ? at : TopBeside(at, largest);
    }

    /// <summary>rad that an angle of attack may rise before the least angle of largest lift of the tables; negative beyond it.</summary>
    public double BelowStall(double angleOfAttack) => Least(static table => table.LeastStallAngle) - angleOfAttack;

    /// <summary>rad that an angle of attack may rise before a table lifts; negative where one does.</summary>
    public double BelowLift(double angleOfAttack) => Least(static table => table.LeastLiftingAngle) - angleOfAttack;

    public double LossAt(double absoluteSine) => LossFactor.Of(TipExponent, absoluteSine) * LossFactor.Of(HubExponent, absoluteSine);

    public bool IsOutsideAngles(double angleOfAttack)
        => Inner.IsOutsideAngles(angleOfAttack, InnerPlace)
            || (OuterWeight > 0 && Outer.IsOutsideAngles(angleOfAttack, OuterPlace));

    public bool IsOutsideReynolds => InnerPlace.Outside || (OuterWeight > 0 && OuterPlace.Outside);

    // The least over all tables that serve here: what rises in each of them rises in their blend.
    private double Least(Func<SectionTable, double> angleOf)
    {
        var least = angleOf(Inner);
        if (OuterWeight > 0)
            least = Math.Min(least, angleOf(Outer));
        if (Augmentation.IsNone)
            return least;
        least = Math.Min(least, angleOf(Inner.Augmented));
        return OuterWeight > 0 ? Math.Min(least, angleOf(Outer.Augmented)) : least;
    }

    // An augmented table has the rows of the plain one, and perhaps more.
    private ReadOnlySpan<double> KnotsOf(SectionTable table) => Augmentation.IsNone ? table.Knots : table.Augmented.Knots;

    // In the spans to the next row on either side, by golden sections.
    private double TopBeside(double row, double lift)
    {
        const double Tolerance = 1e-7, GoldenShare = 0.6180339887498949;
        var (below, above) = (-Math.PI / 2, Math.PI / 2);
        for (var side = 0; side < (OuterWeight == 0 ? 1 : 2); side++)
            foreach (var angle in KnotsOf(side == 0 ? Inner : Outer))
                if (angle < row)
                    below = Math.Max(below, angle);
                else if (angle > row)
                    above = Math.Min(above, angle);
        var top = row;
        foreach (var end in (ReadOnlySpan<double>)[below, above])
        {
            var (from, to) = (row, end);
            var (near, far) = (to - (GoldenShare * (to - from)), from + (GoldenShare * (to - from)));
            var (nearLift, farLift) = (CoefficientsAt(near).Lift, CoefficientsAt(far).Lift);
            while (Math.Abs(to - from) > Tolerance)
                if (nearLift >= farLift)
                {
                    (to, far, farLift) = (far, near, nearLift);
                    near = to - (GoldenShare * (to - from));
                    nearLift = CoefficientsAt(near).Lift;
                }
                else
                {
                    (from, near, nearLift) = (near, far, farLift);
                    far = from + (GoldenShare * (to - from));
                    farLift = CoefficientsAt(far).Lift;
                }
            if (Math.Max(nearLift, farLift) is var there && there > lift)
                (top, lift) = (nearLift >= farLift ? near : far, there);
        }
        return top;
    }

    // (1 - f) of the plain table and f of the augmented one, f from 0 to 1 and free of the angle: so the bounds of both, blended, are bounds.
    [MethodImpl(MethodImplOptions.NoInlining)]   // else the path without it, which is that of most cases, becomes slower
    private Coefficients Augmented(in Coefficients plain, double angleOfAttack)
    {
        var full = Inner.Augmented.At(angleOfAttack, InnerPlace);
        if (OuterWeight > 0)
        {
            var outer = Outer.Augmented.At(angleOfAttack, OuterPlace);
            full = new Coefficients(
                full.Lift + (OuterWeight * (outer.Lift - full.Lift)), full.Drag + (OuterWeight * (outer.Drag - full.Drag)));
        }
        return new Coefficients(
            plain.Lift + (Augmentation.Lift * (full.Lift - plain.Lift)), plain.Drag + (Augmentation.Drag * (full.Drag - plain.Drag)));
    }

    private CoefficientRange BlendedRange(double from, double to)
    {
        var plain = SectionRange(Inner, Outer, from, to);
        return Augmentation.IsNone
            ? plain
            : Sections.CoefficientRange.Blend(
                plain, SectionRange(Inner.Augmented, Outer.Augmented, from, to), Augmentation.Lift, Augmentation.Drag);
    }

    private CoefficientRange SectionRange(SectionTable inner, SectionTable outer, double from, double to)
    {
        var range = inner.Range(from, to, InnerPlace);
        return OuterWeight == 0 ? range : Sections.CoefficientRange.Blend(range, outer.Range(from, to, OuterPlace), OuterWeight);
    }
}
