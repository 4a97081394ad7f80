using BladeLoads.Studies.Fingerprints;

namespace BladeLoads.Studies.Cases;

/// <summary>
/// The numbers that a key may take, in the unit of the file, and what is said of any other: the range, what the value would mean, what would do.
/// </summary>
internal sealed record Bounds(double Low, bool LowIncluded, double High)
{
    /// <summary>What a value below would mean: <c>no energy would be left</c>.</summary>
    public string? TooLow { get; init; }

    /// <summary>What a value above would mean.</summary>
    public string? TooHigh { get; init; }

    /// <summary>What to write instead.</summary>
    public string? Remedy { get; init; }

    /// <summary>For a value in another unit than meant: what to write for it, in the place of the remedy; null where it is none.</summary>
    public Func<double, string?>? Slip { get; init; }

    /// <summary>Whether <see cref="High"/> itself does.</summary>
    public bool HighIncluded { get; init; } = true;

    public static Bounds AboveZero { get; } = new(0, false, double.PositiveInfinity);

    public static Bounds ZeroOrMore { get; } = new(0, true, double.PositiveInfinity);

    /// <summary>Above 0, the limit included.</summary>
    public static Bounds AboveZeroTo(double limit) => new(0, false, limit);

    /// <summary>From minus to plus, both included.</summary>
    public static Bounds Within(double limit) => new(-limit, true, limit);

    public static Bounds FromTo(double low, double high) => new(low, true, high);

    public bool Contain(double value) => (LowIncluded ? value >= Low : value > Low) && (HighIncluded ? value <= High : value < High);

    /// <summary>All that is said of a value outside, after what was found: the range, the consequence, the remedy.</summary>
    public string Refusal(double value)
    {
        var meaning = value > Low && !Contain(value) ? TooHigh : TooLow;
        var remedy = Slip?.Invoke(value) ?? Remedy;
        return Rule + (meaning is null ? "" : $": {meaning}") + (remedy is null ? "" : $"; {remedy}");
    }

    /// <summary>What would do: <c>it must be above 0</c>.</summary>
    private string Rule => (LowIncluded, double.IsInfinity(High)) switch
    {
        (true, false) when !HighIncluded => $"it must be {CanonicalText.Of(Low)} or more and below {CanonicalText.Of(High)}",
        (false, true) => $"it must be above {CanonicalText.Of(Low)}",
        (true, true) => $"it must be {CanonicalText.Of(Low)} or more",
        (false, false) => $"it must be above {CanonicalText.Of(Low)} and at most {CanonicalText.Of(High)}",
        (true, false) => $"it must be from {CanonicalText.Of(Low)} to {CanonicalText.Of(High)}",
    };
}
