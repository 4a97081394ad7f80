namespace BladeLoads.Rotor.Momentum;

/// <summary>
/// Finds the sign changes of the residual that a scan of <see cref="Steps"/> equal steps over an interval would show, without making most of the scan: a stretch of it is left out only where the residual is proved to keep its sign there, or to rise.
/// </summary>
internal ref struct SignChanges
{
    /// <summary>Steps of the scan that defines the answer.</summary>
    public const int Steps = 2000;

    /// <summary>The most sign changes that are kept; what lies beyond is counted as seen.</summary>
    public const int Kept = 8;

    private readonly ref readonly Annulus _annulus;
    private readonly double _from;
    private readonly double _to;
    private readonly bool _downwards;
    private readonly Span<Bracket> _found;

    private SignChanges(ref readonly Annulus annulus, double from, double to, bool downwards, Span<Bracket> found)
    {
        _annulus = ref annulus;
        (_from, _to, _downwards) = (from, to, downwards);
        _found = found;
    }

    public int Count { get; private set; }

    public int Evaluations { get; private set; }

    /// <param name="from">rad; the interval lies on one side of 0 and of pi/2.</param>
    /// <param name="to">rad, above <paramref name="from"/>.</param>
    /// <param name="downwards">Whether the brackets are wanted in falling order; else in rising.</param>
    /// <param name="found">Receives the brackets; <see cref="Kept"/> long.</param>
    public static SignChanges Between(
        double from, double to, bool downwards, ref readonly Annulus annulus, Span<Bracket> found)
    {
        var search = new SignChanges(in annulus, from, to, downwards, found);
        var (first, last) = (search.ProbeAt(0), search.ProbeAt(Steps));
        var start = FirstSplit(from, to, annulus);
        var middle = search.ProbeAt(start);
        search.VisitHalves(0, first, start, middle, Steps, last);
        return search;
    }

    /// <summary>
    /// A node just beyond the undisturbed inflow angle: from there up a lifting element has no balance, and below there is one, as a rule.
    /// </summary>
    public static int FirstSplit(double from, double to, in Annulus annulus)
    {
        var undisturbed = Math.Atan(annulus.SpeedRatio);
        var node = (int)((undisturbed - from) / (to - from) * Steps) + 1;
        return node is > 1 and < Steps ? node : Steps / 2;
    }

    /// <summary>The inflow angle of a node of the scan, rad.</summary>
    public static double Node(double from, double to, int node)
        // The last node is the end itself, so that no rounding carries it past pi/2.
        => node == Steps ? to : from + (node * ((to - from) / Steps));

    private void Visit(int first, in Probe a, int last, in Probe b)
    {
        var changes = a.Residual > 0 != b.Residual > 0;
        if (last - first == 1)
        {
            if (changes)
                Keep(new Bracket(a, b));
            return;
        }
        var range = _annulus.CoefficientRange(a.InflowAngle, b.InflowAngle);
        if (changes)
        {
            if (ResidualBounds.Rises(a, b, _annulus, range))
            {
                Keep(new Bracket(a, b));
                return;
            }
        }
        else if (ResidualBounds.KeepOneSign(a, b, _annulus, range) || ResidualBounds.Rises(a, b, _annulus, range))
            return;

        var middle = (first + last) / 2;
        var m = ProbeAt(middle);
        VisitHalves(first, a, middle, m, last, b);
    }

    private void VisitHalves(int first, in Probe a, int middle, in Probe m, int last, in Probe b)
    {
        if (_downwards)
            Visit(middle, m, last, b);
        Visit(first, a, middle, m);
        if (!_downwards)
            Visit(middle, m, last, b);
    }

    private void Keep(in Bracket bracket)
    {
        if (Count < Kept)
            _found[Count] = bracket;
        Count++;
    }

    private Probe ProbeAt(int node)
    {
        Evaluations++;
        return Residual.At(Node(_from, _to, node), _annulus);
    }
}

/// <summary>Two inflow angles between which the residual changes sign.</summary>
internal readonly record struct Bracket(Probe Lower, Probe Upper);
