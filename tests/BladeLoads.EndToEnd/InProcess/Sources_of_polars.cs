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
                (2, "", $"'{At("empty")}' is no study, which has a folder 'cases', and no set, which holds tables <section>.csv; it holds nothing\n"),
                (code, text, error));
        }
    }

    [Fact]
    public void What_is_not_there_or_is_none_of_the_three_is_told_alike()
    {
        File.WriteAllText(At("slip.txt"), "");
        Told($"no study, set or table '{At("gone")}'; '{_folder.Path}' holds slip.txt\n", "gone");
        Told($"no study, set or table '{At("gone.csv")}'; '{_folder.Path}' holds slip.txt\n", "gone.csv");
        Told(
            $"'{At("slip.txt")}' is no case file, which ends in .toml, and no polar table, which ends in .csv; 'bladeloads polar read' makes one\n",
            "slip.txt");
        foreach (var command in (string[])["check", "draw"])
            Assert.Equal(
                (2, "", "nothing named; name a study or a case file, the folder of a set, or a table\n"), RunAsGiven(["polar", command, ""]));
    }

    [Fact]
    public void A_link_that_leads_nowhere_is_told_as_one()
    {
        if (OperatingSystem.IsWindows())
            return;
        File.CreateSymbolicLink(At("dead.csv"), "nowhere");
        Told($"'{At("dead.csv")}' is a link that leads nowhere; name a study or a case file, the folder of a set, or a table\n", "dead.csv");
        Directory.CreateDirectory(At("set"));
        File.CreateSymbolicLink(At("set/dead.csv"), "nowhere");
        var (code, text, error) = Run("check", "set");
        Assert.Equal(
            (2, $"{At("set/dead.csv")}: is a link that leads nowhere; put a file in its place\n\n1 error in 1 file; nothing checked\n", ""),
            (code, text, error));
    }

    [Fact]
    public void Options_of_a_study_are_refused_with_a_set_and_with_a_table()
    {
        Directory.CreateDirectory(At("set"));
        File.WriteAllText(At("set/round.csv"), "alpha_deg,cl,cd\n-180,0,0.6\n0,0,0.6\n180,0,0.6\n");
        foreach (var (source, what) in new[] { ("set", "set"), ("set/round.csv", "table") })
        {
            Told("check", "--out says where the report goes", "--results", "x");
            Told("check", "leave it out", "--workers", "1");
            Told("draw", "--out says where pictures go", "--results", "x");

            void Told(string command, string instead, params string[] option) => Assert.Equal(
                (2, "", $"{option[0]} is of a study, and '{At(source)}' is a {what}; {instead}\n"),
                RunAsGiven(["polar", command, At(source), .. option]));
        }
    }

    [Fact]
    public void A_second_source_is_one_too_many()
    {
        foreach (var command in (string[])["check", "draw"])
            Assert.Equal(
                (2, "", $"'b' is one too many: 'bladeloads polar {command}' takes one <study, set or table>\n"),
                RunAsGiven(["polar", command, "a", "b"]));
        Assert.Equal((2, "", "'b' is one too many: 'bladeloads run' takes one <study>\n"), RunAsGiven(["run", "a", "b"]));
    }

    private void Told(string expected, string source)
    {
        foreach (var command in (string[])["check", "draw"])
            Assert.Equal((2, "", expected), Run(command, source));
    }

    private string At(string path) => Path.Join(_folder.Path, path);

    private (int Code, string Out, string Error) Run(string command, string source) => RunAsGiven(["polar", command, At(source)]);

    private static (int Code, string Out, string Error) RunAsGiven(string[] arguments)
    {
        using var output = new StringWriter { NewLine = "\n" };
        using var error = new StringWriter { NewLine = "\n" };
        var surroundings = new Surroundings(
            output, error, false, false, StudyReader.Read, CaseSolver.Solve, new Disk(), TimeProvider.System, _ => { });
        var code = CommandLine.Run(arguments, surroundings);
        return (code, output.ToString(), error.ToString());
    }
}
