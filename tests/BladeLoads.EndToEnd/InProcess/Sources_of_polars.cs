using BladeLoads.Batch.Tests.Building;
using BladeLoads.Commands;
using BladeLoads.Results.Publishing;
using BladeLoads.Rotor.Operation;
using BladeLoads.Studies;

namespace BladeLoads.EndToEnd.InProcess;

/// <summary>What a user names is the same thing to every command that takes a study, a set or a table.</summary>
public sealed class Sources_of_polars : IDisposable
{
    private readonly TemporaryFolder _folder = new();

    public void Dispose() => _folder.Dispose();

    [Fact]
    public void A_folder_without_cases_and_tables_is_no_study_to_both()
    {
        Directory.CreateDirectory(Path.Join(_folder.Path, "empty"));
        foreach (var command in (string[])["check", "draw"])
        {
            var (code, text, error) = Run(command, "empty");
            Assert.Equal(
                (2, "", $"'{Path.Join(_folder.Path, "empty")}' has no folder 'cases' and so is no study; a study keeps its cases in cases/<case>.toml\n"),
                (code, text, error));
        }
    }

    [Fact]
    public void A_table_that_is_not_there_is_a_table_to_both()
    {
        foreach (var command in (string[])["check", "draw"])
        {
            var (code, text, error) = Run(command, "gone.csv");
            Assert.Equal(2, code);
            Assert.StartsWith($"{Path.Join(_folder.Path, "gone.csv")}: ", text + error, StringComparison.Ordinal);
        }
    }

    private (int Code, string Out, string Error) Run(string command, string source)
    {
        using var output = new StringWriter { NewLine = "\n" };
        using var error = new StringWriter { NewLine = "\n" };
        var surroundings = new Surroundings(
            output, error, false, false, StudyReader.Read, CaseSolver.Solve, new Disk(), TimeProvider.System, _ => { });
        var code = CommandLine.Run(
            ["polar", command, Path.Join(_folder.Path, source), "--results", Path.Join(_folder.Path, "results")], surroundings);
        return (code, output.ToString(), error.ToString());
    }
}
