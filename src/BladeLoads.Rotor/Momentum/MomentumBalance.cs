namespace BladeLoads.Rotor.Momentum;

/// <summary>Finds the inflow angle at which blade forces and momentum loss agree in an annulus.</summary>
internal static class MomentumBalance
{
    /// <summary>rad; a root is closed until its bracket is no wider than this.</summary>
    public const double Tolerance = 1e-12;

    /// <summary>rad; how near to 0 and to pi an inflow angle is looked for.</summary>
    public const double Edge = 1e-6;

    /// <summary>
    /// The balance of an annulus: the first sign change of the residual that a scan of 2,000 equal steps shows on [1e-6, pi/2], else the one
    /// nearest zero on [-pi/4, -1e-6] with k above 1 (propeller brake), else the first on [pi/2, pi - 1e-6]; only where it is a flow. The
    /// smallest angle is the attached flow, the higher load.
    /// </summary>
    public static Balance Solve(in Annulus annulus)
    {
        var evaluations = 0;
        Span<Bracket> found = stackalloc Bracket[SignChanges.Kept];
        return TryInterval(Edge, Math.PI / 2, downwards: false, annulus, found, ref evaluations)
            ?? TryInterval(-Math.PI / 4, -Edge, downwards: true, annulus, found, ref evaluations)
            ?? TryInterval(Math.PI / 2, Math.PI - Edge, downwards: false, annulus, found, ref evaluations)
            ?? new Balance(double.NaN, double.NaN, evaluations, default, SeveralBalances: false);
    }

    private static Balance? TryInterval(
        double from, double to, bool downwards, in Annulus annulus, Span<Bracket> found, ref int evaluations)
    {
        var changes = SignChanges.Between(from, to, downwards, in annulus, found);
        evaluations += changes.Evaluations;
        Balance? first = null;
        for (var i = 0; i < Math.Min(changes.Count, SignChanges.Kept); i++)
        {
            var root = RootBracket.Close(found[i], annulus, Tolerance, ref evaluations);
            var induction = Residual.InductionAt(root.InflowAngle, annulus);
            if (root.IsJump(annulus) || !induction.IsFlow)
                continue;
            if (first is { } answer)
                return answer with { Evaluations = evaluations, SeveralBalances = true };
            first = new Balance(root.InflowAngle, root.Residual, 0, induction, SeveralBalances: false);
        }
        return first is { } only ? only with { Evaluations = evaluations } : null;
    }
}

/// <summary>What was found for an annulus.</summary>
/// <param name="InflowAngle">rad; NaN where no inflow angle balances.</param>
/// <param name="Residual">What is left of the balance at that angle, a ratio of speeds.</param>
/// <param name="Evaluations">Evaluations of the residual, the proof that no smaller angle balances included.</param>
/// <param name="SeveralBalances">More than one inflow angle of the interval balances (sharp stall).</param>
internal readonly record struct Balance(
    double InflowAngle, double Residual, int Evaluations, Induction Induction, bool SeveralBalances)
{
    public bool IsBalanced => !double.IsNaN(InflowAngle);

    /// <summary>A rotor at rest: the wind meets the blade square to its way, and is not slowed.</summary>
    public static Balance AtRest(in Annulus annulus)
    {
        const double Square = Math.PI / 2;
        var coefficients = annulus.CoefficientsAt(annulus.AngleOfAttack(Square));
        return new(Square, 0, 0, new Induction(0, 0, 1, coefficients, 1, 0, IsFlow: true), SeveralBalances: false);
    }
}
