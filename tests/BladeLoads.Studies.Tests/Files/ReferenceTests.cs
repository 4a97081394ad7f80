namespace BladeLoads.Studies.Tests.Files;

/// <summary>Which files a case may refer to, and what is said of the others.</summary>
public class ReferenceTests
{
    [Theory]
    [InlineData("../blades/fel.csv", "no file '../blades/fel.csv'; blades/ holds fell.csv")]
    [InlineData("../wings/fell.csv", "no file '../wings/fell.csv'; there is no folder 'wings' in the study")]
    [InlineData("../fell.csv", "no file '../fell.csv'; the study folder holds no file")]
    [InlineData("../blades", "'../blades' is a folder; name a file")]
    [InlineData("", "the name is empty; name a file")]
    [InlineData("../../secret/fell.csv", "'../../secret/fell.csv' leaves the study folder; put the file inside it")]
    [InlineData("../../../../../../etc/passwd", "'../../../../../../etc/passwd' leaves the study folder; put the file inside it")]
    [InlineData("/etc/passwd", "'/etc/passwd' leaves the study folder; put the file inside it")]
    [InlineData("../../fell-evil/blade.csv", "'../../fell-evil/blade.csv' leaves the study folder; put the file inside it")]
    [InlineData("..\\\\blades\\\\fell.csv", "'..\\blades\\fell.csv' has backslashes; write forward slashes: ../blades/fell.csv")]
    [InlineData("../blades/\\u001bfell.csv", "'../blades/\\u001Bfell.csv' holds a control character; name a file without")]
    [InlineData("../blades/pipe.csv", "'../blades/pipe.csv' is not a regular file; name a file")]
    [InlineData("../blades/out.csv", "'../blades/out.csv' is a link that leads out of the study folder; put the file itself inside the study folder")]
    [InlineData("../away/fell.csv", "'../away/fell.csv' is a link that leads out of the study folder; put the file itself inside the study folder")]
    [InlineData("../round/fell.csv", "'../round/fell.csv' is a link that leads round in a circle; put the file itself inside the study folder")]
    public void A_reference_that_cannot_be_followed_is_told(string reference, string expected)
    {
        var study = new FellStudy().Change("cases/clean.toml", "\"../blades/fell.csv\"", $"\"{reference}\"");
        study.Files
            .Write("/studies/fell-evil/blade.csv", FellStudy.Blade)
            .Write("/studies/secret/fell.csv", FellStudy.Blade)
            .AddPipe($"{FellStudy.Folder}/blades/pipe.csv")
            .Link($"{FellStudy.Folder}/blades/out.csv", "../../secret/fell.csv")
            .Link($"{FellStudy.Folder}/away", "/studies/secret")
            .Link($"{FellStudy.Folder}/round", "round");

        Told.Exactly([$"cases/clean.toml:2:10: {expected}"], study.Read().Errors);
        Assert.DoesNotContain(study.Files.Reads, path => path.Contains("secret", StringComparison.Ordinal) || path.Contains("evil", StringComparison.Ordinal));
    }

    [Theory]
    [InlineData("../polars/soild", "no folder '../polars/soild'; polars/ holds clean")]
    [InlineData("../polars/clean/root.csv", "'../polars/clean/root.csv' is a file; name a folder")]
    [InlineData("../../polars", "'../../polars' leaves the study folder; put the folder inside it")]
    public void A_folder_of_polars_that_cannot_be_followed_is_told(string reference, string expected)
        => Told.Exactly([$"cases/clean.toml:3:10: {expected}"],
            new FellStudy().Change("cases/clean.toml", "../polars/clean", reference).Read().Errors);

    [Theory]
    [InlineData("../blades/linked.csv")]
    [InlineData("/studies/fell/blades/fell.csv")]
    [InlineData("./../blades/./fell.csv")]
    public void A_reference_within_the_study_is_followed_however_it_is_written(string reference)
    {
        var study = new FellStudy().Change("cases/clean.toml", "../blades/fell.csv", reference);
        study.Files.Link($"{FellStudy.Folder}/blades/linked.csv", "fell.csv");

        Assert.Equal(new FellStudy().OnlyCase().Fingerprint, study.OnlyCase().Fingerprint);
    }

    [Fact]
    public void A_polar_table_that_is_a_link_out_of_the_study_is_not_read()
    {
        var study = new FellStudy();
        study.Files.Remove($"{FellStudy.Folder}/polars/clean/tip.csv").Write("/studies/secret/tip.csv", FellStudy.TipPolar)
            .Link($"{FellStudy.Folder}/polars/clean/tip.csv", "../../../secret/tip.csv");

        Told.Exactly(["polars/clean/tip.csv: is a link that leads out of the study folder; put the file itself inside the study folder"], study.Read().Errors);
    }

    [Fact]
    public void A_case_file_that_is_a_link_out_of_the_study_is_not_read()
    {
        var study = new FellStudy();
        study.Files.Write("/studies/secret/case.toml", FellStudy.Case).Link($"{FellStudy.Folder}/cases/linked.toml", "../../secret/case.toml");

        Told.Exactly(["cases/linked.toml: is a link that leads out of the study folder; put the file itself inside the study folder"], study.Read().Errors);
    }

    [Fact]
    public void A_study_that_is_reached_by_a_link_is_read()
    {
        var study = new FellStudy();
        study.Files.Link("/here", "/studies/fell");

        var read = StudyReader.Read("/here", study.Files);

        Told.Exactly([], read.Errors);
        Assert.Equal("here", read.Name);
    }

    [Fact]
    public void A_table_that_may_not_be_read_is_told()
    {
        var study = new FellStudy();
        study.Files.Forbidden.Add($"{FellStudy.Folder}/polars/clean/tip.csv");

        Told.Exactly(["polars/clean/tip.csv: cannot be read: no permission"], study.Read().Errors);
    }

    [Fact]
    public void A_folder_or_a_pipe_in_the_place_of_a_table_is_told()
    {
        var study = new FellStudy();
        study.Files.Remove($"{FellStudy.Folder}/polars/clean/tip.csv").AddFolder($"{FellStudy.Folder}/polars/clean/tip.csv")
            .Remove($"{FellStudy.Folder}/polars/clean/root.csv").AddPipe($"{FellStudy.Folder}/polars/clean/root.csv");

        Told.Exactly(
            [
                "polars/clean/root.csv: is not a regular file; put a file in its place",
                "polars/clean/tip.csv: is a folder; put a file in its place",
            ],
            study.Read().Errors);
    }
}
