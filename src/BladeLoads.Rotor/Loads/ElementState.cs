namespace BladeLoads.Rotor.Loads;

/// <summary>What a reader of an element must know besides its numbers.</summary>
[Flags]
public enum ElementMarks
{
    None = 0,
    Unbalanced = 1,
    SeveralBalances = 2,
    OutsideAngles = 4,
    OutsideReynolds = 8,
}

/// <summary>
/// One blade element at one operating point. SI units and radians; forces per length of blade. Where the marks say
/// <see cref="ElementMarks.Unbalanced"/>, everything from the inflow angle on, but for the Reynolds number, is NaN.
/// </summary>
/// <param name="Length">Along the blade, m.</param>
/// <param name="Section">The section's name; <c>inner/outer</c> where the coefficients of two are blended.</param>
/// <param name="Reynolds">From the undisturbed relative speed.</param>
/// <param name="Residual">What is left of the momentum balance at the inflow angle, as a ratio of speeds.</param>
/// <param name="Evaluations">Evaluations of section coefficients that the balance took.</param>
public readonly record struct ElementState(
    double Radius, double Length, double Chord, double Twist, string Section,
    double InflowAngle, double AngleOfAttack, double Reynolds, double AxialInduction, double TangentialInduction, double LossFactor,
    double LiftCoefficient, double DragCoefficient, double NormalForcePerLength, double TangentialForcePerLength,
    double Residual, int Evaluations, ElementMarks Marks);
