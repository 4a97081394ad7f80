namespace BladeLoads.Rotor.Operation;

/// <summary>Finds where a quantity is largest along a line.</summary>
internal static class Largest
{
    private const double GoldenShare = 0.3819660112501051;

    /// <summary>
    /// The place of the largest value: every peak that the places show is followed by golden sections, and the highest taken.
    /// </summary>
    /// <param name="value">NaN counts as lowest.</param>
    /// <param name="places">Rising, one or more; closer together than two peaks that matter.</param>
    /// <param name="tolerance">In the unit of the places.</param>
    public static Sample Find(Func<double, double> value, ReadOnlySpan<double> places, double tolerance)
    {
        var samples = new Sample[places.Length];
        for (var i = 0; i < places.Length; i++)
            samples[i] = At(places[i]);
        var best = samples[0];
        for (var i = 0; i < samples.Length; i++)
        {
            var isPeak = (i == 0 || samples[i].Excess >= samples[i - 1].Excess)
                && (i == samples.Length - 1 || samples[i].Excess >= samples[i + 1].Excess);
            if (!isPeak)
                continue;
            var peak = Follow(samples[Math.Max(0, i - 1)].Place, samples[i], samples[Math.Min(samples.Length - 1, i + 1)].Place);
            if (peak.Excess > best.Excess)
                best = peak;
        }
        return best;

        Sample At(double place)
        {
            var found = value(place);
            return new Sample(place, double.IsNaN(found) ? double.NegativeInfinity : found, null);
        }

        Sample Follow(double from, Sample peak, double to)
        {
            while (to - from > tolerance)
            {
                var inUpper = to - peak.Place > peak.Place - from;
                var sample = At(inUpper ? peak.Place + (GoldenShare * (to - peak.Place)) : peak.Place - (GoldenShare * (peak.Place - from)));
                if (sample.Excess > peak.Excess)
                    (from, to, peak) = inUpper ? (peak.Place, to, sample) : (from, peak.Place, sample);
                else
                    (from, to) = inUpper ? (from, sample.Place) : (sample.Place, to);
            }
            return peak;
        }
    }
}
