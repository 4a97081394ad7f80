using BladeLoads.Studies.Tables;

namespace BladeLoads.Studies.Laboratory;

/// <summary>Forces square to the chord and along it turned into lift and drag.</summary>
/// <remarks>
/// With the normal force n positive towards the upper side and t along the chord, positive towards the leading edge:
/// <c>cl = n cos alpha + t sin alpha</c>, <c>cd = n sin alpha - t cos alpha</c>. By geometry.
/// </remarks>
internal sealed class SectionForces
{
    private readonly int _forward;

    private SectionForces(int forward) => _forward = forward;

    /// <summary>Null where lift and drag are in the table themselves.</summary>
    public static SectionForces? Asked(ReadingRequest request)
        => !request.TakesForces ? null : new SectionForces(request.Takes(ColumnRole.Axial) ? -1 : 1);

    /// <param name="angle">rad.</param>
    public (double Lift, double Drag) ToLiftAndDrag(double normal, double along, double angle)
    {
        var (sin, cos) = Math.SinCos(angle);
        var tangential = _forward * along;
        return (TwelveDigits.Of((normal * cos) + (tangential * sin)), TwelveDigits.Of((normal * sin) - (tangential * cos)));
    }
}
