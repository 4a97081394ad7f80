using System.Globalization;
using BladeLoads.Rotor.Sections;
using BladeLoads.Studies.Cases;
using static BladeLoads.Studies.Tables.RecordText;

namespace BladeLoads.Studies.Tables;

/// <summary>What is told of an extension, wherever it is made.</summary>
public static class ExtensionText
{
    public const string CompleteAlready = "reaches from -180 to 180 deg already";

    /// <param name="origin">Of the aspect ratio: <c> of blade.csv</c>; empty where it was given.</param>
    public static string Method(double aspectRatio, string origin, ExtensionJoin join)
        => $"{SectionMethod.Viterna}: aspect ratio {Brief(aspectRatio)}{origin}, drag {Brief(DeepStall.LargestDrag(aspectRatio))} at 90 deg, "
            + $"joined at {(join == ExtensionJoin.Stall ? "stall" : "the end of the table")}";

    /// <summary>Where the extension of one Reynolds number begins on either side, and what became of the table there.</summary>
    public static string Of(ExtendedPolar extended)
        => $"above 0 {Told(extended.Above)}; below 0 {Told(extended.Below)}"
            + (extended.RaisedToFloor == 0
                ? ""
                : $"; drag of {Rows(extended.RaisedToFloor, "added row")} raised to that of a plate along the wind");

    private static string Told(ExtendedSide side)
    {
        var at = $"{Degrees(side.JoinAngle)} deg";
        return side.Kind switch
        {
            ExtensionKind.Complete => "complete as it was",
            ExtensionKind.CarriedOn => $"end value carried on from {at}",
            ExtensionKind.Mirrored => $"from {at} to the mirrored stall point{Breaks(side)}",
            ExtensionKind.FromStall => $"from stall at {at}, {Rows(side.RowsLeftOut, "row")} beyond left out{Breaks(side)}",
            _ => $"from the end at {at}{Breaks(side)}",
        };
    }

    private static string Breaks(ExtendedSide side) => double.IsNaN(side.LiftSlopeBreak)
        ? ""
        : $", slope of lift breaks by {PerDegree(side.LiftSlopeBreak)} a degree, of drag by {PerDegree(side.DragSlopeBreak)}";

    private static string PerDegree(double slope) => double.DegreesToRadians(slope).ToString("+0.####;-0.####;0", CultureInfo.InvariantCulture);

    private static string Rows(int count, string noun)
        => string.Create(CultureInfo.InvariantCulture, $"{count} {noun}{(count == 1 ? "" : "s")}");
}
