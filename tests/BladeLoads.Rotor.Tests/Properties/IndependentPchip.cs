namespace BladeLoads.Rotor.Tests.Properties;

/// <summary>
/// Shape-preserving cubic through points, written for the tests from docs/theory.md and nothing of the library: interior slopes of
/// Fritsch and Butland 1984, three-point ends held to the shape, end values beyond the ends.
/// </summary>
internal sealed class IndependentPchip
{
    private readonly double[] _x;
    private readonly double[] _y;
    private readonly double[] _slope;

    public IndependentPchip(IReadOnlyList<double> x, IReadOnlyList<double> y)
    {
        (_x, _y, _slope) = ([.. x], [.. y], new double[x.Count]);
        for (var i = 1; i < _x.Length - 1; i++)
        {
            var (before, after) = (Secant(i - 1), Secant(i));
            if (before * after <= 0)
                continue;
            var (h1, h2) = (_x[i] - _x[i - 1], _x[i + 1] - _x[i]);
            var (w1, w2) = (2 * h2 + h1, h2 + 2 * h1);
            _slope[i] = (w1 + w2) / (w1 / before + w2 / after);
        }
        var last = _x.Length - 1;
        _slope[0] = EndSlope(_x[1] - _x[0], _x[2] - _x[1], Secant(0), Secant(1));
        _slope[last] = EndSlope(_x[last] - _x[last - 1], _x[last - 1] - _x[last - 2], Secant(last - 1), Secant(last - 2));
    }

    public double First => _x[0];

    public double Last => _x[^1];

    /// <summary>The interval that holds x, and how far into it x lies; beyond the ends, the end.</summary>
    public (int Interval, double Offset) Locate(double x)
    {
        if (x <= _x[0])
            return (0, 0);
        if (x >= _x[^1])
            return (_x.Length - 2, _x[^1] - _x[^2]);
        var (low, high) = (0, _x.Length - 1);
        while (high - low > 1)
        {
            var middle = (low + high) / 2;
            (low, high) = _x[middle] <= x ? (middle, high) : (low, middle);
        }
        return (low, x - _x[low]);
    }

    public double At(int i, double offset)
    {
        var h = _x[i + 1] - _x[i];
        var t = offset / h;
        var (t2, t3) = (t * t, t * t * t);
        return (2 * t3 - 3 * t2 + 1) * _y[i] + (t3 - 2 * t2 + t) * h * _slope[i]
            + (3 * t2 - 2 * t3) * _y[i + 1] + (t3 - t2) * h * _slope[i + 1];
    }

    public double At(double x)
    {
        var (interval, offset) = Locate(x);
        return At(interval, offset);
    }

    private double Secant(int i) => (_y[i + 1] - _y[i]) / (_x[i + 1] - _x[i]);

    private static double EndSlope(double h0, double h1, double secant0, double secant1)
    {
        var slope = ((2 * h0 + h1) * secant0 - h0 * secant1) / (h0 + h1);
        if (slope * secant0 <= 0)
            return 0;
        return secant0 * secant1 <= 0 && Math.Abs(slope) > 3 * Math.Abs(secant0) ? 3 * secant0 : slope;
    }
}
