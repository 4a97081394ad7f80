using BladeLoads.Batch.Work;
using BladeLoads.Results.Receipts;
using BladeLoads.Results.Wording;
using BladeLoads.Rotor.Operation;
using BladeLoads.Studies;
using Serilog;

namespace BladeLoads.Batch.Logs;

/// <summary>What a case's log tells: what was read, how the balance went, what came out and how long it took.</summary>
internal static class CaseEvents
{
    public static void Read(this ILogger log, StudyCase studyCase)
    {
        log.Information("Case {Case}: {Title}; fingerprint {Fingerprint}", studyCase.Name, studyCase.Title, studyCase.Fingerprint);
        foreach (var input in studyCase.Inputs)
            log.Information("Case {Case} read {File}: {Contents} (SHA-256 {Sha256})", studyCase.Name, input.File, input.Contents, input.Sha256);
        foreach (var line in studyCase.Preparation)
            log.Information("Case {Case} polar tables: {Preparation}", studyCase.Name, line);
        log.Information(
            "Case {Case} asks for {Points} wind speeds, {Elements} elements each",
            studyCase.Name, studyCase.Rotor.WindSpeeds.Length, studyCase.Rotor.Model.Elements);
    }

    public static void Balanced(this ILogger log, StudyCase studyCase, PowerCurve curve)
    {
        var balance = BalanceStatistics.Of(curve);
        log.Information(
            "Case {Case} balanced {Elements} elements: worst residual {WorstResidual:0.0e+0} at {WindSpeed} m/s, r = {Radius:0.###} m; "
            + "most evaluations {MostEvaluations}, mean {MeanEvaluations:0.0}; {RotorSolves} rotor solves",
            studyCase.Name, balance.Elements - balance.Unbalanced, balance.WorstResidual, balance.WorstWindSpeed, balance.WorstRadius,
            balance.MostEvaluations, balance.MeanEvaluations, curve.RotorSolves);
        log.Information(
            "Case {Case} marked elements: {SeveralBalances} at several balances, {OutsideAngles} outside the angles of their table, "
            + "{OutsideReynolds} outside its Reynolds numbers, {Unbalanced} unbalanced",
            studyCase.Name, balance.SeveralBalances, balance.OutsideAngles, balance.OutsideReynolds, balance.Unbalanced);
    }

    public static void Solved(this ILogger log, StudyCase studyCase, CaseSummary summary, double seconds)
    {
        if (summary.RatedWindSpeed is { } rated)
            log.Information("Case {Case} reaches rated power at {RatedWindSpeed:0.###} m/s", studyCase.Name, rated);
        else if (summary.Marks.ContainsKey(StatusWords.Of(PointMarks.RatedNotReached)))
            log.RatedNotReached(studyCase, summary);
        else
            log.Information("Case {Case} has no rated wind speed", studyCase.Name);
        if (summary.Marks.TryGetValue(StatusWords.Of(PointMarks.ThrustNotHeld), out var unheld))
            log.Warning(
                "Case {Case}: at {Unheld} of {Points} points thrust is above its limit even with the blades feathered; they are marked "
                + "'thrust-not-held' and stand at the pitch with the least thrust; raise thrust_limit_kN, or lower the cut-out wind speed",
                studyCase.Name, unheld, summary.Points);
        if (summary.Best is { Searched: true } best)
            log.Information(
                "Case {Case} runs best at tip-speed ratio {TipSpeedRatio:0.####}, pitch {PitchDeg:0.####} deg: power coefficient {PowerCoefficient:0.#####}",
                studyCase.Name, best.TipSpeedRatio, double.RadiansToDegrees(best.FinePitch), best.PowerCoefficient);
        if (summary.Energy is { AnnualEnergy: null })
            log.Warning(
                "Case {Case}: the annual energy is left blank, because bins of the curve have no balance; annual-energy.csv names them",
                studyCase.Name);
        log.Information(
            "Case {Case} solved: {Points} points, {Unbalanced} unbalanced, {Seconds:0.000} s",
            studyCase.Name, summary.Points, summary.UnbalancedPoints, seconds);
        if (summary.UnbalancedPoints > 0)
            log.Warning(
                "Case {Case}: no inflow angle balances blade force and momentum at {Unbalanced} of {Points} points; "
                + "they are marked 'unbalanced' and left blank",
                studyCase.Name, summary.UnbalancedPoints, summary.Points);
    }

    private static void RatedNotReached(this ILogger log, StudyCase studyCase, CaseSummary summary)
        => log.Warning(
            "Case {Case} never makes its rated power of {Rated:0.###} kW: the most is {Most:0.###} kW, at {WindSpeed:0.###} m/s, and the row with the "
            + "most is marked 'rated-not-reached'; see which of rated power, rotor-speed limit, fine pitch, thrust limit and efficiency is not meant so",
            studyCase.Name, studyCase.Rotor.Control.RatedPower / 1e3, summary.LargestElectricalPower?.Value / 1e3,
            summary.LargestElectricalPower?.WindSpeed);

    public static void Reused(this ILogger log, StudyCase studyCase, string from)
        => log.Information("Case {Case} has a result of its very values already, from {From}; not solved again", studyCase.Name, from);

    public static void Failed(this ILogger log, StudyCase studyCase, string reason, Exception? details)
        => log.Error(details, "Case {Case} failed: {Reason}", studyCase.Name, reason);

    public static void SolvedByAnother(this ILogger log, StudyCase studyCase)
        => log.Information("Case {Case} was solved by another run meanwhile", studyCase.Name);

    public static void WaitsForAnother(this ILogger log, StudyCase studyCase, int? process)
    {
        if (process is { } number)
            log.Warning("Case {Case}: waiting for process {Process}, another run that is solving it", studyCase.Name, number);
        else
            log.Warning("Case {Case}: waiting for another run that is solving it", studyCase.Name);
    }
}
