namespace BladeLoads.Studies.Tests.Cases;

/// <summary>What the formats know and the solver does not do yet is refused in words, never ignored.</summary>
public class NotYetTests
{
    [Theory]
    [InlineData("[rotor]", "tilt_deg = 5", "tilt_deg is 5; a tilted rotor is not solved yet; give 0 or leave it out")]
    [InlineData("[wind]", "shear_exponent = 0.2", "shear_exponent is 0.2; wind shear is not solved yet; give 0 or leave it out")]
    [InlineData("[wind]", "yaw_deg = -10", "yaw_deg is -10; yawed wind is not solved yet; give 0 or leave it out")]
    public void What_is_not_there_yet_is_told_at_its_key(string table, string keys, string expected)
    {
        var text = FellStudy.VariableSpeedCase.Replace($"{table}\n", $"{table}\n{keys}\n", StringComparison.Ordinal);
        var line = 1 + Array.FindIndex(text.Split('\n'), l => l.StartsWith(expected.Split(' ')[0], StringComparison.Ordinal));

        Told.Exactly([$"cases/clean.toml:{line}:1: {expected}"], Read(text).Errors);
    }

    [Fact]
    public void What_changes_nothing_is_accepted()
    {
        var text = FellStudy.VariableSpeedCase
            .Replace("[rotor]", "[rotor]\ntilt_deg = 0\nhub_height_m = 30", StringComparison.Ordinal)
            .Replace("[wind]", "[wind]\nshear_exponent = 0.0\nyaw_deg = 0\nturbulence_intensity = 0", StringComparison.Ordinal)
            .Replace("[control]", "[control]\nspeed_limited_pitch = \"hold\"\nabove_rated = \"none\"", StringComparison.Ordinal);
        var plain = Assert.Single(Read(FellStudy.VariableSpeedCase).Cases);

        var study = Read(text);

        Told.Exactly([], study.Errors);
        Assert.Equal(plain.Fingerprint, Assert.Single(study.Cases).Fingerprint);
    }

    [Fact]
    public void A_blade_of_thickness_ratios_alone_is_not_read_yet()
    {
        var errors = new FellStudy().With("blades/fell.csv", "radius_m,chord_m,twist_deg,thickness_ratio\n1,1,0,0.4\n2,1,0,0.3\n").Read().Errors;

        Told.Exactly(["blades/fell.csv:1:1: sections from thickness_ratio are not supported yet; add a column 'section'"], errors);
    }

    [Fact]
    public void A_row_of_a_thickness_ratio_alone_is_not_read_yet()
    {
        var errors = new FellStudy().With("blades/fell.csv",
            "radius_m,chord_m,twist_deg,section,thickness_ratio\n1,1,0,root,0.4\n2,1,0,,0.3\n3,1,0,tip,\n").Read().Errors;

        Told.Exactly(["blades/fell.csv:3:7: a section from thickness_ratio is not supported yet; name a section"], errors);
    }

    private static Study Read(string caseText) => new FellStudy().With("cases/clean.toml", caseText).Read();
}
