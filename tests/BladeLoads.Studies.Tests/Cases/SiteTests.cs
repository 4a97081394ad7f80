using BladeLoads.Rotor.Energy;

namespace BladeLoads.Studies.Tests.Cases;

public class SiteTests
{
    private const string Mast = "from_m_s,to_m_s,share\n0,5,0.25\n5,10,0.5\n10,20,0.25\n";

    [Fact]
    public void A_site_is_read_with_its_defaults()
    {
        var site = Study("mean_wind_speed_m_s = 7.5").OnlyCase().Further.Site!;

        Assert.Equal(new WindClimate.Weibull(7.5, 2), site.Climate);
        Assert.Equal((2, 1, 1), (site.Shape, site.Availability, site.ShareLeft));
    }

    [Fact]
    public void Losses_follow_on_one_another()
    {
        var site = Study("mean_wind_speed_m_s = 7.5\navailability = 0.9\nlosses = { wakes = 0.5, grid = 0.2 }").OnlyCase().Further.Site!;

        Assert.Equal([("grid", 0.2), ("wakes", 0.5)], site.Losses.ToArray());
        Assert.Equal(0.36, site.ShareLeft, 1e-15);
    }

    [Fact]
    public void A_histogram_is_read_from_its_table()
    {
        var only = Study("histogram = \"../site/mast.csv\"").OnlyCase();

        var climate = Assert.IsType<WindClimate.Histogram>(only.Further.Site!.Climate);
        Assert.Equal([0, 5, 10, 20], climate.Edges.ToArray());
        Assert.Equal([0.25, 0.5, 0.25], climate.Shares.ToArray());
        Assert.Equal(("site/mast.csv", "3 bins from 0 to 20 m/s"), (only.Inputs[^1].File, only.Inputs[^1].Contents));
        Assert.Matches("^[0-9a-f]{64}$", only.Values["site.histogram"]);
    }

    [Fact]
    public void A_case_without_a_site_asks_for_no_energy()
        => Assert.Equal(FurtherResults.None, new FellStudy().OnlyCase().Further);

    [Fact]
    public void A_histogram_in_the_case_takes_the_place_of_a_mean_to_start_from()
    {
        var study = Study("histogram = \"../site/mast.csv\"").With("study.toml", "[site]\nmean_wind_speed_m_s = 7\nweibull_shape = 2.2\n");

        Assert.IsType<WindClimate.Histogram>(study.OnlyCase().Further.Site!.Climate);
    }

    [Theory]
    [InlineData("availability = 0.97",
        "cases/clean.toml:11:2: [site] mean_wind_speed_m_s is missing; write it, such as mean_wind_speed_m_s = 7.5")]
    [InlineData("mean_wind_speed_m_s = 7\nweibull_shape = 0.8", "cases/clean.toml:13:17: weibull_shape is 0.8; it must be 1 or more: below 1 calm would be the likeliest wind; "
        + "sites have 1.5 to 3, and 2 is Rayleigh's; fit it to the wind at hub height, or give a histogram of it")]
    [InlineData("mean_wind_speed_m_s = 7\navailability = 0", "cases/clean.toml:13:16: availability is 0; it must be above 0 and at most 1: "
        + "the machine would never run; give the share of time in which it can run, such as 0.97")]
    [InlineData("mean_wind_speed_m_s = 7\navailability = 97", "cases/clean.toml:13:16: availability is 97; it must be above 0 and at most 1: "
        + "the machine would run longer than the year; it is a share and not percent: write 0.97")]
    [InlineData("mean_wind_speed_m_s = 7\navailability = 1.1", "cases/clean.toml:13:16: availability is 1.1; it must be above 0 and at most 1: "
        + "the machine would run longer than the year; give the share of time in which it can run, such as 0.97")]
    [InlineData("mean_wind_speed_m_s = 0", "cases/clean.toml:12:23: mean_wind_speed_m_s is 0; it must be above 0 and at most 200: "
        + "there would be no wind; give the mean of the year at hub height in m/s, such as 7.5")]
    [InlineData("mean_wind_speed_m_s = 7\nlosses = { wakes = 1 }", "cases/clean.toml:13:20: losses has 'wakes' 1; it must be 0 or more and below 1: "
        + "no energy would be left; it is a share and not percent: write 0.01")]
    [InlineData("mean_wind_speed_m_s = 7\nlosses = { wakes = -0.06 }", "cases/clean.toml:13:20: losses has 'wakes' -0.06; it must be 0 or more and below 1: "
        + "a loss would add energy; give the share of energy that is lost, such as 0.06")]
    [InlineData("mean_wind_speed_m_s = 7\nlosses = { wakes = nan }",
        "cases/clean.toml:13:20: losses has 'wakes' nan; give the share of energy that is lost, such as 0.06")]
    [InlineData("mean_wind_speed_m_s = 7\nlosses = 0.1",
        "cases/clean.toml:13:10: losses is 0.1; name each loss with its share: { wakes = 0.06, grid = 0.02 }")]
    [InlineData("mean_wind_speed_m_s = 7\nlosses = { wakes = 6 }",
        "cases/clean.toml:13:20: losses has 'wakes' 6; it must be 0 or more and below 1: no energy would be left; it is a share and not percent: write 0.06")]
    [InlineData("mean_wind_speed_m_s = 7\nhistogram = \"../site/mast.csv\"",
        "cases/clean.toml:12:1: 'mean_wind_speed_m_s' does not go with histogram, which says how often each wind speed blows; leave one of them out")]
    [InlineData("weibull_shape = 2\nhistogram = \"../site/mast.csv\"\nmean_wind_speed_m_s = 7",
        "cases/clean.toml:12:1: 'weibull_shape' and 'mean_wind_speed_m_s' do not go with histogram, which says how often each wind speed blows; "
        + "leave histogram out, or the others")]
    [InlineData("histogram = \"../site/mats.csv\"", "cases/clean.toml:12:13: no file '../site/mats.csv'; site/ holds mast.csv")]
    public void A_wrong_site_is_told(string keys, string expected) => Told.Exactly([expected], Study(keys).Read().Errors);

    [Theory]
    [InlineData("10,20,0.25", "10,20,0.24",
        "site/mast.csv:1:17: share sums to 0.99 over 3 bins from 0 to 20 m/s, so 1% of the year would be missing; "
        + "the shares must make 1 within a millionth: add the bins that are missing, or divide each share by 0.99")]
    [InlineData("10,20,0.25", "10,20,0.3",
        "site/mast.csv:1:17: share sums to 1.05 over 3 bins from 0 to 20 m/s, so 5% of the year would be counted twice; "
        + "the shares must make 1 within a millionth: take out what is there twice, or divide each share by 1.05")]
    [InlineData("0,5,0.25\n5,10,0.5\n10,20,0.25", "0,5,0\n5,10,0",
        "site/mast.csv:1:17: share sums to 0, so the year would have no wind at all; give the share of time of each bin, which make 1 together")]
    [InlineData("10,20,0.25", "10,20,-0.25", "site/mast.csv:4:7: share is -0.25; no time is negative: "
        + "give the share of time, from 0 to 1, not percent or hours")]
    [InlineData("10,20,0.25", "11,20,0.25",
        "site/mast.csv:4:1: from_m_s is 11, where the bin before ends at 10; bins must follow on one another (give an empty one share 0)")]
    [InlineData("5,10,0.5", "5,5,0.5", "site/mast.csv:3:3: to_m_s is 5, not above from_m_s 5; a bin must have a width\n"
        + "site/mast.csv:4:1: from_m_s is 10, where the bin before ends at 5; bins must follow on one another (give an empty one share 0)")]
    [InlineData("10,20,0.25", "10,20,25", "site/mast.csv:4:7: share is 25; no bin holds more than all of the year: "
        + "give the share of time, from 0 to 1, not percent or hours")]
    [InlineData("0,5,0.25", "-1,5,0.25", "site/mast.csv:2:1: from_m_s is -1; it must be 0 or more")]
    public void A_wrong_histogram_is_told_at_its_row(string text, string by, string expected)
        => Told.Exactly(expected.Split('\n'), Study("histogram = \"../site/mast.csv\"").Change("site/mast.csv", text, by).Read().Errors);

    [Fact]
    public void A_year_of_a_curve_that_stops_short_of_cut_out_is_doubted()
    {
        var toml = FellStudy.VariableSpeedCase.Replace("[model]\n", "[site]\nmean_wind_speed_m_s = 7.5\n[model]\n", StringComparison.Ordinal)
            .Replace("[control]\n", "[control]\ncut_in_wind_speed_m_s = 1\ncut_out_wind_speed_m_s = 60\n", StringComparison.Ordinal);
        var doubts = new FellStudy().With("cases/clean.toml", toml).Read().Doubts.Select(d => d.Text).ToArray();

        Assert.Contains(doubts, d => d.StartsWith("cut_in_wind_speed_m_s is 1, and the wind speeds of the case begin at ", StringComparison.Ordinal)
            && d.EndsWith(" m/s; the year of [site] leaves out what lies between", StringComparison.Ordinal));
        Assert.Contains(doubts, d => d.StartsWith("cut_out_wind_speed_m_s is 60, and the wind speeds of the case end at ", StringComparison.Ordinal));
    }

    [Fact]
    public void A_year_without_stated_limits_of_operation_raises_no_doubt_about_them()
        => Assert.DoesNotContain(
            Study("mean_wind_speed_m_s = 7.5").Read().Doubts, d => d.Text.Contains("the year of [site]", StringComparison.Ordinal));

    private static FellStudy Study(string keys) => new FellStudy()
        .With("cases/clean.toml", FellStudy.VariableSpeedCase.Replace("[model]\n", $"[site]\n{keys}\n[model]\n", StringComparison.Ordinal))
        .With("site/mast.csv", Mast);
}
