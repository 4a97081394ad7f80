using System.Collections.Immutable;

namespace BladeLoads.Results.Pictures;

/// <summary>A line of a panel: a point for each angle of attack from one end to the other.</summary>
/// <param name="From">rad</param>
/// <param name="To">rad, above <paramref name="From"/>.</param>
/// <param name="Knots">Angles of the rows behind it, rad, rising; some may lie outside the ends.</param>
/// <param name="At">What lies across and up at an angle, in the values of the panel's axes; NaN where there is nothing to draw.</param>
internal sealed record Curve(LineLook Look, double From, double To, ImmutableArray<double> Knots, Func<double, (double X, double Y)> At)
{
    private const double Flat = 0.12;     // px off the true curve
    private const int MostHalvings = 9;
    private const int SamplesPerRow = 6;

    /// <summary>The rows between the ends.</summary>
    public IEnumerable<(double X, double Y)> Rows => Knots.Where(k => k >= From && k <= To).Select(At).Where(IsDrawn);

    /// <summary>Points close enough to tell the range of the values.</summary>
    public IEnumerable<(double X, double Y)> Samples()
        => Breaks().Zip(Breaks().Skip(1))
            .SelectMany(cell => Enumerable.Range(0, SamplesPerRow).Select(i => cell.First + ((cell.Second - cell.First) * i / SamplesPerRow)))
            .Append(To).Select(At).Where(IsDrawn);

    /// <summary>The curve as straight pieces that no eye tells from it, as far as it lies within a frame.</summary>
    public IEnumerable<ImmutableArray<(double X, double Y)>> Pieces(Frame frame)
    {
        var piece = ImmutableArray.CreateBuilder<(double X, double Y)>();
        (double X, double Y)? last = null;
        foreach (var point in Points(frame))
        {
            var next = IsDrawn(point) ? point : ((double X, double Y)?)null;
            if (last is { } from && next is { } to && frame.MayShow(from, to))
            {
                if (piece.Count == 0)
                    piece.Add(from);
                piece.Add(to);
            }
            else if (piece.Count > 0)
            {
                yield return piece.ToImmutable();
                piece.Clear();
            }
            last = next;
        }
        if (piece.Count > 0)
            yield return piece.ToImmutable();
    }

    private IEnumerable<(double X, double Y)> Points(Frame frame)
    {
        var breaks = Breaks().ToList();
        yield return At(breaks[0]);
        for (var i = 1; i < breaks.Count; i++)
            foreach (var point in Halved(breaks[i - 1], At(breaks[i - 1]), breaks[i], At(breaks[i]), frame, MostHalvings))
                yield return point;
    }

    private IEnumerable<(double X, double Y)> Halved(
        double a, (double X, double Y) atA, double b, (double X, double Y) atB, Frame frame, int halvings)
    {
        var middle = (a + b) / 2;
        var atMiddle = At(middle);
        // Off by nothing in the middle is no proof: a cubic may cross its chord there.
        if (halvings == 0 || (frame.Distance(atMiddle, atA, atB) < Flat && frame.Distance(At((a + middle) / 2), atA, atB) < Flat
            && frame.Distance(At((middle + b) / 2), atA, atB) < Flat))
            return [atB];
        return Halved(a, atA, middle, atMiddle, frame, halvings - 1).Concat(Halved(middle, atMiddle, b, atB, frame, halvings - 1));
    }

    private IEnumerable<double> Breaks() => Knots.Where(k => k > From && k < To).Prepend(From).Append(To);

    private static bool IsDrawn((double X, double Y) point) => double.IsFinite(point.X) && double.IsFinite(point.Y);
}

/// <summary>The ranges of a panel's two axes and how many px they are long.</summary>
internal readonly record struct Frame(double Left, double Right, double Bottom, double Top, float Width, float Height)
{
    public bool Contains((double X, double Y) point)
        => point.X >= Left && point.X <= Right && point.Y >= Bottom && point.Y <= Top;

    /// <summary>False only where all between the two points is outside.</summary>
    public bool MayShow((double X, double Y) a, (double X, double Y) b)
        => Math.Max(a.X, b.X) >= Left && Math.Min(a.X, b.X) <= Right && Math.Max(a.Y, b.Y) >= Bottom && Math.Min(a.Y, b.Y) <= Top;

    /// <summary>How far a point is from the straight between two others, px.</summary>
    public double Distance((double X, double Y) point, (double X, double Y) a, (double X, double Y) b)
    {
        var (x, y) = (Width / (Right - Left), Height / (Top - Bottom));
        var (dx, dy) = ((b.X - a.X) * x, (b.Y - a.Y) * y);
        var (px, py) = ((point.X - a.X) * x, (point.Y - a.Y) * y);
        var length = Math.Sqrt((dx * dx) + (dy * dy));
        return length < 1e-9 ? Math.Sqrt((px * px) + (py * py)) : Math.Abs((px * dy) - (py * dx)) / length;
    }
}
