using BladeLoads.Batch.Tests.Building;
using BladeLoads.Batch.Work;
using BladeLoads.Commands;
using BladeLoads.Results.Publishing;
using BladeLoads.Rotor.Operation;
using BladeLoads.Studies;

namespace BladeLoads.EndToEnd.InProcess;

public sealed class Drawing_polars : IDisposable
{
    private const string Table = """
        reynolds,alpha_deg,cl,cd
        1000000,-10,-0.8,0.02
        1000000,0,0.3,0.008
        1000000,10,1.2,0.02
        1000000,20,0.9,0.2

        """;

    private readonly TemporaryFolder _folder = new();
    private readonly SolveCase _solve = CaseSolver.Solve;

    public Drawing_polars()
    {
        Put("fell/blades/fell.csv", """
            radius_m,chord_m,twist_deg,section
            1,1,10,tip
            10,0.5,0,tip

            """);
        Put("fell/polars/clean/tip.csv", Table);
        Put("fell/polars/clean/unused.csv", Table);
        Put("fell/cases/plain.toml", Case(""));
    }

    public void Dispose() => _folder.Dispose();

    [Fact]
    public void Of_a_study_the_tables_that_its_cases_use_are_drawn_among_its_results()
    {
        var (code, text, error) = Run("fell", "--format", "both");
        Assert.Equal((0, ""), (code, error));
        Assert.Equal($"{At("results/fell/pictures/clean/tip.svg")}\n{At("results/fell/pictures/clean/tip.png")}\n", text);
        Assert.True(File.Exists(At("results/fell/pictures/clean/tip.png")));
        Assert.Contains(">Section tip, set clean<", Read("results/fell/pictures/clean/tip.svg"), StringComparison.Ordinal);
        Assert.Contains(">study fell, polars/clean/tip.csv<", Read("results/fell/pictures/clean/tip.svg"), StringComparison.Ordinal);
    }

    [Fact]
    public void A_case_that_extends_and_augments_its_tables_has_pages_of_its_own()
    {
        Put("fell/cases/rotating.toml", Case("[sections]\nextend = \"viterna-1982\"\naugment = \"snel-1993\"\n"));
        Put("fell/cases/rotating-again.toml", Case("[sections]\nextend = \"viterna-1982\"\naugment = \"snel-1993\"\n"));
        var (code, text, _) = Run("fell", "--out", "pages");
        Assert.Equal(0, code);
        Assert.Equal($"{At("pages/clean/tip.svg")}\n{At("pages/clean/tip~rotating.svg")}\n", text);
        var page = Read("pages/clean/tip~rotating.svg");
        Assert.Contains(">extended, Viterna and Corrigan 1982<", page, StringComparison.Ordinal);
        Assert.Contains(">augmented, Snel 1993, r/R 0.", page, StringComparison.Ordinal);
        Assert.Contains(">Augmented at the best power coefficient of the case: ", page, StringComparison.Ordinal);
        Assert.DoesNotContain("ugmented", Read("pages/clean/tip.svg"), StringComparison.Ordinal);
    }

    /// <summary>
    /// By Du and Selig's relation nothing is augmented where the chord is small beside the radius: at 7.19 m, where it is 0.45 m, lift by
    /// hand as (1.6 x 0.0626 / 0.1267 - 1)/(2 pi) at most, below 0, which counts as none. Radii: the middles of eight equal elements.
    /// </summary>
    [Fact]
    public void The_innermost_the_middle_and_the_outermost_are_of_the_elements_that_are_augmented()
    {
        const string Treated = "[model]\nelements = 8\nspacing = \"uniform\"\n[sections]\naugment = \"du-selig-1998\"\n";
        Put("fell/cases/plain.toml", Case(Treated));
        Put("fell/blades/fell.csv", "radius_m,chord_m,twist_deg,section\n1,1,10,tip\n10,0.2,0,tip\n");
        Assert.Equal(0, Run("fell", "--out", "pages").Code);
        Assert.Equal(["0.16", "0.38", "0.61"], RadiiOn("pages/clean/tip~plain.svg"));
    }

    [Fact]
    public void Of_a_blade_by_thickness_the_elements_that_stand_on_a_table_in_part_are_drawn_too()
    {
        const string Treated = "[model]\nelements = 8\nspacing = \"uniform\"\n[sections]\naugment = \"snel-1993\"\n";
        Put("fell/polars/clean/root.csv", Table);
        Put("fell/polars/clean/set.toml", "[thickness_ratio]\nroot = 0.4\ntip = 0.2\n");
        Put("fell/blades/fell.csv", "radius_m,chord_m,twist_deg,thickness_ratio\n1,1,10,0.4\n5.5,0.75,5,0.2\n10,0.5,0,0.2\n");
        Put("fell/cases/plain.toml", Case(Treated));
        var (code, _, error) = Run("fell", "--out", "pages");
        Assert.Equal((0, ""), (code, error));
        // Four elements lie between the two tables; none is augmented beyond 0.8 of the radius.
        Assert.Equal(["0.16", "0.38", "0.49"], RadiiOn("pages/clean/root~plain.svg"));
        Assert.Equal(["0.16", "0.49", "0.72"], RadiiOn("pages/clean/tip~plain.svg"));
    }

    private string[] RadiiOn(string page) => [.. Read(page).Split(">augmented, ").Skip(1).Select(label => label.Split("r/R ")[1][..4])];

    [Fact]
    public void Sets_of_one_folder_name_have_folders_of_different_names()
    {
        foreach (var set in (string[])["a/clean", "b/clean"])
        {
            Put($"fell/polars/{set}/tip.csv", Table);
            Put($"fell/cases/{set[0]}.toml", Case("").Replace("polars/clean", "polars/" + set, StringComparison.Ordinal));
        }
        File.Delete(At("fell/cases/plain.toml"));
        var (code, text, error) = Run("fell", "--out", "pages");
        Assert.Equal((0, ""), (code, error));
        Assert.Equal($"{At("pages/a~clean/tip.svg")}\n{At("pages/b~clean/tip.svg")}\n", text);
        Assert.Contains(">Section tip, set b/clean<", Read("pages/b~clean/tip.svg"), StringComparison.Ordinal);
    }

    [Fact]
    public void Tables_in_the_folder_of_the_study_go_into_one_that_no_other_set_has()
    {
        foreach (var set in (string[])["", "fell/"])
        {
            Put($"fell/{set}tip.csv", Table);
            Put($"fell/cases/in-{set.Length}.toml", Case("").Replace("../polars/clean", "../" + set, StringComparison.Ordinal));
        }
        Assert.Equal($"{At("pages/fell/tip.svg")}\n", Run("fell/cases/in-0.toml", "--out", "pages").Out);
        Assert.Equal(
            $"{At("pages/fell/tip.svg")}\n{At("pages/polars~clean/tip.svg")}\n{At("pages/~/tip.svg")}\n", Run("fell", "--out", "pages").Out);
    }

    [Fact]
    public void A_table_that_cannot_be_read_again_is_told_and_has_no_page()
    {
        Put("fell/cases/rotating.toml", Case("[sections]\nextend = \"viterna-1982\"\n"));
        var (code, text, error) = Run(new Disk(), _solve, ReadThenSpoil, "fell", "--out", "pages");
        Assert.Equal((1, $"{At("pages/clean/tip.svg")}\n"), (code, text));
        Assert.Equal(
            "polars/clean/tip.csv:2:5: cd is -1; drag coefficients must be >= 0\n"
            + "1 error in tables that changed just now; their pages are not drawn\n", error);
        Assert.False(File.Exists(At("pages/clean/tip~rotating.svg")));

        Study ReadThenSpoil(string path)
        {
            var study = StudyReader.Read(path);
            Put("fell/polars/clean/tip.csv", "alpha_deg,cl,cd\n0,0,-1\n1,0,1\n2,0,1\n");
            return study;
        }
    }

    [Fact]
    public void No_case_is_solved_for_sections_that_were_not_asked_for()
    {
        Put("fell/polars/clean/root.csv", Table);
        Put("fell/blades/other.csv", "radius_m,chord_m,twist_deg,section\n1,1,10,root\n10,0.5,0,root\n");
        Put("fell/cases/rotating.toml", Case("[sections]\nextend = \"viterna-1982\"\naugment = \"snel-1993\"\n")
            .Replace("fell.csv", "other.csv", StringComparison.Ordinal));
        var solved = 0;
        SolveCase solve = (rotor, cancellation) =>
        {
            solved++;
            return CaseSolver.Solve(rotor, cancellation);
        };
        Assert.Equal($"{At("pages/clean/tip.svg")}\n", Run(new Disk(), solve, StudyReader.Read, "fell", "--out", "pages", "--only", "tip").Out);
        Assert.Equal(0, solved);
        Assert.Equal(
            $"{At("pages/clean/root~rotating.svg")}\n", Run(new Disk(), solve, StudyReader.Read, "fell", "--out", "pages", "--only", "root").Out);
        Assert.Equal(1, solved);
        Assert.Equal("no section matches 'x*'; there are root, tip\n", Run("fell", "--only", "x*").Error);
    }

    [Fact]
    public void Pictures_are_told_by_the_path_that_was_given()
    {
        var relative = Path.GetRelativePath(Directory.GetCurrentDirectory(), At("results"));
        Assert.Equal(
            $"{Path.Join(relative, "fell/pictures/clean/tip.svg")}\n",
            RunAsGiven(new Disk(), _solve, StudyReader.Read, At("fell"), "--results", relative).Out);
        Assert.True(File.Exists(At("results/fell/pictures/clean/tip.svg")));
        var set = Path.GetRelativePath(Directory.GetCurrentDirectory(), At("fell/polars/clean"));
        var pages = Path.GetRelativePath(Directory.GetCurrentDirectory(), At("pages"));
        Assert.Equal(
            $"{Path.Join(pages, "clean/tip.svg")}\n", RunAsGiven(new Disk(), _solve, StudyReader.Read, set, "--out", pages, "--only", "tip").Out);
        Assert.Contains($">{Path.Join(set, "tip.csv")}<", Read("pages/clean/tip.svg"), StringComparison.Ordinal);
    }

    [Fact]
    public void Of_a_set_every_table_is_drawn_and_of_a_table_that_one()
    {
        Assert.Equal($"{At("pages/clean/tip.svg")}\n{At("pages/clean/unused.svg")}\n", Run("fell/polars/clean", "--out", "pages").Out);
        Assert.Equal($"{At("pages/clean/unused.svg")}\n", Run("fell/polars/clean", "--only", "un*", "--out", "pages").Out);
        Assert.Equal($"{At("one/clean/tip.png")}\n", Run("fell/polars/clean/tip.csv", "--out", "one", "--format", "png").Out);
    }

    [Fact]
    public void Drawn_again_a_picture_of_ours_gives_way_and_no_other_file_does()
    {
        Run("fell", "--out", "pages");
        Put("fell/polars/clean/tip.csv", Table.Replace("1.2,", "1.3,", StringComparison.Ordinal));
        var before = Read("pages/clean/tip.svg");
        Assert.Equal(0, Run("fell", "--out", "pages").Code);
        Assert.NotEqual(before, Read("pages/clean/tip.svg"));

        Put("pages/clean/tip.svg", "<svg>mine</svg>");
        var (code, text, error) = Run("fell", "--out", "pages");
        Assert.Equal((1, ""), (code, text));
        Assert.Equal(
            $"not drawn: {At("pages/clean/tip.svg")} is there and is no picture of ours; give another folder with --out, "
            + "or put the picture in its place with --replace\n", error);
        Assert.Equal("<svg>mine</svg>", Read("pages/clean/tip.svg"));
        Assert.Equal(0, Run("fell", "--out", "pages", "--replace").Code);
        Assert.Contains("Section tip", Read("pages/clean/tip.svg"), StringComparison.Ordinal);

        File.Delete(At("pages/clean/tip.svg"));
        Directory.CreateDirectory(At("pages/clean/tip.svg"));
        Assert.Equal(
            $"not drawn: {At("pages/clean/tip.svg")} is a folder; give another with --out\n", Run("fell", "--out", "pages", "--replace").Error);
    }

    [Fact]
    public void The_tables_before_an_update_are_a_table_a_set_or_an_earlier_study()
    {
        Put("old/cases/plain.toml", "");
        Put("old/polars/clean/tip.csv", Table);
        foreach (var (source, before) in new[]
            {
                ("fell", "old"), ("fell", "old/polars/clean"), ("fell/polars/clean/tip.csv", "old/polars/clean/tip.csv"),
                ("fell/polars/clean", "old/polars/clean"),
            })
        {
            var (code, _, error) = Run(source, "--out", "pages", "--before", At(before));
            Assert.Equal((0, ""), (code, error));
            var earlier = At(
                before.EndsWith(".csv", StringComparison.Ordinal) ? before : before == "old" ? "old/polars/clean/tip.csv" : before + "/tip.csv");
            Assert.Contains($"before: {earlier}", Title(Read("pages/clean/tip.svg")), StringComparison.Ordinal);
            File.Delete(At("pages/clean/tip.svg"));
        }
        Assert.StartsWith(
            $"clean/unused: no earlier table in {At("old/polars/clean")}\n",
            Run("fell/polars/clean", "--out", "pages", "--before", At("old/polars/clean")).Out, StringComparison.Ordinal);
    }

    [Fact]
    public void An_earlier_table_with_an_error_is_told_and_nothing_is_drawn()
    {
        Put("old/tip.csv", "alpha_deg,cl,cd\n0,0,-1\n1,0,1\n2,0,1\n");
        var (code, text, error) = Run("fell", "--out", "pages", "--before", At("old/tip.csv"));
        Assert.Equal((2, ""), (code, text));
        Assert.Equal($"{At("old/tip.csv")}:2:5: cd is -1; drag coefficients must be >= 0\n1 error in the earlier tables; nothing drawn\n", error);
        Assert.False(Directory.Exists(At("pages")));
    }

    [Fact]
    public void A_table_with_an_error_is_told_and_nothing_is_drawn()
    {
        Put("bad.csv", "alpha_deg,cl,cd\n0,0,-1\n1,0,1\n2,0,1\n");
        var (code, text, error) = Run("bad.csv", "--out", "pages");
        Assert.Equal((2, "", $"{At("bad.csv")}:2:5: cd is -1; drag coefficients must be >= 0\n1 error; nothing drawn\n"), (code, text, error));
    }

    [Fact]
    public void Of_a_set_the_tables_without_errors_are_drawn_and_the_others_told()
    {
        Put("fell/polars/clean/bad.csv", "alpha_deg,cl,cd\n0,0,-1\n1,0,1\n2,0,1\n");
        var error = $"{At("fell/polars/clean/bad.csv")}:2:5: cd is -1; drag coefficients must be >= 0\n";
        Assert.Equal(
            (1, $"{At("pages/clean/tip.svg")}\n{At("pages/clean/unused.svg")}\n", error + "1 error; only tables without errors are drawn\n"),
            Run("fell/polars/clean", "--out", "pages"));
        Assert.Equal((0, $"{At("pages/clean/tip.svg")}\n", ""), Run("fell/polars/clean", "--out", "pages", "--only", "tip"));
        Assert.Equal((2, "", error + "1 error; nothing drawn\n"), Run("fell/polars/clean", "--out", "pages", "--only", "bad"));
        Assert.Equal((2, "", "no section matches 'x'; there are bad, tip, unused\n"), Run("fell/polars/clean", "--only", "x"));
    }

    [Fact]
    public void A_table_before_an_update_stands_for_the_section_of_its_name_alone()
    {
        Put("old/tip.csv", Table);
        Put("old/other.csv", Table);
        Assert.Equal(
            (2, "", $"--before '{At("old/tip.csv")}' is the table of section 'tip' alone, and drawn are tip, unused; give the folder of a set or an "
                + "earlier copy of the study, or draw --only tip\n"),
            Run("fell/polars/clean", "--out", "pages", "--before", At("old/tip.csv")));
        Assert.Equal(
            (2, "", $"--before '{At("old/other.csv")}' is the table of section 'other' alone, and drawn are tip; give the folder of a set or an "
                + "earlier copy of the study, or draw one table by itself\n"),
            Run("fell", "--out", "pages", "--before", At("old/other.csv")));
        Assert.False(Directory.Exists(At("pages")));
        Assert.Equal(0, Run("fell/polars/clean", "--out", "pages", "--only", "tip", "--before", At("old/tip.csv")).Code);
        Assert.Equal(0, Run("fell", "--out", "pages", "--before", At("old/tip.csv")).Code);
        // Of two tables it is plain which are meant, whatever they are called.
        Assert.Equal(0, Run("fell/polars/clean/tip.csv", "--out", "pages", "--before", At("old/other.csv")).Code);
    }

    [Fact]
    public void A_file_where_a_folder_of_pictures_would_stand_is_told()
    {
        Put("file", "");
        Assert.Equal((2, "", $"'{At("file")}' is a file; give a folder with --out\n"), Run("fell", "--out", "file"));
        Assert.Equal((2, "", $"'{At("file")}' is a file; give a folder with --out\n"), Run("fell", "--out", "file/pages"));
    }

    [Fact]
    public void What_can_be_drawn_of_a_study_with_errors_is_drawn_and_the_errors_are_told()
    {
        Put("fell/cases/wrong.toml", Case("") + "colour = 3\n");
        var (code, text, error) = Run("fell", "--out", "pages");
        Assert.Equal((1, $"{At("pages/clean/tip.svg")}\n"), (code, text));
        Assert.StartsWith("cases/wrong.toml:", error, StringComparison.Ordinal);
    }

    [Theory]
    [InlineData(
        "--before 'nowhere' is not there; give a table, the folder of a set, or an earlier copy of the study\n", "fell", "--before", "nowhere")]
    [InlineData("--out is empty; give the folder that pictures go to\n", "fell", "--out", "")]
    [InlineData("no section matches 'x*'; there are tip\n", "fell", "--only", "x*")]
    [InlineData(
        "--format is 'jpeg'; give svg, png or both\n\n'bladeloads polar draw --help' shows what can be asked, with examples\n", "fell", "--format",
        "jpeg")]
    public void Wrong_use_is_told(string expected, params string[] arguments)
    {
        var (code, _, error) = Run(arguments);
        Assert.Equal((2, expected), (code, error));
    }

    [Fact]
    public void A_study_is_no_earlier_table_of_a_set()
    {
        var (code, _, error) = Run("fell/polars/clean", "--before", At("fell"));
        Assert.Equal((2, $"--before '{At("fell")}' is a study, and what is drawn is none; give a table or the folder of a set\n"), (code, error));
    }

    [Fact]
    public void Names_of_files_are_text_and_make_safe_names_of_pictures()
    {
        if (OperatingSystem.IsWindows())
            return;
        Put("set/a\"<script>\u0007.csv", Table);
        var (code, text, error) = Run("set", "--out", "pages");
        Assert.Equal((0, ""), (code, error));
        Assert.Equal($"{At("pages/set/a\"<script>_u0007.svg")}\n", text);
        Assert.Contains("Section a\"&lt;script&gt;\\u0007, set set", Read("pages/set/a\"<script>_u0007.svg"), StringComparison.Ordinal);
    }

    [Fact]
    public void A_full_disk_is_told_with_its_exit_code_and_leaves_no_half_picture()
    {
        var (code, text, error) = Run(new FailingDisk(2), "fell", "--out", "pages");
        Assert.Equal((3, "", $"cannot write {At("pages/clean/tip.svg")}: no room left on the disk\n"), (code, text, error));
        Assert.Empty(Directory.EnumerateFiles(At("pages/clean")));
    }

    private static string Case(string more) => $$"""
        blade = "../blades/fell.csv"
        polars = "../polars/clean"
        [rotor]
        blade_count = 3
        [wind]
        speeds_m_s = [6, 8, 10]
        [control]
        strategy = "fixed-speed"
        rotor_speed_rpm = 50
        pitch_deg = 0
        {{more}}
        """;

    private static string Title(string svg) => System.Net.WebUtility.HtmlDecode(svg);

    private string At(string path) => Path.Join(_folder.Path, path);

    private string Read(string path) => File.ReadAllText(At(path));

    private void Put(string path, string text)
    {
        Directory.CreateDirectory(Path.GetDirectoryName(At(path))!);
        File.WriteAllText(At(path), text);
    }

    private (int Code, string Out, string Error) Run(params string[] arguments) => Run(new Disk(), arguments);

    // Paths that a user would give from within the folder; the process of the tests stays where it is.
    private (int Code, string Out, string Error) Run(IDisk disk, params string[] arguments) => Run(disk, _solve, StudyReader.Read, arguments);

    private (int Code, string Out, string Error) Run(IDisk disk, SolveCase solve, Func<string, Study> read, params string[] arguments)
        => RunAsGiven(disk, solve, read, [
            .. arguments.Select((a, i) => i == 0 || (arguments[i - 1] == "--out" && a.Length > 0) ? At(a) : a),
            .. Directory.Exists(At(arguments[0] + "/cases")) ? (string[])["--results", At("results")] : []]);

    private static (int Code, string Out, string Error) RunAsGiven(IDisk disk, SolveCase solve, Func<string, Study> read, params string[] arguments)
    {
        using var output = new StringWriter { NewLine = "\n" };
        using var error = new StringWriter { NewLine = "\n" };
        var surroundings = new Surroundings(output, error, false, false, read, solve, disk, TimeProvider.System, _ => { });
        var code = CommandLine.Run(["polar", "draw", .. arguments], surroundings);
        return (code, output.ToString(), error.ToString());
    }
}
