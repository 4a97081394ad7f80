namespace BladeLoads.Rotor.Operation;

/// <summary>Finds where a quantity is largest along a line.</summary>
internal static class Largest
{
    private const double GoldenShare = 0.3819660112501051;

    // Of a place's own size: nearer to a top, values differ by less than their rounding.
    private const double LeastStep = 1e-9;

    /// <summary>
    /// The place of the largest value: each peak that the places show and that could be the highest is followed, the highest taken.
    /// </summary>
    /// <param name="value">NaN counts as lowest.</param>
    /// <param name="places">Rising, one or more; closer together than two peaks that matter.</param>
    /// <param name="tolerance">In the unit of the places.</param>
    /// <param name="worth">
    /// Share of the range of values, 0 to 1: a sample further below the highest is no peak worth following. 1 follows all.
    /// </param>
    public static Sample Find(Func<double, double> value, ReadOnlySpan<double> places, double tolerance, double worth)
    {
        var samples = new Sample[places.Length];
        for (var i = 0; i < places.Length; i++)
            samples[i] = At(value, places[i]);
        var best = samples.MaxBy(s => s.Excess);
        var least = best.Excess - (worth * (best.Excess - samples.Min(s => s.Excess)));
        for (var i = 0; i < samples.Length; i++)
        {
            var isPeak = (i == 0 || samples[i].Excess >= samples[i - 1].Excess)
                && (i == samples.Length - 1 || samples[i].Excess >= samples[i + 1].Excess);
            if (!isPeak || samples[i].Excess < least)
                continue;
            var peak = Follow(value, samples[Math.Max(0, i - 1)].Place, samples[i], samples[Math.Min(samples.Length - 1, i + 1)].Place, tolerance);
            if (peak.Excess > best.Excess)
                best = peak;
        }
        return best;
    }

    /// <summary>
    /// Follows one peak between two places: parabolas through the three highest samples, golden sections where those do not close in.
    /// Done when the top lies between two places no further apart than the tolerance. A value that jumps is closed in on by the sections.
    /// </summary>
    /// <remarks>Source: key brent1973 in docs/sources.md, for a largest in place of a least value.</remarks>
    private static Sample Follow(Func<double, double> value, double from, Sample top, double to, double tolerance)
    {
        var (second, third) = (top, top);
        double step = 0, stepBefore = 0;
        while (true)
        {
            var middle = (from + to) / 2;
            var least = (LeastStep * Math.Abs(top.Place)) + (tolerance / 3);
            if (Math.Abs(top.Place - middle) <= (2 * least) - ((to - from) / 2))
                return top;
            var parabola = Math.Abs(stepBefore) > least ? ParabolaStep(top, second, third) : double.NaN;
            if (Math.Abs(parabola) < Math.Abs(stepBefore) / 2 && top.Place + parabola > from && top.Place + parabola < to)
            {
                (stepBefore, step) = (step, parabola);
                if (top.Place + step - from < 2 * least || to - top.Place - step < 2 * least)
                    step = top.Place < middle ? least : -least;
            }
            else
            {
                stepBefore = top.Place < middle ? to - top.Place : from - top.Place;
                step = GoldenShare * stepBefore;
            }
            var sample = At(value, top.Place + (Math.Abs(step) >= least ? step : Math.CopySign(least, step)));
            if (sample.Excess >= top.Excess)
            {
                (from, to) = sample.Place >= top.Place ? (top.Place, to) : (from, top.Place);
                (third, second, top) = (second, top, sample);
                continue;
            }
            (from, to) = sample.Place < top.Place ? (sample.Place, to) : (from, sample.Place);
            if (sample.Excess >= second.Excess || second.Place == top.Place)
                (third, second) = (second, sample);
            else if (sample.Excess >= third.Excess || third.Place == top.Place || third.Place == second.Place)
                third = sample;
        }
    }

    // From the highest of three samples to the top of the parabola through them; NaN where two of them are one.
    private static double ParabolaStep(in Sample top, in Sample second, in Sample third)
    {
        var (toSecond, toThird) = (top.Place - second.Place, top.Place - third.Place);
        var (r, q) = (toSecond * (top.Excess - third.Excess), toThird * (top.Excess - second.Excess));
        return ((toSecond * r) - (toThird * q)) / (2 * (q - r));
    }

    private static Sample At(Func<double, double> value, double place)
    {
        var found = value(place);
        return new Sample(place, double.IsNaN(found) ? double.NegativeInfinity : found, null);
    }
}
