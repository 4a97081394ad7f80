using System.Collections.Immutable;
using BladeLoads.Rotor.Loads;

namespace BladeLoads.Rotor.Operation;

/// <summary>Solves rotor cases: the one entrance to the physics.</summary>
public static class CaseSolver
{
    /// <summary>The power curve of a case. The same case gives the same bytes, whatever else runs beside it.</summary>
    /// <exception cref="OperationCanceledException">Cancelled between two operating points.</exception>
    public static PowerCurve Solve(RotorCase rotorCase, CancellationToken cancellation)
    {
        var model = new RotorModel(rotorCase);
        var rated = rotorCase.Control is Control.VariableSpeed variable
            ? RatedOperation.Of(rotorCase, variable, model, cancellation)
            : null;
        var points = ImmutableArray.CreateBuilder<CurvePoint>(rotorCase.WindSpeeds.Length);
        var jumpIsMarked = false;
        foreach (var windSpeed in rotorCase.WindSpeeds)
        {
            cancellation.ThrowIfCancellationRequested();
            var setting = SettingAt(rotorCase, windSpeed, rated, model);
            var point = PointAt(rotorCase, setting, model);
            if (point.Region == Region.RatedPower && rated is { StartsWithJump: true } && !jumpIsMarked)
            {
                point = point with { Marks = point.Marks | PointMarks.PitchJump };
                jumpIsMarked = true;
            }
            points.Add(point);
        }
        return new PowerCurve(points.MoveToImmutable(), rated?.WindSpeed, rated?.Marks ?? PointMarks.None, model.Solves);
    }

    private static Setting SettingAt(RotorCase rotorCase, double windSpeed, RatedOperation? rated, RotorModel model)
    {
        if (windSpeed < rotorCase.CutInWindSpeed)
            return Setting.AtRest(windSpeed, RestingPitch(rotorCase, windSpeed), PointMarks.BelowCutIn);
        if (windSpeed > rotorCase.CutOutWindSpeed)
            return Setting.AtRest(windSpeed, RestingPitch(rotorCase, windSpeed), PointMarks.AboveCutOut);
        return rotorCase.Control switch
        {
            Control.FixedSpeed fixedSpeed =>
                new Setting(new OperatingPoint(windSpeed, fixedSpeed.RotorSpeed, fixedSpeed.Pitch), Region.FixedSpeed, PointMarks.None),
            Control.Schedule schedule => new Setting(schedule.At(windSpeed), Region.Schedule, PointMarks.None),
            Control.VariableSpeed { AboveRated: AboveRated.PitchToFeather } when windSpeed >= rated?.WindSpeed =>
                rated.FeatherAt(windSpeed, model),
            Control.VariableSpeed variable => VariableSpeedLaw.FinePitchAt(variable, windSpeed, model.SweptRadius),
            _ => throw new InvalidOperationException($"no law for {rotorCase.Control.GetType().Name}"),
        };
    }

    private static double RestingPitch(RotorCase rotorCase, double windSpeed) => rotorCase.Control switch
    {
        Control.VariableSpeed variable => variable.FinePitch,
        Control.FixedSpeed fixedSpeed => fixedSpeed.Pitch,
        Control.Schedule schedule => schedule.At(windSpeed).Pitch,
        _ => 0,
    };

    private static CurvePoint PointAt(RotorCase rotorCase, in Setting setting, RotorModel model)
    {
        var loads = model.Solve(setting.Point);
        var elements = model.Elements.ToImmutableArray();
        var marks = setting.Marks;
        foreach (var element in elements)
            marks |= MarksOf(element.Marks);
        if (loads is null)
            return new CurvePoint(setting.Point, null, double.NaN, setting.Region, marks, elements);
        var electrical = Math.Max(0, loads.Power) * rotorCase.DrivetrainEfficiency;
        var region = loads.Power < 0 ? Region.Idle : setting.Region;
        if (RatedPowerOf(rotorCase.Control) is { } rated && electrical > rated * (1 + RatedOperation.PowerTolerance)
            && (marks & PointMarks.PowerJump) == 0)
            marks |= PointMarks.ExceedsRated;
        return new CurvePoint(setting.Point, loads, electrical, region, marks, elements);
    }

    private static double? RatedPowerOf(Control control) => control switch
    {
        Control.VariableSpeed variable => variable.RatedPower,
        Control.FixedSpeed fixedSpeed => fixedSpeed.RatedPower,
        Control.Schedule schedule => schedule.RatedPower,
        _ => null,
    };

    private static PointMarks MarksOf(ElementMarks marks)
        => ((marks & ElementMarks.Unbalanced) != 0 ? PointMarks.Unbalanced : 0)
            | ((marks & ElementMarks.SeveralBalances) != 0 ? PointMarks.SeveralBalances : 0)
            | ((marks & ElementMarks.OutsideAngles) != 0 ? PointMarks.OutsideAngles : 0)
            | ((marks & ElementMarks.OutsideReynolds) != 0 ? PointMarks.OutsideReynolds : 0);
}

/// <summary>What the control asks for at a wind speed, and why.</summary>
internal readonly record struct Setting(OperatingPoint Point, Region Region, PointMarks Marks)
{
    /// <summary>Outside the wind speeds of operation the rotor stands still.</summary>
    public static Setting AtRest(double windSpeed, double pitch, PointMarks reason)
        => new(new OperatingPoint(windSpeed, 0, pitch), Region.Idle, reason);
}
