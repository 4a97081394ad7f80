using BladeLoads.Results.Publishing;
using BladeLoads.Results.Receipts;
using BladeLoads.Results.Tables;
using BladeLoads.Rotor.Air;
using BladeLoads.Rotor.Energy;
using BladeLoads.Rotor.Operation;
using BladeLoads.Studies;

namespace BladeLoads.Batch.Work;

/// <summary>What a case asks for beside its curve, worked out.</summary>
/// <param name="RotorSolves">Operating points solved for it.</param>
internal sealed record FurtherWork(
    CoefficientSurface? Surface, EnergyYield? Energy, Func<double, double>? MeanPower, PowerCurve? AtReferenceDensity, int RotorSolves)
{
    /// <param name="curve">The case's own.</param>
    /// <exception cref="OperationCanceledException">Cancelled between two operating points.</exception>
    public static FurtherWork Of(StudyCase studyCase, PowerCurve curve, SolveCase solve, CancellationToken stopping)
    {
        var (asked, rotor) = (studyCase.Further, studyCase.Rotor);
        var surface = asked.Surface is { } grid
            ? CoefficientSurface.Solve(rotor, grid.TipSpeedRatios, grid.Pitches, grid.WindSpeed, stopping)
            : null;
        var steady = asked.Site is null && asked.Turbulence is null ? null : SteadyPower.Of(curve);
        var energy = asked.Site is { } site ? EnergyYield.Of(steady, site, asked.Turbulence, rotor.Control.RatedPower) : null;
        var atReference = asked.ReferenceDensity is { } density
            ? solve(rotor with { Air = new AirProperties(density, rotor.Air.DynamicViscosity, rotor.Air.SpeedOfSound) }, stopping)
            : null;
        return new FurtherWork(
            surface, energy,
            asked.Turbulence is { } turbulence && steady is not null ? v => TurbulentPower.Mean(steady, v, turbulence.At(v)) : null,
            atReference, (surface?.Points.Length ?? 0) + (atReference?.RotorSolves ?? 0));
    }

    public CaseSummary Complete(CaseSummary summary) => Energy is null ? summary : summary with { Energy = EnergySummary.Of(Energy) };

    /// <summary>Its tables, beside those of the curve.</summary>
    public IEnumerable<ResultContent> Tables(StudyCase studyCase, PowerCurve curve)
    {
        yield return new(DesignPointsTable.FileName, DesignPointsTable.Write(curve, MeanPower));
        if (Surface is not null)
            yield return new(SurfaceTable.FileName, SurfaceTable.Write(Surface));
        if (Energy is not null)
            yield return new(EnergyTable.FileName, EnergyTable.Write(Energy, curve));
        if (AtReferenceDensity is not null && studyCase.Further.ReferenceDensity is { } density)
            yield return new(
                NormalisationTable.FileName, NormalisationTable.Write(curve, studyCase.Rotor.Air.Density, AtReferenceDensity, density));
    }
}
