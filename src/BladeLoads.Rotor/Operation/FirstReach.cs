namespace BladeLoads.Rotor.Operation;

/// <summary>
/// Walks along a line of places until a quantity reaches 0 from below, and closes on the place where it does. What could hide between two
/// places is looked for: a peak, and a jump of elements that change their balance.
/// </summary>
internal static class FirstReach
{
    private const double GoldenShare = 0.3819660112501051;

    /// <summary>Where the excess first reaches 0, in the order walked; null where it does not.</summary>
    /// <param name="at">The sample at a place; its excess is to reach 0, and NaN counts as below.</param>
    /// <param name="places">In the order walked, rising or falling.</param>
    /// <param name="tolerance">In the unit of the places: how far apart the two sides of the answer may be.</param>
    /// <param name="finest">How close to a jump it is looked at.</param>
    /// <param name="fastestTurn">rad a unit of place: an inflow angle that turns faster has jumped.</param>
    /// <param name="longestLeap">
    /// Places that may be passed over at once where nothing can hide among them; 1 for none. More only for pitches that fall.
    /// </param>
    public static Reach? Find(
        Func<double, Sample> at, ReadOnlySpan<double> places, double tolerance, double finest, double fastestTurn, int longestLeap)
    {
        var below = at(places[0]);
        if (below.Excess >= 0)
            return new Reach(below, below);
        var beforeThat = below;
        for (var next = 1; next < places.Length; next++)
        {
            next += Leap(beforeThat, below, places[next..], longestLeap);
            var here = at(places[next]);
            if (beforeThat.Place != below.Place && below.Excess > beforeThat.Excess && below.Excess >= here.Excess
                && PeakReaching(at, beforeThat, below, here, tolerance) is { } peak)
                return Close(at, beforeThat, peak, tolerance);
            if (BesideJumps(at, below, here, finest, fastestTurn) is { } beside)
                return Close(at, beside.Below, beside.Reached, tolerance);
            if (here.Excess >= 0)
                return Close(at, below, here, tolerance);
            (beforeThat, below) = (below, here);
        }
        return null;
    }

    // How many of the places ahead need no look. Never more than half of them: towards the end of a walk a peak has no sample behind it.
    private static int Leap(in Sample before, in Sample from, ReadOnlySpan<double> ahead, int longest)
    {
        for (var leap = longest; leap > 1; leap /= 2)
            if (leap <= ahead.Length / 2 && from.RulesOutReachUpTo(ahead[leap - 1], before))
                return leap - 1;
        return 0;
    }

    // Elements that change their balance between two places make the quantity jump there, and it may be 0 or more on one side of the jump
    // only. The stretch is halved towards each jump that could lift it so far.
    private static Reach? BesideJumps(Func<double, Sample> at, Sample from, Sample to, double finest, double fastestTurn)
    {
        if (Math.Abs(to.Place - from.Place) <= finest || !from.MayHideReach(to, fastestTurn))
            return null;
        var middle = at((from.Place + to.Place) / 2);
        if (BesideJumps(at, from, middle, finest, fastestTurn) is { } first)
            return first;
        return middle.Excess >= 0 ? new Reach(from, middle) : BesideJumps(at, middle, to, finest, fastestTurn);
    }

    // Golden sections round a peak, until it reaches 0 or is told apart no more.
    private static Sample? PeakReaching(Func<double, Sample> at, Sample before, Sample peak, Sample after, double tolerance)
    {
        var (from, to) = (before.Place, after.Place);
        while (Math.Abs(to - from) > 1e3 * tolerance)
        {
            var inUpper = Math.Abs(to - peak.Place) > Math.Abs(peak.Place - from);
            var sample = at(inUpper
                ? peak.Place + (GoldenShare * (to - peak.Place))
                : peak.Place - (GoldenShare * (peak.Place - from)));
            if (sample.Excess >= 0)
                return sample;
            if (sample.Excess > peak.Excess)
                (from, to, peak) = inUpper ? (peak.Place, to, sample) : (from, peak.Place, sample);
            else
                (from, to) = inUpper ? (from, sample.Place) : (sample.Place, to);
        }
        return null;
    }

    // Regula falsi with halving (Illinois) keeps both sides; a bisection steps in where it crawls, so that a jump is closed on as well.
    private static Reach Close(Func<double, Sample> at, Sample below, Sample reached, double tolerance)
    {
        var (fBelow, fReached) = (below.Excess, reached.Excess);
        var lastSide = 0;
        for (var i = 0; Math.Abs(reached.Place - below.Place) > tolerance && i < 200; i++)
        {
            var width = reached.Place - below.Place;
            var share = i % 4 == 3 || !double.IsFinite(fBelow) ? 0.5 : Math.Clamp(fBelow / (fBelow - fReached), 0, 1);
            var least = Math.Min(0.5, 0.4 * tolerance / Math.Abs(width));
            var place = below.Place + (Math.Clamp(share, least, 1 - least) * width);
            var sample = at(place);
            if (sample.Excess >= 0)
            {
                (reached, fReached) = (sample, sample.Excess);
                if (lastSide == 1)
                    fBelow /= 2;
                lastSide = 1;
            }
            else
            {
                (below, fBelow) = (sample, sample.Excess);
                if (lastSide == -1)
                    fReached /= 2;
                lastSide = -1;
            }
        }
        return new Reach(below, reached);
    }
}

/// <summary>The two sides of a place where an excess reaches 0.</summary>
/// <param name="Below">Where it has not yet; the same as <paramref name="Reached"/> where it had from the start.</param>
/// <param name="Reached">Where it is 0 or more.</param>
internal readonly record struct Reach(Sample Below, Sample Reached);
