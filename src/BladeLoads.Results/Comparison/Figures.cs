using System.Collections.Immutable;
using BladeLoads.Results.Tables;
using BladeLoads.Results.Wording;
using BladeLoads.Rotor.Operation;

namespace BladeLoads.Results.Comparison;

/// <summary>A figure of a result and where it was found.</summary>
/// <param name="WindSpeed">m/s; null for a figure that is itself a wind speed, or belongs to none.</param>
public sealed record FigureValue(double Value, double? WindSpeed);

/// <summary>A figure that is compared between two results.</summary>
/// <param name="Name">In words, as files and the screen name it.</param>
/// <param name="Unit">Of the file; empty for a ratio.</param>
/// <param name="BySize">Compared by magnitude: of a moment, the sign says the direction and not whether the load has grown.</param>
/// <param name="Of">Null where the result has no such figure.</param>
public sealed record Figure(string Name, string Unit, bool BySize, Func<StoredResult, FigureValue?> Of)
{
    /// <summary>Left out of a comparison of two results that both have none.</summary>
    public bool IsOfSomeCases { get; init; }
}

/// <summary>The figures that are compared, in their order. A later one (annual energy) joins at the end.</summary>
public static class Figures
{
    public const string ElectricalPower = "electrical_power_kW";
    public const string Thrust = "thrust_kN";

    // A rotor that stands still outside its wind speeds of operation counts for no largest figure, as in the summary.
    private static readonly string[] AtRest = [StatusWords.Of(PointMarks.BelowCutIn), StatusWords.Of(PointMarks.AboveCutOut)];

    public static ImmutableArray<Figure> All { get; } =
    [
        new("best power coefficient", "", false, Largest("power_coefficient")),
        new("rated wind speed", "m/s", false, Rated),
        new("largest electrical power", "kW", false, Largest(ElectricalPower)),
        new("largest thrust", "kN", false, Largest(Thrust)),
        new("largest root out-of-plane moment", "kNm", true, LargestBySize("aero_root_out_of_plane_moment_kNm")),
        new("largest root in-plane moment", "kNm", true, LargestBySize("aero_root_in_plane_moment_kNm")),
        new("largest root flapwise moment", "kNm", true, LargestBySize("aero_root_flapwise_moment_kNm")),
        new("largest root edgewise moment", "kNm", true, LargestBySize("aero_root_edgewise_moment_kNm")),
        new("annual energy", "MWh", false, AnnualEnergy) { IsOfSomeCases = true },
    ];

    // The table has no row at the rated wind speed: the receipt alone knows it.
    private static FigureValue? Rated(StoredResult result)
        => result.Receipt?.Summary.RatedWindSpeed is { } rated ? new FigureValue(rated, null) : null;

    private static FigureValue? AnnualEnergy(StoredResult result)
        => result.Receipt?.Summary.Energy?.AnnualEnergy is { } energy ? new FigureValue(FileUnits.MegawattHours(energy), null) : null;

    private static Func<StoredResult, FigureValue?> Largest(string column) => result => Largest(result, column, value => value);

    private static Func<StoredResult, FigureValue?> LargestBySize(string column) => result => Largest(result, column, Math.Abs);

    private static FigureValue? Largest(StoredResult result, string column, Func<double, double> size)
    {
        var found = result.Curve.Points.Concat(result.DesignPoints.Points).OrderBy(p => p.WindSpeed)
            .Where(p => p[column] is not null && !p.Marks.Any(AtRest.Contains)).Select(p => new FigureValue(p[column]!.Value, p.WindSpeed)).ToList();
        if (found.Count == 0)
            return null;
        var largest = found.Max(f => size(f.Value));
        return found.First(f => size(f.Value) >= largest - (DesignPoint.FlatWithin * Math.Abs(largest)));
    }
}
