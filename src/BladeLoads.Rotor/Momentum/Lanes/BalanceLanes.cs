using System.Runtime.CompilerServices;
using System.Runtime.Intrinsics;

namespace BladeLoads.Rotor.Momentum.Lanes;

/// <summary><see cref="MomentumBalance"/>, eight annuli at a time.</summary>
/// <remarks>
/// Most annuli are plain: one balance, near the undisturbed inflow angle, and none below or above. Where five probes and three proofs show
/// that, the lane's bracket is closed beside its neighbours'. Every other lane goes to the scalar search.
/// </remarks>
internal static class BalanceLanes
{
    private const int Probes = 5;

    /// <summary>
    /// <c>balances[i]</c> is <c>MomentumBalance.Solve(annuli[i])</c>: the inflow angle to the tolerance of the search, the marks exactly.
    /// It does not depend on the other annuli.
    /// </summary>
    /// <param name="annuli">Any number, all with one heavy-loading relation and one way of balancing.</param>
    /// <param name="balances">As many.</param>
    public static void Solve(ReadOnlySpan<Annulus> annuli, Span<Balance> balances)
    {
        var whole = annuli.Length - (annuli.Length % AnnulusLanes.Count);
        for (var i = 0; i < whole; i += AnnulusLanes.Count)
            SolveEight(annuli.Slice(i, AnnulusLanes.Count), balances.Slice(i, AnnulusLanes.Count));
        if (whole == annuli.Length)
            return;

        // The rest is filled up with copies of the last, so that an annulus meets the same arithmetic wherever it stands.
        var rest = annuli[whole..];
        var filled = default(EightAnnuli);
        var solved = default(EightBalances);
        Span<Annulus> eight = filled;
        Span<Balance> eightBalances = solved;
        rest.CopyTo(eight);
        eight[rest.Length..].Fill(rest[^1]);
        SolveEight(eight, eightBalances);
        eightBalances[..rest.Length].CopyTo(balances[whole..]);
    }

    private static void SolveEight(ReadOnlySpan<Annulus> eight, Span<Balance> balances)
    {
        var annuli = new AnnulusLanes(eight);
        Span<Nodes> nodes = stackalloc Nodes[AnnulusLanes.Count];
        for (var i = 0; i < AnnulusLanes.Count; i++)
            nodes[i] = new Nodes(SignChanges.FirstSplit(MomentumBalance.Edge, Math.PI / 2, eight[i]));
        var first = ResidualLanes.At(Vector512.Create(MomentumBalance.Edge), annuli);
        var half = ProbeAt(nodes, static n => n.Half, annuli);
        var split = ProbeAt(nodes, static n => n.Split, annuli);
        var last = ResidualLanes.At(Vector512.Create(Math.PI / 2), annuli);
        // Where the balance lies below half, or beyond the undisturbed angle, one probe more brackets it.
        var isBelow = Vector512.GreaterThan(half.Residual, Vector512<double>.Zero);
        var isBeyond = Vector512.LessThanOrEqual(split.Residual, Vector512<double>.Zero);
        var outer = (isBelow | isBeyond) == Vector512<double>.Zero
            ? split
            : ProbeAt(nodes, isBelow, annuli);
        var lower = ProbeLanes.Select(isBelow, outer, ProbeLanes.Select(isBeyond, split, half));
        var upper = ProbeLanes.Select(isBelow, half, ProbeLanes.Select(isBeyond, outer, split));

        Span<Probe> firsts = stackalloc Probe[AnnulusLanes.Count];
        Span<Probe> lowers = stackalloc Probe[AnnulusLanes.Count];
        Span<Probe> uppers = stackalloc Probe[AnnulusLanes.Count];
        Span<Probe> lasts = stackalloc Probe[AnnulusLanes.Count];
        first.CopyTo(firsts);
        lower.CopyTo(lowers);
        upper.CopyTo(uppers);
        last.CopyTo(lasts);
        Span<long> plain = stackalloc long[AnnulusLanes.Count];
        for (var i = 0; i < AnnulusLanes.Count; i++)
            plain[i] = IsPlain(firsts[i], lowers[i], uppers[i], lasts[i], eight[i]) ? -1 : 0;

        var (rootLanes, residualLanes) = RootLanes.Close(
            lower, upper, Vector512.Create<long>(plain).AsDouble(), annuli, MomentumBalance.Tolerance, out var rounds);
        Span<double> roots = stackalloc double[AnnulusLanes.Count];
        Span<double> residuals = stackalloc double[AnnulusLanes.Count];
        rootLanes.CopyTo(roots);
        residualLanes.CopyTo(residuals);
        for (var i = 0; i < AnnulusLanes.Count; i++)
        {
            var induction = plain[i] != 0 ? Residual.InductionAt(roots[i], eight[i]) : default;
            balances[i] = induction.IsFlow && !new Root(roots[i], residuals[i]).IsJump(eight[i])
                ? new Balance(roots[i], residuals[i], Probes + rounds, induction, SeveralBalances: false)
                : MomentumBalance.Solve(eight[i]);
        }
    }

    private static bool IsPlain(in Probe first, in Probe lower, in Probe upper, in Probe last, in Annulus annulus)
        => first.Residual <= 0 && lower.Residual <= 0 && upper.Residual > 0 && last.Residual > 0
            && ResidualBounds.KeepOneSign(first, lower, annulus, annulus.CoefficientRange(first.InflowAngle, lower.InflowAngle))
            && ResidualBounds.Rises(lower, upper, annulus, annulus.CoefficientRange(lower.InflowAngle, upper.InflowAngle))
            && ResidualBounds.KeepOneSign(upper, last, annulus, annulus.CoefficientRange(upper.InflowAngle, last.InflowAngle));

    private static ProbeLanes ProbeAt(ReadOnlySpan<Nodes> nodes, Func<Nodes, int> which, in AnnulusLanes annuli)
    {
        Span<double> angles = stackalloc double[AnnulusLanes.Count];
        for (var i = 0; i < AnnulusLanes.Count; i++)
            angles[i] = SignChanges.Node(MomentumBalance.Edge, Math.PI / 2, which(nodes[i]));
        return ResidualLanes.At(Vector512.Create<double>(angles), annuli);
    }

    private static ProbeLanes ProbeAt(ReadOnlySpan<Nodes> nodes, Vector512<double> isBelow, in AnnulusLanes annuli)
    {
        Span<double> angles = stackalloc double[AnnulusLanes.Count];
        Span<long> below = stackalloc long[AnnulusLanes.Count];
        isBelow.AsInt64().CopyTo(below);
        for (var i = 0; i < AnnulusLanes.Count; i++)
            angles[i] = SignChanges.Node(MomentumBalance.Edge, Math.PI / 2, below[i] != 0 ? nodes[i].Quarter : nodes[i].Beyond);
        return ResidualLanes.At(Vector512.Create<double>(angles), annuli);
    }

    /// <summary>Nodes of the scan by which a balance is bracketed.</summary>
    /// <param name="Split">Just beyond the undisturbed inflow angle.</param>
    private readonly record struct Nodes(int Split)
    {
        public int Quarter => Split / 4;

        public int Half => Split / 2;

        public int Beyond => Math.Min(Split + (Split / 2) + 1, SignChanges.Steps);
    }

    [InlineArray(AnnulusLanes.Count)]
    private struct EightAnnuli
    {
        private Annulus _first;
    }

    [InlineArray(AnnulusLanes.Count)]
    private struct EightBalances
    {
        private Balance _first;
    }
}
