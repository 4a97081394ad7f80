namespace BladeLoads.Rotor.Operation;

/// <summary>
/// The rated wind speed of a variable-speed machine, and the pitch that holds rated power from there up: the feather branch.
/// </summary>
internal sealed class RatedOperation
{
    /// <summary>Share of rated power within which power counts as rated.</summary>
    public const double PowerTolerance = 1e-7;

    private const double PitchTolerance = 1e-12;
    private const double WindSpeedTolerance = 1e-11;
    private const double WindSpeedStep = 0.25;

    private readonly RotorCase _case;
    private readonly Control.VariableSpeed _control;
    private readonly double _ratedPower;
    private readonly double[] _pitchesFromFeather;

    private RatedOperation(RotorCase rotorCase, Control.VariableSpeed control, double ratedPower)
    {
        (_case, _control, _ratedPower) = (rotorCase, control, ratedPower);
        _pitchesFromFeather = PitchesFromFeather(control.FinePitch);
    }

    /// <summary>m/s; null where rated power is not reached up to the last wind speed of the case.</summary>
    public double? WindSpeed { get; private init; }

    /// <summary>Whether power rises with pitch at the rated wind speed, so that the branch begins away from fine pitch.</summary>
    public bool StartsWithJump { get; private init; }

    public PointMarks Marks
        => WindSpeed is null ? PointMarks.RatedNotReached : StartsWithJump ? PointMarks.PitchJump : PointMarks.None;

    /// <summary>Null where the control names no rated power.</summary>
    public static RatedOperation? Of(
        RotorCase rotorCase, Control.VariableSpeed control, RotorModel model, CancellationToken cancellation)
    {
        if (control.RatedPower is not { } ratedPower)
            return null;
        var operation = new RatedOperation(rotorCase, control, ratedPower);
        var windSpeed = FirstReach.Find(
            v =>
            {
                cancellation.ThrowIfCancellationRequested();
                return operation.Excess(VariableSpeedLaw.FinePitchAt(control, v, model.SweptRadius).Point, model);
            },
            operation.WindSpeedsUpwards(model.Area), WindSpeedTolerance);
        if (windSpeed is not { } rated)
            return operation;
        var jumps = control.AboveRated == AboveRated.PitchToFeather
            && operation.FeatherPitchAt(rated, model) > control.FinePitch + 1e-4;
        return new RatedOperation(rotorCase, control, ratedPower) { WindSpeed = rated, StartsWithJump = jumps };
    }

    /// <summary>At or above the rated wind speed: the largest pitch from fine to feather at which power is rated.</summary>
    public Setting FeatherAt(double windSpeed, RotorModel model)
    {
        var fine = VariableSpeedLaw.FinePitchAt(_control, windSpeed, model.SweptRadius);
        if (FeatherPitchAt(windSpeed, model) is not { } pitch)
            return fine with { Marks = PointMarks.RatedNotReached };
        var point = fine.Point with { Pitch = pitch };
        var jumps = Excess(point, model) > PowerTolerance * _ratedPower;
        return new Setting(point, Region.RatedPower, jumps ? PointMarks.PowerJump : PointMarks.None);
    }

    private double? FeatherPitchAt(double windSpeed, RotorModel model)
    {
        var fine = VariableSpeedLaw.FinePitchAt(_control, windSpeed, model.SweptRadius).Point;
        return FirstReach.Find(pitch => Excess(fine with { Pitch = pitch }, model), _pitchesFromFeather, PitchTolerance);
    }

    // NaN where an element is unbalanced: such a point cannot be said to hold rated power.
    private double Excess(OperatingPoint point, RotorModel model)
        => ((model.Solve(point)?.Power ?? double.NaN) * _case.DrivetrainEfficiency) - _ratedPower;

    private double[] WindSpeedsUpwards(double area)
    {
        var last = double.IsFinite(_case.CutOutWindSpeed)
            ? Math.Max(_case.CutOutWindSpeed, _case.WindSpeeds[^1])
            : _case.WindSpeeds[^1];
        // No rotor takes more than all the power of the wind through its area, so the search need not begin below this.
        var first = Math.Cbrt(_ratedPower / (0.5 * _case.Air.Density * area * _case.DrivetrainEfficiency));
        var places = new List<double>();
        for (var i = 0; first + (i * WindSpeedStep) < last; i++)
            places.Add(first + (i * WindSpeedStep));
        places.Add(last);
        return [.. places];
    }

    // Power falls steeply towards feather, so steps may be longer there; they are shortest at fine pitch, where a narrow peak could hide.
    private static double[] PitchesFromFeather(double finePitch)
    {
        var places = new List<double>();
        var pitch = Math.PI / 2;
        while (pitch > finePitch)
        {
            places.Add(pitch);
            var above = double.RadiansToDegrees(pitch - finePitch);
            var step = above > 45 ? 2 : above > 1.5 ? 1 : 0.25;
            pitch -= double.DegreesToRadians(step);
        }
        places.Add(finePitch);
        return [.. places];
    }
}
