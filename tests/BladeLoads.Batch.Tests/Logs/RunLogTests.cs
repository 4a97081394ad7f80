using System.Text.Json;
using BladeLoads.Batch.Logs;
using BladeLoads.Batch.Tests.Building;
using Serilog.Core;
using Serilog.Events;

namespace BladeLoads.Batch.Tests.Logs;

public class RunLogTests
{
    [Fact]
    public void Every_event_of_a_case_is_a_line_of_JSON_that_names_the_case()
    {
        using var folder = new TemporaryFolder();
        string file;
        using (var log = RunLog.Open(Path.Join(folder.Path, "logs"), new Screen(), TimeProvider.System, _ => { }))
        {
            file = log.File!;
            Runs.Solve(Runs.Results(folder), [FellRotor.Case("clean", title: "a\e\u202E\"b")], log: log.Logger);
        }
        Assert.Matches(@"^\d{8}-\d{6}-\d{3}\.jsonl$", Path.GetFileName(file));
        var text = File.ReadAllText(file);
        Assert.DoesNotContain('\e', text);
        Assert.DoesNotContain('\u202E', text);
        var events = text.TrimEnd('\n').Split('\n').Select(line => JsonDocument.Parse(line).RootElement).ToList();
        var ofTheCase = events.Where(e => e.TryGetProperty("Case", out _)).ToList();
        Assert.Equal(events.Count - 2, ofTheCase.Count);   // the run's beginning and end
        Assert.All(ofTheCase, e => Assert.Equal("clean", e.GetProperty("Case").GetString()));
        Assert.Equal("a\e\u202E\"b", ofTheCase[0].GetProperty("Title").GetString());
    }

    [Fact]
    public void Only_warnings_and_worse_reach_the_screen()
    {
        using var folder = new TemporaryFolder();
        var screen = new Screen();
        using (var log = RunLog.Open(folder.Path, screen, TimeProvider.System, _ => { }))
            Runs.Solve(Runs.Results(folder), [FellRotor.Case("clean")], (_, _) => throw new InvalidOperationException("odd"), log: log.Logger);
        Assert.Equal(["Case \"clean\" failed: \"fault in BladeLoads, please report: odd\""], screen.Lines);
    }

    [Fact]
    public void A_log_that_cannot_be_written_is_reported_once_and_costs_no_result()
    {
        using var folder = new TemporaryFolder();
        var notAFolder = Path.Join(folder.Path, "logs");
        File.WriteAllText(notAFolder, "");
        var reports = new List<string>();
        using var log = RunLog.Open(notAFolder, new Screen(), TimeProvider.System, reports.Add);
        Assert.Equal(2, Runs.Solve(Runs.Results(folder), [FellRotor.Case("a"), FellRotor.Case("b")], log: log.Logger).Solved);
        Assert.StartsWith($"the log in {notAFolder} cannot be written: ", Assert.Single(reports), StringComparison.Ordinal);
    }

    private sealed class Screen : ILogEventSink
    {
        public List<string> Lines { get; } = [];

        public void Emit(LogEvent logEvent) => Lines.Add(logEvent.RenderMessage(System.Globalization.CultureInfo.InvariantCulture));
    }
}
