using BladeLoads.Rotor.Momentum;
using BladeLoads.Rotor.Operation;
using BladeLoads.Rotor.Sections;

namespace BladeLoads.Rotor.Tests.Properties;

/// <summary>
/// One element of a rotor at one operating point, from the case alone: geometry, coefficients and the residual of its momentum
/// balance, written from docs/theory.md and nothing of the library, without a thought for speed.
/// </summary>
internal sealed class IndependentAnnulus
{
    private readonly RotorCase _rotor;
    private readonly OperatingPoint _operation;
    private readonly List<(double Share, IndependentPchip Lift, IndependentPchip Drag)> _tables = [];
    private readonly List<(double Share, IndependentPchip Lift, IndependentPchip Drag)> _augmented = [];
    private readonly double _liftFactor;
    private readonly double _dragFactor;

    public IndependentAnnulus(RotorCase rotor, OperatingPoint operation, int element)
    {
        (_rotor, _operation) = (rotor, operation);
        var (inner, outer) = (Edge(element), Edge(element + 1));
        (Radius, Length) = ((inner + outer) / 2, outer - inner);
        var stations = rotor.Blade.Stations;
        var i = 0;
        while (i < stations.Length - 2 && stations[i + 1].Radius <= Radius)
            i++;
        var (a, b) = (stations[i], stations[i + 1]);
        var share = (Radius - a.Radius) / (b.Radius - a.Radius);
        Chord = a.Chord + share * (b.Chord - a.Chord);
        Twist = a.Twist + share * (b.Twist - a.Twist);
        NormalWind = operation.WindSpeed * Math.Cos(rotor.Cone);
        TangentialWind = operation.RotorSpeed * Radius * Math.Cos(rotor.Cone);
        Solidity = rotor.BladeCount * Chord / (2 * Math.PI * Radius * Math.Cos(rotor.Cone));
        Reynolds = rotor.Air.Density * Math.Sqrt(NormalWind * NormalWind + TangentialWind * TangentialWind) * Chord
            / rotor.Air.DynamicViscosity;
        var tip = rotor.Blade.TipRadius;
        (_liftFactor, _dragFactor) = IndependentAugmentation.Factors(
            rotor.Augmentation, Chord / Radius, Radius / tip, operation.WindSpeed, operation.RotorSpeed * tip * Math.Cos(rotor.Cone));
        if (a.Section == b.Section)
            Add(rotor.Sections[a.Section!], 1);
        else
        {
            Add(rotor.Sections[a.Section!], 1 - share);
            Add(rotor.Sections[b.Section!], share);
        }

        double Edge(int k)
        {
            var (root, tip, n) = (rotor.Blade.HubRadius, rotor.Blade.TipRadius, rotor.Model.Elements);
            var fraction = rotor.Model.Spacing == ElementSpacing.Cosine ? (1 - Math.Cos(Math.PI * k / n)) / 2 : (double)k / n;
            return root + (tip - root) * fraction;
        }
    }

    public double Radius { get; }

    public double Length { get; }

    public double Chord { get; }

    public double Twist { get; }

    public double NormalWind { get; }

    public double TangentialWind { get; }

    public double Solidity { get; }

    public double Reynolds { get; }

    public (double Lift, double Drag) Coefficients(double angleOfAttack)
    {
        var wrapped = Math.IEEERemainder(angleOfAttack, 2 * Math.PI);
        var (lift, drag) = Sum(_tables);
        if (_liftFactor == 0 && _dragFactor == 0)
            return (lift, drag);
        var (fullLift, fullDrag) = Sum(_augmented);
        return (lift + _liftFactor * (fullLift - lift), drag + _dragFactor * (fullDrag - drag));

        (double, double) Sum(List<(double Share, IndependentPchip Lift, IndependentPchip Drag)> tables)
        {
            var (lift, drag) = (0.0, 0.0);
            foreach (var (share, liftTable, dragTable) in tables)
            {
                var (interval, offset) = liftTable.Locate(wrapped);
                lift += share * liftTable.At(interval, offset);
                drag += share * dragTable.At(interval, offset);
            }
            return (lift, drag);
        }
    }

    public double LossFactor(double inflowAngle)
    {
        var sin = Math.Abs(Math.Sin(inflowAngle));
        var (b, root, tip) = (_rotor.BladeCount, _rotor.Blade.HubRadius, _rotor.Blade.TipRadius);
        static double Prandtl(double exponent) => 2 / Math.PI * Math.Acos(Math.Exp(-exponent));
        var atTip = _rotor.Model.TipLoss ? Prandtl(b * (tip - Radius) / (2 * Radius * sin)) : 1;
        var atHub = _rotor.Model.HubLoss ? Prandtl(b * (Radius - root) / (2 * root * sin)) : 1;
        return atTip * atHub;
    }

    /// <summary>k and F of docs/theory.md, and sigma cl/(4 F).</summary>
    public (double Loading, double LossFactor, double Swirl) Loading(double inflowAngle)
    {
        var (sin, cos) = Math.SinCos(inflowAngle);
        var lossFactor = LossFactor(inflowAngle);
        var (lift, drag) = Coefficients(inflowAngle - Twist - _operation.Pitch);
        var normal = lift * cos + (_rotor.Model.BalanceWith == BalanceWith.LiftAndDrag ? drag * sin : 0);
        return (Solidity * normal / (4 * lossFactor * sin * sin), lossFactor, Solidity * lift / (4 * lossFactor));
    }

    public double Residual(double inflowAngle)
    {
        var (sin, cos) = Math.SinCos(inflowAngle);
        var (k, lossFactor, swirl) = Loading(inflowAngle);
        return inflowAngle > 0
            ? sin * InverseOfOneMinusInduction(k, lossFactor) - NormalWind / TangentialWind * (cos - swirl)
            : sin * (1 - k) - NormalWind / TangentialWind * (cos + swirl);
    }

    /// <summary>Whether air flows the way the inflow angle says, at an angle where the residual changes sign.</summary>
    public bool IsFlow(double inflowAngle)
    {
        var cos = Math.Cos(inflowAngle);
        var (k, lossFactor, swirl) = Loading(inflowAngle);
        return inflowAngle > 0
            ? InverseOfOneMinusInduction(k, lossFactor) > 0 && cos - swirl >= 0
            : k > 1 && cos + swirl >= 0;
    }

    /// <summary>
    /// 1/(1 - a). With v = 1/(1 - a) the cubic of glauert-1935 reads v^3/2 - 3 v^2/4 - (k - 1) v - 3/4 = 0, convex from v = 1/2 up
    /// and solved by Newton's steps from above, and the parabola of buhl-2005 reads v = 5/3 - F + sqrt(2 F k - F (4/3 - F)).
    /// </summary>
    private double InverseOfOneMinusInduction(double k, double lossFactor)
    {
        if (_rotor.Model.HeavyLoading == HeavyLoading.Buhl2005)
            return k <= 2.0 / 3 ? 1 + k : 5.0 / 3 - lossFactor + Math.Sqrt(lossFactor * (2 * k - 4.0 / 3 + lossFactor));
        if (k <= 0.5)
            return 1 + k;
        var v = 1.5 + Math.Sqrt(2 * k);
        for (var i = 0; i < 60; i++)
        {
            var next = v - (((0.5 * v - 0.75) * v - (k - 1)) * v - 0.75) / ((1.5 * v - 1.5) * v - (k - 1));
            if (!(next < v))
                return v;
            v = next;
        }
        return v;
    }

    private void Add(Section section, double share)
    {
        var polars = section.Polars;
        var last = polars.Length - 1;
        if (last == 0 || Reynolds <= polars[0].Reynolds)
            AddPolar(polars[0], share);
        else if (Reynolds >= polars[last].Reynolds)
            AddPolar(polars[last], share);
        else
        {
            var i = 0;
            while (polars[i + 1].Reynolds < Reynolds)
                i++;
            var outer = Math.Log(Reynolds / polars[i].Reynolds) / Math.Log(polars[i + 1].Reynolds / polars[i].Reynolds);
            AddPolar(polars[i], share * (1 - outer));
            AddPolar(polars[i + 1], share * outer);
        }
    }

    private void AddPolar(Polar polar, double share)
    {
        _tables.Add((share, new IndependentPchip(polar.Angles, polar.Lift), new IndependentPchip(polar.Angles, polar.Drag)));
        if (_liftFactor == 0 && _dragFactor == 0)
            return;
        var (angles, lift, drag) = IndependentAugmentation.Full(polar);
        _augmented.Add((share, new IndependentPchip(angles, lift), new IndependentPchip(angles, drag)));
    }
}
