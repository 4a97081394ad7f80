namespace BladeLoads.Rotor.Operation;

/// <summary>A tip-speed ratio, a pitch (rad) and the power coefficient there.</summary>
/// <param name="IsSearched">Whether either was searched for; else both were given.</param>
public readonly record struct BestOperation(double TipSpeedRatio, double Pitch, double PowerCoefficient, bool IsSearched)
{
    /// <summary>
    /// m/s: the wind speed at which the best is searched for. A power coefficient moves with the Reynolds number, so with the wind speed; this
    /// is one at which most rotors run at their best tip-speed ratio.
    /// </summary>
    public const double WindSpeed = 8;

    private const double LeastTipSpeedRatio = 0.5;
    private const double LargestTipSpeedRatio = 20;
    private const double RatioStep = 0.5;
    private static readonly double PitchStep = double.DegreesToRadians(1.5);
    private static readonly double LeastPitch = double.DegreesToRadians(-15);
    private static readonly double LargestPitch = double.DegreesToRadians(30);

    // Shares of a grid step.
    private const double FirstStep = 0.8;
    private const double CoarseStep = 0.02;
    private const double LastStep = 1e-6;
    private const int HighestSamples = 6;
    private const double GoldenShare = 0.3819660112501051;

    // Lower peaks than this share of the highest sample are not followed: no peak is that much sharper than the steps.
    private const double WorthFollowing = 0.9;

    /// <summary>
    /// The pair with the highest power coefficient, or the missing one of a pair; right to 1e-5 in power coefficient.
    /// </summary>
    /// <param name="tipSpeedRatio">Null where it is to be found, from 0.5 to 20.</param>
    /// <param name="pitch">rad; null where it is to be found, from -15 to 30 degrees.</param>
    /// <remarks>
    /// A grid of steps of 0.5 and 1.5 degrees shows the peaks; each that is worth it is climbed by steps in turning directions,
    /// shortened where none leads up. So a lower peak that happens to lie nearer does not catch the search.
    /// </remarks>
    internal static BestOperation Find(RotorModel model, double? tipSpeedRatio, double? pitch, CancellationToken cancellation)
    {
        double[] ratios = tipSpeedRatio is { } givenRatio ? [givenRatio] : Steps(LeastTipSpeedRatio, LargestTipSpeedRatio, RatioStep);
        double[] pitches = pitch is { } givenPitch
            ? [givenPitch]
            : Steps(LeastPitch, LargestPitch, PitchStep);
        var grid = new double[ratios.Length, pitches.Length];
        var highest = double.NegativeInfinity;
        for (var i = 0; i < ratios.Length; i++)
        {
            cancellation.ThrowIfCancellationRequested();
            for (var j = 0; j < pitches.Length; j++)
            {
                grid[i, j] = CoefficientAt(model, ratios[i], pitches[j]);
                highest = Math.Max(highest, grid[i, j]);
            }
        }
        // Coarsely from every start, then finely from where the best of them ended.
        var best = new BestOperation(ratios[0], pitches[0], double.NegativeInfinity, IsSearched: true);
        var tops = new List<BestOperation>();
        foreach (var (i, j) in Starts(grid, highest))
        {
            cancellation.ThrowIfCancellationRequested();
            if (tops.Exists(t => Math.Abs(t.TipSpeedRatio - ratios[i]) < RatioStep && Math.Abs(t.Pitch - pitches[j]) < PitchStep))
                continue;
            var start = new BestOperation(ratios[i], pitches[j], grid[i, j], IsSearched: true);
            var top = Climb(model, start, tipSpeedRatio is null, pitch is null, FirstStep, CoarseStep);
            tops.Add(top);
            if (top.PowerCoefficient > best.PowerCoefficient)
                best = top;
        }
        return Climb(model, best, tipSpeedRatio is null, pitch is null, 4 * CoarseStep, LastStep);
    }

    // The peaks of the grid that are worth it, and the highest samples besides: a peak on the edge of stall may fall between samples.
    private static IEnumerable<(int, int)> Starts(double[,] grid, double highest)
    {
        var all = Enumerable.Range(0, grid.GetLength(0)).SelectMany(i => Enumerable.Range(0, grid.GetLength(1)).Select(j => (i, j))).ToArray();
        var peaks = all.Where(at => double.IsFinite(grid[at.i, at.j]) && IsPeak(grid, at.i, at.j) && grid[at.i, at.j] >= highest - ((1 - WorthFollowing) * Math.Abs(highest)));
        return peaks.Concat(all.OrderByDescending(at => grid[at.i, at.j]).Take(HighestSamples)).Distinct();
    }

    internal static BestOperation Given(double tipSpeedRatio, double pitch, RotorModel model)
        => new(tipSpeedRatio, pitch, CoefficientAt(model, tipSpeedRatio, pitch), IsSearched: false);

    // The highest point may lie on the edge of stall, a ridge that falls off on one side: few directions lead up along it, so many are tried,
    // others at every step.
    private static BestOperation Climb(
        RotorModel model, BestOperation from, bool freeRatio, bool freePitch, double firstStep, double lastStep)
    {
        var directions = freeRatio && freePitch ? 16 : 2;
        var step = firstStep;
        for (var round = 0; step > lastStep; round++)
        {
            var (ratioStep, pitchStep) = (freeRatio ? step * RatioStep : 0, freePitch ? step * PitchStep : 0);
            var up = from;
            for (var i = 0; i < directions; i++)
            {
                var turn = 2 * Math.PI * (((double)i / directions) + (directions > 2 ? GoldenShare * round : 0));
                var (alongRatio, alongPitch) = directions > 2 ? (Math.Cos(turn), Math.Sin(turn)) : (1 - (2 * i), 1 - (2 * i));
                var ratio = freeRatio
                    ? Math.Clamp(from.TipSpeedRatio + (alongRatio * ratioStep), LeastTipSpeedRatio, LargestTipSpeedRatio)
                    : from.TipSpeedRatio;
                var pitch = freePitch ? Math.Clamp(from.Pitch + (alongPitch * pitchStep), LeastPitch, LargestPitch) : from.Pitch;
                var coefficient = CoefficientAt(model, ratio, pitch);
                if (coefficient > up.PowerCoefficient)
                    up = new BestOperation(ratio, pitch, coefficient, IsSearched: true);
            }
            if (up == from)
                step *= 0.6;
            from = up;
        }
        return from;
    }

    private static double CoefficientAt(RotorModel model, double tipSpeedRatio, double pitch)
        => model.Solve(new OperatingPoint(WindSpeed, tipSpeedRatio * WindSpeed / model.SweptRadius, pitch))?.PowerCoefficient
            ?? double.NegativeInfinity;

    private static bool IsPeak(double[,] grid, int i, int j)
    {
        for (var k = Math.Max(0, i - 1); k <= Math.Min(grid.GetLength(0) - 1, i + 1); k++)
            for (var l = Math.Max(0, j - 1); l <= Math.Min(grid.GetLength(1) - 1, j + 1); l++)
                if (grid[k, l] > grid[i, j])
                    return false;
        return true;
    }

    private static double[] Steps(double from, double to, double step)
        => [.. Enumerable.Range(0, (int)(((to - from) / step) + 1e-9) + 1).Select(i => from + (i * step))];
}
