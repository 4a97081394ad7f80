using BladeLoads.Rotor.Loads;

namespace BladeLoads.Rotor.Operation;

/// <summary>A quantity of the rotor at a place along a walk, as an excess over what is asked for.</summary>
/// <param name="Place">Pitch or wind speed.</param>
/// <param name="Shares">What each element adds, with its balance; null where a walk does not ask for jumps.</param>
internal readonly record struct Sample(double Place, double Excess, ElementShare[]? Shares)
{
    // A jump is not the whole difference between two places, nor a slope the steepest; the rest may add as much again.
    private const double Allowance = 2;

    // rad: a quantity that only follows the pitch has no two tops so near to each other.
    private static readonly double SmoothLeap = double.DegreesToRadians(8);

    /// <summary>
    /// Whether the excess may reach 0 between two places where it is below 0 at both: because elements change their balance between them,
    /// which shows in several balances at either, or in an inflow angle that turns too far.
    /// </summary>
    /// <remarks>A sound guess, no proof: an element that jumps and jumps back between the two places is not seen.</remarks>
    /// <param name="fastestTurn">rad a unit of place: a balance that does not jump turns no faster.</param>
    public bool MayHideReach(in Sample next, double fastestTurn)
    {
        if (Shares is not { } here || next.Shares is not { } there)
            return false;
        var mostTurn = fastestTurn * Math.Abs(next.Place - Place);
        var jumps = 0.0;
        for (var i = 0; i < here.Length; i++)
            if (here[i].SeveralBalances || there[i].SeveralBalances || !(Math.Abs(there[i].InflowAngle - here[i].InflowAngle) <= mostTurn))
                jumps += Math.Abs(there[i].Share - here[i].Share);
        // Beside an unbalanced element this is NaN, and false: what has no number cannot be said to reach anything.
        return jumps != 0 && Math.Max(Excess, next.Excess) + (Allowance * jumps) >= 0;
    }

    /// <summary>
    /// Whether no pitch down to <paramref name="place"/> can reach 0, so that they need no look: because too little could be added on the
    /// way, or because every element stays below stall and the quantity is smooth.
    /// </summary>
    /// <remarks>As the pitch falls, an angle of attack rises by no more: the inflow turns the other way, or stays.</remarks>
    /// <param name="place">rad, below this pitch.</param>
    /// <param name="before">The sample before this; the same where there is none.</param>
    public bool RulesOutReachUpTo(double place, in Sample before)
    {
        if (Shares is not { } here || before.Shares is not { } there)
            return false;
        var (distance, behind) = (Math.Abs(place - Place), Math.Abs(before.Place - Place));
        var (most, staysBelowStall) = (Excess, true);
        for (var i = 0; i < here.Length; i++)
        {
            var e = here[i];
            if (e.Share <= 0 && e.BelowLift >= distance)
                continue;
            if (behind == 0)
                return false;
            var mayStall = e.SeveralBalances || !(e.BelowStall > distance);
            staysBelowStall &= !mayStall;
            most += Allowance * ((Math.Abs(e.Share - there[i].Share) * distance / behind) + (mayStall ? Math.Abs(e.Share) : 0));
        }
        return most < 0 || (staysBelowStall && distance <= SmoothLeap);
    }
}

/// <summary>An element's balance and what it adds to the quantity walked along.</summary>
/// <param name="InflowAngle">rad.</param>
/// <param name="BelowStall">rad that the angle of attack may rise before the least angle of largest lift of its tables.</param>
/// <param name="BelowLift">rad that it may rise before its lift is positive; minus infinity where that says nothing of the quantity.</param>
internal readonly record struct ElementShare(
    double InflowAngle, double Share, bool SeveralBalances, double BelowStall, double BelowLift)
{
    public static ElementShare[] OfPower(RotorModel model, in OperatingPoint point)
    {
        var shares = new ElementShare[model.Elements.Length];
        for (var i = 0; i < shares.Length; i++)
        {
            var share = Of(model, i, model.PowerShare(i, point));
            // Without lift a blade only takes power.
            shares[i] = share with { BelowLift = model.Annuli[i].BelowLift(model.Elements[i].AngleOfAttack) };
        }
        return shares;
    }

    public static ElementShare[] OfThrust(RotorModel model)
    {
        var shares = new ElementShare[model.Elements.Length];
        for (var i = 0; i < shares.Length; i++)
            shares[i] = Of(model, i, model.ThrustShare(i));
        return shares;
    }

    private static ElementShare Of(RotorModel model, int i, double share)
    {
        var e = model.Elements[i];
        return new ElementShare(
            e.InflowAngle, share, (e.Marks & ElementMarks.SeveralBalances) != 0, model.Annuli[i].BelowStall(e.AngleOfAttack),
            double.NegativeInfinity);
    }
}
