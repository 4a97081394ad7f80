namespace BladeLoads.Rotor.Operation;

/// <summary>Wind speed m/s, rotor speed rad/s, pitch rad (positive towards feather). The default is a parked rotor in calm air.</summary>
public readonly record struct OperatingPoint(double WindSpeed, double RotorSpeed, double Pitch);
