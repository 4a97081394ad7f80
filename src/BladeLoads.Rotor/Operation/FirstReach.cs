namespace BladeLoads.Rotor.Operation;

/// <summary>
/// Walks along a line of places until a quantity reaches 0 from below, peaks between two places included, and closes on the place where
/// it does.
/// </summary>
internal static class FirstReach
{
    private const double GoldenShare = 0.3819660112501051;

    /// <summary>Where the excess first reaches 0, in the order walked; null where it does not.</summary>
    /// <param name="excess">What is to reach 0; NaN counts as below.</param>
    /// <param name="places">In the order walked, rising or falling.</param>
    /// <param name="tolerance">In the unit of the places: how far apart the two sides of the answer may be.</param>
    public static Reach? Find(Func<double, double> excess, ReadOnlySpan<double> places, double tolerance)
    {
        var below = new Sample(places[0], excess(places[0]));
        if (below.Excess >= 0)
            return new Reach(below, below);
        var beforeThat = below;
        foreach (var place in places[1..])
        {
            var here = new Sample(place, excess(place));
            if (beforeThat.Place != below.Place && below.Excess > beforeThat.Excess && below.Excess >= here.Excess
                && PeakReaching(excess, beforeThat.Place, below, here.Place, tolerance) is { } peak)
                return Close(excess, beforeThat, peak, tolerance);
            if (here.Excess >= 0)
                return Close(excess, below, here, tolerance);
            (beforeThat, below) = (below, here);
        }
        return null;
    }

    // Golden sections round a peak, until it reaches 0 or is told apart no more.
    private static Sample? PeakReaching(Func<double, double> excess, double from, Sample peak, double to, double tolerance)
    {
        while (Math.Abs(to - from) > 1e3 * tolerance)
        {
            var inUpper = Math.Abs(to - peak.Place) > Math.Abs(peak.Place - from);
            var place = inUpper
                ? peak.Place + (GoldenShare * (to - peak.Place))
                : peak.Place - (GoldenShare * (peak.Place - from));
            var sample = new Sample(place, excess(place));
            if (sample.Excess >= 0)
                return sample;
            if (sample.Excess > peak.Excess)
                (from, to, peak) = inUpper ? (peak.Place, to, sample) : (from, peak.Place, sample);
            else
                (from, to) = inUpper ? (from, place) : (place, to);
        }
        return null;
    }

    // Regula falsi with halving (Illinois) keeps both sides; a bisection steps in where it crawls, so that a jump is closed on as well.
    private static Reach Close(Func<double, double> excess, Sample below, Sample reached, double tolerance)
    {
        var (fBelow, fReached) = (below.Excess, reached.Excess);
        var lastSide = 0;
        for (var i = 0; Math.Abs(reached.Place - below.Place) > tolerance && reached.Excess != 0 && i < 200; i++)
        {
            var width = reached.Place - below.Place;
            var share = i % 4 == 3 || !double.IsFinite(fBelow) ? 0.5 : Math.Clamp(fBelow / (fBelow - fReached), 0, 1);
            var least = Math.Min(0.5, 0.4 * tolerance / Math.Abs(width));
            var place = below.Place + (Math.Clamp(share, least, 1 - least) * width);
            var sample = new Sample(place, excess(place));
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

/// <summary>A place and the excess there.</summary>
internal readonly record struct Sample(double Place, double Excess);

/// <summary>The two sides of a place where an excess reaches 0.</summary>
/// <param name="Below">Where it has not yet; the same as <paramref name="Reached"/> where it had from the start.</param>
/// <param name="Reached">Where it is 0 or more.</param>
internal readonly record struct Reach(Sample Below, Sample Reached);
