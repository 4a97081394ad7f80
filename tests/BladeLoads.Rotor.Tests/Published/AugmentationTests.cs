using BladeLoads.Rotor.Sections;

namespace BladeLoads.Rotor.Tests.Published;

/// <summary>Factors of augmentation at tabled stations; the sources stand in the data file.</summary>
public sealed class AugmentationTests
{
    // The tip of the tabled rotor: 5.029 m at 7.54 rad/s.
    private const double TipSpeed = 5.029 * 7.54;

    [Fact]
    public void Factors_are_the_tabled_ones_cut_off_at_nothing()
    {
        var rows = PublishedTable.Read("sections/augmentation.csv").Rows;
        foreach (var row in rows)
        {
            var share = RotationalAugmentation.TipSpeedShare(row["wind_speed_m_s"], TipSpeed);
            Assert.Equal(row["tip_speed_share"], share, 1e-6);

            var snel = RotationalAugmentation.Factors(Augmentation.Snel1993, row["chord_over_r"], row["r_over_R"], share);
            Assert.Equal(row["snel"], snel.Lift, 1e-6);
            Assert.Equal(0, snel.Drag);

            var duSelig = RotationalAugmentation.Factors(Augmentation.DuSelig1998, row["chord_over_r"], row["r_over_R"], share);
            Assert.Equal(Math.Max(0, row["du_selig_lift"]), duSelig.Lift, 1e-6);
            Assert.Equal(Math.Max(0, row["du_selig_drag"]), duSelig.Drag, 1e-6);
        }
        Assert.Contains(rows, row => row["du_selig_drag"] < 0);
    }

    [Fact]
    public void Factors_below_nothing_are_the_tabled_ones_before_they_are_cut_off()
    {
        foreach (var row in PublishedTable.Read("sections/augmentation.csv").Rows)
        {
            var exponent = 1 / (row["tip_speed_share"] * row["r_over_R"]);
            // The share of tip speed has six digits; the factors hang on it weakly.
            Assert.Equal(row["du_selig_lift"], RotationalAugmentation.DuSelig(row["chord_over_r"], exponent), 2e-6);
            Assert.Equal(row["du_selig_drag"], RotationalAugmentation.DuSelig(row["chord_over_r"], exponent / 2), 2e-6);
        }
    }
}
