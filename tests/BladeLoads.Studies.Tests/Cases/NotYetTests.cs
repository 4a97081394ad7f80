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

    private static Study Read(string caseText) => new FellStudy().With("cases/clean.toml", caseText).Read();
}
