using System.Collections.Immutable;
using BladeLoads.Rotor.Loads;

namespace BladeLoads.Rotor.Operation;

/// <summary>The coefficients of a rotor over tip-speed ratio and pitch.</summary>
/// <param name="Points">Pitch by pitch within tip-speed ratio by tip-speed ratio.</param>
/// <param name="Best">Index of the point with the highest power coefficient.</param>
public sealed record CoefficientSurface(ImmutableArray<SurfacePoint> Points, int Best)
{
    /// <summary>Solves a surface at one wind speed.</summary>
    /// <param name="tipSpeedRatios">Above 0, one or more.</param>
    /// <param name="pitches">rad, one or more.</param>
    /// <param name="windSpeed">m/s, above 0; sets the Reynolds numbers.</param>
    /// <exception cref="OperationCanceledException">Cancelled between two points.</exception>
    public static CoefficientSurface Solve(
        RotorCase rotorCase, ImmutableArray<double> tipSpeedRatios, ImmutableArray<double> pitches, double windSpeed,
        CancellationToken cancellation)
    {
        var model = new RotorModel(rotorCase);
        var points = ImmutableArray.CreateBuilder<SurfacePoint>(tipSpeedRatios.Length * pitches.Length);
        var best = 0;
        foreach (var ratio in tipSpeedRatios)
            foreach (var pitch in pitches)
            {
                cancellation.ThrowIfCancellationRequested();
                var loads = model.Solve(new OperatingPoint(windSpeed, ratio * windSpeed / model.SweptRadius, pitch));
                var marks = ElementMarks.None;
                foreach (var element in model.Elements)
                    marks |= element.Marks;
                points.Add(new SurfacePoint(ratio, pitch, loads, marks));
                if (loads is not null && !(loads.PowerCoefficient <= points[best].Loads?.PowerCoefficient))
                    best = points.Count - 1;
            }
        return new CoefficientSurface(points.MoveToImmutable(), best);
    }
}

/// <param name="Loads">Null where an element is unbalanced.</param>
/// <param name="Marks">Of all elements together.</param>
public sealed record SurfacePoint(double TipSpeedRatio, double Pitch, RotorLoads? Loads, ElementMarks Marks);
