using System.Diagnostics;

namespace BladeLoads.EndToEnd.Program;

/// <summary>
/// A test that mounts file systems of its own, for which Linux wants root. Elsewhere it is skipped and says so. <c>.ci/run</c> skips it only
/// on a machine that refuses root to mount anything, and then says so beside its count.
/// </summary>
[AttributeUsage(AttributeTargets.Method)]
public sealed class FactOfRootAttribute : FactAttribute
{
    public FactOfRootAttribute()
    {
        if (Environment.GetEnvironmentVariable("BLADELOADS_MOUNTS") == "refused")
            Skip = "no file system can be mounted here";
        else if (!(OperatingSystem.IsLinux() && Environment.IsPrivilegedProcess) && Environment.GetEnvironmentVariable("CI") != "true")
            Skip = "mounts file systems of its own: run as root on Linux, with e2fsprogs and mount installed";
    }
}

/// <summary>A file system mounted for a test, gone with it.</summary>
internal sealed class Mounted : IDisposable
{
    private Mounted(string folder) => Folder = folder;

    public string Folder { get; }

    /// <summary>In memory, with room for so many bytes.</summary>
    public static Mounted InMemory(string folder, int bytes) => Mount(folder, ["-t", "tmpfs", "-o", $"size={bytes}", "none"]);

    /// <summary>The ext4 file system in a file. Its journal is written when something is flushed, and otherwise seldom.</summary>
    public static Mounted Image(string folder, string image) => Mount(folder, ["-t", "ext4", "-o", "loop,commit=300", image]);

    /// <summary>A new ext4 file system in a file of that size.</summary>
    public static void MakeImage(string image, int megabytes)
    {
        using (var file = File.Create(image))
            file.SetLength((long)megabytes << 20);
        Command("mkfs.ext4", "-q", "-F", image);
    }

    public void Remount(string options) => Command("mount", "-o", "remount," + options, Folder);

    public void Dispose()
    {
        try
        {
            Command("umount", Folder);
        }
        catch (InvalidOperationException)
        {
            Command("umount", "--lazy", Folder);
        }
    }

    public static void Command(string command, params string[] arguments)
    {
        using var process = Process.Start(new ProcessStartInfo(command, arguments) { RedirectStandardError = true })!;
        var error = process.StandardError.ReadToEnd();
        process.WaitForExit();
        if (process.ExitCode != 0)
            throw new InvalidOperationException($"{command} {string.Join(' ', arguments)}: {error}");
    }

    private static Mounted Mount(string folder, string[] what)
    {
        Directory.CreateDirectory(folder);
        Command("mount", [.. what, folder]);
        return new Mounted(folder);
    }
}
