using BladeLoads.Batch.Plan;
using BladeLoads.Batch.Tests.Building;

namespace BladeLoads.Batch.Tests.Plan;

public class CaseChoiceTests
{
    [Theory]
    [InlineData("clean", "clean", true)]
    [InlineData("clean", "clean-2", false)]
    [InlineData("clean*", "clean-2", true)]
    [InlineData("clean-?", "clean-2", true)]
    [InlineData("clean-?", "clean-22", false)]
    [InlineData("*density-1.05*", "air~density-1.05~pitch-0", true)]
    [InlineData("a[b]", "a[b]", true)]
    [InlineData("Clean", "clean", false)]
    public void A_star_is_any_text_and_a_question_mark_one_character(string pattern, string name, bool matches)
        => Assert.Equal(matches, new CaseChoice([pattern]).Includes(name));

    [Fact]
    public void Several_patterns_keep_what_any_of_them_matches()
        => Assert.Equal(["a", "c"], new[] { "a", "b", "c" }.Where(new CaseChoice(["a", "c*"]).Includes));

    [Fact]
    public void Without_a_pattern_all_are_kept() => Assert.True(CaseChoice.All.Includes("anything"));

    [Theory]
    [InlineData("air~*", "cases/air.toml", true)]
    [InlineData("air", "cases/air.toml", true)]
    [InlineData("soiled", "cases/air.toml", false)]
    public void A_rejected_sweep_is_meant_by_a_pattern_for_its_variants(string pattern, string rejected, bool matches)
        => Assert.Equal(matches, new CaseChoice([pattern]).IncludesRejected(rejected));

    [Fact]
    public void A_case_whose_name_the_results_need_is_rejected_with_an_error()
    {
        var study = ReservedNames.Rejected(FellRotor.Study(FellRotor.Case("clean"), FellRotor.Case("report.html")));
        Assert.Equal("clean", Assert.Single(study.Cases).Name);
        Assert.Equal("report.html", Assert.Single(study.Rejected));
        Assert.Equal("the results folder needs the name 'report.html' itself; rename the case file", Assert.Single(study.Errors).Text);
    }
}
