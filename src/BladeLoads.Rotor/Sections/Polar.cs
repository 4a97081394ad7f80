using System.Collections.Immutable;

namespace BladeLoads.Rotor.Sections;

/// <summary>
/// Lift and drag coefficients of a blade section against angle of attack at one Reynolds number.
/// Holds at least three rows; angles rise strictly within -pi to pi; every value is finite; drag is not negative.
/// Equality is by reference.
/// </summary>
public sealed class Polar
{
    private Polar(double reynolds, ImmutableArray<double> angles, ImmutableArray<double> lift, ImmutableArray<double> drag)
        => (Reynolds, Angles, Lift, Drag) = (reynolds, angles, lift, drag);

    /// <summary>Reynolds number on the chord, above 0; <see cref="double.NaN"/> when the table does not say.</summary>
    public double Reynolds { get; }

    /// <summary>Angles of attack, rad, rising.</summary>
    public ImmutableArray<double> Angles { get; }

    /// <summary>Lift coefficients, one an angle.</summary>
    public ImmutableArray<double> Lift { get; }

    /// <summary>Drag coefficients, one an angle, not negative.</summary>
    public ImmutableArray<double> Drag { get; }

    /// <summary>Whether no row lifts more than 0.01, up or down: a round section, for which nothing that rests on lift is meant.</summary>
    public bool IsRound => Lift.All(lift => Math.Abs(lift) <= 0.01);

    /// <param name="reynolds">Above 0, or NaN for a table that names no Reynolds number.</param>
    /// <param name="angles">rad, at least three, rising strictly, within -pi to pi.</param>
    /// <param name="lift">One an angle, finite.</param>
    /// <param name="drag">One an angle, finite, not negative.</param>
    /// <exception cref="ArgumentException">A row breaks what is said above; the message says which.</exception>
    public static Polar FromRows(double reynolds, ReadOnlySpan<double> angles, ReadOnlySpan<double> lift, ReadOnlySpan<double> drag)
    {
        if (angles.Length < 3 || lift.Length != angles.Length || drag.Length != angles.Length)
            throw new ArgumentException("a polar needs three rows or more, with lift and drag in each", nameof(angles));
        if (!double.IsNaN(reynolds) && !(reynolds > 0 && double.IsFinite(reynolds)))
            throw new ArgumentException("a Reynolds number is positive and finite", nameof(reynolds));
        for (var i = 0; i < angles.Length; i++)
        {
            if (!(Math.Abs(angles[i]) <= Math.PI) || !double.IsFinite(lift[i]) || !(drag[i] >= 0) || !double.IsFinite(drag[i]))
                throw new ArgumentException($"row {i}: angle within +-pi, finite lift, drag of 0 or more", nameof(angles));
            if (i > 0 && !(angles[i] > angles[i - 1]))
                throw new ArgumentException($"row {i}: angles must rise", nameof(angles));
        }
        return new Polar(reynolds, [.. angles], [.. lift], [.. drag]);
    }
}
