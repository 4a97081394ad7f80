namespace BladeLoads.Studies.Tests.Cases;

public class AirTests
{
    // Densities, viscosities and speeds of sound: key iso2533 in docs/sources.md, from memory, worked with another tool.
    [Theory]
    [InlineData("", 1.225, 1.789e-5, 340.294)]
    [InlineData("altitude_m = 0", 1.225, 1.78938e-5, 340.294)]
    [InlineData("altitude_m = 1000", 1.11164, 1.75785e-5, 336.434)]
    [InlineData("temperature_C = 15", 1.225, 1.78938e-5, 340.294)]
    [InlineData("temperature_C = -20", 1.394366, 1.61533e-5, 318.96)]
    // Pressure of 1000 m with the air of sea level: 1.225 x 89874.56/101325.
    [InlineData("altitude_m = 1000\ntemperature_C = 15", 1.086565, 1.78938e-5, 340.294)]
    [InlineData("pressure_Pa = 89874.56", 1.086565, 1.789e-5, 340.294)]
    [InlineData("temperature_C = 40\ndynamic_viscosity_Pa_s = 1.8e-5", 1.127203, 1.8e-5, 354.73)]
    public void Air_is_worked_out_from_what_the_case_says(string keys, double density, double viscosity, double speedOfSound)
    {
        var air = Study(keys).OnlyCase().Rotor.Air;

        Assert.Equal(density, air.Density, 2e-5 * density);
        Assert.Equal(viscosity, air.DynamicViscosity, 1e-5 * viscosity);
        Assert.Equal(speedOfSound, air.SpeedOfSound, 1e-4 * speedOfSound);
    }

    [Fact]
    public void Humid_air_is_lighter()
    {
        // iec61400-12-1, from memory: (1/T)(p/R0 - h pw (1/R0 - 1/Rw)), by hand at 30 degrees C: pw = 4261.3 Pa, 1.164397 - 0.018514 at h = 1.
        var air = Study("temperature_C = 30\nrelative_humidity = 1").OnlyCase().Rotor.Air;

        Assert.Equal(1.1459, air.Density, 2e-4);
    }

    [Theory]
    [InlineData("density_kg_m3 = 1.2\naltitude_m = 500",
        "cases/clean.toml:13:1: 'altitude_m' does not go with density_kg_m3, which gives the density already; leave one of them out")]
    [InlineData("density_kg_m3 = 1.2\nrelative_humidity = 0.5",
        "cases/clean.toml:13:1: 'relative_humidity' does not go with density_kg_m3, which gives the density already; leave one of them out")]
    [InlineData("pressure_Pa = 1e5\naltitude_m = 500",
        "cases/clean.toml:12:1: 'pressure_Pa' does not go with altitude_m, which gives the pressure already; leave one of them out")]
    [InlineData("density_kg_m3 = 1.2\naltitude_m = 500\ntemperature_C = 5\npressure_Pa = 1e5\nrelative_humidity = 0.5",
        "cases/clean.toml:13:1: 'altitude_m', 'temperature_C', 'pressure_Pa' and 'relative_humidity' do not go with density_kg_m3, "
        + "which gives the density already; leave density_kg_m3 out, or the others; of altitude_m and pressure_Pa one does, as either gives the pressure")]
    [InlineData("relative_humidity = 0.5\ndensity_kg_m3 = 1.2\ntemperature_C = 5",
        "cases/clean.toml:12:1: 'relative_humidity' and 'temperature_C' do not go with density_kg_m3, which gives the density already; "
        + "leave density_kg_m3 out, or the others")]
    [InlineData("pressure_Pa = 101.325", "cases/clean.toml:12:15: pressure_Pa is 101.325; it must be from 10000 to 120000: "
        + "the air over ground has more; is it in kPa? write 101325")]
    [InlineData("pressure_Pa = 130000", "cases/clean.toml:12:15: pressure_Pa is 130000; it must be from 10000 to 120000: "
        + "the air over ground has less; give it in Pa, such as 101325")]
    [InlineData("temperature_C = -273", "cases/clean.toml:12:17: temperature_C is -273; it must be from -100 to 100: "
        + "no air over ground is as cold; give it in degrees C, such as 15")]
    [InlineData("relative_humidity = -0.1", "cases/clean.toml:12:21: relative_humidity is -0.1; it must be from 0 to 1: "
        + "air cannot be drier than dry; give the share of saturation, such as 0.6")]
    [InlineData("pressure_Pa = 1013.25", "cases/clean.toml:12:15: pressure_Pa is 1013.25; it must be from 10000 to 120000: "
        + "the air over ground has more; is it in hPa? write 101325")]
    [InlineData("altitude_m = 12000", "cases/clean.toml:12:14: altitude_m is 12000; it must be from -500 to 11000: "
        + "the standard atmosphere is used no higher; give it in m over the sea, such as 500, or the density itself")]
    [InlineData("temperature_C = 288.15", "cases/clean.toml:12:17: temperature_C is 288.15; it must be from -100 to 100: "
        + "no air over ground is as hot; is it in kelvin? write 15")]
    [InlineData("relative_humidity = 60", "cases/clean.toml:12:21: relative_humidity is 60; it must be from 0 to 1: "
        + "air holds no more water than when it is saturated; it is a share and not percent: write 0.6")]
    [InlineData("reference_density_kg_m3 = 0", "cases/clean.toml:12:27: reference_density_kg_m3 is 0; it must be above 0 and at most 100: "
        + "there would be no air; give it in kg/m3, such as 1.225")]
    public void Wrong_air_is_told(string keys, string expected) => Told.Exactly([expected], Study(keys).Read().Errors);

    [Fact]
    public void An_altitude_in_the_case_takes_the_place_of_a_density_to_start_from()
    {
        var study = Study("altitude_m = 1000").With("study.toml", "[air]\ndensity_kg_m3 = 1.3\n");

        Assert.Equal(1.11164, study.OnlyCase().Rotor.Air.Density, 2e-5);
    }

    [Fact]
    public void An_altitude_swept_takes_the_place_of_a_density_to_start_from()
    {
        var study = new FellStudy().With("study.toml", "[air]\ndensity_kg_m3 = 1.3\n")
            .With("cases/clean.toml", FellStudy.VariableSpeedCase + "[sweep]\n\"air.altitude_m\" = [0, 1000]\n");

        Assert.Equal([1.225, 1.1117], study.SoundCases().Select(c => Math.Round(c.Rotor.Air.Density, 4)));
    }

    [Fact]
    public void Swept_keys_that_exclude_a_density_are_told_once_at_the_key()
        => Told.Exactly(
            ["cases/clean.toml:15:1: 'altitude_m' and 'temperature_C' do not go with density_kg_m3, which gives the density already; "
                + "leave density_kg_m3 out, or the others"],
            new FellStudy().With("cases/clean.toml", FellStudy.VariableSpeedCase.Replace("[model]\n", "[air]\ndensity_kg_m3 = 1.2\n", StringComparison.Ordinal)
                + "[sweep]\n\"air.altitude_m\" = [0, 500, 1000]\n\"air.temperature_C\" = [-5, 12]\n").Read().Errors);

    private static FellStudy Study(string keys) => new FellStudy().With("cases/clean.toml", FellStudy.VariableSpeedCase
        .Replace("[model]\n", $"[air]\n{keys}\n[model]\n", StringComparison.Ordinal));
}
