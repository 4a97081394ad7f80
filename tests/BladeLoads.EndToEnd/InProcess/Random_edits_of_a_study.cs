using System.Text;
using System.Text.Json;
using BladeLoads.Batch.Tests.Building;
using BladeLoads.Commands;
using BladeLoads.Results.Publishing;
using BladeLoads.Results.Tables;
using BladeLoads.Rotor.Operation;
using BladeLoads.Studies;

namespace BladeLoads.EndToEnd.InProcess;

/// <summary>
/// The planned set is the solved set, and both are what brute force says: a case has to be solved if no whole result of its identity is
/// anywhere among the results. After each run every table is that of a fresh solve.
/// </summary>
public sealed class Random_edits_of_a_study : IDisposable
{
    private const int Rounds = 30;

    private readonly TemporaryFolder _folder = new();
    private readonly Lock _lock = new();
    private readonly List<string> _solved = [];
    private Study? _read;

    public void Dispose() => _folder.Dispose();

    [Theory]
    [InlineData(1, false)]
    [InlineData(2, true)]
    [InlineData(3, true)]
    public void Planned_is_what_brute_force_says_and_solved_is_what_was_planned(int seed, bool trustsTheIndexAtOnce)
    {
        TimeProvider time = trustsTheIndexAtOnce ? new InAnHour() : TimeProvider.System;
        var study = new EditedStudy(Path.Join(_folder.Path, "beck"), seed);
        var random = new Random(seed);
        var results = new ResultsFolder(Path.Join(_folder.Path, "results"), "beck");
        var held = new HeldResults();
        for (var round = 0; round < Rounds; round++)
        {
            var told = $"seed {seed}, round {round}: {(round == 0 ? "" : study.Edit())}";
            if (round > 0)
                told += held.Spoil(random, study.CaseNames, results);
            var expected = study.CaseNames.Where(name => !held.Has(study.Identity(name))).Order(StringComparer.Ordinal).ToList();

            var planned = Plan(time);
            Assert.True(expected.SequenceEqual(planned.ToSolve), $"{told}\nto solve {string.Join(' ', expected)}\nplanned  {planned.Text}");
            Assert.Equal(planned.Text, Plan(time).Text);   // the second from the index, as far as it goes

            _solved.Clear();
            var (code, text, error) = Command(time, "run");
            Assert.True(code == 0, $"{told}\n{text}{error}");
            Assert.True(expected.SequenceEqual(_solved.Order(StringComparer.Ordinal)), $"{told}\nplanned {string.Join(' ', expected)}\nsolved  {string.Join(' ', _solved)}");
            held.Run(study.CaseNames.Select(name => (name, study.Identity(name))));

            Assert.True(Plan(time) is { ToSolve: [], ToReuse: 0 }, told);
            foreach (var fresh in StudyReader.Read(Path.Join(_folder.Path, "beck")).Cases)
                Assert.True(
                    CurveTable.Write(CaseSolver.Solve(fresh.Rotor, default)).AsSpan()
                        .SequenceEqual(File.ReadAllBytes(Path.Join(results.Case(fresh.Name), CurveTable.FileName))),
                    $"{told}\nthe table of {fresh.Name} is not that of a fresh solve");
        }
    }

    private Planned Plan(TimeProvider time)
    {
        var (code, text, error) = Command(time, "plan", "--json");
        Assert.True(code == 0, text + error);
        using var json = JsonDocument.Parse(text);
        var solve = new[] { "missing", "out of date", "damaged", "failed" };
        var cases = json.RootElement.GetProperty("cases").EnumerateArray().ToList();
        List<string> toSolve =
            [.. cases.Where(c => solve.Contains(c.GetProperty("state").GetString())).Select(c => c.GetProperty("name").GetString()!)];
        Assert.Equal(toSolve.Count, json.RootElement.GetProperty("to_solve").GetInt32());
        return new Planned(toSolve, json.RootElement.GetProperty("to_reuse").GetInt32(), text);
    }

    private (int Code, string Out, string Error) Command(TimeProvider time, string command, params string[] options)
    {
        using var output = new StringWriter { NewLine = "\n" };
        using var error = new StringWriter { NewLine = "\n" };
        var surroundings = new Surroundings(
            output, error, false, false, path => _read = StudyReader.Read(path, time), Solve, new Disk(), time, _ => { });
        var code = CommandLine.Run(
            [command, Path.Join(_folder.Path, "beck"), "--results", Path.Join(_folder.Path, "results"), .. options], surroundings);
        return (code, output.ToString(), error.ToString());
    }

    private PowerCurve Solve(RotorCase rotor, CancellationToken cancellation)
    {
        lock (_lock)
            _solved.Add(_read!.Cases.First(c => ReferenceEquals(c.Rotor, rotor)).Name);
        return CaseSolver.Solve(rotor, cancellation);
    }

    private sealed record Planned(IReadOnlyList<string> ToSolve, int ToReuse, string Text);

    private sealed class InAnHour : TimeProvider
    {
        public override DateTimeOffset GetUtcNow() => base.GetUtcNow().AddHours(1);
    }

    /// <summary>The whole results that are there: in each place, and among the replaced.</summary>
    private sealed class HeldResults
    {
        private readonly Dictionary<string, string?> _inPlace = new(StringComparer.Ordinal);   // null: damaged
        private readonly List<(string Name, string Identity)> _replaced = [];

        public bool Has(string identity) => _inPlace.ContainsValue(identity) || _replaced.Exists(r => r.Identity == identity);

        /// <summary>What a run leaves: every case in its place, what was there before among the replaced.</summary>
        public void Run(IEnumerable<(string Name, string Identity)> cases)
        {
            foreach (var (name, identity) in cases)
            {
                var before = _inPlace.GetValueOrDefault(name);
                if (before == identity)
                    continue;
                _replaced.Remove((name, identity));   // its own replaced result comes back; one from elsewhere is copied
                if (before is not null)
                    _replaced.Add((name, before));
                _inPlace[name] = identity;
            }
        }

        /// <summary>Now and then a result is cut, or removed.</summary>
        public string Spoil(Random random, IEnumerable<string> names, ResultsFolder results)
        {
            var name = names.Order(StringComparer.Ordinal).First();
            var folder = results.Case(name);
            if (!Directory.Exists(folder))
                return "";
            switch (random.Next(6))
            {
                case 0:
                    File.WriteAllText(Path.Join(folder, CurveTable.FileName), "cut", Encoding.UTF8);
                    _inPlace[name] = null;
                    return $"; result of {name} cut";
                case 1:
                    Directory.Delete(folder, recursive: true);
                    _inPlace.Remove(name);
                    return $"; result of {name} removed";
                default:
                    return "";
            }
        }
    }
}
