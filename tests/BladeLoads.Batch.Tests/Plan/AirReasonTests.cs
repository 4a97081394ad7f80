using BladeLoads.Batch.Plan;

namespace BladeLoads.Batch.Tests.Plan;

/// <summary>Why a result is out of date whose air is another: what was written first, then what follows from it.</summary>
public sealed class AirReasonTests
{
    // As a case notes them; the standard atmosphere at 0, 300 and 500 m (iso2533 in docs/sources.md, from memory), dry air at 15 degrees C at 900 hPa.
    private static readonly Dictionary<string, string> Stated = Values("1.225", "1.789e-05", "340.293988026089");
    private static readonly Dictionary<string, string> At300 =
        Values("1.1900099646", "1.779955964922234e-05", "339.140596142072", ("air.altitude_m", "300"));
    private static readonly Dictionary<string, string> At500 =
        Values("1.1672711358", "1.7736559636838554e-05", "338.36948403808515", ("air.altitude_m", "500"));

    [Fact]
    public void An_altitude_is_told_as_written_and_then_what_follows()
        => Said(
            "air.altitude_m 300 -> 500; so density 1.19 -> 1.167 kg/m3, viscosity 1.78e-05 -> 1.774e-05 Pa s, speed of sound 339.1 -> 338.4 m/s",
            At300, At500);

    [Fact]
    public void An_altitude_in_the_place_of_a_density_is_new()
        => Said(
            "air.altitude_m is new: 500; so density 1.225 -> 1.167 kg/m3, viscosity 1.789e-05 -> 1.774e-05 Pa s, speed of sound 340.3 -> 338.4 m/s",
            Stated, At500);

    [Fact]
    public void A_density_in_the_place_of_an_altitude_is_one_that_was_written()
        => Said(
            "air.altitude_m is gone, was 300; air.density_kg_m3 1.1900099646 -> 1.1; so viscosity 1.78e-05 -> 1.789e-05 Pa s, speed of sound 339.1 -> 340.3 m/s",
            At300, Values("1.1", "1.789e-05", "340.293988026089"));

    [Fact]
    public void A_viscosity_that_is_not_that_of_the_temperature_was_written()
        => Said("air.dynamic_viscosity_Pa_s 1.779955964922234e-05 -> 1.8e-05", At300, With(At300, "air.dynamic_viscosity_Pa_s", "1.8e-05"));

    [Fact]
    public void A_small_difference_is_told_with_as_many_digits_as_show_it()
        => Said(
            "air.relative_humidity is new: 0.001; so density 1.19001 -> 1.19 kg/m3", At300,
            With(With(At300, "air.density_kg_m3", "1.1900035"), "air.relative_humidity", "0.001"));

    [Fact]
    public void A_density_by_itself_is_told_as_it_is()
        => Said("air.density_kg_m3 1.225 -> 1.05", Stated, With(Stated, "air.density_kg_m3", "1.05"));

    [Fact]
    public void Where_nothing_was_written_every_value_is_told_by_itself()
        => Said(
            "air.density_kg_m3 1.1900099646 -> 1.19; air.speed_of_sound_m_s 339.140596142072 -> 339.1", At300,
            With(With(At300, "air.density_kg_m3", "1.19"), "air.speed_of_sound_m_s", "339.1"));

    [Fact]
    public void The_air_is_told_before_what_is_not_of_it()
        => Said(
            "air.altitude_m 300 -> 500; so density 1.19 -> 1.167 kg/m3, viscosity 1.78e-05 -> 1.774e-05 Pa s, speed of sound 339.1 -> 338.4 m/s; "
            + "rotor.cone_deg 2 -> 3",
            With(At300, "rotor.cone_deg", "2"), With(At500, "rotor.cone_deg", "3"));

    [Theory]
    [InlineData("air.altitude_m", "high")]
    [InlineData("air.altitude_m", "1e300")]
    [InlineData("air.temperature_C", "")]
    public void Values_that_no_case_could_have_are_told_without_a_fault(string key, string value)
        => Assert.NotEmpty(Sentence(At300, With(At500, key, value)));

    private static void Said(string expected, Dictionary<string, string> was, Dictionary<string, string> now)
        => Assert.Equal(expected, Sentence(was, now));

    private static string Sentence(Dictionary<string, string> was, Dictionary<string, string> now)
        => string.Join("; ", Differences.OfValues(was, now, [], _ => null).Select(r => r.Sentence));

    private static Dictionary<string, string> Values(string density, string viscosity, string speedOfSound, params (string, string)[] stated)
    {
        var values = stated.ToDictionary(s => s.Item1, s => s.Item2, StringComparer.Ordinal);
        values["air.density_kg_m3"] = density;
        values["air.dynamic_viscosity_Pa_s"] = viscosity;
        values["air.speed_of_sound_m_s"] = speedOfSound;
        return values;
    }

    private static Dictionary<string, string> With(Dictionary<string, string> values, string key, string value)
        => new(values, StringComparer.Ordinal) { [key] = value };
}
