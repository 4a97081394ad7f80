using System.Collections.Immutable;

namespace BladeLoads.Studies.Tests.Studies;

/// <summary>What a path may name, and what is said when it names nothing.</summary>
public class StudyPlaceTests
{
    [Theory]
    [InlineData("/studies/fel", "no study folder or case file '/studies/fel'; '/studies' holds fell")]
    [InlineData("/nowhere/fell", "no study folder or case file '/nowhere/fell'; the folder it would be in does not exist either")]
    [InlineData("/studies", "'/studies' has no folder 'cases' and so is no study; studies in it: fell")]
    [InlineData("/studies/fell/polars", "'/studies/fell/polars' has no folder 'cases' and so is no study; a study keeps its cases in cases/<case>.toml")]
    [InlineData("/studies/fell/blades/fell.csv", "'/studies/fell/blades/fell.csv' is no case file; a case file ends in .toml")]
    [InlineData("/studies/fell/study.toml", "'/studies/fell/study.toml' holds the starting values of a study and is no case; name its folder or a case file")]
    [InlineData("/bare", "the folder 'cases' of '/bare' holds no case; a case is a file cases/<case>.toml")]
    [InlineData("/studies/\u001bfell", "no study folder or case file '/studies/\\u001Bfell'; '/studies' holds fell")]
    [InlineData("/pipe.toml", "'/pipe.toml' is not a regular file; name a study folder or a case file (.toml)")]
    [InlineData(" ", "no study named; name a study folder or a case file")]
    public void A_path_without_a_study_is_told(string path, string expected)
    {
        var study = new FellStudy().With("study.toml", "[air]\n");
        study.Files.AddFolder("/bare/cases").AddPipe("/pipe.toml");

        Assert.Equal(expected, Assert.Throws<StudyNotFoundException>(() => StudyReader.Read(path, study.Files)).Message);
    }

    [Fact]
    public void A_case_file_is_read_alone_from_the_study_above_it()
    {
        var study = new FellStudy().With("cases/other.toml", "rubbish").With("study.toml", "[air]\ndensity_kg_m3 = 1.1\n");

        var read = StudyReader.Read("/studies/fell/cases/clean.toml", study.Files);

        Told.Exactly([], read.Errors);
        Assert.Equal(("fell", "/studies/fell"), (read.Name, read.Folder));
        Assert.Equal(1.1, Assert.Single(read.Cases).Rotor.Air.Density);
    }

    [Fact]
    public void A_case_file_outside_a_folder_of_cases_has_its_own_folder_as_study()
    {
        var study = new FellStudy().With("alone.toml", FellStudy.Case.Replace("../", "", StringComparison.Ordinal));

        var read = StudyReader.Read("/studies/fell/alone.toml", study.Files);

        Told.Exactly([], read.Errors);
        Assert.Equal(("fell", "alone", "alone.toml"), (read.Name, Assert.Single(read.Cases).Name, read.Cases[0].File));
    }

    [Fact]
    public void Hidden_files_and_other_endings_are_no_cases()
    {
        var study = new FellStudy().With("cases/.clean.toml", "rubbish").With("cases/clean.toml~", "rubbish").With("cases/notes.md", "rubbish");

        study.OnlyCase();
    }

    [Theory]
    [InlineData("x.TOML")]
    [InlineData(".hid.toml")]
    [InlineData("VSn.tml")]
    [InlineData("clean.toml.txt")]
    public void A_file_that_looks_like_a_case_and_is_not_read_is_a_doubt(string name)
        => Told.Exactly(
            [$"cases/{name}: is not read: a case file's name ends in .toml, in small letters, and does not begin with a dot"],
            Doubts($"cases/{name}"));

    [Theory]
    [InlineData("cases/clean.toml~")]
    [InlineData("cases/#clean.toml#")]
    [InlineData("cases/.clean.toml.swp")]
    [InlineData("cases/notes.md")]
    [InlineData("cases/page.html")]
    [InlineData("cases/old.TOML/notes.md")]
    [InlineData("spare/x.TOML")]
    public void Other_files_beside_the_cases_are_nobodys_matter(string file) => Told.Exactly([], Doubts(file));

    [Fact]
    public void Two_case_files_whose_names_differ_in_letter_case_only_are_refused()
    {
        var study = new FellStudy().With("cases/Clean.toml", FellStudy.Case).Read();

        Told.Exactly(
            ["cases/clean.toml: the name differs from Clean.toml in letter case only, and some systems take both for one; rename one"],
            study.Errors);
        Assert.Equal(["Clean"], study.Cases.Select(c => c.Name));
        Assert.Equal(["clean"], study.Rejected.ToArray());
    }

    private static ImmutableArray<InputFinding> Doubts(string file)
        => new FellStudy().With("polars/clean/tip.csv", FellStudy.RootPolar).With(file, "rubbish").Read().Doubts;
}
