namespace BladeLoads.Rotor.Operation;

/// <summary>
/// A variable-speed machine with its best point and its rated wind speed found: what the control asks for at any wind speed.
/// </summary>
internal sealed partial class VariableSpeedOperation
{
    /// <summary>Share of rated power, or of the thrust limit, within which it counts as met.</summary>
    public const double MetTolerance = 1e-7;

    private const double PitchTolerance = 1e-12;
    private const double WindSpeedTolerance = 1e-11;
    private const double WindSpeedStep = 0.25;

    // How near to a jump of power it is looked at: m/s, rad.
    private const double FinestWindSpeed = 1e-3;
    private const double FinestPitch = 1e-4;

    // rad per m/s, rad per rad: a balance that only follows the wind or the pitch turns no faster.
    private const double TurnPerWindSpeed = 0.1;
    private const double TurnPerPitch = 0.5;

    private readonly Control.VariableSpeed _control;
    private readonly Drivetrain _drivetrain;
    private readonly RotorModel _model;
    private readonly CancellationToken _cancellation;

    private VariableSpeedOperation(RotorCase rotorCase, Control.VariableSpeed control, RotorModel model, CancellationToken cancellation)
    {
        (_control, _drivetrain, _model, _cancellation) = (control, rotorCase.Drivetrain, model, cancellation);
        Best = control is { TipSpeedRatio: { } ratio, FinePitch: { } pitch }
            ? BestOperation.Given(ratio, pitch, model)
            : BestOperation.Find(model, control.TipSpeedRatio, control.FinePitch, cancellation);
        if (control.RatedPower is not { } ratedPower)
            return;
        RatedWindSpeed = FirstReach.Find(
            v => PowerAt(v, BaseAt(v).Point),
            WindSpeedsUpwards(rotorCase, ratedPower), WindSpeedTolerance, FinestWindSpeed, TurnPerWindSpeed, longestLeap: 1)?.Reached.Place;
        Marks = RatedWindSpeed is null ? PointMarks.RatedNotReached
            : StartsWithJump(RatedWindSpeed.Value) ? PointMarks.PitchJump
            : PointMarks.None;
    }

    /// <summary>The tip-speed ratio and fine pitch in use, and the power coefficient there.</summary>
    public BestOperation Best { get; }

    /// <summary>m/s: where the rotor first makes rated power below the branch; null where it does not, from cut-in to cut-out.</summary>
    public double? RatedWindSpeed { get; }

    public PointMarks Marks { get; }

    public static VariableSpeedOperation Of(
        RotorCase rotorCase, Control.VariableSpeed control, RotorModel model, CancellationToken cancellation)
        => new(rotorCase, control, model, cancellation);

    /// <summary>m/s, rising: where the rotor speed meets a limit, rated power, and the ends of the thrust limit on a curve.</summary>
    public double[] LikelyBeginnings(ReadOnlySpan<CurvePoint> curve)
    {
        List<double> all =
        [
            _control.MinRotorSpeed * _model.SweptRadius / Best.TipSpeedRatio, _control.MaxRotorSpeed * _model.SweptRadius / Best.TipSpeedRatio,
            RatedWindSpeed ?? double.PositiveInfinity,
        ];
        for (var i = 1; i < curve.Length; i++)
        {
            double[] between = [curve[i - 1].Operation.WindSpeed, curve[i].Operation.WindSpeed];
            Func<double, double>? excess = (curve[i - 1].Region, curve[i].Region) switch
            {
                (not Region.ThrustLimit, Region.ThrustLimit) => v => ThrustExcess(BaseAt(v).Point),
                (Region.ThrustLimit, Region.RatedPower) => v => PowerExcess(WithinThrust(BaseAt(v), _control.ThrustLimit!.Value).Point),
                _ => null,
            };
            if (excess is not null
                && FirstReach.Find(v => new Sample(v, excess(v), null), between, WindSpeedTolerance, FinestWindSpeed, TurnPerWindSpeed, 1)
                    is { } reach)
                all.Add(reach.Reached.Place);
        }
        return [.. all.Where(double.IsFinite).Order()];
    }

    /// <summary>What the control asks for: below rated, above it, or at the thrust limit.</summary>
    public Setting At(double windSpeed)
    {
        var setting = BaseAt(windSpeed);
        if (windSpeed >= RatedWindSpeed && _control.RatedPower is { } ratedPower)
            setting = _control.AboveRated switch
            {
                AboveRated.PitchToFeather => OnBranch(setting, ratedPower, FeatherPitchAt(setting)),
                AboveRated.PitchToStall => OnBranch(setting, ratedPower, StallPitchAt(setting)),
                _ => setting,
            };
        return _control.ThrustLimit is { } limit ? WithinRated(WithinThrust(setting, limit)) : setting;
    }

    /// <summary>Below rated: rotor speed by the tip-speed ratio within its limits, fine pitch or the pitch with the most power.</summary>
    public Setting BaseAt(double windSpeed)
    {
        var wanted = Best.TipSpeedRatio * windSpeed / _model.SweptRadius;
        var (rotorSpeed, region) = wanted < _control.MinRotorSpeed ? (_control.MinRotorSpeed, Region.MinimumSpeed)
            : wanted > _control.MaxRotorSpeed ? (_control.MaxRotorSpeed, Region.MaximumSpeed)
            : (wanted, Region.BestTipSpeedRatio);
        var point = new OperatingPoint(windSpeed, rotorSpeed, Best.Pitch);
        if (region != Region.BestTipSpeedRatio && _control.SpeedLimitedPitch == SpeedLimitedPitch.Best)
            point = point with { Pitch = PitchWithMostPower(point) };
        return new Setting(point, region, PointMarks.None);
    }

    // Over rated power and over the thrust limit, of a control that has them; NaN where an element is unbalanced: such a point cannot be
    // said to hold anything.
    private double PowerExcess(in OperatingPoint point)
    {
        _cancellation.ThrowIfCancellationRequested();
        return _drivetrain.Electrical(_model.Solve(point)?.Power ?? double.NaN) - _control.RatedPower!.Value;
    }

    private double ThrustExcess(in OperatingPoint point)
    {
        _cancellation.ThrowIfCancellationRequested();
        return (_model.Solve(point)?.Thrust ?? double.NaN) - _control.ThrustLimit!.Value;
    }

    private Sample PowerAt(double place, in OperatingPoint point) => new(place, PowerExcess(point), ElementShare.OfPower(_model, point));

    private double[] WindSpeedsUpwards(RotorCase rotorCase, double ratedPower)
    {
        // Where a rotor does not operate it makes no power, rated or other.
        var last = double.IsFinite(rotorCase.CutOutWindSpeed) ? rotorCase.CutOutWindSpeed : rotorCase.WindSpeeds[^1];
        // No rotor takes more than all the power of the wind through its area, so the search need not begin below this.
        var first = Math.Cbrt(ratedPower / (0.5 * rotorCase.Air.Density * _model.Area));
        first = Math.Min(Math.Max(first, rotorCase.CutInWindSpeed), last);
        // The case's own wind speeds are among them: no row above rated may go unseen.
        var places = new SortedSet<double>(rotorCase.WindSpeeds.Where(v => v > first && v < last)) { last };
        for (var i = 0; first + (i * WindSpeedStep) < last; i++)
            places.Add(first + (i * WindSpeedStep));
        return [.. places];
    }
}
