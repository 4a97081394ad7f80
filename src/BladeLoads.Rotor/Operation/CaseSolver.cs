using System.Collections.Immutable;

namespace BladeLoads.Rotor.Operation;

/// <summary>Solves rotor cases: the one entrance to the physics.</summary>
public static class CaseSolver
{
    /// <summary>The power curve of a case. The same case gives the same bytes, whatever else runs beside it.</summary>
    /// <exception cref="OperationCanceledException">Cancelled between two operating points.</exception>
    public static PowerCurve Solve(RotorCase rotorCase, CancellationToken cancellation)
    {
        var model = new RotorModel(rotorCase);
        var variableSpeed = rotorCase.Control is Control.VariableSpeed control
            ? VariableSpeedOperation.Of(rotorCase, control, model, cancellation)
            : null;
        var solver = new OperatingPointSolver(rotorCase, model);
        CurvePoint Solved(double windSpeed)
        {
            cancellation.ThrowIfCancellationRequested();
            return solver.Solve(SettingAt(rotorCase, windSpeed, variableSpeed));
        }

        var points = ImmutableArray.CreateBuilder<CurvePoint>(rotorCase.WindSpeeds.Length);
        foreach (var windSpeed in rotorCase.WindSpeeds)
            points.Add(Solved(windSpeed));
        if (variableSpeed?.Marks == PointMarks.PitchJump)
            MarkFirstRated(points);
        var curve = points.MoveToImmutable();
        Region RegionAt(double windSpeed) => solver.RegionOf(SettingAt(rotorCase, windSpeed, variableSpeed));
        var limited = rotorCase.Control is Control.VariableSpeed { ThrustLimit: not null };
        var designPoints = DesignPoints.Of(
            rotorCase, curve, limited ? null : variableSpeed?.RatedWindSpeed, variableSpeed?.LikelyBeginnings(curve.AsSpan()) ?? [], Solved,
            RegionAt);
        var rated = limited
            ? RatedUnderLimit.WindSpeed(rotorCase, variableSpeed?.RatedWindSpeed, curve, designPoints, RegionAt)
            : variableSpeed?.RatedWindSpeed;
        var marks = variableSpeed?.Marks ?? PointMarks.None;
        if (limited && rated is null && rotorCase.Control.RatedPower is not null)
            marks = PointMarks.RatedNotReached;
        if (marks == PointMarks.RatedNotReached && NearestToRated(curve) is { } nearest)
        {
            var marked = nearest with { Marks = nearest.Marks | PointMarks.RatedNotReached };
            curve = curve.Replace(nearest, marked);
            designPoints = [.. designPoints.Select(d => ReferenceEquals(d.Point, nearest) ? d with { Point = marked } : d)];
        }
        return new PowerCurve(curve, rated, variableSpeed?.Best, designPoints, marks, model.Solves);
    }

    // The row that shows how far the rotor gets: the most electrical power, at the lowest wind speed that has it; null where none has any.
    private static CurvePoint? NearestToRated(ImmutableArray<CurvePoint> curve)
    {
        var most = curve.Select(p => p.ElectricalPower).Where(double.IsFinite).DefaultIfEmpty(0).Max();
        return most > 0 ? curve.First(p => p.ElectricalPower >= most * (1 - DesignPoint.FlatWithin)) : null;
    }

    private static Setting SettingAt(RotorCase rotorCase, double windSpeed, VariableSpeedOperation? variableSpeed)
    {
        var reason = windSpeed < rotorCase.CutInWindSpeed ? PointMarks.BelowCutIn
            : windSpeed > rotorCase.CutOutWindSpeed ? PointMarks.AboveCutOut
            : PointMarks.None;
        return (rotorCase.Control, reason) switch
        {
            (Control.VariableSpeed, PointMarks.None) => variableSpeed!.At(windSpeed),
            (Control.VariableSpeed, _) => Setting.AtRest(windSpeed, variableSpeed!.Best.Pitch, reason),
            (Control.FixedSpeed f, PointMarks.None) =>
                new Setting(new OperatingPoint(windSpeed, f.RotorSpeed, f.Pitch), Region.FixedSpeed, PointMarks.None),
            (Control.FixedSpeed f, _) => Setting.AtRest(windSpeed, f.Pitch, reason),
            (Control.Schedule s, PointMarks.None) => new Setting(s.At(windSpeed), Region.Schedule, PointMarks.None),
            (Control.Schedule s, _) => Setting.AtRest(windSpeed, s.At(windSpeed).Pitch, reason),
            _ => throw new InvalidOperationException($"no law for {rotorCase.Control.GetType().Name}"),
        };
    }

    private static void MarkFirstRated(ImmutableArray<CurvePoint>.Builder points)
    {
        for (var i = 0; i < points.Count; i++)
            if (points[i].Region == Region.RatedPower)
            {
                points[i] = points[i] with { Marks = points[i].Marks | PointMarks.PitchJump };
                return;
            }
    }
}

/// <summary>What the control asks for at a wind speed, and why.</summary>
internal readonly record struct Setting(OperatingPoint Point, Region Region, PointMarks Marks)
{
    /// <summary>Outside the wind speeds of operation the rotor stands still.</summary>
    public static Setting AtRest(double windSpeed, double pitch, PointMarks reason)
        => new(new OperatingPoint(windSpeed, 0, pitch), Region.Idle, reason);
}
