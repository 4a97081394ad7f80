using BladeLoads.Rotor.Loads;

namespace BladeLoads.Rotor.Operation;

/// <summary>A quantity of the rotor at a place along a walk, as an excess over what is asked for.</summary>
/// <param name="Place">Pitch or wind speed.</param>
/// <param name="Shares">What each element adds, with its balance; null where a walk does not ask for jumps.</param>
internal readonly record struct Sample(double Place, double Excess, ElementShare[]? Shares)
{
    // A jump is not the whole difference between two places; the rest may add as much again.
    private const double Allowance = 2;

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
}

/// <summary>An element's balance and what it adds to the quantity walked along.</summary>
/// <param name="InflowAngle">rad.</param>
internal readonly record struct ElementShare(double InflowAngle, double Share, bool SeveralBalances)
{
    public static ElementShare[] OfPower(RotorModel model, in OperatingPoint point)
    {
        var shares = new ElementShare[model.Elements.Length];
        for (var i = 0; i < shares.Length; i++)
        {
            var e = model.Elements[i];
            shares[i] = Of(e, model.PowerShare(i, point));
        }
        return shares;
    }

    public static ElementShare[] OfThrust(RotorModel model)
    {
        var shares = new ElementShare[model.Elements.Length];
        for (var i = 0; i < shares.Length; i++)
            shares[i] = Of(model.Elements[i], model.ThrustShare(i));
        return shares;
    }

    private static ElementShare Of(in ElementState e, double share)
        => new(e.InflowAngle, share, (e.Marks & ElementMarks.SeveralBalances) != 0);
}
