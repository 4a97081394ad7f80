namespace BladeLoads.Rotor.Operation;

/// <summary>The pitch that holds rated power or the thrust limit, or gives the most power.</summary>
internal sealed partial class VariableSpeedOperation
{
    private const double Feathered = Math.PI / 2;

    // Steps of a walk from feather, which are of 2, 1 and 1/4 degree.
    private const int LongestLeap = 16;

    // Lower peaks of power than this share of its range are not followed: none is that much sharper than the steps.
    private const double WorthFollowing = 0.1;

    private const double LeastThrustTolerance = 1e-6;

    // rad, a tenth of a degree: below it a flat top of power at fine pitch would count as a jump.
    private const double LeastJump = 2e-3;
    private static readonly double DeepestStall = double.DegreesToRadians(-30);

    // Where even feathered blades make more than rated nothing holds it: no jump, but a point that exceeds rated.
    private static Setting OnBranch(in Setting below, double ratedPower, BranchPitch? found)
        => found is { } at
            ? new Setting(
                below.Point with { Pitch = at.Pitch }, Region.RatedPower,
                at.Excess > MetTolerance * ratedPower && at.Pitch < Feathered ? PointMarks.PowerJump : PointMarks.None)
            : below with { Marks = PointMarks.RatedNotReached };

    // The largest pitch up to feather at which power is rated. At high wind the rotor at fine pitch may be stalled and make less than
    // rated; that is no operating point, so the walk comes down from feather.
    private BranchPitch? FeatherPitchAt(in Setting below)
    {
        var point = below.Point;
        var reach = FirstReach.Find(
            pitch => PowerAt(pitch, point with { Pitch = pitch }), PitchesFromFeather(Math.Min(Best.Pitch, point.Pitch)),
            PitchTolerance, FinestPitch, TurnPerPitch, LongestLeap);
        return reach is { } r ? new BranchPitch(r.Reached.Place, r.Reached.Excess) : null;
    }

    // The pitch nearest to fine pitch, towards stall, at which power is rated.
    private BranchPitch? StallPitchAt(in Setting below)
    {
        var point = below.Point;
        var places = PitchesIntoStall(point.Pitch);
        Sample Power(double pitch) => PowerAt(pitch, point with { Pitch = pitch });
        if (Power(point.Pitch).Excess < 0)
            return FirstReach.Find(Power, places, PitchTolerance, FinestPitch, TurnPerPitch, longestLeap: 1) is { } rising
                ? new BranchPitch(rising.Reached.Place, rising.Reached.Excess)
                : null;
        static Sample Below(in Sample s) => s with { Excess = -s.Excess };
        // The side at or above rated is the one on which power has not fallen below it yet.
        return FirstReach.Find(pitch => Below(Power(pitch)), places, PitchTolerance, FinestPitch, TurnPerPitch, longestLeap: 1)
            is { } falling
            ? new BranchPitch(falling.Below.Place, -falling.Below.Excess)
            : null;
    }

    // The smallest pitch from which thrust stays within the limit up to feather; where rated power asks for more pitch, that wins. On the
    // side of stall the limit steps in only where the stalled blades do not hold it themselves.
    private Setting WithinThrust(in Setting setting, double limit)
    {
        var point = setting.Point;
        Sample Thrust(double pitch) => new(pitch, ThrustExcess(point with { Pitch = pitch }), ElementShare.OfThrust(_model));
        var isHeldByStall = _control.AboveRated == AboveRated.PitchToStall && setting.Region == Region.RatedPower
            && Thrust(point.Pitch).Excess <= MetTolerance * limit;
        // Where more pitch than this is not needed, rated power or fine pitch wins.
        if (isHeldByStall || FirstReach.Find(
            Thrust, PitchesFromFeather(point.Pitch), PitchTolerance, FinestPitch, TurnPerPitch, LongestLeap) is not { } reach)
            return setting;
        if (reach.Below == reach.Reached)
        {
            // Not even feathered blades hold it: the pitch with the least thrust comes nearest.
            var pitches = PitchesFromFeather(Math.Min(Best.Pitch, point.Pitch));
            Array.Reverse(pitches);
            var least = Largest.Find(pitch => -Thrust(pitch).Excess, pitches, LeastThrustTolerance, worth: 1);
            var marks = least.Excess >= 0 ? setting.Marks : setting.Marks | PointMarks.ThrustNotHeld;
            return new Setting(point with { Pitch = least.Place }, Region.ThrustLimit, marks & ~PointMarks.PowerJump);
        }
        return new Setting(point with { Pitch = reach.Below.Place }, Region.ThrustLimit, setting.Marks & ~PointMarks.PowerJump);
    }

    // Where power rises with pitch, the pitch that holds thrust may make rated power before fine pitch does; more pitch holds that too.
    private Setting WithinRated(in Setting setting)
        => setting.Region == Region.ThrustLimit && _control is { RatedPower: { } rated, AboveRated: AboveRated.PitchToFeather }
            && PowerExcess(setting.Point) > MetTolerance * rated
            ? OnBranch(setting, rated, FeatherPitchAt(setting))
            : setting;

    private double PitchWithMostPower(OperatingPoint point)
    {
        var places = new List<double>();
        for (var deg = -15; deg <= 45; deg += 2)
            places.Add(double.DegreesToRadians(deg));
        return Largest.Find(
            pitch =>
            {
                _cancellation.ThrowIfCancellationRequested();
                return _model.Solve(point with { Pitch = pitch })?.Power ?? double.NaN;
            },
            [.. places], 1e-9, WorthFollowing).Place;
    }

    private bool StartsWithJump(double ratedWindSpeed)
    {
        var below = BaseAt(ratedWindSpeed);
        return _control.AboveRated == AboveRated.PitchToFeather
            && FeatherPitchAt(below)?.Pitch > below.Point.Pitch + LeastJump;
    }

    // Power and thrust fall steeply towards feather, so steps may be longer there; they are shortest at fine pitch, where a narrow peak
    // could hide.
    private static double[] PitchesFromFeather(double finePitch)
    {
        var places = new List<double>();
        for (var pitch = Feathered; pitch > finePitch;)
        {
            places.Add(pitch);
            var above = double.RadiansToDegrees(pitch - finePitch);
            pitch -= double.DegreesToRadians(above > 45 ? 2 : above > 1.5 ? 1 : 0.25);
        }
        places.Add(finePitch);
        return [.. places];
    }

    private static double[] PitchesIntoStall(double finePitch)
    {
        var places = new List<double>();
        for (var pitch = finePitch; pitch > DeepestStall; pitch -= double.DegreesToRadians(0.25))
            places.Add(pitch);
        places.Add(Math.Min(DeepestStall, finePitch));
        return [.. places];
    }

    private readonly record struct BranchPitch(double Pitch, double Excess);
}
