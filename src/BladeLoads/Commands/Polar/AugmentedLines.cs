using System.Collections.Immutable;
using System.Globalization;
using BladeLoads.Batch.Work;
using BladeLoads.Results.Pictures;
using BladeLoads.Rotor.Blades;
using BladeLoads.Rotor.Loads;
using BladeLoads.Rotor.Operation;
using BladeLoads.Rotor.Sections;
using BladeLoads.Studies;
using BladeLoads.Studies.Tables;

namespace BladeLoads.Commands.Polar;

/// <summary>
/// How rotation changes the tables of a case at its best power coefficient: at the innermost, the middle and the outermost of the elements
/// that take coefficients from a table, all of them or a part, and are augmented there.
/// </summary>
internal sealed class AugmentedLines
{
    private readonly StudyCase _case;
    private readonly CurvePoint? _best;

    private AugmentedLines(StudyCase studyCase, CurvePoint? best) => (_case, _best) = (studyCase, best);

    public static AugmentedLines Of(StudyCase studyCase, SolveCase solve)
    {
        var curve = solve(studyCase.Rotor, CancellationToken.None);
        return new AugmentedLines(studyCase, curve.Points.Where(p => p.Loads is not null).MaxBy(p => p.Loads!.PowerCoefficient));
    }

    /// <summary>The lines of a section, and at which operating point they are, or why there are none.</summary>
    public (ImmutableArray<PolarLine> Lines, string Note) On(string section)
    {
        if (_best is null)
            return ([], "No augmentation is shown: no operating point of the case has a balance.");
        var augmented = Elements(section).Select(e => (e.Radius, e.Reynolds, Factors: FactorsOf(e))).Where(e => !e.Factors.IsNone).ToList();
        var lines = augmented.Count == 0 ? [] : new[] { augmented[0], augmented[augmented.Count / 2], augmented[^1] }
            .DistinctBy(e => e.Radius).Select(e => Line(section, e.Radius, e.Reynolds, e.Factors)).OfType<PolarLine>().ToImmutableArray();
        return (lines, lines.IsEmpty
            ? "Rotation changes nothing here: the section stands where it is not augmented."
            : "Augmented at the best power coefficient of the case: "
                + string.Create(
                    CultureInfo.InvariantCulture, $"{_best.Operation.WindSpeed:0.##} m/s, tip-speed ratio {_best.Loads!.TipSpeedRatio:0.0#}")
                + "; each radius on the table nearest in Reynolds number.");
    }

    // Root to tip, as they are solved.
    private IEnumerable<ElementState> Elements(string section)
    {
        var rotor = _case.Rotor;
        return BladeElements.Of(rotor.Blade, rotor.Model.Elements, rotor.Model.Spacing).Zip(_best!.Elements)
            .Where(e => SectionShares.Of(e.First, rotor.Sections).Any(share => share.Section == section)).Select(e => e.Second);
    }

    private AugmentationFactors FactorsOf(ElementState element) => RotationalAugmentation.Factors(
        _case.Rotor.Augmentation, element.Chord / element.Radius, element.Radius / _case.Rotor.Blade.TipRadius,
        RotationalAugmentation.TipSpeedShare(_best!.Operation.WindSpeed, _best.Loads!.TipSpeed));

    private PolarLine? Line(string section, double radius, double elementReynolds, AugmentationFactors factors)
    {
        var polar = _case.Rotor.Sections[section].Polars
            .MinBy(p => double.IsNaN(p.Reynolds) ? 0 : Math.Abs(Math.Log(p.Reynolds / elementReynolds)))!;
        var augmented = RotationalAugmentation.Augment(polar, factors);
        var moved = Enumerable.Range(0, polar.Angles.Length)
            .Where(i => polar.Lift[i] != augmented.Lift[i] || polar.Drag[i] != augmented.Drag[i]).ToList();
        if (moved.Count == 0)
            return null;
        var method = _case.Rotor.Augmentation == Augmentation.Snel1993 ? "Snel 1993" : "Du and Selig 1998";
        var reynolds = double.IsNaN(polar.Reynolds) ? "" : $", Reynolds number {ReynoldsNumber.Text(polar.Reynolds)}";
        return new PolarLine(
            augmented, LineKind.Augmented,
            string.Create(
                CultureInfo.InvariantCulture, $"augmented, {method}, r/R {radius / _case.Rotor.Blade.TipRadius:0.00}{reynolds}"))
        {
            Parts = [(polar.Angles[Math.Max(0, moved[0] - 1)], polar.Angles[Math.Min(polar.Angles.Length - 1, moved[^1] + 1)])],
        };
    }
}
