using System.Globalization;
using BladeLoads.Results.Publishing;
using BladeLoads.Results.Wording;
using Serilog;
using Serilog.Core;
using Serilog.Events;
using Serilog.Formatting.Compact;

namespace BladeLoads.Batch.Logs;

/// <summary>
/// The log of a run: every event a line of JSON in a file of its own, warnings and up on the screen besides. A log that cannot be
/// written is reported once and costs no result.
/// </summary>
public sealed class RunLog : IDisposable
{
    private readonly Logger _logger;

    private readonly ReportOnce? _once;

    private RunLog(Logger logger, string? file, ReportOnce? once) => (_logger, File, _once) = (logger, file, once);

    public ILogger Logger => _logger;

    /// <summary>The file it is written to; null where it goes to no file.</summary>
    public string? File { get; }

    /// <summary>A log that writes to the screen alone, for work that leaves no trace.</summary>
    public static RunLog OnScreen(ILogEventSink screen) => new(Configuration(screen).CreateLogger(), null, null);

    /// <param name="folder">Created if need be.</param>
    /// <param name="report">Takes one line for the screen, at most once.</param>
    public static RunLog Open(string folder, ILogEventSink screen, TimeProvider time, Action<string> report)
    {
        var once = new ReportOnce(folder, report);
        try
        {
            Directory.CreateDirectory(folder);
            var name = time.GetLocalNow().ToString("yyyyMMdd-HHmmss-fff", CultureInfo.InvariantCulture);
            var file = OwnPath(folder, name);
            return new RunLog(
                Configuration(screen)
                    .WriteTo.Fallible(
                        to => to.File(new PrintableFormatter(new CompactJsonFormatter()), file, fileSizeLimitBytes: null), once)
                    .CreateLogger(),
                file, once);
        }
        catch (Exception e) when (e is IOException or UnauthorizedAccessException)
        {
            once.Report(e);
            return OnScreen(screen);
        }
    }

    public void Dispose()
    {
        try
        {
            _logger.Dispose();
        }
        catch (Exception e) when (e is IOException or UnauthorizedAccessException)
        {
            _once?.Report(e);   // the last lines of a full disk's log are written when it is closed
        }
    }

    private static LoggerConfiguration Configuration(ILogEventSink screen)
        => new LoggerConfiguration().WriteTo.Sink(screen, LogEventLevel.Warning);

    // Two runs may begin within a millisecond: whoever creates the file has its name.
    private static string OwnPath(string folder, string name)
    {
        for (var i = 1; ; i++)
        {
            var path = Path.Join(folder, i == 1 ? $"{name}.jsonl" : string.Create(CultureInfo.InvariantCulture, $"{name}-{i}.jsonl"));
            try
            {
                System.IO.File.Open(path, FileMode.CreateNew, FileAccess.Write).Dispose();
                return path;
            }
            catch (IOException) when (System.IO.File.Exists(path) && i < 1000)
            {
                // Another run was first.
            }
        }
    }

    private sealed class ReportOnce(string folder, Action<string> report) : ILoggingFailureListener
    {
        private int _reported;

        public void OnLoggingFailed(
            object sender, LoggingFailureKind kind, string message, IReadOnlyCollection<LogEvent>? events, Exception? exception)
            => Report(exception ?? new IOException(message));

        public void Report(Exception trouble)
        {
            if (Interlocked.Exchange(ref _reported, 1) == 0)
                report($"the log in {Printable.Of(folder)} cannot be written: {DiskTrouble.Reason(trouble)}; the results do not depend on it");
        }
    }
}
