using BladeLoads.Rotor.Loads;
using BladeLoads.Rotor.Sections;

namespace BladeLoads.Studies.PolarCheck;

/// <summary>
/// How much of the blades works where in a polar table: over angle of attack, by Reynolds number. Counts up element by element, each by its
/// share of the blade's length; an element between two Reynolds numbers counts for both by their weights.
/// </summary>
/// <remarks>
/// Shares are counted in whole billionths, so that sums do not depend on their order, and many can be counted side by side.
/// </remarks>
public sealed class TableUse
{
    private const double Billionths = 1e9;          // a blade
    private const int AnglesPerDegree = 10;
    private const int AngleBins = 360 * AnglesPerDegree;
    private const double LowestPower = 3;           // of ten; all that lies below counts there
    private const int BinsPerDecade = 100;
    private const int ReynoldsBins = 6 * BinsPerDecade;

    private readonly Section _table;
    private readonly double[] _firstPeaks;
    private readonly long[][] _angles;
    private readonly long[] _reynolds = new long[ReynoldsBins];
    private long _total;
    private long _outsideAngles;
    private long _outsideReynolds;
    private long _beyondPeak;
    private long _severalBalances;

    /// <param name="table">As tabulated: what a case adds to it for itself is no part of it.</param>
    public TableUse(Section table)
    {
        _table = table;
        _firstPeaks = [.. table.Polars.Select(polar => FirstLiftPeak.Of(polar).Peak)];
        _angles = [.. table.Polars.Select(_ => new long[AngleBins])];
    }

    /// <summary>Blades at work, summed over operating points: an element counts for its share of one.</summary>
    public double Blades => _total / Billionths;

    /// <summary>Share of it at angles outside those of the table at that Reynolds number.</summary>
    public double OutsideAngles => Share(_outsideAngles);

    /// <summary>Share of it at Reynolds numbers outside those of the table.</summary>
    public double OutsideReynolds => Share(_outsideReynolds);

    /// <summary>Share of it beyond the first peak of lift.</summary>
    public double BeyondPeak => Share(_beyondPeak);

    /// <summary>Share of it at elements with several balances.</summary>
    public double SeveralBalances => Share(_severalBalances);

    /// <summary>Counts an element at an operating point; one without a balance has no angle, and counts for nothing.</summary>
    /// <param name="share">Its share of the blade's length, times that of its coefficients that come from this table; 0 to 1.</param>
    public void Add(in ElementState element, double share)
    {
        if (double.IsNaN(element.AngleOfAttack))
            return;
        var place = _table.PlaceOf(element.Reynolds);
        Add(element, place.Polar, share * (1 - place.Weight), place.Outside);
        if (place.Weight > 0)
            Add(element, place.Polar + 1, share * place.Weight, place.Outside);
    }

    /// <summary>Adds what another has counted of the same table.</summary>
    public void Add(TableUse other)
    {
        for (var m = 0; m < _angles.Length; m++)
            for (var bin = 0; bin < AngleBins; bin++)
                _angles[m][bin] += other._angles[m][bin];
        for (var bin = 0; bin < ReynoldsBins; bin++)
            _reynolds[bin] += other._reynolds[bin];
        _total += other._total;
        _outsideAngles += other._outsideAngles;
        _outsideReynolds += other._outsideReynolds;
        _beyondPeak += other._beyondPeak;
        _severalBalances += other._severalBalances;
    }

    /// <summary>Share within any of some ranges of angles, degrees; where they overlap it counts once.</summary>
    /// <param name="polar">Which of the Reynolds numbers; -1 for all.</param>
    public double Within(int polar, IReadOnlyCollection<(double FromDeg, double ToDeg)> ranges)
    {
        var counted = 0L;
        for (var bin = 0; bin < AngleBins; bin++)
            if (At(polar, bin) is > 0 and var here && MiddleDeg(bin) is var angle && ranges.Any(r => angle >= r.FromDeg && angle <= r.ToDeg))
                counted += here;
        return Share(counted);
    }

    /// <summary>Share at one of the Reynolds numbers.</summary>
    public double At(int polar) => Share(_angles[polar].Sum());

    /// <summary>Share of it at Reynolds numbers below one or above another, both above 0, to 2 %.</summary>
    public double OutsideOf(double lowest, double highest)
    {
        var counted = 0L;
        for (var bin = 0; bin < ReynoldsBins; bin++)
            if (Math.Pow(10, LowestPower + ((bin + 0.5) / BinsPerDecade)) is var middle && (middle < lowest || middle > highest))
                counted += _reynolds[bin];
        return Share(counted);
    }

    /// <summary>The angle below which a share of that works, degrees, to a tenth; NaN where nothing does.</summary>
    public double AngleDegBelow(double share) => Quantile(share, AngleBins, bin => At(-1, bin), bin => -180 + (bin / AnglesPerDegree));

    /// <summary>The Reynolds number below which a share of that works, to 2 %; NaN where nothing does.</summary>
    public double ReynoldsBelow(double share)
        => Quantile(share, ReynoldsBins, bin => _reynolds[bin], bin => Math.Pow(10, LowestPower + (bin / BinsPerDecade)));

    /// <summary>Shares by angle of attack, degrees: bins of one degree in which there is any. They make 1.</summary>
    public IEnumerable<UseBin> ByAngleDeg()
    {
        for (var bin = 0; bin < AngleBins; bin += AnglesPerDegree)
        {
            var counted = 0L;
            for (var fine = bin; fine < bin + AnglesPerDegree; fine++)
                counted += At(-1, fine);
            if (counted > 0)
                yield return new UseBin(Edge(bin), Edge(bin + AnglesPerDegree), Share(counted));
        }
        static double Edge(int bin) => -180 + ((double)bin / AnglesPerDegree);
    }

    /// <summary>Shares by Reynolds number: ten bins a decade, those in which there is any. They make 1.</summary>
    public IEnumerable<UseBin> ByReynolds()
    {
        const int Together = BinsPerDecade / 10;
        for (var bin = 0; bin < ReynoldsBins; bin += Together)
        {
            var counted = 0L;
            for (var fine = bin; fine < bin + Together; fine++)
                counted += _reynolds[fine];
            if (counted > 0)
                yield return new UseBin(Edge(bin), Edge(bin + Together), Share(counted));
        }
        static double Edge(int bin) => Math.Pow(10, LowestPower + ((double)bin / BinsPerDecade));
    }

    private void Add(in ElementState element, int polar, double share, bool isOutsideReynolds)
    {
        var counted = (long)Math.Round(share * Billionths);
        var angle = element.AngleOfAttack;
        var angles = _table.Polars[polar].Angles;
        _angles[polar][BinOf((double.RadiansToDegrees(angle) + 180) * AnglesPerDegree, AngleBins)] += counted;
        _reynolds[BinOf((Math.Log10(element.Reynolds) - LowestPower) * BinsPerDecade, ReynoldsBins)] += counted;
        _total += counted;
        if (angle < angles[0] || angle > angles[^1])
            _outsideAngles += counted;
        if (isOutsideReynolds)
            _outsideReynolds += counted;
        if (angle > _firstPeaks[polar])
            _beyondPeak += counted;
        if ((element.Marks & ElementMarks.SeveralBalances) != 0)
            _severalBalances += counted;
    }

    private static int BinOf(double place, int bins) => (int)Math.Clamp(Math.Floor(place), 0, bins - 1);

    private static double MiddleDeg(int bin) => -180 + ((bin + 0.5) / AnglesPerDegree);

    private long At(int polar, int bin) => polar >= 0 ? _angles[polar][bin] : _angles.Sum(angles => angles[bin]);

    private double Share(long counted) => _total == 0 ? 0 : (double)counted / _total;

    private double Quantile(double share, int bins, Func<int, long> counted, Func<double, double> edge)
    {
        var wanted = share * _total;
        var before = 0L;
        for (var bin = 0; bin < bins; bin++)
        {
            var here = counted(bin);
            if (here > 0 && before + here >= wanted)
                return edge(bin + ((wanted - before) / here));
            before += here;
        }
        return double.NaN;
    }
}

/// <summary>A share of what works in a table, within two edges.</summary>
/// <param name="Share">Above 0 to 1.</param>
public readonly record struct UseBin(double From, double To, double Share);
