using System.Collections.Immutable;
using System.Globalization;
using BladeLoads.Batch.Work;
using BladeLoads.Results.Pictures;
using BladeLoads.Rotor.Loads;
using BladeLoads.Rotor.Operation;
using BladeLoads.Rotor.Sections;
using BladeLoads.Studies;
using BladeLoads.Studies.Tables;

namespace BladeLoads.Commands.Polar;

/// <summary>
/// How rotation changes the tables of a case at its best power coefficient: at the innermost, the middle and the outermost element that
/// stands on a section and is augmented.
/// </summary>
internal sealed class CorrectedLines
{
    private readonly StudyCase _case;
    private readonly CurvePoint? _best;

    private CorrectedLines(StudyCase studyCase, CurvePoint? best) => (_case, _best) = (studyCase, best);

    public static CorrectedLines Of(StudyCase studyCase, SolveCase solve)
    {
        var curve = solve(studyCase.Rotor, CancellationToken.None);
        return new CorrectedLines(studyCase, curve.Points.Where(p => p.Loads is not null).MaxBy(p => p.Loads!.PowerCoefficient));
    }

    /// <summary>The lines of a section, and at which operating point they are, or why there are none.</summary>
    public (ImmutableArray<PolarLine> Lines, string Note) On(string section)
    {
        if (_best is null)
            return ([], "No correction for rotation is shown: no operating point of the case has a balance.");
        if (_case.Rotor.Blade.IsByThickness)
            return ([], "No correction for rotation is shown: the blade is given by thickness, and its elements stand between the tables.");
        var lines = Elements(section).Select(e => Line(e, section)).OfType<PolarLine>().ToImmutableArray();
        return (lines, lines.IsEmpty
            ? "Rotation changes nothing here: the section stands where it is not augmented."
            : "Corrected at the best power coefficient of the case: "
                + string.Create(CultureInfo.InvariantCulture, $"{_best.Operation.WindSpeed:0.##} m/s, tip-speed ratio {_best.Loads!.TipSpeedRatio:0.0#}")
                + "; each radius on the table nearest in Reynolds number.");
    }

    private IEnumerable<ElementState> Elements(string section)
    {
        var on = (_best?.Elements ?? []).Where(e => e.Section.Split('/').Contains(section)
            && e.Radius <= RotationalAugmentation.LargestRadiusRatio * _case.Rotor.Blade.TipRadius).ToList();
        return on.Count == 0 ? [] : new[] { on[0], on[on.Count / 2], on[^1] }.DistinctBy(e => e.Radius);
    }

    private PolarLine? Line(ElementState element, string section)
    {
        var polar = _case.Rotor.Sections[section].Polars
            .MinBy(p => double.IsNaN(p.Reynolds) ? 0 : Math.Abs(Math.Log(p.Reynolds / element.Reynolds)))!;
        var radiusRatio = element.Radius / _case.Rotor.Blade.TipRadius;
        var factors = RotationalAugmentation.Factors(
            _case.Rotor.Augmentation, element.Chord / element.Radius, radiusRatio,
            RotationalAugmentation.TipSpeedShare(_best!.Operation.WindSpeed, _best.Loads!.TipSpeed));
        var corrected = RotationalAugmentation.Augment(polar, factors);
        var moved = Enumerable.Range(0, polar.Angles.Length)
            .Where(i => polar.Lift[i] != corrected.Lift[i] || polar.Drag[i] != corrected.Drag[i]).ToList();
        if (moved.Count == 0)
            return null;
        var method = _case.Rotor.Augmentation == Augmentation.Snel1993 ? "Snel 1993" : "Du and Selig 1998";
        var reynolds = double.IsNaN(polar.Reynolds) ? "" : $", Reynolds number {ReynoldsNumber.Text(polar.Reynolds)}";
        return new PolarLine(
            corrected, LineKind.Corrected,
            string.Create(CultureInfo.InvariantCulture, $"corrected, {method}, r/R {radiusRatio:0.00}{reynolds}"))
        {
            Parts = [(polar.Angles[Math.Max(0, moved[0] - 1)], polar.Angles[Math.Min(polar.Angles.Length - 1, moved[^1] + 1)])],
        };
    }
}
