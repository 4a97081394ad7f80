using System.Globalization;
using System.Text;

namespace BladeLoads.EndToEnd.Program;

/// <summary>A small invented study, written into a folder: three cases of a 20 m rotor, sections by formula.</summary>
internal static class BeckStudy
{
    /// <param name="folder">The study's folder; created.</param>
    public static void Write(string folder)
    {
        foreach (var sub in new[] { "cases", "blades", "polars/clean" })
            Directory.CreateDirectory(Path.Join(folder, sub));
        File.WriteAllText(Path.Join(folder, "study.toml"), """
            baseline = "clean"
            blade  = "blades/beck-20.csv"
            polars = "polars/clean"
            [rotor]
            blade_count = 3
            [wind]
            speeds_m_s = { from = 4, to = 20, step = 2 }
            [control]
            strategy        = "fixed-speed"
            rotor_speed_rpm = 34
            pitch_deg       = 0.0
            [model]
            elements = 12

            """);
        File.WriteAllText(Path.Join(folder, "blades/beck-20.csv"), """
            radius_m,chord_m,twist_deg,section
            1.0,1.4,14,beck-30
            5.0,1.5,8,beck-30
            12.0,1.0,3,beck-18
            20.0,0.4,0,beck-18

            """);
        Section(folder, "beck-30", liftMaximum: 1.2, drag: 0.012);
        Section(folder, "beck-18", liftMaximum: 1.4, drag: 0.008);
        Case(folder, "clean", "title = \"Clean blades\"");
        Case(folder, "thin-air", "title = \"Thin air\"\n[air]\ndensity_kg_m3 = 1.0");
        Case(folder, "slow", "title = \"Slow\"\n[control]\nrotor_speed_rpm = 26");
    }

    public static void Case(string folder, string name, string text)
        => File.WriteAllText(Path.Join(folder, "cases", name + ".toml"), text + "\n");

    /// <summary>Adds a case with so many variants that a run of it takes its time.</summary>
    public static void AddLongSweep(string folder) => Case(folder, "long", $$"""
        title = "Long"
        [wind]
        speeds_m_s = { from = 4, to = 24, step = 0.1 }
        [model]
        elements = 60
        [sweep]
        "air.density_kg_m3" = [{{string.Join(", ", Enumerable.Range(0, 400).Select(i => (1 + i * 0.0005).ToString(CultureInfo.InvariantCulture)))}}]
        """);

    /// <summary>Adds a case with variants that take a few milliseconds each.</summary>
    public static void AddSmallSweep(string folder, int variants, double pitch = 0) => Case(folder, "small", $$"""
        title = "Small"
        [control]
        pitch_deg = {{pitch.ToString(CultureInfo.InvariantCulture)}}
        [sweep]
        "air.density_kg_m3" = [{{string.Join(", ", Enumerable.Range(0, variants).Select(i => (1 + i * 0.0001).ToString(CultureInfo.InvariantCulture)))}}]
        """);

    /// <summary>Adds a single case that takes some seconds.</summary>
    public static void AddGiant(string folder) => Case(folder, "giant", """
        title = "Giant"
        [wind]
        speeds_m_s = { from = 4, to = 24, step = 0.01 }
        [model]
        elements = 800
        [outputs]
        spanwise = "none"
        """);

    // Lift 2 pi sin(a) cut off at its maximum, then a plate's 2 sin(a) cos(a); drag of a plate beyond. By formula, no measurement.
    private static void Section(string folder, string name, double liftMaximum, double drag)
    {
        var text = new StringBuilder("alpha_deg,cl,cd\n");
        for (var alpha = -180; alpha <= 180; alpha += 2)
        {
            var a = double.DegreesToRadians(alpha);
            var attached = Math.Abs(alpha) <= 30 ? Math.Clamp(2 * Math.PI * Math.Sin(a), -liftMaximum, liftMaximum) : 0;
            var plate = 2 * Math.Sin(a) * Math.Cos(a);
            var share = Math.Clamp((30 - Math.Abs(alpha)) / 15.0, 0, 1);
            text.Append(CultureInfo.InvariantCulture, $"{alpha},{share * attached + (1 - share) * plate:0.0000},{drag + 1.8 * Math.Pow(Math.Sin(a), 2):0.0000}\n");
        }
        File.WriteAllText(Path.Join(folder, "polars/clean", name + ".csv"), text.ToString());
    }
}
