using BladeLoads.Studies.Fingerprints;

namespace BladeLoads.Studies.Cases;

/// <summary>The numbers that a key may take, in the unit of the file.</summary>
internal sealed record Bounds(double Low, bool LowIncluded, double High)
{
    public static Bounds Any { get; } = new(double.NegativeInfinity, false, double.PositiveInfinity);

    public static Bounds AboveZero { get; } = new(0, false, double.PositiveInfinity);

    public static Bounds ZeroOrMore { get; } = new(0, true, double.PositiveInfinity);

    public static Bounds OneOrMore { get; } = new(1, true, double.PositiveInfinity);

    public static Bounds Share { get; } = new(0, true, 1);

    public static Bounds AboveZeroToOne { get; } = AboveZeroTo(1);

    /// <summary>Above 0, the limit included.</summary>
    public static Bounds AboveZeroTo(double limit) => new(0, false, limit);

    /// <summary>From minus to plus, both included.</summary>
    public static Bounds Within(double limit) => new(-limit, true, limit);

    public static Bounds FromTo(double low, double high) => new(low, true, high);

    public bool Contain(double value) => (LowIncluded ? value >= Low : value > Low) && value <= High;

    /// <summary>What would do: <c>it must be above 0</c>.</summary>
    public string Rule => (LowIncluded, double.IsInfinity(High)) switch
    {
        (false, true) => $"it must be above {CanonicalText.Of(Low)}",
        (true, true) => $"it must be {CanonicalText.Of(Low)} or more",
        (false, false) => $"it must be above {CanonicalText.Of(Low)} and at most {CanonicalText.Of(High)}",
        (true, false) => $"it must be from {CanonicalText.Of(Low)} to {CanonicalText.Of(High)}",
    };
}
