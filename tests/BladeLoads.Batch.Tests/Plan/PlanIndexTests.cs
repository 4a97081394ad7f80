using System.Collections.Immutable;
using BladeLoads.Batch.Plan;
using BladeLoads.Batch.Plan.Index;
using BladeLoads.Batch.Tests.Building;
using BladeLoads.Results.Publishing;
using BladeLoads.Studies;
using BladeLoads.Studies.Files;

namespace BladeLoads.Batch.Tests.Plan;

public sealed class PlanIndexTests : IDisposable
{
    private readonly TemporaryFolder _folder = new();
    private readonly CountedFiles _files = new();

    private string Folder => Path.Join(_folder.Path, "fell");

    private ResultsFolder Results => new(Path.Join(_folder.Path, "results"), "fell");

    public PlanIndexTests()
    {
        foreach (var sub in new[] { "cases", "blades", "polars/clean" })
            Directory.CreateDirectory(Path.Join(Folder, sub));
        Write("blades/fell.csv", "radius_m,chord_m,twist_deg,section\n1,0.8,12,root\n5,0.4,1,root\n");
        Write("polars/clean/root.csv", "alpha_deg,cl,cd\n-10,-0.8,0.02\n0,0.2,0.01\n10,1.1,0.015\n");
        Write("study.toml", """
            blade = "blades/fell.csv"
            polars = "polars/clean"
            [rotor]
            blade_count = 3
            [wind]
            speeds_m_s = [8]
            [control]
            strategy = "fixed-speed"
            rotor_speed_rpm = 70
            pitch_deg = 2
            """);
        Write("cases/a.toml", "title = \"A\"\n");
        Write("cases/b.toml", "title = \"B\"\n[air]\ndensity_kg_m3 = 1.1\n");
    }

    public void Dispose() => _folder.Dispose();

    [Fact]
    public void Where_nothing_has_changed_neither_an_input_nor_a_receipt_is_read()
    {
        Solve();
        Assert.Equal(["a: current", "b: current"], Quick(Later)!);
        Assert.Empty(_files.Read);
    }

    [Fact]
    public void Within_two_seconds_of_a_change_inputs_are_read_and_the_next_look_need_not()
    {
        Solve(Now);
        Assert.NotNull(Quick(Now));
        Assert.Contains("a.toml", _files.Read);
        _files.Read.Clear();
        Assert.NotNull(Quick(Later));
        Assert.Contains("a.toml", _files.Read);
        _files.Read.Clear();
        Assert.NotNull(Quick(Later));
        Assert.Empty(_files.Read);
    }

    [Theory]
    [InlineData("cases/a.toml", "title = \"A\" \n")]
    [InlineData("polars/clean/root.csv", "alpha_deg,cl,cd\n-10,-0.8,0.02\n0,0.2,0.01\n10,1.1,0.016\n")]
    [InlineData("blades/fell.csv", "")]
    [InlineData("cases/c.toml", "title = \"C\"\n")]
    [InlineData("polars/clean/unnamed.csv", "rubbish")]
    public void Other_bytes_or_another_name_in_a_folder_that_was_listed_mean_reading_the_study(string file, string text)
    {
        Solve();
        Write(file, text);
        Assert.Null(Quick(Later));
    }

    [Fact]
    public void A_file_written_again_with_the_same_bytes_is_read_and_found_the_same()
    {
        Solve();
        Write("cases/a.toml", "title = \"A\"\n");
        File.SetLastWriteTimeUtc(Path.Join(Folder, "blades/fell.csv"), new DateTime(2099, 1, 1, 0, 0, 0, DateTimeKind.Utc));
        Assert.NotNull(Quick(Later));
        Assert.Equal(["a.toml", "fell.csv"], _files.Read.Order(StringComparer.Ordinal));
    }

    [Fact]
    public void An_edit_of_the_same_size_with_its_time_put_back_is_seen()
    {
        Solve();
        var path = Path.Join(Folder, "cases/b.toml");
        var time = File.GetLastWriteTimeUtc(path);
        Write("cases/b.toml", "title = \"B\"\n[air]\ndensity_kg_m3 = 1.2\n");
        File.SetLastWriteTimeUtc(path, time);
        Assert.Null(Quick(Later));
    }

    [Theory]
    [InlineData("receipt.json")]
    [InlineData("power-curve.csv")]
    [InlineData("case.log")]
    public void A_file_of_a_result_that_is_gone_or_cut_is_seen(string name)
    {
        Solve();
        var path = Path.Join(Results.Case("a"), name);
        using (var file = File.OpenWrite(path))
            file.SetLength(file.Length - 1);
        Assert.True(name == "receipt.json" || Quick(Later) is null);
        File.Delete(path);
        Assert.Null(Quick(Later));
    }

    [Fact]
    public void A_receipt_of_other_values_is_seen()
    {
        Solve();
        Directory.Delete(Results.Case("a"), recursive: true);
        Directory.Move(Results.Case("b"), Results.Case("a"));
        Assert.Null(Quick(Later));
    }

    [Fact]
    public void Doubts_are_told_from_the_index_as_they_were_when_the_study_was_read()
    {
        Write("polars/clean/root.csv", "alpha_deg,cl,cd\n-180,-0.8,0.02\n0,0.2,0.01\n180,1.1,0.015\n");
        Solve();
        var doubts = new StudyLook(Results, "0.0.0", 1, Later).AllCurrent(Folder, _files)!.Doubts;
        Assert.Contains(doubts, d => d.Text.StartsWith("cl is 1.1 at 180 deg", StringComparison.Ordinal));
        Assert.Equal<InputFinding>(StudyReader.Read(Folder).Doubts, doubts);
    }

    [Fact]
    public void A_study_with_an_error_is_read_every_time()
    {
        Write("cases/b.toml", "title = 7\n");
        Solve();
        Assert.Null(Quick(Later));
        Write("cases/b.toml", "");
        Solve();
        Assert.Null(Quick(Later));   // 'is empty'
    }

    [Fact]
    public void A_study_with_a_link_in_it_is_read_every_time()
    {
        File.Move(Path.Join(Folder, "cases/b.toml"), Path.Join(Folder, "b.toml"));
        File.CreateSymbolicLink(Path.Join(Folder, "cases/b.toml"), "../b.toml");
        Solve();
        Assert.Null(Quick(Later));
    }

    [Fact]
    public void An_index_of_another_version_or_another_study_is_not_believed()
    {
        Solve();
        Assert.Null(new StudyLook(Results, "0.0.1", 1, Later).AllCurrent(Folder, _files));
        Assert.Null(new StudyLook(Results, "0.0.0", 2, Later).AllCurrent(Folder, _files));
        Assert.Null(new StudyLook(Results, "0.0.0", 1, Later).AllCurrent(Folder + "2", _files));
    }

    [Fact]
    public void An_index_cut_at_any_byte_or_with_any_byte_changed_is_taken_for_none()
    {
        Solve();
        var whole = File.ReadAllBytes(Results.Index);
        Assert.NotNull(IndexFile.FromBytes(whole));
        for (var length = 0; length < whole.Length; length++)
            Assert.Null(IndexFile.FromBytes(whole[..length]));
        for (var at = 0; at < whole.Length; at++)
        {
            var flipped = (byte[])whole.Clone();
            flipped[at] ^= (byte)(1 << at % 8);
            Assert.Null(IndexFile.FromBytes(flipped));
        }
        File.WriteAllBytes(Results.Index, whole[..100]);
        Assert.Null(Quick(Later));
        Assert.Equal(["current", "current"], Plan().Cases.Select(c => c.State.Word));
        Assert.NotNull(Quick(Later));   // the plan has written it anew
    }

    [Fact]
    public void A_foreign_file_that_adds_up_is_taken_for_none()
    {
        foreach (var text in new[] { "", "\0", "bladeloads plan index 2", "\u0017bladeloads plan index 1", "\u0017bladeloads plan index 1\u00ff\u00ff\u00ff\u00ff\u00ff" })
        {
            var bytes = System.Text.Encoding.Latin1.GetBytes(text);
            Assert.Null(IndexFile.FromBytes([.. bytes, .. IndexFile.ChecksumOf(bytes)]));
        }
    }

    [Fact]
    public void An_index_that_cannot_be_written_costs_nothing_but_time()
    {
        Solve();
        File.Delete(Results.Index);
        Directory.CreateDirectory(Results.Index);
        Assert.Equal(["current", "current"], Plan().Cases.Select(c => c.State.Word));
        Assert.Null(Quick(Later));
        Assert.DoesNotContain(Directory.EnumerateFileSystemEntries(Results.Study), e => e.EndsWith(".new", StringComparison.Ordinal));
    }

    [Fact]
    public void A_plan_makes_no_results_folder()
    {
        Plan();
        Assert.False(Directory.Exists(Results.Study));
    }

    // Does not go on: however long a test takes, what it wrote was written just now.
    private static TimeProvider Now { get; } = new StoppedClock(TimeProvider.System.GetUtcNow());

    // Long after everything that a test has written.
    private static TimeProvider Later { get; } = new InAnHour();

    private void Write(string file, string text) => File.WriteAllText(Path.Join(Folder, file), text);

    private void Solve(TimeProvider? time = null)
    {
        var study = StudyReader.Read(Folder, time ?? Later);
        Runs.Solve(Results, study.Cases);
        new StudyLook(Results, "0.0.0", 1, time ?? Later).Plan(study);
    }

    private StudyPlan Plan() => new StudyLook(Results, "0.0.0", 1, Later).Plan(StudyReader.Read(Folder, Later));

    private ImmutableArray<string>? Quick(TimeProvider time) => new StudyLook(Results, "0.0.0", 1, time).AllCurrent(Folder, _files) is { } all
        ? [.. all.Cases.Select(c => $"{c.Name}: {c.State.Word}")] : null;

    private sealed class StoppedClock(DateTimeOffset now) : TimeProvider
    {
        public override DateTimeOffset GetUtcNow() => now;
    }

    private sealed class InAnHour : TimeProvider
    {
        public override DateTimeOffset GetUtcNow() => base.GetUtcNow().AddHours(1);
    }

    private sealed class CountedFiles : IStudyFiles
    {
        private readonly DiskFiles _files = new();

        public List<string> Read { get; } = [];

        public EntryKind Kind(string path) => _files.Kind(path);

        public string RealPath(string path) => _files.RealPath(path);

        public ImmutableArray<string> Names(string folder) => _files.Names(folder);

        byte[] IStudyFiles.Read(string path, int limit)
        {
            Read.Add(Path.GetFileName(path));
            return _files.Read(path, limit);
        }
    }
}
