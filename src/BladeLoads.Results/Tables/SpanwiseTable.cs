using System.Collections.Immutable;
using BladeLoads.Results.Wording;
using BladeLoads.Rotor.Loads;
using BladeLoads.Rotor.Operation;
using static BladeLoads.Results.Tables.FileUnits;

namespace BladeLoads.Results.Tables;

/// <summary><c>spanwise.csv</c>: a row an element of an operating point, root to tip. The columns are a promise (docs/formats.md).</summary>
public static class SpanwiseTable
{
    public const string FileName = "spanwise.csv";

    public static ImmutableArray<string> Columns { get; } =
    [
        "wind_speed_m_s", "radius_m", "chord_m", "twist_deg", "section", "inflow_angle_deg", "angle_of_attack_deg", "reynolds",
        "axial_induction", "tangential_induction", "loss_factor", "lift_coefficient", "drag_coefficient",
        "normal_force_N_per_m", "tangential_force_N_per_m", "status",
        "element_length_m",
    ];

    /// <summary>The table as UTF-8, or null where the case asks for no wind speed.</summary>
    /// <param name="windSpeeds">m/s: the points to write; null for all.</param>
    public static byte[]? Write(PowerCurve curve, ImmutableArray<double>? windSpeeds)
    {
        if (windSpeeds is { IsEmpty: true })
            return null;
        using var table = new TableWriter(Columns.AsSpan());
        foreach (var point in curve.Points)
            if (windSpeeds is not { } wanted || wanted.Any(w => IsSame(w, point.Operation.WindSpeed)))
                foreach (var element in point.Elements)
                    WriteElement(table, point.Operation.WindSpeed, element);
        return table.ToBytes();
    }

    // A wind speed from a range (from + i step) differs in its last digits from the same one typed in a list.
    private static bool IsSame(double wanted, double windSpeed) => Math.Abs(wanted - windSpeed) <= 1e-9 * Math.Abs(windSpeed);

    private static void WriteElement(TableWriter table, double windSpeed, in ElementState element)
    {
        table.Number(windSpeed);
        table.Number(element.Radius);
        table.Number(element.Chord);
        table.Number(Deg(element.Twist));
        table.Text(element.Section);
        table.Number(Deg(element.InflowAngle));
        table.Number(Deg(element.AngleOfAttack));
        table.Number(element.Reynolds);
        table.Number(element.AxialInduction);
        table.Number(element.TangentialInduction);
        table.Number(element.LossFactor);
        table.Number(element.LiftCoefficient);
        table.Number(element.DragCoefficient);
        table.Number(element.NormalForcePerLength);
        table.Number(element.TangentialForcePerLength);
        table.Text(StatusWords.Of(element.Marks));
        table.Number(element.Length);
        table.EndRow();
    }
}
