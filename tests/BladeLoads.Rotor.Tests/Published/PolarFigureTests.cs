using BladeLoads.Rotor.Sections;
using static BladeLoads.Rotor.Tests.Published.PublishedRotor;

namespace BladeLoads.Rotor.Tests.Published;

public sealed class PolarFigureTests
{
    /// <summary>
    /// ramsay1995, table B2: largest lift 1.03 at 15.2 degrees, lowest -0.80 at -16.2, least drag 0.0085 at 0; 0.79/0.0090 at 6.1 is the best ratio of its
    /// rows. Between -2.1 (-0.16) and 0 degrees (0.07) lift is 0 at -0.64. All of it read off the table by eye.
    /// </summary>
    [Fact]
    public void The_S809_has_the_figures_of_its_table()
    {
        var figures = PolarFigures.Of(ReadPolar("phase-6/polars/s809.csv"));
        Is(1.03, 15.2, figures.LargestLift);
        Is(-0.80, -16.2, figures.LowestLift);
        Is(0.0085, 0, figures.LeastDrag);
        Is(0.79 / 0.0090, 6.1, figures.BestLiftToDrag);
        Assert.Equal(-0.639, figures.Attached!.Value.ZeroLiftAngle / Degree, 1e-3);
        // Attached lift of every section is near that of a plate, 2 pi (glauert1926); measured, 0.105 to 0.115 a degree: common practice, no source.
        Assert.InRange(figures.Attached.Value.LiftSlope * Degree, 0.105, 0.115);
    }

    /// <summary>nrel5mw, appendix B: largest lift 1.453 at 13.5 degrees, least drag 0.0052 first at -1, and so 1.011/0.0058 at 5 the best ratio.</summary>
    [Fact]
    public void The_tip_section_of_the_5_MW_turbine_has_the_figures_of_its_table()
    {
        var figures = PolarFigures.Of(ReadPolar("nrel-5mw/polars/NACA64_A17.csv"));
        Is(1.453, 13.5, figures.LargestLift);
        Is(0.0052, -1, figures.LeastDrag);
        Is(1.011 / 0.0058, 5, figures.BestLiftToDrag);
    }

    /// <summary>nrel5mw, appendix B: a cambered section, that lifts at 0 degrees: lowest lift -0.985 at -13 degrees, largest 1.442 at 10.</summary>
    [Fact]
    public void A_cambered_section_of_the_5_MW_turbine_has_its_lowest_lift_beyond_its_angle_of_zero_lift()
    {
        var figures = PolarFigures.Of(ReadPolar("nrel-5mw/polars/DU25_A17.csv"));
        Is(1.442, 10, figures.LargestLift);
        Is(-0.985, -13, figures.LowestLift);
    }

    /// <summary>sheldahl-klimas1981: largest lift 0.8322 at 10 degrees. A symmetric section has no lift at zero angle.</summary>
    [Fact]
    public void The_NACA_0015_has_the_largest_lift_of_its_table_and_none_at_zero_angle()
    {
        var figures = PolarFigures.Of(ReadPolar("sections/naca0015.csv"));
        Is(0.8322, 10, figures.LargestLift);
        Assert.Equal(0, figures.Attached!.Value.ZeroLiftAngle, 1e-15);
        Assert.InRange(figures.SlopeRatio!.Value, 0.95, 1.05);
    }

    private static void Is(double value, double angleDeg, PolarExtreme? extreme)
    {
        Assert.Equal(value, extreme!.Value.Value, 1e-12);
        Assert.Equal(angleDeg, extreme.Value.Angle / Degree, 1e-9);
        Assert.False(extreme.Value.AtEnd);
    }
}
