using System.Diagnostics;
using BladeLoads.Studies.Files;

namespace BladeLoads.Studies.Tests.Files;

/// <summary>The real file system: what can only be tried there.</summary>
public sealed class DiskFilesTests : IDisposable
{
    private readonly string _folder = Directory.CreateTempSubdirectory("bladeloads-").FullName;
    private readonly DiskFiles _files = new();

    public void Dispose() => Directory.Delete(_folder, recursive: true);

    [Fact]
    public void A_study_on_disk_is_read_as_one_in_memory_is()
    {
        var study = StudyReader.Read(WriteStudy());

        Told.Exactly([], study.Errors);
        Assert.Equal("fell", study.Name);
        var (onDisk, inMemory) = (Assert.Single(study.Cases), new FellStudy().OnlyCase());
        Assert.Equal(inMemory.Fingerprint, onDisk.Fingerprint);
        Assert.Equal(inMemory.Inputs.ToArray(), onDisk.Inputs.ToArray());
    }

    [Fact]
    public void One_case_file_is_read_with_the_study_it_belongs_to()
    {
        var study = StudyReader.Read(Path.Combine(WriteStudy(), "cases", "clean.toml"));

        Told.Exactly([], study.Errors);
        Assert.Equal(("fell", Path.Combine(_folder, "fell")), (study.Name, study.Folder));
    }

    [Fact]
    public void Links_are_followed_to_the_end_and_never_out_of_the_study()
    {
        if (OperatingSystem.IsWindows())
            return; // links need rights there that a test does not have
        var study = WriteStudy();
        File.WriteAllText(Path.Combine(_folder, "secret.csv"), FellStudy.Blade);
        Directory.CreateSymbolicLink(Path.Combine(study, "up"), "..");
        File.Delete(Path.Combine(study, "blades", "fell.csv"));
        File.CreateSymbolicLink(Path.Combine(study, "blades", "fell.csv"), "../up/secret.csv");

        Assert.Equal(_files.RealPath(Path.Combine(_folder, "secret.csv")), _files.RealPath(Path.Combine(study, "blades", "fell.csv")));
        Told.Exactly(
            ["cases/clean.toml:2:10: '../blades/fell.csv' is a link that leads out of the study folder; put the file itself inside the study folder"],
            StudyReader.Read(study).Errors);
    }

    [Fact]
    public void A_circle_of_links_ends()
    {
        if (OperatingSystem.IsWindows())
            return; // as above
        File.CreateSymbolicLink(Path.Combine(_folder, "a"), "b");
        File.CreateSymbolicLink(Path.Combine(_folder, "b"), "a");

        Assert.Equal("links lead round in a circle", Assert.Throws<IOException>(() => _files.RealPath(Path.Combine(_folder, "a"))).Message);
        Assert.Equal(EntryKind.Missing, _files.Kind(Path.Combine(_folder, "a", "x")));
    }

    [Fact]
    public void A_pipe_is_refused_and_not_waited_for()
    {
        if (!OperatingSystem.IsLinux())
            return; // pipes are not told apart elsewhere
        var study = WriteStudy();
        var tip = Path.Combine(study, "polars", "clean", "tip.csv");
        File.Delete(tip);
        using (var make = Process.Start("mkfifo", [tip]))
            make.WaitForExit();

        Assert.Equal(EntryKind.Other, _files.Kind(tip));
        Told.Exactly(["polars/clean/tip.csv: is not a regular file; put a file in its place"], StudyReader.Read(study).Errors);
    }

    [Fact]
    public void Kinds_are_told_apart()
    {
        var file = Path.Combine(_folder, "file");
        File.WriteAllText(file, "text");

        Assert.Equal(EntryKind.File, _files.Kind(file));
        Assert.Equal(EntryKind.Folder, _files.Kind(_folder));
        Assert.Equal(EntryKind.Missing, _files.Kind(file + "-none"));
        if (OperatingSystem.IsLinux())
            Assert.Equal(EntryKind.Other, _files.Kind("/dev/zero"));
    }

    [Fact]
    public void No_more_is_read_than_asked_for()
    {
        var file = Path.Combine(_folder, "file");
        File.WriteAllText(file, "0123456789");

        Assert.Equal("0123"u8.ToArray(), _files.Read(file, 4));
        Assert.Equal("0123456789"u8.ToArray(), _files.Read(file, 100));
    }

    private string WriteStudy()
    {
        var study = Path.Combine(_folder, "fell");
        foreach (var (file, text) in new[]
        {
            ("cases/clean.toml", FellStudy.Case), ("blades/fell.csv", FellStudy.Blade), ("polars/clean/root.csv", FellStudy.RootPolar),
            ("polars/clean/tip.csv", FellStudy.TipPolar),
        })
        {
            Directory.CreateDirectory(Path.GetDirectoryName(Path.Combine(study, file))!);
            File.WriteAllText(Path.Combine(study, file), text);
        }
        return study;
    }
}
