using System.Collections.Immutable;

namespace BladeLoads.Studies.PolarCheck;

/// <summary>What can be doubtful in a polar table, in a few words; docs/formats.md says when each is raised.</summary>
public static class DoubtKinds
{
    public const string Reach = "reach";
    public const string Gap = "gap";
    public const string OneAngleTwice = "one angle twice";
    public const string RepeatedRows = "repeated rows";
    public const string Scatter = "scatter";
    public const string LiftSlope = "lift slope";
    public const string ZeroLiftAngle = "zero-lift angle";
    public const string SignOfLift = "sign of lift";
    public const string LargestLift = "largest lift";
    public const string EndsBeforeStall = "ends before stall";
    public const string DragBelowPlate = "drag below a plate";
    public const string UnitOfDrag = "unit of drag";
    public const string Jump = "jump";
    public const string SharpStall = "sharp stall";
    public const string HalfTurn = "180 deg";
    public const string DragAcross = "drag across the wind";
    public const string ExchangedColumns = "exchanged columns";
    public const string ReynoldsNumbers = "Reynolds numbers";
    public const string Augmented = "augmented";

    /// <summary>In the order of the documents.</summary>
    public static ImmutableArray<string> All { get; } =
    [
        Reach, Gap, OneAngleTwice, RepeatedRows, Scatter, LiftSlope, ZeroLiftAngle, SignOfLift, LargestLift, EndsBeforeStall,
        DragBelowPlate, UnitOfDrag, Jump, SharpStall, HalfTurn, DragAcross, ExchangedColumns, ReynoldsNumbers, Augmented,
    ];
}
