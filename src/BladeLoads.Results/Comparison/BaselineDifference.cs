using BladeLoads.Results.Receipts;

namespace BladeLoads.Results.Comparison;

/// <summary>
/// How far a case lies from the baseline of its study, in percent of the baseline; null where either has no such figure, or the
/// baseline's is 0. The flapwise moment is compared by magnitude: its sign turns with the pitch, not with its size.
/// </summary>
public sealed record BaselineDifference(
    double? BestPowerCoefficient, double? LargestElectricalPower, double? LargestThrust, double? RatedWindSpeed,
    double? LargestFlapwiseMoment, double? AnnualEnergy, double? CapacityFactor)
{
    public static BaselineDifference Between(CaseSummary one, CaseSummary baseline) => new(
        Percent(one.BestPowerCoefficient?.Value, baseline.BestPowerCoefficient?.Value),
        Percent(one.LargestElectricalPower?.Value, baseline.LargestElectricalPower?.Value),
        Percent(one.LargestThrust?.Value, baseline.LargestThrust?.Value),
        Percent(one.RatedWindSpeed, baseline.RatedWindSpeed),
        Percent(Magnitude(one.LargestFlapwiseMoment), Magnitude(baseline.LargestFlapwiseMoment)),
        Percent(one.Energy?.AnnualEnergy, baseline.Energy?.AnnualEnergy),
        Percent(one.Energy?.CapacityFactor, baseline.Energy?.CapacityFactor));

    private static double? Magnitude(Extreme? moment) => moment is null ? null : Math.Abs(moment.Value);

    private static double? Percent(double? value, double? baseline)
        => baseline is { } b && b != 0 ? 100 * (value - b) / Math.Abs(b) : null;
}
