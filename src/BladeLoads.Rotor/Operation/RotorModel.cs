using BladeLoads.Rotor.Air;
using BladeLoads.Rotor.Blades;
using BladeLoads.Rotor.Loads;
using BladeLoads.Rotor.Momentum;
using BladeLoads.Rotor.Momentum.Lanes;
using BladeLoads.Rotor.Sections;

namespace BladeLoads.Rotor.Operation;

/// <summary>
/// A rotor divided into elements, its section tables at hand: made once a case, solved at many operating points. Not to be shared
/// between threads.
/// </summary>
public sealed class RotorModel
{
    private readonly Element[] _elements;
    private readonly Annulus[] _annuli;
    private readonly Balance[] _balances;
    private readonly ElementState[] _states;
    private readonly AirProperties _air;
    private readonly int _bladeCount;
    private readonly double _cosCone;
    private readonly double _tipRadius;
    private readonly double _hubRadius;
    private readonly BalanceModel _model;
    private readonly Augmentation _augmentation;

    public RotorModel(RotorCase rotorCase)
    {
        var blade = rotorCase.Blade;
        (_air, _bladeCount, _model, _augmentation) = (rotorCase.Air, rotorCase.BladeCount, rotorCase.Model, rotorCase.Augmentation);
        _cosCone = Math.Cos(rotorCase.Cone);
        (_hubRadius, _tipRadius) = (blade.HubRadius, blade.TipRadius);
        _elements = [.. BladeElements.Of(blade, _model.Elements, _model.Spacing).Select(e => Prepare(e, rotorCase.Sections))];
        _annuli = new Annulus[_elements.Length];
        _balances = new Balance[_elements.Length];
        _states = new ElementState[_elements.Length];
    }

    /// <summary>Operating points solved so far.</summary>
    public int Solves { get; private set; }

    /// <summary>Area swept by the coned rotor, m2: <c>pi (R cos cone)^2</c>.</summary>
    public double Area => Math.PI * _tipRadius * _cosCone * _tipRadius * _cosCone;

    /// <summary>Radius swept by the coned rotor, m: <c>R cos cone</c>.</summary>
    public double SweptRadius => _tipRadius * _cosCone;

    /// <summary>The elements of the operating point solved last, root to tip; overwritten by the next.</summary>
    public ReadOnlySpan<ElementState> Elements => _states;

    /// <summary>The annuli of the operating point solved last.</summary>
    internal ReadOnlySpan<Annulus> Annuli => _annuli;

    /// <summary>Solves one operating point. At rest there is no induction; the undisturbed wind loads the blades.</summary>
    /// <param name="point">Wind speed above 0, rotor speed 0 or above.</param>
    /// <returns>The loads; null where an element is unbalanced. <see cref="Elements"/> holds the elements.</returns>
    public RotorLoads? Solve(in OperatingPoint point)
    {
        Solves++;
        for (var i = 0; i < _elements.Length; i++)
            _annuli[i] = AnnulusOf(_elements[i], point);
        if (point.RotorSpeed > 0)
            BalanceLanes.Solve(_annuli, _balances);
        else
            for (var i = 0; i < _elements.Length; i++)
                _balances[i] = Balance.AtRest(_annuli[i]);
        for (var i = 0; i < _elements.Length; i++)
            _states[i] = StateOf(_elements[i], _annuli[i], _balances[i], point);
        return Sum(point);
    }

    /// <summary>What element <paramref name="i"/> of the operating point solved last adds to rotor power, W.</summary>
    internal double PowerShare(int i, in OperatingPoint point)
        => _bladeCount * _states[i].TangentialForcePerLength * _elements[i].Geometry.Length * _states[i].Radius * _cosCone * point.RotorSpeed;

    /// <summary>What element <paramref name="i"/> of the operating point solved last adds to thrust, N.</summary>
    internal double ThrustShare(int i) => _bladeCount * _states[i].NormalForcePerLength * _elements[i].Geometry.Length * _cosCone;

    private Element Prepare(in BladeElement e, SectionSet sections)
    {
        var byThickness = e.ThicknessRatio is { } thickness ? sections.Family!.At(thickness) : null;
        var (inner, outer) = (byThickness ?? sections[e.InnerSection], byThickness ?? sections[e.OuterSection]);
        return new Element(
            e, inner.Table, outer.Table, e.OuterWeight == 0 ? inner.Name : $"{inner.Name}/{outer.Name}",
            _bladeCount * e.Chord / (2 * Math.PI * e.Radius * _cosCone),
            _model.TipLoss ? LossFactor.TipExponent(_bladeCount, e.Radius, _tipRadius) : double.NegativeInfinity,
            _model.HubLoss ? LossFactor.HubExponent(_bladeCount, e.Radius, _hubRadius) : double.NegativeInfinity);
    }

    private (double Normal, double Tangential) UndisturbedSpeeds(in Element e, in OperatingPoint point)
        => (point.WindSpeed * _cosCone, point.RotorSpeed * e.Geometry.Radius * _cosCone);

    private double Reynolds(in Element e, double normalSpeed, double tangentialSpeed)
        => _air.Density * Math.Sqrt((normalSpeed * normalSpeed) + (tangentialSpeed * tangentialSpeed)) * e.Geometry.Chord
            / _air.DynamicViscosity;

    private Annulus AnnulusOf(in Element e, in OperatingPoint point)
    {
        var (normalSpeed, tangentialSpeed) = UndisturbedSpeeds(e, point);
        var logReynolds = Math.Log(Reynolds(e, normalSpeed, tangentialSpeed));
        return new Annulus
        {
            Solidity = e.Solidity,
            SpeedRatio = normalSpeed / tangentialSpeed,
            SectionAngle = e.Geometry.Twist + point.Pitch,
            TipExponent = e.TipExponent,
            HubExponent = e.HubExponent,
            Inner = e.Inner,
            Outer = e.Outer,
            OuterWeight = e.Geometry.OuterWeight,
            InnerPlace = e.Inner.Place(logReynolds),
            OuterPlace = e.Outer.Place(logReynolds),
            Augmentation = AugmentationOf(e, point),
            HeavyLoading = _model.HeavyLoading,
            DragInBalance = _model.BalanceWith == BalanceWith.LiftAndDrag ? 1 : 0,
        };
    }

    private AugmentationFactors AugmentationOf(in Element e, in OperatingPoint point)
        => _augmentation == Augmentation.None ? AugmentationFactors.None : RotationalAugmentation.Factors(
            _augmentation, e.Geometry.Chord / e.Geometry.Radius, e.Geometry.Radius / _tipRadius,
            RotationalAugmentation.TipSpeedShare(point.WindSpeed, point.RotorSpeed * SweptRadius));

    private ElementState StateOf(in Element e, in Annulus annulus, in Balance balance, in OperatingPoint point)
    {
        var (normalSpeed, tangentialSpeed) = UndisturbedSpeeds(e, point);
        var reynolds = Reynolds(e, normalSpeed, tangentialSpeed);
        var (induction, phi) = (balance.Induction, balance.InflowAngle);
        var marks = (balance.SeveralBalances ? ElementMarks.SeveralBalances : 0)
            | (annulus.IsOutsideReynolds ? ElementMarks.OutsideReynolds : 0);
        if (!balance.IsBalanced)
            return new ElementState(
                e.Geometry.Radius, e.Geometry.Length, e.Geometry.Chord, e.Geometry.Twist, e.Section, double.NaN, double.NaN, reynolds, double.NaN,
                double.NaN, double.NaN, double.NaN, double.NaN, double.NaN, double.NaN, double.NaN, balance.Evaluations,
                marks | ElementMarks.Unbalanced);

        var angleOfAttack = annulus.AngleOfAttack(phi);
        var ((cl, cd), sin, cos) = (induction.Coefficients, induction.Sine, induction.Cosine);
        var axialSpeed = normalSpeed * (1 - induction.Axial);
        var rotationalSpeed = tangentialSpeed * (1 + induction.Tangential);
        var pressure = 0.5 * _air.Density * ((axialSpeed * axialSpeed) + (rotationalSpeed * rotationalSpeed)) * e.Geometry.Chord;
        return new ElementState(
            e.Geometry.Radius, e.Geometry.Length, e.Geometry.Chord, e.Geometry.Twist, e.Section, phi, angleOfAttack, reynolds, induction.Axial,
            induction.Tangential, induction.LossFactor, cl, cd, pressure * ((cl * cos) + (cd * sin)), pressure * ((cl * sin) - (cd * cos)),
            balance.Residual, balance.Evaluations,
            marks | (annulus.IsOutsideAngles(angleOfAttack) ? ElementMarks.OutsideAngles : 0));
    }

    private RotorLoads? Sum(in OperatingPoint point)
    {
        double normal = 0, driving = 0, outOfPlane = 0, inPlane = 0;
        // Root to tip, always: another order gives other last digits, and results would seem to have moved.
        for (var i = 0; i < _states.Length; i++)
        {
            var s = _states[i];
            if ((s.Marks & ElementMarks.Unbalanced) != 0)
                return null;
            var (fn, ft) = (s.NormalForcePerLength * _elements[i].Geometry.Length, s.TangentialForcePerLength * _elements[i].Geometry.Length);
            normal += fn;
            driving += ft * s.Radius;
            outOfPlane += fn * (s.Radius - _hubRadius);
            inPlane += ft * (s.Radius - _hubRadius);
        }
        var thrust = _bladeCount * normal * _cosCone;
        var torque = _bladeCount * driving * _cosCone;
        var power = torque * point.RotorSpeed;
        var tipSpeed = point.RotorSpeed * SweptRadius;
        var force = 0.5 * _air.Density * point.WindSpeed * point.WindSpeed * Area;
        var (sinPitch, cosPitch) = Math.SinCos(point.Pitch);
        return new RotorLoads(
            thrust, torque, power, tipSpeed, tipSpeed / point.WindSpeed, power / (force * point.WindSpeed), thrust / force,
            torque / (force * SweptRadius), outOfPlane, inPlane, (outOfPlane * cosPitch) + (inPlane * sinPitch),
            (inPlane * cosPitch) - (outOfPlane * sinPitch));
    }

    private sealed record Element(
        BladeElement Geometry, SectionTable Inner, SectionTable Outer, string Section, double Solidity, double TipExponent,
        double HubExponent);
}
