using BladeLoads.Studies;

namespace BladeLoads.EndToEnd.Documentation;

public sealed class Documented_keys : IDisposable
{
    private static readonly string[] Tables = ["rotor", "air", "wind", "control", "site", "surface", "model", "sections", "outputs"];

    private readonly ExtractedStudies _studies = new();

    public void Dispose() => _studies.Dispose();

    [Fact]
    public void Have_the_defaults_that_the_page_states()
    {
        var stated = new List<string>();
        foreach (var table in Tables)
        {
            stated.Add($"[{table}]");
            foreach (var row in DocumentedTable.Rows($"`[{table}]`").Where(row => !ComesLater(row[4])))
                if (row[2] is not ("needed" or "none"))
                    stated.Add($"{row[0].Trim('`')} = {row[2].Trim('`')}");
            stated.AddRange(Needed(table));
        }
        Assert.True(stated.Count(line => line.Contains('=', StringComparison.Ordinal)) > 10, string.Join('\n', stated));

        var needed = Tables.SelectMany(table => Needed(table).Prepend($"[{table}]"));
        _studies.Write("example/cases/defaults-stated.toml", CaseText(stated));
        _studies.Write("example/cases/defaults-left-out.toml", CaseText(needed));
        var study = StudyReader.Read(_studies.PathOf("example"));

        Assert.Empty(study.Errors);
        Assert.Equal(Fingerprint(study, "defaults-left-out"), Fingerprint(study, "defaults-stated"));
    }

    public static TheoryData<string, string> KeysThatComeLater
    {
        get
        {
            var data = new TheoryData<string, string>();
            foreach (var table in Tables)
                foreach (var row in DocumentedTable.Rows($"`[{table}]`").Where(row => ComesLater(row[4])))
                    foreach (var key in DocumentedTable.NamesIn(row[0]))
                        data.Add(table, key);
            return data;
        }
    }

    [Theory]
    [MemberData(nameof(KeysThatComeLater))]
    public void That_come_later_are_refused_by_their_name(string table, string key)
    {
        // Half of anything is within range wherever a number is asked for.
        var lines = Tables.SelectMany(t => Needed(t).Prepend($"[{t}]").Concat(t == table ? [$"{key} = 0.5"] : []));
        _studies.Write("example/cases/asks-for-more.toml", CaseText(lines));

        var error = Assert.Single(StudyReader.Read(_studies.PathOf("example")).Errors);

        Assert.Equal("cases/asks-for-more.toml", error.File);
        Assert.Contains(key, error.Text, StringComparison.Ordinal);
        Assert.DoesNotContain("unknown key", error.Text, StringComparison.Ordinal);
    }

    private static bool ComesLater(string meaning) => meaning.StartsWith("**later**", StringComparison.Ordinal);

    private static string[] Needed(string table) => table switch
    {
        "rotor" => ["blade_count = 3"],
        "wind" => ["speeds_m_s = [8.0]"],
        "control" => ["strategy = \"variable-speed\"", "rated_power_kW = 400.0"],
        "site" => ["mean_wind_speed_m_s = 7.0"],
        "surface" => ["tip_speed_ratios = [7.0]", "pitches_deg = [0.0]"],
        _ => [],
    };

    private static string CaseText(IEnumerable<string> lines) => string.Concat(
        lines.Prepend("polars = \"../polars/clean\"").Prepend("blade = \"../blades/fell-20.csv\"").Select(line => line + "\n"));

    private static string Fingerprint(Study study, string name) => study.Cases.Single(c => c.Name == name).Fingerprint;
}
