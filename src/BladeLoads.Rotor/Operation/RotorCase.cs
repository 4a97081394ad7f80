using System.Collections.Immutable;
using BladeLoads.Rotor.Air;
using BladeLoads.Rotor.Blades;
using BladeLoads.Rotor.Momentum;
using BladeLoads.Rotor.Sections;

namespace BladeLoads.Rotor.Operation;

/// <summary>
/// One rotor, one air, one control strategy, one list of wind speeds: all that determines a power curve.
/// Nothing in it has a default; whoever reads a case fills in what it leaves out.
/// </summary>
/// <param name="Blade">Every section it names is in <paramref name="Sections"/>.</param>
/// <param name="BladeCount">1 or more.</param>
/// <param name="Cone">rad, positive with the tips upwind; within +-pi/2, ends excluded.</param>
/// <param name="Augmentation">How the coefficients are augmented for rotation, element by element and operating point by operating point.</param>
/// <param name="WindSpeeds">m/s, positive, rising.</param>
/// <param name="CutInWindSpeed">m/s; below it the rotor is at rest. 0 for none.</param>
/// <param name="CutOutWindSpeed">m/s; above it the rotor is at rest. Positive infinity for none.</param>
public sealed record RotorCase(
    Blade Blade, SectionSet Sections, Augmentation Augmentation, int BladeCount, double Cone, AirProperties Air,
    ImmutableArray<double> WindSpeeds, Control Control, double CutInWindSpeed, double CutOutWindSpeed, Drivetrain Drivetrain, BalanceModel Model);
