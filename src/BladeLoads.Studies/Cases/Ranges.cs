using BladeLoads.Studies.Fingerprints;

namespace BladeLoads.Studies.Cases;

/// <summary>
/// The ranges of keys of which more is said than the range: what a value outside would mean and what would do. What is usual at a site or in a
/// machine is common practice, no source.
/// </summary>
internal static class Ranges
{
    public static Bounds Efficiency { get; } = Bounds.AboveZeroTo(1) with
    {
        TooLow = "no electrical power would be left",
        TooHigh = "electrical power would exceed rotor power",
        Remedy = "give the share of rotor power that becomes electrical, such as 0.94",
        Slip = Percent(from: 20),
    };

    public static Bounds Load { get; } = Bounds.FromTo(0, 10) with
    {
        TooLow = "a load is a share of rated electrical power",
        TooHigh = "no machine carries ten times its rated power",
        Remedy = "give the share of rated electrical power, such as 0.25",
        Slip = Percent(from: 10),
    };

    public static Bounds ThrustLimit { get; } = Bounds.AboveZero with
    {
        TooLow = "a rotor that takes no thrust makes no power",
        Remedy = "give the largest thrust that the rotor may take, in kN, such as 320, or leave the key out for none",
    };

    public static Bounds RatedPower { get; } = Bounds.AboveZeroTo(Limits.RatedPowerKiloWatt) with
    {
        TooLow = "there would be no power to hold",
        TooHigh = "no machine makes as much",
        Remedy = "give it in kW, such as 2000, or leave the key out for none",
    };

    public static Bounds CutIn { get; } = Bounds.FromTo(0, Limits.WindSpeed) with
    {
        TooLow = "no wind is slower than calm",
        TooHigh = "no machine operates there",
        Remedy = "give it in m/s, such as 3, or leave the key out for none",
    };

    public static Bounds CutOut { get; } = Bounds.AboveZeroTo(Limits.WindSpeed) with
    {
        TooLow = "there would be no wind to operate in",
        TooHigh = "no machine operates there",
        Remedy = "give it in m/s, such as 25, or leave the key out for none",
    };

    public static Bounds TipSpeedRatio { get; } = Bounds.AboveZero with
    {
        TooLow = "the rotor would not turn in its own direction",
        Remedy = "give a number such as 8, or \"best\" for the one with the highest power coefficient",
    };

    public static Bounds FinePitch { get; } = Bounds.Within(90) with
    {
        TooLow = "the blade would stand beyond full stall",
        TooHigh = "the blade would stand beyond feather",
        Remedy = "give it in degrees, such as 0, or \"best\" for the one with the highest power coefficient",
    };

    public static Bounds RotorSpeed { get; } = Bounds.FromTo(0, Limits.RotorSpeedRpm) with
    {
        TooLow = "the rotor turns one way only",
        TooHigh = "no rotor turns as fast",
        Remedy = "give it in rpm, such as 12",
    };

    public static Bounds HighestRotorSpeed { get; } = RotorSpeed with { LowIncluded = false, TooLow = "the rotor could not turn" };

    public static Bounds Density { get; } = Bounds.AboveZeroTo(Limits.Density) with
    {
        TooLow = "there would be no air",
        TooHigh = "no air is as dense",
        Remedy = "give it in kg/m3, such as 1.225",
    };

    public static Bounds Viscosity { get; } = Bounds.AboveZeroTo(Limits.DynamicViscosity) with
    {
        TooLow = "Reynolds numbers would have no bound",
        TooHigh = "no air is as viscous",
        Remedy = "give it in Pa s, such as 1.789e-5",
    };

    public static Bounds Altitude { get; } = Bounds.FromTo(-500, 11_000) with
    {
        TooLow = "no ground is as low",
        TooHigh = "the standard atmosphere is used no higher",
        Remedy = "give it in m over the sea, such as 500, or the density itself",
    };

    public static Bounds Temperature { get; } = Bounds.FromTo(-100, 100) with
    {
        TooLow = "no air over ground is as cold",
        TooHigh = "no air over ground is as hot",
        Remedy = "give it in degrees C, such as 15",
        Slip = value => value is > 170 and < 340
            ? $"is it in kelvin? write {CanonicalText.Of(Math.Round(value - AirReader.CelsiusZero, 6))}" : null,
    };

    public static Bounds Pressure { get; } = Bounds.FromTo(10_000, 120_000) with
    {
        TooLow = "the air over ground has more",
        TooHigh = "the air over ground has less",
        Remedy = "give it in Pa, such as 101325",
        Slip = value => value switch
        {
            >= 300 and <= 1100 => $"is it in hPa? write {CanonicalText.Of(Math.Round(value * 100, 6))}",
            >= 30 and <= 110 => $"is it in kPa? write {CanonicalText.Of(Math.Round(value * 1000, 6))}",
            _ => null,
        },
    };

    public static Bounds Humidity { get; } = Bounds.FromTo(0, 1) with
    {
        TooLow = "air cannot be drier than dry",
        TooHigh = "air holds no more water than when it is saturated",
        Remedy = "give the share of saturation, such as 0.6",
        Slip = Percent(from: 2),
    };

    public static Bounds TurbulenceIntensity { get; } = Bounds.FromTo(0, 1) with
    {
        TooLow = "a standard deviation is never negative",
        TooHigh = "the wind speed would vary by more than its mean",
        Remedy = "give the standard deviation over the mean, such as 0.16",
        Slip = Percent(from: 2),
    };

    public static Bounds MeanWindSpeed { get; } = Bounds.AboveZeroTo(Limits.WindSpeed) with
    {
        TooLow = "there would be no wind",
        TooHigh = "no site has as much",
        Remedy = "give the mean of the year at hub height in m/s, such as 7.5",
    };

    public static Bounds WeibullShape { get; } = new(1, true, double.PositiveInfinity)
    {
        TooLow = "below 1 calm would be the likeliest wind",
        Remedy = "sites have 1.5 to 3, and 2 is Rayleigh's; fit it to the wind at hub height, or give a histogram of it",
    };

    public static Bounds Availability { get; } = Bounds.AboveZeroTo(1) with
    {
        TooLow = "the machine would never run",
        TooHigh = "the machine would run longer than the year",
        Remedy = "give the share of time in which it can run, such as 0.97",
        Slip = Percent(from: 20),
    };

    public static Bounds Loss { get; } = Bounds.FromTo(0, 1) with
    {
        HighIncluded = false,
        TooLow = "a loss would add energy",
        TooHigh = "no energy would be left",
        Remedy = "give the share of energy that is lost, such as 0.06",
        Slip = Percent(from: 1),
    };

    // Below, the value is no likely percentage of such a share: an efficiency of 1.2 is no 1.2 percent.
    private static Func<double, string?> Percent(double from)
        => value => value >= from && value <= 100
            ? $"it is a share and not percent: write {CanonicalText.Of(Math.Round(value / 100, 12))}" : null;
}
