using System.Text;

namespace BladeLoads.Studies.Tests.Studies;

/// <summary>Whatever lies in a file, reading it ends in cases or findings, never in an exception, and never in neither.</summary>
public class RubbishTests
{
    private const int Seed = 20_260_314;

    private static readonly (string File, string Text)[] Inputs =
    [
        ("cases/clean.toml", FellStudy.Case + "[sweep]\n\"air.density_kg_m3\" = [1.225, 1.05]\n"),
        ("cases/clean.toml", FellStudy.VariableSpeedCase),
        ("cases/clean.toml", FellStudy.ScheduleCase),
        ("study.toml", "baseline = \"clean\"\n[air]\ndensity_kg_m3 = 1.1\n"),
        ("blades/fell.csv", FellStudy.Blade),
        ("polars/clean/root.csv", FellStudy.RootPolar),
        ("polars/clean/tip.csv", FellStudy.TipPolar),
        ("schedules/gentle.csv", FellStudy.Schedule),
    ];

    private static readonly string[] Pieces =
    [
        "\"", "'", ",", "\n", "\r", "#", "=", "[", "]", "{", "}", ".", "-", "0", "9", "e", "1e308", "nan", "inf", "\0", "\u001b[2J", "\ufeff",
        "\u202e", "\"\"\"", "\\u", "é", "\ud800", " ", "\t", "..", "/", "~", "99999999999999999999", "1979-05-27",
    ];

    [Fact]
    public void A_file_cut_anywhere_is_answered()
    {
        foreach (var (file, text) in Inputs)
            for (var length = 0; length < text.Length; length++)
                AssertAnswered(file, Encoding.UTF8.GetBytes(text[..length]));
    }

    [Fact]
    public void A_file_with_anything_put_in_anywhere_is_answered()
    {
        var random = new Random(Seed);
        for (var i = 0; i < 4000; i++)
        {
            var (file, text) = Inputs[random.Next(Inputs.Length)];
            for (var changes = random.Next(1, 4); changes > 0; changes--)
            {
                var from = random.Next(text.Length + 1);
                var to = Math.Min(text.Length, from + random.Next(4));
                text = text[..from] + Pieces[random.Next(Pieces.Length)] + text[to..];
            }
            AssertAnswered(file, Encoding.UTF8.GetBytes(text));
        }
    }

    [Fact]
    public void Bytes_without_any_sense_are_answered()
    {
        var random = new Random(Seed);
        foreach (var (file, _) in Inputs)
            for (var i = 0; i < 50; i++)
            {
                var bytes = new byte[random.Next(200)];
                random.NextBytes(bytes);
                AssertAnswered(file, bytes);
            }
    }

    private static void AssertAnswered(string file, byte[] bytes)
    {
        var test = new FellStudy().With(file, bytes);
        if (file == "schedules/gentle.csv")
            test.With("cases/clean.toml", FellStudy.ScheduleCase);

        var study = test.Read();

        var told = $"{file}: {Encoding.UTF8.GetString(bytes)}\n{string.Join('\n', study.Errors.Select(FindingText.Format))}";
        Assert.True(study.Cases.Length + study.Rejected.Length > 0, told);
        Assert.True(study.Rejected.IsEmpty || !study.Errors.IsEmpty, told);
        Assert.All(study.Errors, error => Assert.DoesNotContain(FindingText.Format(error), char.IsControl));
    }
}
