namespace BladeLoads.Studies.Tests.Toml;

public class SyntaxErrorTests
{
    [Theory]
    [InlineData("rotor_speed_rpm = 70,5", "cases/clean.toml:13:19: rotor_speed_rpm is '70,5'; write decimals with a point: 70.5")]
    [InlineData("rotor_speed_rpm = 500,000", "cases/clean.toml:13:19: rotor_speed_rpm is '500,000'; write it without separators: 500000")]
    [InlineData("rotor_speed_rpm = 1,234", "cases/clean.toml:13:19: rotor_speed_rpm is '1,234'; write 1234 or 1.234, whichever is meant")]
    [InlineData("rotor_speed_rpm = ,5", "cases/clean.toml:13:19: rotor_speed_rpm is ',5'; write decimals with a point: 0.5")]
    [InlineData("rotor_speed_rpm = \u22122", "cases/clean.toml:13:19: rotor_speed_rpm is '\u22122', with a minus sign (U+2212); write -2")]
    [InlineData("rotor_speed_rpm = 70 rpm", "cases/clean.toml:13:19: rotor_speed_rpm is '70 rpm'; write the number alone: 70")]
    [InlineData("rotor_speed_rpm = 070", "cases/clean.toml:13:19: rotor_speed_rpm is '070'; write it without leading zeros: 70")]
    [InlineData("rotor_speed_rpm = fast", "cases/clean.toml:13:19: rotor_speed_rpm is 'fast' without quotes; write text in quotes: \"fast\"")]
    [InlineData("rotor_speed_rpm = True # yes", "cases/clean.toml:13:19: rotor_speed_rpm is 'True'; write true")]
    [InlineData("rotor_speed_rpm = NaN", "cases/clean.toml:13:19: rotor_speed_rpm is 'NaN'; write nan")]
    [InlineData("rotor_speed_rpm =", "cases/clean.toml:13:18: rotor_speed_rpm has no value; write one after the =")]
    [InlineData("rotor_speed_rpm", "cases/clean.toml:13:1: 'rotor_speed_rpm' has no value; write rotor_speed_rpm = and the value")]
    [InlineData("rotor_speed_rpm : 70", "cases/clean.toml:13:17: 'rotor_speed_rpm' is followed by a colon; write rotor_speed_rpm = and the value")]
    [InlineData("[outputs", "cases/clean.toml:13:1: [outputs has no closing bracket; write [outputs]")]
    [InlineData("rotor_speed_rpm = \"70", "cases/clean.toml:13:22: a text is not closed; close it with the quote that opened it, in the same line")]
    [InlineData("rotor_speed_rpm = [70", "cases/clean.toml:14:1: a list that was opened before is not closed here; close it with ]")]
    [InlineData("rotor_speed_rpm = 99999999999999999999", "cases/clean.toml:13:19: a whole number is too large here; write a smaller one")]
    [InlineData("strategy = \"schedule\"\nrotor_speed_rpm = 70", "cases/clean.toml:13:1: key 'strategy' is given twice, first in line 12; keep one")]
    [InlineData("rotor_speed_rpm = 70\n[rotor]\ncone_deg = 1", "cases/clean.toml:14:2: table [rotor] is there twice, first in line 5; put its keys together")]
    [InlineData("rotor_speed_rpm = 70\n[[rotor]]\ncone_deg = 1", "cases/clean.toml:14:3: [[rotor]] is a list of tables; write [rotor], once")]
    [InlineData("rotor_speed_rpm = 70\n[wind.speeds_m_s]\nfrom = 1", "cases/clean.toml:14:7: key 'speeds_m_s' is given twice, first in line 9; keep one")]
    [InlineData("rotor_speed_rpm = 70 \u001b[2J", "cases/clean.toml:13:22: not TOML here: Unexpected token found `\\u1B;` while expecting token `newline`; "
        + "the line reads 'rotor_speed_rpm = 70 \\u001B[2J'")]
    public void A_line_that_is_not_toml_is_told_in_a_plain_sentence(string line, string expected)
    {
        var study = new FellStudy().Change("cases/clean.toml", "rotor_speed_rpm = 70", line).Read();

        Told.Exactly([expected], study.Errors);
        Assert.Equal(["clean"], study.Rejected.ToArray());
    }

    [Fact]
    public void Several_lines_that_are_not_toml_are_told_at_once()
        => Told.Exactly(
            [
                "cases/clean.toml:6:15: blade_count is 'three' without quotes; write text in quotes: \"three\"",
                "cases/clean.toml:14:19: pitch_deg is '2,5'; write decimals with a point: 2.5",
            ],
            new FellStudy().Change("cases/clean.toml", "= 3", "= three").Change("cases/clean.toml", "pitch_deg       = 2", "pitch_deg       = 2,5").Read().Errors);

    [Fact]
    public void Brackets_within_brackets_without_end_are_told()
        => Told.Exactly(
            ["cases/clean.toml:13: cannot be read as TOML; look at the quotes, backslashes and brackets here"],
            new FellStudy().Change("cases/clean.toml", "rotor_speed_rpm = 70", "rotor_speed_rpm = " + new string('[', 100_000)).Read().Errors);

    [Fact]
    public void A_file_that_ends_within_an_escape_is_told()
        => Told.Exactly(
            ["cases/clean.toml:16: cannot be read as TOML; look at the quotes, backslashes and brackets here"],
            new FellStudy().With("cases/clean.toml", FellStudy.Case + "\ntitle = \"\\").Read().Errors);
}
