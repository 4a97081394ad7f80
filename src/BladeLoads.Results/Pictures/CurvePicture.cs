using System.Collections.Immutable;
using BladeLoads.Results.Comparison;

namespace BladeLoads.Results.Pictures;

/// <summary>Power curves of cases in the same diagrams: power, thrust, moment and operation over wind speed.</summary>
/// <param name="Title">For screen readers.</param>
/// <param name="Lines">In the order of the legend.</param>
public sealed record CurvePicture(string Title, ImmutableArray<CurveLine> Lines)
{
    /// <summary>More lines than this cannot be told apart.</summary>
    public const int MostLines = 12;

    /// <summary>Whether there is a line to draw: a curve of two wind speeds or more.</summary>
    public bool HasLines => Lines.Any(line => line.IsDrawn);
}

/// <param name="Label">What the legend says of it.</param>
public sealed record CurveLine(string Label, StoredCurve Curve)
{
    internal bool IsDrawn => Curve.Points.Length > 1 && Curve.Points[^1].WindSpeed > Curve.Points[0].WindSpeed;
}
