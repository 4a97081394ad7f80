using BladeLoads.Rotor.Loads;
using BladeLoads.Rotor.Operation;

namespace BladeLoads.Batch.Work;

/// <summary>How the momentum balances of a curve went, over the elements of its points.</summary>
/// <param name="Elements">Elements of all points.</param>
/// <param name="WorstResidual">The largest magnitude left of a balance; 0 where none was solved.</param>
/// <param name="WorstWindSpeed">m/s: where the worst residual lies.</param>
/// <param name="WorstRadius">m: where the worst residual lies.</param>
/// <param name="MostEvaluations">Of section coefficients, in one element.</param>
/// <param name="MeanEvaluations">Over the elements that took any.</param>
public sealed record BalanceStatistics(
    int Elements, double WorstResidual, double WorstWindSpeed, double WorstRadius, int MostEvaluations, double MeanEvaluations,
    int Unbalanced, int SeveralBalances, int OutsideAngles, int OutsideReynolds)
{
    public static BalanceStatistics Of(PowerCurve curve)
    {
        var statistics = new BalanceStatistics(0, 0, 0, 0, 0, 0, 0, 0, 0, 0);
        long evaluations = 0;
        var evaluated = 0;
        foreach (var point in curve.Points)
            foreach (var element in point.Elements)
            {
                statistics = statistics.With(point.Operation.WindSpeed, element);
                evaluations += element.Evaluations;
                evaluated += element.Evaluations > 0 ? 1 : 0;
            }
        return statistics with { MeanEvaluations = evaluated == 0 ? 0 : (double)evaluations / evaluated };
    }

    private BalanceStatistics With(double windSpeed, in ElementState element)
    {
        var residual = Math.Abs(element.Residual);
        var isWorst = residual > WorstResidual;   // false for the NaN of an unbalanced element
        return this with
        {
            Elements = Elements + 1,
            WorstResidual = isWorst ? residual : WorstResidual,
            WorstWindSpeed = isWorst ? windSpeed : WorstWindSpeed,
            WorstRadius = isWorst ? element.Radius : WorstRadius,
            MostEvaluations = Math.Max(MostEvaluations, element.Evaluations),
            Unbalanced = Unbalanced + Counts(element, ElementMarks.Unbalanced),
            SeveralBalances = SeveralBalances + Counts(element, ElementMarks.SeveralBalances),
            OutsideAngles = OutsideAngles + Counts(element, ElementMarks.OutsideAngles),
            OutsideReynolds = OutsideReynolds + Counts(element, ElementMarks.OutsideReynolds),
        };
    }

    private static int Counts(in ElementState element, ElementMarks mark) => element.Marks.HasFlag(mark) ? 1 : 0;
}
