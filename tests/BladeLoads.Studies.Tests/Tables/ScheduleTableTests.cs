namespace BladeLoads.Studies.Tests.Tables;

public class ScheduleTableTests
{
    private const string File = "schedules/gentle.csv";

    [Theory]
    [InlineData("8,70,3", "3,70,3", "3:1: wind_speed_m_s falls from 4 to 3 (row 2 to 3); wind speeds must rise")]
    [InlineData("8,70,3", "4,70,3", "3:1: wind_speed_m_s is 4 again (row 2 to 3); wind speeds must rise")]
    [InlineData("8,70,3", "8,-70,3", "3:3: rotor_speed_rpm is -70; it must be from 0 to 100000")]
    [InlineData("8,70,3", "8,100001,3", "3:3: rotor_speed_rpm is 100001; it must be from 0 to 100000")]
    [InlineData("8,70,3", "201,70,3", "3:1: wind_speed_m_s is 201; it must be from 0 to 200")]
    [InlineData("8,70,3", "8,70,181", "3:6: pitch_deg is 181; give an angle from -180 to 180")]
    [InlineData("8,70,3", "8,70,", "3:6: pitch_deg is empty; give a number")]
    [InlineData("4,40,0\n8,70,3\n", "", ": has no row; a schedule needs one or more")]
    [InlineData("pitch_deg", "pitch", "1:32: unknown column 'pitch'; did you mean 'pitch_deg'?")]
    public void A_wrong_schedule_is_told_by_row_and_column(string text, string by, string expected)
    {
        var errors = new FellStudy().With("cases/clean.toml", FellStudy.ScheduleCase).Change(File, text, by).Read().Errors;

        Told.Exactly([expected[0] == ':' ? File + expected : $"{File}:{expected}"], errors);
    }
}
