using System.Collections.Immutable;
using BladeLoads.Rotor.Sections;

namespace BladeLoads.Results.Pictures;

/// <summary>The lines of a picture, each with its look and its coefficients.</summary>
/// <param name="All">In the order in which they are drawn: earlier tables, then the picture's own lines.</param>
internal sealed record PolarLines(ImmutableArray<PolarLines.Drawn> All)
{
    /// <summary>Tabulated lines beside the earlier section at the same Reynolds number.</summary>
    public ImmutableArray<(Drawn Now, Drawn Earlier)> Compared { get; private init; } = [];

    /// <param name="Kind">Null for earlier tables.</param>
    /// <param name="From">rad; where the drawn line begins.</param>
    internal sealed record Drawn(LineKind? Kind, string Label, LineLook Look, double From, double To)
    {
        public required ImmutableArray<(double From, double To)> Parts { get; init; }

        public required ImmutableArray<double> Knots { get; init; }

        public required Func<double, Coefficients> At { get; init; }

        public IEnumerable<Curve> OverAngle((double From, double To) span, Func<Coefficients, double> value)
            => Within(span, angle => (double.RadiansToDegrees(angle), value(At(angle))));

        public IEnumerable<Curve> Within((double From, double To) span, Func<double, (double, double)> at)
            => Parts.Select(part => (From: Math.Max(part.From, span.From), To: Math.Min(part.To, span.To)))
                .Where(part => part.To > part.From)
                .Select(part => new Curve(Look, part.From, part.To, Knots, at));
    }

    public static PolarLines Of(PolarPicture picture)
    {
        var reynolds = picture.Lines.Where(l => l.Kind == LineKind.Tabulated).Select(l => l.Polar.Reynolds).Distinct().Order().ToList();
        var augmented = picture.Lines.Where(l => l.Kind == LineKind.Augmented).Select(l => l.Label).Distinct().ToList();
        var own = picture.Lines.Select(line => Line(line.Polar, line.Kind, line.Label, Look(line), line.Parts)).ToList();
        if (picture.Earlier is not { } earlier)
            return new PolarLines([.. own]);

        var before = earlier.Section.Polars.Select(p => Line(p, null, earlier.Label, LineLook.Earlier(LookOf(p.Reynolds)), [])).ToList();
        var compared = picture.Lines.Zip(own).Where(l => l.First.Kind == LineKind.Tabulated)
            .Select(l => (Now: l.Second, Earlier: Beside(l.First.Polar.Reynolds, earlier)));
        return new PolarLines([.. before, .. own]) { Compared = [.. compared] };

        LineLook? LookOf(double number) => reynolds.IndexOf(number) is >= 0 and var place ? LineLook.Tabulated(place, reynolds.Count) : null;

        LineLook Look(PolarLine line)
        {
            var place = reynolds.IndexOf(line.Polar.Reynolds);
            return line.Kind switch
            {
                LineKind.Tabulated => LineLook.Tabulated(place, reynolds.Count),
                LineKind.Extended => LineLook.Extended,
                _ => LineLook.Augmented(augmented.IndexOf(line.Label)),
            };
        }
    }

    public ImmutableArray<Curve> OverAngle((double From, double To) span, Func<Coefficients, double> value)
        => [.. All.SelectMany(line => line.OverAngle(span, value))];

    public ImmutableArray<Curve> AgainstEachOther(
        (double From, double To) span, Func<Coefficients, double> across, Func<Coefficients, double> up)
        => [.. All.SelectMany(line => line.Within(span, angle => (across(line.At(angle)), up(line.At(angle)))))];

    /// <summary>What an update changed, where both reach.</summary>
    public ImmutableArray<Curve> Differences((double From, double To) span, Func<Coefficients, double> value)
        => [.. Compared
            .Select(c => (
                c.Now, c.Earlier,
                From: Math.Max(Math.Max(c.Now.From, c.Earlier.From), span.From), To: Math.Min(Math.Min(c.Now.To, c.Earlier.To), span.To)))
            .Where(c => c.To > c.From)
            .Select(c => new Curve(
                c.Now.Look, c.From, c.To, [.. c.Now.Knots.Concat(c.Earlier.Knots).Distinct().Order()],
                angle => (double.RadiansToDegrees(angle), value(c.Now.At(angle)) - value(c.Earlier.At(angle)))))];

    private static Drawn Line(Polar polar, LineKind? kind, string label, LineLook look, ImmutableArray<(double From, double To)> parts)
    {
        var alone = Section.FromPolars("", [polar]);
        var (from, to) = (polar.Angles[0], polar.Angles[^1]);
        var drawn = parts.Select(p => (From: Math.Max(p.From, from), To: Math.Min(p.To, to))).Where(p => p.To > p.From).ToImmutableArray();
        if (parts.IsEmpty)
            drawn = [(from, to)];
        return new Drawn(kind, label, look, drawn.IsEmpty ? from : drawn[0].From, drawn.IsEmpty ? from : drawn[^1].To)
        {
            Parts = drawn,
            Knots = polar.Angles,
            At = angle => alone.At(angle, polar.Reynolds),
        };
    }

    // As the solver would take it from the earlier tables: between their Reynolds numbers, the nearest beyond them.
    private static Drawn Beside(double reynolds, EarlierTables earlier)
    {
        var all = earlier.Section.Polars;
        var at = double.IsNaN(reynolds) ? all[all.Length / 2].Reynolds : reynolds;
        var (from, to) = (all.Max(p => p.Angles[0]), all.Min(p => p.Angles[^1]));
        return new Drawn(null, earlier.Label, LineLook.Earlier(null), from, to)
        {
            Parts = [(from, to)],
            Knots = [.. all.SelectMany(p => p.Angles).Distinct().Order()],
            At = angle => earlier.Section.At(angle, at),
        };
    }
}
