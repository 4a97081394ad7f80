using System.Collections.Immutable;
using BladeLoads.Rotor.Sections;

namespace BladeLoads.Results.Pictures;

/// <summary>The diagrams of a section's page.</summary>
/// <param name="LiftToDragDifference">Strips of what an update changed; null, like the other two, where nothing is compared.</param>
/// <param name="WholeLift">Over all angles of the tables; null, like <paramref name="WholeDrag"/>, where the working range holds them all.</param>
internal sealed record PolarPanels(
    Panel Lift, Panel? LiftDifference, Panel Drag, Panel? DragDifference, Panel LiftToDrag, Panel? LiftToDragDifference, Panel LiftOverDrag,
    Panel? WholeLift, Panel? WholeDrag)
{
    // Angles at which blades work with the wind in their face, and a little more: common practice, no source.
    private const double WorkingFrom = -20 * Math.PI / 180;
    private const double WorkingTo = 30 * Math.PI / 180;

    private const double Slack = 1e-9;             // rad
    private const double LogarithmicFrom = 8;      // largest over least drag
    private const double LiftOverDragReach = 5;    // largest drag shown over the least one
    private const double NarrowestLift = 0.2;
    private const double NarrowestLiftToDrag = 2;

    private const string Lifting = "lift coefficient, -";
    private const string Dragging = "drag coefficient, -";
    private const string Ratio = "lift-to-drag ratio, -";

    private static readonly Func<Coefficients, double> OfLift = c => c.Lift;
    private static readonly Func<Coefficients, double> OfDrag = c => c.Drag;
    private static readonly Func<Coefficients, double> OfLogDrag = c => c.Drag > 0 ? Math.Log10(c.Drag) : double.NaN;
    private static readonly Func<Coefficients, double> OfRatio = c => c.Drag > 0 ? c.Lift / c.Drag : double.NaN;

    public static PolarPanels Of(PolarLines lines)
    {
        var whole = (From: lines.All.Min(l => l.From), To: lines.All.Max(l => l.To));
        var working = whole.From < WorkingTo && whole.To > WorkingFrom ? (From: WorkingFrom, To: WorkingTo) : whole;
        var goesFurther = whole.From < working.From || whole.To > working.To;

        var (from, to) = (double.RadiansToDegrees(working.From), double.RadiansToDegrees(working.To));
        var angles = PanelAxis.Angles(from, to);
        var drags = lines.All.SelectMany(l => l.OverAngle(working, OfDrag)).SelectMany(c => c.Samples()).Select(p => p.Y).ToList();
        var logarithmic = drags.Count > 0 && drags.Min() > 0 && drags.Max() > LogarithmicFrom * drags.Min();

        return new PolarPanels(
            Over(angles, lines.OverAngle(working, OfLift), y => PanelAxis.Around(Lifting, y, NarrowestLift)),
            Difference(angles, lines.Differences(working, OfLift), 0.01),
            logarithmic
                ? Over(angles, lines.OverAngle(working, OfLogDrag), y => PanelAxis.Logarithmic(Dragging, y))
                : Over(angles, lines.OverAngle(working, OfDrag), y => PanelAxis.FromZero(Dragging, y)),
            Difference(angles, lines.Differences(working, OfDrag), 0.001),
            Over(angles, lines.OverAngle(working, OfRatio), y => PanelAxis.Around(Ratio, y, NarrowestLiftToDrag)),
            Difference(angles, lines.Differences(working, OfRatio), 0.1),
            LiftAgainstDrag(lines, working),
            goesFurther ? Whole(lines.OverAngle(whole, OfLift), y => PanelAxis.Around(Lifting, y, NarrowestLift)) : null,
            goesFurther ? Whole(lines.OverAngle(whole, OfDrag), y => PanelAxis.FromZero(Dragging, y)) : null);

        Panel Whole(ImmutableArray<Curve> curves, Func<IEnumerable<double>, PanelAxis> axis)
            => Over(PanelAxis.Angles(double.RadiansToDegrees(whole.From), double.RadiansToDegrees(whole.To)), curves, axis);
    }

    /// <summary>The same with a ring about each row in doubt, and the angles shaded at which blades work.</summary>
    public PolarPanels With(PolarPicture picture)
    {
        if (picture.Ringed.IsEmpty && picture.Shaded is null)
            return this;
        (double, double)? shade = picture.Shaded is var (from, to) ? (double.RadiansToDegrees(from), double.RadiansToDegrees(to)) : null;
        return this with
        {
            Lift = OverAngle(Lift, OfLift, RingedCoefficient.Lift, _ => true),
            Drag = OverAngle(Drag, Drag.Up.IsLogarithmic ? OfLogDrag : OfDrag, RingedCoefficient.Drag, _ => true),
            LiftToDrag = OverAngle(LiftToDrag, OfRatio, RingedCoefficient.Both, _ => true),
            LiftOverDrag = LiftOverDrag with
            {
                Rings = Rings(RingedCoefficient.Both, angle => angle is >= WorkingFrom and <= WorkingTo, (_, c) => (c.Drag, c.Lift)),
            },
            WholeLift = WholeLift is { } lift ? OverAngle(lift, OfLift, RingedCoefficient.Lift, IsBeyond) : null,
            WholeDrag = WholeDrag is { } drag ? OverAngle(drag, OfDrag, RingedCoefficient.Drag, IsBeyond) : null,
        };

        Panel OverAngle(Panel panel, Func<Coefficients, double> value, RingedCoefficient drawn, Func<double, bool> isRinged)
            => panel with { Shade = shade, Rings = Rings(drawn, isRinged, (angle, c) => (double.RadiansToDegrees(angle), value(c))) };

        // Within the working range the rows stand so close there that rings would cover each other, and another diagram shows them.
        static bool IsBeyond(double angle) => angle is <= WorkingFrom + Slack or >= WorkingTo - Slack;

        ImmutableArray<(double, double)> Rings(
            RingedCoefficient drawn, Func<double, bool> isRinged, Func<double, Coefficients, (double, double)> at)
            => [.. picture.Ringed
                .Where(r => drawn == RingedCoefficient.Both || r.Of == RingedCoefficient.Both || r.Of == drawn)
                .Where(r => isRinged(r.Polar.Angles[r.Row])).DistinctBy(r => (r.Polar, r.Row))
                .Select(r => at(r.Polar.Angles[r.Row], new Coefficients(r.Polar.Lift[r.Row], r.Polar.Drag[r.Row])))];
    }

    private static Panel Over(PanelAxis angles, ImmutableArray<Curve> curves, Func<IEnumerable<double>, PanelAxis> axis)
        => new(angles, axis(curves.SelectMany(c => c.Samples()).Select(p => p.Y)), curves, HasMarks: true);

    private static Panel? Difference(PanelAxis angles, ImmutableArray<Curve> curves, double narrowest) => curves.IsEmpty
        ? null
        : new Panel(
            angles, PanelAxis.Around("change", curves.SelectMany(c => c.Samples()).Select(p => p.Y).Append(0), narrowest), curves, HasMarks: false);

    private static Panel LiftAgainstDrag(PolarLines lines, (double From, double To) working)
    {
        var curves = lines.AgainstEachOther(working, OfDrag, OfLift);
        // Of the tables' own lines: an extension begins where drag is large.
        var least = lines.All.Where(l => l.Kind is null or LineKind.Tabulated)
            .Select(l => l.OverAngle(working, OfDrag).SelectMany(c => c.Samples()).Select(p => p.Y).DefaultIfEmpty(0).Min()).DefaultIfEmpty(0).Max();
        var largest = curves.SelectMany(c => c.Samples()).Select(p => p.X).DefaultIfEmpty(1).Max();
        var across = PanelAxis.FromZero(Dragging, [least > 0 ? Math.Min(LiftOverDragReach * least, largest) : largest]);
        var shown = curves.SelectMany(c => c.Samples()).Where(p => p.X <= across.To).Select(p => p.Y);
        return new Panel(across, PanelAxis.Around(Lifting, shown, NarrowestLift), curves, HasMarks: true);
    }
}
