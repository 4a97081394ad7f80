using System.Collections.Immutable;
using System.Security.Cryptography;
using System.Text;
using BladeLoads.Rotor.Air;
using BladeLoads.Rotor.Blades;
using BladeLoads.Rotor.Loads;
using BladeLoads.Rotor.Momentum;
using BladeLoads.Rotor.Operation;
using BladeLoads.Rotor.Sections;
using BladeLoads.Studies;

namespace BladeLoads.Batch.Tests.Building;

/// <summary>Cases and curves made by hand; the numbers are invented, and no physics is behind them.</summary>
internal static class FellRotor
{
    public static RotorCase Rotor(int elements = 2, int windSpeeds = 3)
    {
        var polar = Polar.FromRows(double.NaN, [-3, 0, 3], [0, 1, 0], [0.1, 0.01, 0.1]);
        return new RotorCase(
            Blade.FromStations([new(1, 1, 0.2, "fell-30"), new(10, 0.5, 0, "fell-30")]),
            SectionSet.Of([Section.FromPolars("fell-30", [polar])]), Augmentation.None, 3, 0, new AirProperties(1.225, 1.789e-5, 340.29),
            [.. Enumerable.Range(1, windSpeeds).Select(i => (double)i)], new Control.FixedSpeed(2, 0, null), 0, double.PositiveInfinity, Drivetrain.Constant(1),
            new BalanceModel(elements, ElementSpacing.Uniform, true, true, HeavyLoading.Glauert1935, BalanceWith.LiftAndDrag));
    }

    public static StudyCase Case(string name, RotorCase? rotor = null, string title = "invented", params (string Key, string Value)[] values)
    {
        var all = values.ToImmutableSortedDictionary(v => v.Key, v => v.Value, StringComparer.Ordinal);
        // Cases of the same values are the same case under another name; those without any differ.
        var determining = values.Length == 0 ? name : string.Join('\n', all.Select(v => $"{v.Key}={v.Value}"));
        return new StudyCase(
            name, title, $"cases/{name}.toml", rotor ?? Rotor(), null, Hash(determining),
            [new InputFile($"cases/{name}.toml", Hash(name), "case file")], all);
    }

    public static Study Study(params StudyCase[] cases)
        => new("fell", Path.GetTempPath(), null, [.. cases], [], [], []);

    /// <summary>A curve that depends on the case alone; its powers are multiples of the wind speed.</summary>
    public static PowerCurve Curve(RotorCase rotor, PointMarks marks = PointMarks.None) => new(
        [.. rotor.WindSpeeds.Select(v => Point(v, rotor.Model.Elements, marks))], 2.5, null, [], PointMarks.None, rotor.WindSpeeds.Length);

    /// <summary>The same curve with every thrust so many times as large.</summary>
    public static PowerCurve Scaled(PowerCurve curve, double factor) => curve with
    {
        Points = [.. curve.Points.Select(p => p.Loads is { } loads ? p with { Loads = loads with { Thrust = loads.Thrust * factor } } : p)],
    };

    public static CurvePoint Point(double windSpeed, int elements = 2, PointMarks marks = PointMarks.None) => new(
        new OperatingPoint(windSpeed, Math.PI, Math.PI / 180),
        marks.HasFlag(PointMarks.Unbalanced) ? null : Loads(windSpeed),
        marks.HasFlag(PointMarks.Unbalanced) ? double.NaN : 900 * windSpeed,
        Region.FixedSpeed, marks, marks.HasFlag(PointMarks.Unbalanced) ? null : Margins, [.. Enumerable.Range(0, elements).Select(Element)]);

    public static PointMargins Margins { get; } = new(-18e3 / Math.PI, 360e3 / Math.PI, Math.PI / 36, 7.5, 0.25);

    public static RotorLoads Loads(double windSpeed) => new(
        2000 * windSpeed, 300, 1000 * windSpeed, 31, 31 / windSpeed, 0.4 - 0.01 * windSpeed, 0.8, 0.05, 7000, -100, 6000 - 100 * windSpeed, 50);

    public static ElementState Element(int index) => new(
        2.5 + index, 1, 0.75, 0.1, "fell-30", 0.2, 0.1, 1.5e6, 0.3, 0.01, 0.9, 1.1, 0.02, 500, 50, 1e-13, 9 + index, ElementMarks.None);

    public static string Hash(string text) => Convert.ToHexStringLower(SHA256.HashData(Encoding.UTF8.GetBytes(text)));
}
