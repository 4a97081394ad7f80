using System.Runtime.InteropServices;

namespace BladeLoads.Commands;

/// <summary>
/// Ctrl-C and SIGTERM: the first asks the run to stop, a second one exits at once. Results stay whole either way.
/// </summary>
internal sealed class StopSignals : IDisposable
{
    private readonly CancellationTokenSource _stopping = new();
    private readonly PosixSignalRegistration[] _registrations;
    private readonly Surroundings _surroundings;
    private int _exitCode;

    public StopSignals(Surroundings surroundings)
    {
        _surroundings = surroundings;
        _registrations =
        [
            PosixSignalRegistration.Create(PosixSignal.SIGINT, context => Stop(context, ExitCode.Interrupted)),
            PosixSignalRegistration.Create(PosixSignal.SIGTERM, context => Stop(context, ExitCode.Terminated)),
        ];
    }

    public CancellationToken Stopping => _stopping.Token;

    /// <summary>The exit code of an interrupted run; null while nobody asked to stop.</summary>
    public int? Code => _exitCode == 0 ? null : _exitCode;

    public void Dispose()
    {
        foreach (var registration in _registrations)
            registration.Dispose();
        _stopping.Dispose();
    }

    private void Stop(PosixSignalContext context, int exitCode)
    {
        context.Cancel = true;
        if (Interlocked.CompareExchange(ref _exitCode, exitCode, 0) != 0)
        {
            if (_surroundings.ErrorIsTerminal)
                _surroundings.Error.Write("\e[?25h");   // the progress bar hides the cursor
            Environment.Exit(exitCode);
        }
        _stopping.Cancel();
    }
}
