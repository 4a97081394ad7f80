using System.Globalization;
using BladeLoads.Results.Wording;
using Serilog.Core;
using Serilog.Events;
using Serilog.Formatting.Display;

namespace BladeLoads.Screen;

/// <summary>Shows what the log finds worth a warning, a line each, without stepping on a progress bar.</summary>
internal sealed class ScreenLog(TextWriter error) : ILogEventSink
{
    // The message alone: what an exception adds is for the run's log.
    private static readonly MessageTemplateTextFormatter Message = new("{Message:lj}", CultureInfo.InvariantCulture);

    private readonly Lock _lock = new();
    private Action<string> _write = error.WriteLine;

    public void Emit(LogEvent logEvent)
    {
        using var line = new StringWriter(CultureInfo.InvariantCulture);
        Message.Format(logEvent, line);
        Line(line.ToString());
    }

    public void Line(string text)
    {
        lock (_lock)
            _write(Printable.Of(text));
    }

    /// <summary>From now on lines go there: a progress bar must be told of them, or it would write over them.</summary>
    public void Through(Action<string> write)
    {
        lock (_lock)
            _write = write;
    }

    public void Directly() => Through(error.WriteLine);
}
