using System.Diagnostics;
using System.Text;

namespace BladeLoads.EndToEnd.Program;

/// <summary>What a run of the program as a process came to.</summary>
internal sealed record Finished(int ExitCode, string Out, string Error)
{
    public string All => Out + Error;
}

/// <summary>The built program, started as a process of its own.</summary>
internal sealed class Started : IDisposable
{
    private static readonly TimeSpan Patience = TimeSpan.FromMinutes(2);

    private readonly Process _process;
    private readonly Task<string> _out;
    private readonly Task<string> _error;

    private Started(ProcessStartInfo start)
    {
        _process = Process.Start(start)!;
        _out = _process.StandardOutput.ReadToEndAsync();
        _error = _process.StandardError.ReadToEndAsync();
    }

    public static Started With(string workingFolder, IReadOnlyDictionary<string, string> environment, params string[] arguments)
        => With(workingFolder, environment, "dotnet", [Program, .. arguments]);

    /// <summary>The program with its arguments and redirections as a shell reads them.</summary>
    public static Finished RunInShell(string workingFolder, string line)
    {
        using var started = With(workingFolder, new Dictionary<string, string>(), "sh", ["-c", $"exec dotnet '{Program}' {line}"]);
        return started.Wait();
    }

    private static string Program { get; } = Path.Join(AppContext.BaseDirectory, "bladeloads.dll");

    private static Started With(
        string workingFolder, IReadOnlyDictionary<string, string> environment, string command, IReadOnlyList<string> arguments)
    {
        var start = new ProcessStartInfo(command, arguments)
        {
            WorkingDirectory = workingFolder,
            RedirectStandardOutput = true,
            RedirectStandardError = true,
            StandardOutputEncoding = Encoding.UTF8,
            StandardErrorEncoding = Encoding.UTF8,
        };
        foreach (var (name, value) in environment)
            start.Environment[name] = value;
        return new Started(start);
    }

    public static Finished Run(string workingFolder, params string[] arguments)
        => Run(workingFolder, new Dictionary<string, string>(), arguments);

    public static Finished Run(string workingFolder, IReadOnlyDictionary<string, string> environment, params string[] arguments)
    {
        using var started = With(workingFolder, environment, arguments);
        return started.Wait();
    }

    public Finished Wait()
    {
        Assert.True(_process.WaitForExit(Patience), "the program does not end");
        return new Finished(_process.ExitCode, _out.GetAwaiter().GetResult(), _error.GetAwaiter().GetResult());
    }

    /// <summary>The number of the process.</summary>
    public int Id => _process.Id;

    /// <summary>Whether it ended by itself within the time.</summary>
    public bool EndsWithin(TimeSpan time) => _process.WaitForExit(time);

    /// <param name="signal">By name: TERM, INT, KILL, STOP, CONT.</param>
    public void Signal(string signal)
    {
        using var kill = Process.Start("kill", [$"-{signal}", _process.Id.ToString(System.Globalization.CultureInfo.InvariantCulture)]);
        kill.WaitForExit();
    }

    /// <summary>Waits until something is so; fails where the program ends first.</summary>
    public void Until(Func<bool> isSo)
    {
        while (!isSo())
            if (_process.WaitForExit(TimeSpan.FromMilliseconds(5)))
                Assert.Fail($"the program ended too early: {Wait()}");
    }

    public void Dispose()
    {
        if (!_process.HasExited)
            _process.Kill();
        _process.Dispose();
    }
}
