namespace BladeLoads.Rotor.Tests.Properties;

/// <summary>
/// The balances that a scan of 2,000 equal steps shows, as docs/theory.md says them, by walking all of its steps.
/// </summary>
internal static class DenseScan
{
    private const int Steps = 2000;

    // In order of search; the propeller-brake state from zero outwards, so that the first is the one nearest zero.
    private static readonly (double From, double To)[] _intervals =
        [(1e-6, Math.PI / 2), (-1e-6, -Math.PI / 4), (Math.PI / 2, Math.PI - 1e-6)];

    /// <summary>All balances of the first interval that holds one, in order of search; none where no interval does.</summary>
    public static IReadOnlyList<double> Balances(IndependentAnnulus annulus)
        => [.. Brackets(annulus).Select(bracket => Close(annulus, bracket.Low, bracket.High))];

    /// <summary>The steps of the scan that hold the balances.</summary>
    public static IReadOnlyList<(double Low, double High)> Brackets(IndependentAnnulus annulus)
    {
        foreach (var (from, to) in _intervals)
        {
            var found = new List<(double, double)>();
            var (angle, residual) = (from, annulus.Residual(from));
            for (var i = 1; i <= Steps; i++)
            {
                var next = from + (to - from) * i / Steps;
                var nextResidual = annulus.Residual(next);
                if (residual < 0 != nextResidual < 0 && IsBalance(annulus, Close(annulus, angle, next)))
                    found.Add((angle, next));
                (angle, residual) = (next, nextResidual);
            }
            if (found.Count > 0)
                return found;
        }
        return [];
    }

    // Where the angle of attack passes a half turn and a table does not go round, the residual jumps; nothing is in balance there.
    private static bool IsBalance(IndependentAnnulus annulus, double angle)
        => Math.Abs(annulus.Residual(angle)) < 1e-6 && annulus.IsFlow(angle);

    private static double Close(IndependentAnnulus annulus, double low, double high)
    {
        var below = annulus.Residual(low) < 0;
        while (Math.Abs(high - low) > 1e-14)
        {
            var middle = (low + high) / 2;
            if (middle == low || middle == high)
                break;
            (low, high) = annulus.Residual(middle) < 0 == below ? (middle, high) : (low, middle);
        }
        return (low + high) / 2;
    }
}
