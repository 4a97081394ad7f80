using System.Text;

namespace BladeLoads.Studies.Tests;

/// <summary>A small sound study, invented for these tests, whose files a test changes before it is read.</summary>
internal sealed class FellStudy
{
    public const string Folder = "/studies/fell";

    public const string Case = """
        title  = "Clean blades"
        blade  = "../blades/fell.csv"
        polars = "../polars/clean"

        [rotor]
        blade_count = 3

        [wind]
        speeds_m_s = { from = 5, to = 7, step = 1 }

        [control]
        strategy        = "fixed-speed"
        rotor_speed_rpm = 70
        pitch_deg       = 2

        """;

    public const string VariableSpeedCase = """
        blade  = "../blades/fell.csv"
        polars = "../polars/clean"
        [rotor]
        blade_count = 3
        [wind]
        speeds_m_s = [5, 6, 7]
        [control]
        strategy = "variable-speed"
        tip_speed_ratio = 7
        fine_pitch_deg = 1
        [model]
        [outputs]

        """;

    public const string ScheduleCase = """
        blade  = "../blades/fell.csv"
        polars = "../polars/clean"
        [rotor]
        blade_count = 3
        [wind]
        speeds_m_s = [5, 6, 7]
        [control]
        strategy = "schedule"
        schedule = "../schedules/gentle.csv"

        """;

    public const string Blade = """
        # invented
        radius_m,chord_m,twist_deg,section
        1,0.8,12,root
        3,0.6,5,root
        5,0.4,1,tip

        """;

    public const string RootPolar = """
        reynolds,alpha_deg,cl,cd
        1e6,-180,0.0,0.02
        1e6,0,0.3,0.01
        1e6,180,0.0,0.02
        3e6,-180,0.0,0.02
        3e6,0,0.4,0.009
        3e6,180,0.0,0.02

        """;

    public const string TipPolar = """
        alpha_deg,cl,cd,cm
        -10,-0.8,0.02,0
        0,0.2,0.01,-0.05
        10,1.1,0.015,-0.05

        """;

    public const string Schedule = """
        wind_speed_m_s,rotor_speed_rpm,pitch_deg
        4,40,0
        8,70,3

        """;

    public MemoryFiles Files { get; } = new MemoryFiles()
        .Write($"{Folder}/cases/clean.toml", Case)
        .Write($"{Folder}/blades/fell.csv", Blade)
        .Write($"{Folder}/polars/clean/root.csv", RootPolar)
        .Write($"{Folder}/polars/clean/tip.csv", TipPolar)
        .Write($"{Folder}/schedules/gentle.csv", Schedule);

    public FellStudy With(string file, string text)
    {
        Files.Write($"{Folder}/{file}", text);
        return this;
    }

    public FellStudy With(string file, byte[] bytes)
    {
        Files.Write($"{Folder}/{file}", bytes);
        return this;
    }

    /// <summary>The file with one piece of text, which must be there once, in place of another.</summary>
    public FellStudy Change(string file, string text, string by)
    {
        var before = Files.TextOf($"{Folder}/{file}");
        if (before.Split(text).Length != 2)
            throw new ArgumentException($"'{text}' is not once in {file}");
        return With(file, before.Replace(text, by, StringComparison.Ordinal));
    }

    public Study Read() => StudyReader.Read(Folder, Files);

    public IEnumerable<string> Errors() => Read().Errors.Select(FindingText.Format);

    public StudyCase OnlyCase() => Assert.Single(SoundCases());

    public IReadOnlyList<StudyCase> SoundCases()
    {
        var study = Read();
        Told.Exactly([], study.Errors);
        return study.Cases;
    }

    public static byte[] Utf16(string text) => [.. Encoding.Unicode.GetPreamble(), .. Encoding.Unicode.GetBytes(text)];
}
