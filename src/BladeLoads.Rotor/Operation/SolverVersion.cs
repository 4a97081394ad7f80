namespace BladeLoads.Rotor.Operation;

/// <summary>The version of the physics: raised whenever a change moves a number, so that results made before are out of date.</summary>
public static class SolverVersion
{
    public const int Number = 2;
}
