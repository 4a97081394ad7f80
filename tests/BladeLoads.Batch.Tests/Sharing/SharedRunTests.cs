using System.Collections.Concurrent;
using System.Globalization;
using BladeLoads.Batch.Sharing;
using BladeLoads.Batch.Tests.Building;
using BladeLoads.Batch.Work;
using BladeLoads.Results.Publishing;
using BladeLoads.Rotor.Operation;
using BladeLoads.Studies;
using Serilog;
using Serilog.Core;
using Serilog.Events;
using Serilog.Formatting.Display;

namespace BladeLoads.Batch.Tests.Sharing;

public sealed class SharedRunTests : IDisposable
{
    private readonly TemporaryFolder _folder = new(inMemory: true);

    private ResultsFolder Results => Runs.Results(_folder);

    public void Dispose() => _folder.Dispose();

    [Fact]
    public async Task Two_runs_at_once_solve_each_case_once()
    {
        StudyCase[] cases = [.. Enumerable.Range(0, 120).Select(i => FellRotor.Case($"case {i:000}", FellRotor.Rotor(windSpeeds: 1 + i)))];
        var solved = new ConcurrentBag<int>();
        PowerCurve Solve(RotorCase rotor, CancellationToken _)
        {
            solved.Add(rotor.WindSpeeds.Length);
            return FellRotor.Curve(rotor);
        }
        var results = await Task.WhenAll(Enumerable.Range(0, 2).Select(_ => Task.Run(() => Runs.Solve(Results, cases, Solve, again: Again.Nothing))));
        Assert.Equal(Enumerable.Range(1, 120), solved.Order());
        Assert.All(results, r => Assert.Equal((120, 0, 0), (r.Solved + r.SolvedByAnother, r.Failed, r.NotRun)));
        Assert.Equal(120, results.Sum(r => r.Solved));
    }

    [Fact]
    public void A_case_that_another_run_is_solving_is_waited_for_and_told_of_after_a_while()
    {
        StudyCase[] cases = [FellRotor.Case("a"), FellRotor.Case("b")];
        using var other = new Claims(Results, new Disk());
        var claim = other.TryTake(cases[0])!;
        claim.Begin();
        var told = new Messages();
        var pauses = 0;
        var result = Runs.Solve(Results, cases, log: told.Log, pause: _ =>
        {
            if (++pauses < 30)
                return;
            Publish(cases[0]);
            claim.Done();
        });
        Assert.Equal(30, pauses);
        Assert.Equal((1, 1), (result.Solved, result.SolvedByAnother));
        Assert.Equal([$"Case a: waiting for process {Environment.ProcessId}, another run that is solving it"], told.Warnings);
    }

    [Fact]
    public void A_case_whose_run_is_lost_while_it_is_waited_for_is_solved()
    {
        using var other = new Claims(Results, new Disk());
        var claim = other.TryTake(FellRotor.Case("a"))!;
        claim.Begin();
        var result = Runs.Solve(Results, [FellRotor.Case("a")], pause: _ => claim.GiveBack());
        Assert.Equal(1, result.Solved);
    }

    [Fact]
    public void Who_waits_for_another_run_can_be_stopped()
    {
        using var other = new Claims(Results, new Disk());
        other.TryTake(FellRotor.Case("a"))!.Begin();
        using var stopping = new CancellationTokenSource();
        var result = Runs.Solve(Results, [FellRotor.Case("a")], pause: _ => stopping.Cancel(), stopping: stopping.Token);
        Assert.Equal(1, result.NotRun);
    }

    [Fact]
    public void A_case_that_lost_its_process_is_solved_last_and_alone()
    {
        StudyCase[] cases = [.. "abcdefgh".Select((c, i) => FellRotor.Case($"{c}", FellRotor.Rotor(windSpeeds: 1 + i)))];
        Lose(cases[0], times: 2);
        Lose(cases[1], times: 1);
        var order = new ConcurrentQueue<int>();
        var under = 0;
        Runs.Solve(Results, cases, workers: 4, solve: (rotor, _) =>
        {
            order.Enqueue(rotor.WindSpeeds.Length);
            if (rotor.WindSpeeds.Length <= 2)
                Assert.Equal(1, Interlocked.Increment(ref under));
            var curve = FellRotor.Curve(rotor);
            if (rotor.WindSpeeds.Length <= 2)
                Interlocked.Decrement(ref under);
            return curve;
        });
        Assert.Equal([2, 1], order.Skip(6));   // the one that lost fewer first
        Assert.False(Directory.Exists(Results.Claims));
    }

    [Fact]
    public void A_case_that_lost_its_process_three_times_fails_with_that_reason_and_is_tried_again_only_when_told_or_changed()
    {
        var poison = FellRotor.Case("a");
        Lose(poison, times: 3);
        var calls = 0;
        PowerCurve Solve(RotorCase rotor, CancellationToken _)
        {
            calls++;
            return FellRotor.Curve(rotor);
        }
        for (var i = 0; i < 2; i++)
        {
            var result = Runs.Solve(Results, [poison, FellRotor.Case($"b{i}")], Solve);
            Assert.Equal((1, 1), (result.Solved, result.Failed));
            Assert.Equal(
                "its process was lost three times while solving it; it is tried again when one of its values changes, or with --all",
                Assert.IsType<CaseOutcome.Failed>(result.Outcomes["a"]).Reason);
        }
        Assert.Equal(2, calls);
        Assert.Equal(1, Runs.Solve(Results, [FellRotor.Case("a", values: ("pitch", "2"))], Solve).Solved);
        Lose(poison, times: 3);
        Assert.Equal(1, Runs.Solve(Results, [poison], Solve, again: new Again([], Lost: true)).Solved);
        Assert.Equal(4, calls);
    }

    [Fact]
    public void A_current_result_is_solved_again_when_told_and_not_taken_for_the_work_of_another_run()
    {
        StudyCase[] cases = [FellRotor.Case("a")];
        Runs.Solve(Results, cases);
        Assert.Equal(1, Runs.Solve(Results, cases, again: new Again(["a"], Lost: true)).Solved);
        Assert.Equal(1, Runs.Solve(Results, cases, again: Again.Nothing).SolvedByAnother);   // planned before the other run had published it
    }

    [Fact]
    public void A_result_that_is_not_what_was_written_is_not_taken_for_the_work_of_another_run()
    {
        StudyCase[] cases = [FellRotor.Case("a")];
        Runs.Solve(Results, cases);
        var table = Path.Join(Results.Case("a"), "power-curve.csv");
        var bytes = File.ReadAllBytes(table);
        bytes[^2] ^= 1;
        File.WriteAllBytes(table, bytes);
        Assert.Equal(1, Runs.Solve(Results, cases, again: Again.Nothing).Solved);
    }

    private void Publish(StudyCase studyCase)
    {
        using var folder = new TemporaryFolder(inMemory: true);
        var elsewhere = Runs.Results(folder);
        Runs.Solve(elsewhere, [studyCase]);
        using var publisher = Publisher.Open(Results, new Disk());
        publisher.PublishCase(
            studyCase.Name,
            Directory.EnumerateFiles(elsewhere.Case(studyCase.Name)).Select(f => new ResultContent(Path.GetFileName(f), File.ReadAllBytes(f))));
    }

    private void Lose(StudyCase studyCase, int times)
    {
        Directory.CreateDirectory(Results.Claims);
        File.WriteAllText(Results.Claim(studyCase.Name), $"{studyCase.Fingerprint} attempts {times} process 1\n");
    }

    private sealed class Messages : ILogEventSink
    {
        public Messages() => Log = new LoggerConfiguration().WriteTo.Sink(this).CreateLogger();

        public Logger Log { get; }

        public List<string> Warnings { get; } = [];

        public void Emit(LogEvent logEvent)
        {
            if (logEvent.Level != LogEventLevel.Warning)
                return;
            using var text = new StringWriter(CultureInfo.InvariantCulture);
            new MessageTemplateTextFormatter("{Message:lj}", CultureInfo.InvariantCulture).Format(logEvent, text);
            Warnings.Add(text.ToString());
        }
    }
}
