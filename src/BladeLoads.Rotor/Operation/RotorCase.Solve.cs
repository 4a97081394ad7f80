namespace BladeLoads.Rotor.Operation;

/// <summary>Solves rotor cases: the one entrance to the physics.</summary>
public static class CaseSolver
{
    /// <summary>The power curve of a case. The same case gives the same bytes, whatever else runs beside it.</summary>
    /// <exception cref="OperationCanceledException">Cancelled between two operating points.</exception>
    public static PowerCurve Solve(RotorCase rotorCase, CancellationToken cancellation) => throw new NotSupportedException();
}
