using BladeLoads.Rotor.Air;

namespace BladeLoads.Rotor.Tests.Air;

public sealed class AtmosphereTests
{
    /// <summary>
    /// The standard atmosphere: key iso2533 in docs/sources.md, worked from its constants (from memory) with R = 287.05287; density by the
    /// gas constant of iec61400-12-1, 287.05, differs in the fifth digit.
    /// </summary>
    [Theory]
    [InlineData(0, 288.15, 101325, 1.225, 1.78938e-5, 340.294)]
    [InlineData(500, 284.9, 95460.84, 1.167269, 1.77366e-5, 338.369)]
    [InlineData(1000, 281.65, 89874.56, 1.111643, 1.75785e-5, 336.434)]
    [InlineData(3000, 268.65, 70108.53, 0.9091219, 1.69372e-5, 328.578)]
    [InlineData(5000, 255.65, 54019.89, 0.7361155, 1.62812e-5, 320.529)]
    [InlineData(11000, 216.65, 22632.04, 0.3639176, 1.42161e-5, 295.069)]
    public void The_standard_atmosphere_is_met(
        double altitude, double temperature, double pressure, double density, double viscosity, double speedOfSound)
    {
        Assert.Equal(temperature, Atmosphere.Temperature(altitude), 5e-4);
        Assert.Equal(pressure, Atmosphere.Pressure(altitude), 5e-3 * 2);
        Assert.Equal(density, Atmosphere.Density(pressure, temperature, 0), 2e-5 * density);
        Assert.Equal(viscosity, Atmosphere.Viscosity(temperature), 1e-10);
        Assert.Equal(speedOfSound, Atmosphere.SpeedOfSound(temperature), 1e-3);
    }

    [Fact]
    public void Humid_air_is_lighter_by_what_its_vapour_lacks()
    {
        // Saturated at 293.15 K the formula's vapour pressure is 0.0000205 exp(0.0631846 x 293.15) = 2269 Pa (key iec61400-12-1, from memory),
        // near the 2339 Pa of steam tables; the density falls by pw (1/R0 - 1/Rw)/T.
        var vapour = 0.0000205 * Math.Exp(0.0631846 * 293.15);
        Assert.InRange(vapour, 2250, 2290);
        var dry = Atmosphere.Density(101325, 293.15, 0);
        var humid = Atmosphere.Density(101325, 293.15, 1);
        Assert.Equal(vapour * ((1 / 287.05) - (1 / 461.5)) / 293.15, dry - humid, 1e-12);
        Assert.Equal(1.2041, dry, 1e-4);
    }

    /// <summary>
    /// Pressure of saturated vapour, Pa: key steam-tables, from memory. What the formula takes for it, seen in how much lighter humid air is, lies within
    /// 5 % of them from 0 to 30 degrees, and the density of saturated air within 0.05 % of that by them.
    /// </summary>
    [Theory]
    [InlineData(273.15, 611.2)]
    [InlineData(283.15, 1228)]
    [InlineData(293.15, 2339)]
    [InlineData(303.15, 4247)]
    public void Humid_air_is_as_light_as_steam_tables_make_it(double temperature, double saturation)
    {
        const double Pressure = 101325, Dry = 287.05, Vapour = 461.5;
        var (dry, humid) = (Atmosphere.Density(Pressure, temperature, 0), Atmosphere.Density(Pressure, temperature, 1));
        Assert.Equal(saturation, (dry - humid) * temperature / ((1 / Dry) - (1 / Vapour)), 0.05 * saturation);
        // Two gases side by side: what is not vapour is dry air.
        var mixed = (((Pressure - saturation) / Dry) + (saturation / Vapour)) / temperature;
        Assert.Equal(mixed, humid, 5e-4 * mixed);
        Assert.Equal((dry + humid) / 2, Atmosphere.Density(Pressure, temperature, 0.5), 1e-12);
    }

    [Fact]
    public void Beyond_the_troposphere_there_is_no_answer()
        => Assert.Throws<ArgumentOutOfRangeException>(() => Atmosphere.Pressure(11001));
}
