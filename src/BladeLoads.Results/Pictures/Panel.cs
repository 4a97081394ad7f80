using System.Collections.Immutable;
using System.Globalization;

namespace BladeLoads.Results.Pictures;

/// <summary>One diagram of a page.</summary>
/// <param name="HasMarks">Whether rows of tables are marked.</param>
internal sealed record Panel(PanelAxis Across, PanelAxis Up, ImmutableArray<Curve> Curves, bool HasMarks)
{
    /// <summary>What lies across between these is shaded; null for nothing.</summary>
    public (double From, double To)? Shade { get; init; }

    /// <summary>Places with a ring about them.</summary>
    public ImmutableArray<(double X, double Y)> Rings { get; init; } = [];

    /// <summary>A horizontal line at 0 is drawn.</summary>
    public bool HasZeroLine => !Up.IsLogarithmic && Up.From < 0 && Up.To > 0;

    public Frame Frame(float width, float height) => new(Across.From, Across.To, Up.From, Up.To, width, height);
}

/// <summary>An axis: its label and its range, which is of decimal logarithms where it is logarithmic.</summary>
internal sealed record PanelAxis(string Label, double From, double To)
{
    /// <summary>Where numbers stand; empty for places that suit the length.</summary>
    public ImmutableArray<(double At, string Text)> Ticks { get; init; } = [];

    public bool IsLogarithmic { get; init; }

    /// <summary>Angles of attack, with numbers at whole multiples that suit the range.</summary>
    public static PanelAxis Angles(double fromDeg, double toDeg)
    {
        var every = (toDeg - fromDeg) switch { <= 60 => 5, <= 100 => 10, <= 150 => 15, _ => 45 };
        var ticks = Enumerable.Range(-180 / every, (360 / every) + 1).Select(i => i * every)
            .Where(deg => deg >= fromDeg - 1e-9 && deg <= toDeg + 1e-9)
            .Select(deg => ((double)deg, deg.ToString(CultureInfo.InvariantCulture))).ToImmutableArray();
        // From radians, 30 may come a little below itself, and its number would be left out.
        return new PanelAxis("angle of attack, deg", Math.Round(fromDeg, 9), Math.Round(toDeg, 9)) { Ticks = ticks.Length > 2 ? ticks : [] };
    }

    /// <summary>A range with a little room about the values; no narrower than <paramref name="narrowest"/>.</summary>
    public static PanelAxis Around(string label, IEnumerable<double> values, double narrowest)
    {
        var (least, largest) = Extremes(values);
        var room = Math.Max((largest - least) * 0.06, (narrowest - (largest - least)) / 2);
        return new PanelAxis(label, least - room, largest + room);
    }

    /// <summary>From 0 to a little above the largest of the values, none of which is negative.</summary>
    public static PanelAxis FromZero(string label, IEnumerable<double> values)
    {
        var (_, largest) = Extremes(values.Append(0));
        return new PanelAxis(label, 0, largest > 0 ? largest * 1.06 : 1);
    }

    /// <param name="logarithms">Decimal logarithms of the values.</param>
    public static PanelAxis Logarithmic(string label, IEnumerable<double> logarithms)
    {
        var (least, largest) = Extremes(logarithms);
        var room = Math.Max((largest - least) * 0.06, 0.04);
        var (from, to) = (least - room, largest + room);
        var sparse = to - from > 3;
        var steps = sparse ? [1] : (int[])[1, 2, 5];
        return new PanelAxis(label, from, to)
        {
            IsLogarithmic = true,
            Ticks = [.. Enumerable.Range((int)Math.Floor(from), (int)(Math.Ceiling(to) - Math.Floor(from)) + 1)
                .SelectMany(power => steps.Select(step => (At: power + Math.Log10(step), Value: step * Math.Pow(10, power))))
                .Where(tick => tick.At >= from && tick.At <= to)
                .Select(tick => (tick.At, NumberText(tick.Value)))],
        };
    }

    /// <summary>A number beside an axis; those that would need more room than there is with an exponent: <c>1e-5</c>.</summary>
    public static string NumberText(double value) => Math.Abs(value) is >= 1e6 or (< 1e-4 and > 1e-9)
        ? value.ToString("0.###e0", CultureInfo.InvariantCulture)
        : value.ToString("0.######", CultureInfo.InvariantCulture);

    private static (double Least, double Largest) Extremes(IEnumerable<double> values)
    {
        var (least, largest) = (double.PositiveInfinity, double.NegativeInfinity);
        foreach (var value in values)
            (least, largest) = (Math.Min(least, value), Math.Max(largest, value));
        return least <= largest ? (least, largest) : (0, 0);
    }
}
