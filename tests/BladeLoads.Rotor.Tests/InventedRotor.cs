using System.Collections.Immutable;
using BladeLoads.Rotor.Air;
using BladeLoads.Rotor.Blades;
using BladeLoads.Rotor.Momentum;
using BladeLoads.Rotor.Operation;
using BladeLoads.Rotor.Sections;

namespace BladeLoads.Rotor.Tests;

/// <summary>An invented rotor by formula, for tests of how things hang together; no figure of it is a reference for anything.</summary>
internal static class InventedRotor
{
    public static readonly BalanceModel Model = new(
        40, ElementSpacing.Cosine, TipLoss: true, HubLoss: true, HeavyLoading.Glauert1935, BalanceWith.LiftAndDrag);

    public static readonly AirProperties SeaLevel = new(1.225, 1.789e-5, 340.29);

    /// <summary>Lift 2 pi per radian up to stall, then a drop over a given width to the lift of a flat plate.</summary>
    public static Polar PolarByFormula(
        double reynolds = double.NaN, double stallDeg = 10, double dropWidthDeg = 20, double zeroLiftDeg = -4, double drag = 0.01)
    {
        double[] angles = [.. Enumerable.Range(-90, 71).Select(i => 2.0 * i), .. Enumerable.Range(-38, 97).Select(i => 1.0 * i),
            .. Enumerable.Range(30, 61).Select(i => 2.0 * i)];
        double Lift(double deg)
        {
            var plate = Math.Sin(2 * double.DegreesToRadians(deg));
            var attached = 2 * Math.PI * double.DegreesToRadians(deg - zeroLiftDeg);
            var beyond = Math.Max(deg - stallDeg, (2 * zeroLiftDeg) - stallDeg - deg);
            var share = Math.Clamp(1 - (beyond / dropWidthDeg), 0, 1);
            var top = 2 * Math.PI * double.DegreesToRadians(stallDeg - zeroLiftDeg);
            return (share * Math.Clamp(attached, -top, top)) + ((1 - share) * plate);
        }
        double Drag(double deg) => drag + (1.3 * Math.Pow(Math.Sin(double.DegreesToRadians(deg)), 2));
        return Polar.FromRows(
            reynolds, [.. angles.Select(a => Math.Clamp(double.DegreesToRadians(a), -Math.PI, Math.PI))],
            [.. angles.Select(Lift)], [.. angles.Select(Drag)]);
    }

    public static Section SectionByFormula(string name, double stallDeg = 10, double dropWidthDeg = 20)
        => Section.FromPolars(name, [PolarByFormula(stallDeg: stallDeg, dropWidthDeg: dropWidthDeg)]);

    /// <summary>Chord and twist near the optimum for a tip-speed ratio of 7; three blades.</summary>
    public static RotorCase Case(
        Control control, double[] windSpeeds, double tipRadius = 40, double stallDeg = 10, double dropWidthDeg = 20, int bladeCount = 3,
        double solidityFactor = 1, BalanceModel? model = null, double cutIn = 0, double cutOut = double.PositiveInfinity,
        double efficiency = 1, double cone = 0)
    {
        var stations = Enumerable.Range(0, 21).Select(i =>
        {
            var share = 0.06 + (0.94 * i / 20);
            var inflow = Math.Atan(2 / (3 * 7 * share));
            var chord = Math.Min(0.09, 16 * Math.PI / (9 * bladeCount * 49 * share)) * tipRadius * solidityFactor;
            return new BladeStation(
                share * tipRadius, chord, Math.Min(inflow - double.DegreesToRadians(6), double.DegreesToRadians(20)),
                share < 0.3 ? "inboard" : "outboard");
        });
        var sections = SectionSet.Of(
            [SectionByFormula("inboard", stallDeg, dropWidthDeg), SectionByFormula("outboard", stallDeg, dropWidthDeg)]);
        return new RotorCase(
            Blade.FromStations(stations), sections, Augmentation.None, bladeCount, cone, SeaLevel, [.. windSpeeds], control, cutIn, cutOut,
            Drivetrain.Constant(efficiency), model ?? Model);
    }

    public static Control.VariableSpeed VariableSpeed(
        double? ratedPower = null, double? finePitchDeg = 0, double? tipSpeedRatio = 7, double minRotorSpeed = 0,
        double maxRotorSpeed = double.PositiveInfinity, AboveRated aboveRated = AboveRated.PitchToFeather,
        SpeedLimitedPitch speedLimitedPitch = SpeedLimitedPitch.Hold, double? thrustLimit = null)
        => new(
            tipSpeedRatio, finePitchDeg is { } deg ? double.DegreesToRadians(deg) : null, minRotorSpeed, maxRotorSpeed, speedLimitedPitch,
            ratedPower, aboveRated, thrustLimit);

    public static ImmutableArray<CurvePoint> Solve(RotorCase rotorCase) => CaseSolver.Solve(rotorCase, CancellationToken.None).Points;
}
