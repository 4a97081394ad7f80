namespace BladeLoads.Rotor.Loads;

/// <summary>
/// What the whole rotor gives at one operating point, aerodynamic forces only. Coefficients are NaN at zero wind.
/// Moments are of one blade about its first station, N m.
/// </summary>
/// <param name="Thrust">N.</param>
/// <param name="Torque">N m.</param>
/// <param name="Power">Rotor power, W.</param>
/// <param name="TipSpeed">m/s.</param>
/// <param name="RootFlapwiseMoment">Out-of-plane and in-plane moments turned by the pitch.</param>
public sealed record RotorLoads(
    double Thrust, double Torque, double Power, double TipSpeed, double TipSpeedRatio,
    double PowerCoefficient, double ThrustCoefficient, double TorqueCoefficient,
    double RootOutOfPlaneMoment, double RootInPlaneMoment, double RootFlapwiseMoment, double RootEdgewiseMoment);
