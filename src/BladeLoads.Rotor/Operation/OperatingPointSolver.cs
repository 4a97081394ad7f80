using System.Collections.Immutable;
using BladeLoads.Rotor.Loads;

namespace BladeLoads.Rotor.Operation;

/// <summary>Solves what a control asks for into a row of a power curve.</summary>
internal sealed class OperatingPointSolver(RotorCase rotorCase, RotorModel model)
{
    /// <summary>rad to either side; far above the tolerance of a balance, far below any feature of a power curve.</summary>
    private const double PitchStep = 1e-4;

    public CurvePoint Solve(in Setting setting)
    {
        var loads = model.Solve(setting.Point);
        var elements = model.Elements.ToImmutableArray();
        var (stallMargin, stallRadius) = loads is null ? (double.NaN, double.NaN) : StallMargin();
        var marks = setting.Marks;
        foreach (var element in elements)
            marks |= MarksOf(element.Marks);
        if (loads is null)
            return new CurvePoint(setting.Point, null, double.NaN, setting.Region, marks, null, elements);

        var electrical = rotorCase.Drivetrain.Electrical(loads.Power);
        var region = RegionOf(setting, loads.Power);
        if (rotorCase.Control.RatedPower is { } rated && electrical > rated * (1 + VariableSpeedOperation.MetTolerance)
            && (marks & PointMarks.PowerJump) == 0)
            marks |= PointMarks.ExceedsRated;
        var (powerPerPitch, thrustPerPitch) = SlopesByPitch(setting.Point);
        var tipSpeed = Math.Sqrt((loads.TipSpeed * loads.TipSpeed) + (setting.Point.WindSpeed * setting.Point.WindSpeed));
        return new CurvePoint(
            setting.Point, loads, electrical, region, marks,
            new PointMargins(powerPerPitch, thrustPerPitch, stallMargin, stallRadius, tipSpeed / rotorCase.Air.SpeedOfSound), elements);
    }

    public Region RegionOf(in Setting setting) => RegionOf(setting, model.Solve(setting.Point)?.Power ?? double.NaN);

    private static Region RegionOf(in Setting setting, double power) => power < 0 ? Region.Idle : setting.Region;

    private (double Power, double Thrust) SlopesByPitch(OperatingPoint point)
    {
        var (less, more) = (
            model.Solve(point with { Pitch = point.Pitch - PitchStep }), model.Solve(point with { Pitch = point.Pitch + PitchStep }));
        return less is null || more is null
            ? (double.NaN, double.NaN)
            : ((more.Power - less.Power) / (2 * PitchStep), (more.Thrust - less.Thrust) / (2 * PitchStep));
    }

    private (double Margin, double Radius) StallMargin()
    {
        var (margin, radius) = (double.NaN, double.NaN);
        for (var i = 0; i < model.Elements.Length; i++)
        {
            // The thick root is stalled nearly always, and says nothing of the blade that works.
            if (model.Elements[i].Radius < rotorCase.Blade.TipRadius / 2)
                continue;
            var here = model.Annuli[i].AngleOfLargestLift() - model.Elements[i].AngleOfAttack;
            if (here < margin || (double.IsNaN(margin) && !double.IsNaN(here)))
                (margin, radius) = (here, model.Elements[i].Radius);
        }
        return (margin, radius);
    }

    private static PointMarks MarksOf(ElementMarks marks)
        => ((marks & ElementMarks.Unbalanced) != 0 ? PointMarks.Unbalanced : 0)
            | ((marks & ElementMarks.SeveralBalances) != 0 ? PointMarks.SeveralBalances : 0)
            | ((marks & ElementMarks.OutsideAngles) != 0 ? PointMarks.OutsideAngles : 0)
            | ((marks & ElementMarks.OutsideReynolds) != 0 ? PointMarks.OutsideReynolds : 0);
}
