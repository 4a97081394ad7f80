using BladeLoads.Rotor.Sections;

namespace BladeLoads.Rotor.Tests.Properties;

/// <summary>Augmentation for rotation, written for the tests from docs/theory.md and nothing of the library.</summary>
internal static class IndependentAugmentation
{
    private const double Degree = Math.PI / 180;

    public static (double Lift, double Drag) Factors(
        Augmentation method, double chordRatio, double radiusRatio, double windSpeed, double tipSpeed)
    {
        if (method == Augmentation.None || radiusRatio > 0.8 || tipSpeed == 0)
            return (0, 0);
        if (method == Augmentation.Snel1993)
            return (Math.Min(1, 3 * Math.Pow(chordRatio, 2)), 0);
        var lambda = tipSpeed / Math.Sqrt(Math.Pow(windSpeed, 2) + Math.Pow(tipSpeed, 2));
        double Factor(double exponent)
        {
            // (1 - x)/(1 + x) with x = (c/r)^exponent is the hyperbolic tangent of minus half its logarithm.
            var ratio = Math.Tanh(-exponent * Math.Log(chordRatio) / 2);
            return Math.Clamp((1.6 * chordRatio / 0.1267 * ratio - 1) / (2 * Math.PI), 0, 1);
        }
        return (Factor(1 / (lambda * radiusRatio)), Factor(1 / (2 * lambda * radiusRatio)));
    }

    /// <summary>Every row of a polar with all the augmentation of its angle; where it ends before 50 degrees, a row every 2.5 to there.</summary>
    public static (double[] Angles, double[] Lift, double[] Drag) Full(Polar polar)
    {
        double[] angles =
        [
            .. polar.Angles,
            .. Enumerable.Range(1, 20).Select(i => 2.5 * Degree * i).Where(angle => angle > polar.Angles[^1] + 0.5 * Degree),
        ];
        var last = polar.Angles.Length - 1;
        var lift = angles.Select((_, i) => polar.Lift[Math.Min(i, last)]).ToArray();
        var drag = angles.Select((_, i) => polar.Drag[Math.Min(i, last)]).ToArray();
        if (Line(polar) is not var (zero, slope))
            return (angles, lift, drag);
        var least = polar.Drag[0];
        if (zero > polar.Angles[0])
        {
            var before = Enumerable.Range(0, last).Last(i => polar.Angles[i] <= zero);
            var share = (zero - polar.Angles[before]) / (polar.Angles[before + 1] - polar.Angles[before]);
            least = polar.Drag[before] * (1 - share) + polar.Drag[before + 1] * share;
        }
        for (var i = 0; i < angles.Length; i++)
        {
            if (angles[i] < zero || angles[i] >= 50 * Degree)
                continue;
            var part = angles[i] <= 30 * Degree ? 1 : (50 * Degree - angles[i]) / (20 * Degree);
            lift[i] += part * (slope * Math.Sin(angles[i] - zero) - lift[i]);
            drag[i] += part * (least - drag[i]);
        }
        return (angles, lift, drag);
    }

    // Of tables with several rows within 4 degrees of zero lift or, where they begin above it, of their first row: as all plausible ones have.
    private static (double Zero, double Slope)? Line(Polar polar)
    {
        var crossings = Enumerable.Range(0, polar.Angles.Length - 1)
            .Where(i => polar.Lift[i] <= 0 && polar.Lift[i + 1] >= 0 && polar.Lift[i + 1] > polar.Lift[i])
            .Select(i => polar.Angles[i] - polar.Lift[i] * (polar.Angles[i + 1] - polar.Angles[i]) / (polar.Lift[i + 1] - polar.Lift[i]))
            .Where(angle => Math.Abs(angle) <= 20 * Degree).ToArray();
        if (crossings.Length == 0)
            return FirstRows(polar);
        var zero = crossings.MinBy(Math.Abs);
        var rows = polar.Angles.Select((angle, i) => (X: angle - zero, Y: polar.Lift[i])).Where(row => Math.Abs(row.X) <= 4 * Degree + 1e-9).ToArray();
        var slope = rows.Sum(row => row.X * row.Y) / rows.Sum(row => row.X * row.X);
        return slope > 0 ? (zero, slope) : null;
    }

    private static (double Zero, double Slope)? FirstRows(Polar polar)
    {
        var first = polar.Angles[0];
        if (first < -20 * Degree || polar.Lift[0] <= 0)
            return null;
        var rows = polar.Angles.Select((angle, i) => (X: angle, Y: polar.Lift[i])).Where(row => row.X - first <= 4 * Degree).ToArray();
        var (meanX, meanY) = (rows.Average(row => row.X), rows.Average(row => row.Y));
        var slope = rows.Sum(row => (row.X - meanX) * (row.Y - meanY)) / rows.Sum(row => Math.Pow(row.X - meanX, 2));
        return slope > 0 && Math.Abs(meanX - meanY / slope) <= 20 * Degree ? (meanX - meanY / slope, slope) : null;
    }
}
