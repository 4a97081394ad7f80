using BladeLoads.Rotor.Operation;
using BladeLoads.Studies;

namespace BladeLoads.EndToEnd.Documentation;

public sealed class Examples_of_the_documents : IDisposable
{
    private const string Broken = "broken";

    private readonly ExtractedStudies _studies = new();

    public void Dispose() => _studies.Dispose();

    [Fact]
    public void Make_studies_that_read_without_error_or_doubt()
    {
        foreach (var study in SoundStudies())
        {
            Assert.Equal([], study.Errors.Select(Shown));
            Assert.Equal([], study.Doubts.Select(Shown));
            Assert.Empty(study.Rejected);
            Assert.NotEmpty(study.Cases);
        }
    }

    [Fact]
    public void Make_studies_that_solve_at_every_wind_speed()
    {
        foreach (var rotorCase in SoundStudies().SelectMany(study => study.Cases))
        {
            var curve = CaseSolver.Solve(rotorCase.Rotor, CancellationToken.None);

            Assert.Equal(rotorCase.Rotor.WindSpeeds, curve.Points.Select(point => point.Operation.WindSpeed));
            Assert.All(curve.Points, point => Assert.False(point.Marks.HasFlag(PointMarks.Unbalanced), rotorCase.Name));
            Assert.Contains(curve.Points, point => point.ElectricalPower > 0);
        }
    }

    [Fact]
    public void Hold_no_file_that_no_case_uses()
    {
        foreach (var study in SoundStudies())
        {
            var used = study.Cases.SelectMany(rotorCase => rotorCase.Inputs).Select(input => input.File).Append("study.toml").ToHashSet();
            Assert.Equal([], _studies.FilesOf(study.Name).Where(file => !used.Contains(file)));
        }
    }

    [Fact]
    public void Show_every_strategy_and_a_sweep()
    {
        var cases = SoundStudies().SelectMany(study => study.Cases).ToList();

        Assert.Contains(cases, c => c.Rotor.Control is Control.VariableSpeed);
        Assert.Contains(cases, c => c.Rotor.Control is Control.FixedSpeed);
        Assert.Contains(cases, c => c.Rotor.Control is Control.Schedule);
        Assert.Contains(cases, c => c.Name.Contains('~', StringComparison.Ordinal));
    }

    [Fact]
    public void With_mistakes_give_the_errors_that_the_page_shows()
    {
        var page = CodeBlock.AllOf("docs/formats.md").Single(block => block.Attributes.GetValueOrDefault("errors-of") == Broken);

        var found = StudyReader.Read(_studies.PathOf(Broken)).Errors.Select(Shown);

        Assert.Equal(page.Text, string.Concat(found.Select(line => line + "\n")));
    }

    private IEnumerable<Study> SoundStudies()
    {
        var names = _studies.Names.Where(name => name != Broken).ToList();
        Assert.NotEmpty(names);
        return names.Select(name => StudyReader.Read(_studies.PathOf(name)));
    }

    private static string Shown(InputFinding finding) => $"{finding.File}:{finding.Line}:{finding.Column}: {finding.Text}";
}
