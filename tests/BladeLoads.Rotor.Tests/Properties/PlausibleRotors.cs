using System.Globalization;
using BladeLoads.Rotor.Air;
using BladeLoads.Rotor.Blades;
using BladeLoads.Rotor.Momentum;
using BladeLoads.Rotor.Operation;
using BladeLoads.Rotor.Sections;
using CsCheck;
using static BladeLoads.Rotor.Tests.Properties.PlausibleSections;

namespace BladeLoads.Rotor.Tests.Properties;

/// <summary>A rotor at one operating point, with what made it, so that a failing one can be read.</summary>
internal sealed record Trial(RotorCase Rotor, OperatingPoint Operation, IReadOnlyList<PlausibleSections.Shape> Shapes, int Pick)
{
    public CurvePoint Solve() => Assert.Single(CaseSolver.Solve(Rotor, CancellationToken.None).Points);

    /// <summary>The same but for what <paramref name="change"/> does to the rotor, at another operating point.</summary>
    public Trial At(OperatingPoint operation, Func<RotorCase, RotorCase> change) => this with
    {
        Operation = operation,
        Rotor = change(Rotor) with
        {
            WindSpeeds = [operation.WindSpeed],
            Control = new Control.FixedSpeed(operation.RotorSpeed, operation.Pitch, RatedPower: null),
        },
    };

    public override string ToString()
    {
        var stations = string.Join(" ", Rotor.Blade.Stations.Select(s => string.Create(CultureInfo.InvariantCulture,
            $"({s.Radius:R}, {s.Chord:R}, {s.Twist:R}, {s.Section})")));
        var shapes = string.Join("\n  ", Shapes.Select(s => $"{s} Reynolds {string.Join(" ", s.Reynolds)}"));
        return $"{Rotor.BladeCount} blades, cone {Rotor.Cone:R}, {Rotor.Air}, {Operation}, {Rotor.Model}, augmented {Rotor.Augmentation}\n  stations {stations}\n  {shapes}";
    }
}

/// <summary>Random rotors from a metre to a hundred, one to four blades, from feathered to running away.</summary>
internal static class PlausibleRotors
{
    private const double Degree = Math.PI / 180;

    private sealed record Planform(double TipRadius, double HubShare, double Chord, double Taper, double Twist, double TipTwist, int Stations);

    public static Gen<BalanceModel> Models { get; } =
        from elements in Gen.Int[1, 12]
        from spacing in Gen.Enum<ElementSpacing>()
        from tip in Gen.Bool
        from hub in Gen.Bool
        from heavy in Gen.Enum<HeavyLoading>()
        from balance in Gen.Enum<BalanceWith>()
        select new BalanceModel(elements, spacing, tip, hub, heavy, balance);

    private static readonly Gen<Planform> _planforms =
        from logRadius in Between(0, 2)
        from hub in Between(0.02, 0.2)
        from chord in Between(0.04, 0.2)
        from taper in Between(0.15, 1)
        from twist in Between(0, 40)
        from tipTwist in Between(-4, 6)
        from stations in Gen.Int[2, 8]
        select new Planform(Math.Pow(10, logRadius), hub, chord, taper, twist, tipTwist, stations);

    private static readonly Gen<Trial> _ordinary =
        from planform in _planforms
        from blades in Gen.Int[1, 4]
        from shapes in PlausibleSections.Shapes.Array[1, 4]
        from cone in Gen.OneOf(Gen.Const(0.0), Between(-6, 10))
        from pitch in Gen.OneOf(Between(-10, 30), Between(-10, 90))
        from tipSpeedRatio in Gen.OneOf(Between(0.5, 12), Between(0.5, 25))
        from wind in Between(2, 28)
        from density in Between(0.9, 1.35)
        from model in Models
        from augmentation in Gen.Enum<Augmentation>()
        from pick in Gen.Int[0, 1_000_000]
        select Build(planform, blades, shapes, cone * Degree, pitch * Degree, tipSpeedRatio, wind, density, model, augmentation, pick);

    // Pitched so that a place along the blade works within some degrees of a stall that drops lift within a degree: several balances.
    private static readonly Gen<Trial> _nearSharpStall =
        from trial in _ordinary
        from drop in Between(0.3, 0.75)
        from width in Between(0.1, 1)
        from tipSpeedRatio in Between(1, 7)
        from place in Between(0.2, 1)
        from away in Between(-4, 4)
        from wide in Between(1, 2.5)
        select NearStall(trial, drop, width, tipSpeedRatio, place, away * Degree, wide);

    // Broad blades turned far towards feather or past it, hardly turning: lift drives the air faster than the blade, beyond a right angle.
    private static readonly Gen<Trial> _slowAndFeathered =
        from trial in _ordinary
        from pitch in Between(50, 130)
        from tipSpeedRatio in Gen.OneOf(Between(0.02, 0.5), Between(0.5, 2))
        from wide in Between(1, 4)
        select Widened(trial, wide).At(new OperatingPoint(
            trial.Operation.WindSpeed, tipSpeedRatio * trial.Operation.WindSpeed / trial.Rotor.Blade.TipRadius, pitch * Degree), rotor => rotor);

    /// <summary>Most of them ordinary; the others chosen for what is rare and hard.</summary>
    public static Gen<Trial> Trials { get; } = Gen.Frequency((2, (IGen<Trial>)_ordinary), (1, _nearSharpStall), (1, _slowAndFeathered));

    private static Trial NearStall(
        Trial trial, double drop, double width, double tipSpeedRatio, double place, double away, double wide)
    {
        var shapes = trial.Shapes.Select(shape => shape with { StallDrop = drop, StallWidth = width }).ToArray();
        var blade = trial.Rotor.Blade;
        var station = blade.Stations[(int)(place * (blade.Stations.Length - 1))];
        var inflow = Math.Atan(0.75 * blade.TipRadius / (tipSpeedRatio * station.Radius));
        var stall = shapes[int.Parse(station.Section.AsSpan(1), CultureInfo.InvariantCulture)].StallAngle * Degree;
        var point = new OperatingPoint(
            trial.Operation.WindSpeed, tipSpeedRatio * trial.Operation.WindSpeed / blade.TipRadius, inflow - stall - station.Twist + away);
        return Widened(trial, wide).At(point, rotor => rotor with
        {
            Sections = SectionSet.Of(shapes.Select((shape, i) => PlausibleSections.Build("s" + i, shape))),
        }) with
        { Shapes = shapes };
    }

    private static Trial Widened(Trial trial, double factor) => trial.At(trial.Operation, rotor => rotor with
    {
        Blade = Blade.FromStations(rotor.Blade.Stations.Select(s => s with { Chord = factor * s.Chord })),
    });

    private static Trial Build(
        Planform planform, int blades, PlausibleSections.Shape[] shapes, double cone, double pitch, double tipSpeedRatio, double wind,
        double density, BalanceModel model, Augmentation augmentation, int pick)
    {
        var random = new Random(pick);
        var stations = Enumerable.Range(0, planform.Stations).Select(i =>
        {
            var x = (double)i / (planform.Stations - 1);
            var inside = i > 0 && i < planform.Stations - 1;
            var radius = planform.TipRadius * (planform.HubShare + (1 - planform.HubShare) * x);
            if (inside)
                radius += planform.TipRadius * (1 - planform.HubShare) * 0.3 * (random.NextDouble() - 0.5) / planform.Stations;
            var chord = planform.TipRadius * planform.Chord * (1 - (1 - planform.Taper) * x) * (0.9 + 0.2 * random.NextDouble());
            var twist = planform.TipTwist + (planform.Twist - planform.TipTwist) * (1 - x) * (1 - x) + random.NextDouble() - 0.5;
            return new BladeStation(radius, chord, twist * Degree, "s" + Math.Min(shapes.Length - 1, (int)(x * shapes.Length)));
        });
        var sections = SectionSet.Of(shapes.Select((shape, i) => PlausibleSections.Build("s" + i, shape)));
        var operation = new OperatingPoint(wind, tipSpeedRatio * wind / (planform.TipRadius * Math.Cos(cone)), pitch);
        var rotor = new RotorCase(Blade.FromStations(stations), sections, augmentation, blades, cone, new AirProperties(density, 1.8e-5, 340.29), [wind],
            new Control.FixedSpeed(operation.RotorSpeed, pitch, RatedPower: null), 0, double.PositiveInfinity, Drivetrain.Constant(1), model);
        return new Trial(rotor, operation, shapes, pick);
    }
}
