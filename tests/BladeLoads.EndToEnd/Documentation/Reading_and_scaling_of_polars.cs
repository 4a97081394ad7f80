using System.Text.RegularExpressions;
using BladeLoads.Batch.Tests.Building;
using BladeLoads.EndToEnd.Program;

namespace BladeLoads.EndToEnd.Documentation;

public sealed partial class Reading_and_scaling_of_polars : IDisposable
{
    private readonly TemporaryFolder _folder = new();

    public void Dispose() => _folder.Dispose();

    [Fact]
    public void The_table_that_the_page_shows_is_what_is_made_of_the_file_that_it_shows()
    {
        var sent = CodeBlock.AllOf("docs/formats.md").Single(block => block.Attributes.ContainsKey("polar-read"));
        var name = sent.Attributes["polar-read"];
        var made = CodeBlock.AllOf("docs/formats.md").Single(block => block.Attributes.GetValueOrDefault("made-of") == name);
        File.WriteAllText(Path.Join(_folder.Path, name), sent.Text);

        var finished = Started.Run(_folder.Path, "polar", "read", name, "--out", "t21.csv");

        Assert.True(finished.ExitCode == 0, finished.All);
        Assert.Equal(made.Text, File.ReadAllText(Path.Join(_folder.Path, "t21.csv")));
    }

    [Theory]
    [InlineData("read")]
    [InlineData("extend")]
    [InlineData("augment")]
    [InlineData("scale")]
    [InlineData("check")]
    [InlineData("draw")]
    public void The_page_names_every_option_of_the_command_and_no_other(string command)
    {
        var help = Started.Run(_folder.Path, "polar", command, "--help").Out;
        var options = Option().Matches(help[..help.IndexOf("Examples:", StringComparison.Ordinal)])
            .Select(match => match.Value).Except(["--help"]).Order(StringComparer.Ordinal).Distinct();

        var page = string.Join("\n", Repository.Lines("docs/formats.md"));
        var heading = command switch { "check" => "Report on polar tables", "draw" => "Pictures", _ => $"polar {command}" };
        var section = page[page.IndexOf($"### {heading}\n", StringComparison.Ordinal)..];
        section = section[..section.IndexOf("\n##", 4, StringComparison.Ordinal)];

        Assert.Equal(options, Option().Matches(section).Select(match => match.Value).Order(StringComparer.Ordinal).Distinct());
    }

    [Fact]
    public void The_readme_names_every_command_that_takes_a_folder_of_results()
    {
        string[] commands =
        [
            "check", "plan", "run", "compare", "keep", "verify", "tidy", "polar read", "polar extend", "polar augment", "polar scale", "polar check",
            "polar draw",
        ];
        var row = Repository.Lines("README.md").Single(line => line.StartsWith("| `--results <folder>` |", StringComparison.Ordinal));
        Assert.Equal(
            commands.Where(
                command => Started.Run(_folder.Path, [.. command.Split(' '), "--help"]).Out.Contains("--results <folder>", StringComparison.Ordinal)),
            row.Split(" | ")[1].Split(", "));
    }

    [GeneratedRegex("--[a-z]+(?:-[a-z]+)*")]
    private static partial Regex Option();
}
