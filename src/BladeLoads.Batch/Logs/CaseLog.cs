using System.Collections.Immutable;
using System.Globalization;
using System.Text;
using Serilog;
using Serilog.Core;
using Serilog.Events;
using Serilog.Formatting.Display;

namespace BladeLoads.Batch.Logs;

/// <summary>The log of one case: its events go into the run's log and are kept here, to be published with its result.</summary>
public sealed class CaseLog : IDisposable
{
    public const string FileName = "case.log";

    private readonly Logger _logger;
    private readonly LinesInMemory _lines = new();

    /// <param name="caseName">Stands in every event as the property <c>Case</c>, and in every line.</param>
    public CaseLog(ILogger runLog, string caseName)
        => _logger = new LoggerConfiguration().Enrich.WithProperty("Case", caseName).WriteTo.Sink(_lines).WriteTo.Logger(runLog).CreateLogger();

    public ILogger Logger => _logger;

    /// <summary>What was said so far, a line an event.</summary>
    public ImmutableArray<string> Lines => _lines.All;

    public byte[] ToBytes() => Encoding.UTF8.GetBytes(string.Concat(Lines.Select(line => line + "\n")));

    public void Dispose() => _logger.Dispose();

    private sealed class LinesInMemory : ILogEventSink
    {
        private static readonly PrintableFormatter Formatter = new(new MessageTemplateTextFormatter(
            "{Timestamp:yyyy-MM-dd HH:mm:ss.fff zzz} {Level:u3} {Message:lj}", CultureInfo.InvariantCulture));

        private readonly ImmutableArray<string>.Builder _lines = ImmutableArray.CreateBuilder<string>();

        public ImmutableArray<string> All => _lines.ToImmutable();

        public void Emit(LogEvent logEvent)
        {
            using var line = new StringWriter(CultureInfo.InvariantCulture);
            Formatter.Format(logEvent, line);
            _lines.Add(line.ToString().TrimEnd('\n'));
        }
    }
}
