using BladeLoads.Results.Wording;
using Serilog.Events;
using Serilog.Formatting;

namespace BladeLoads.Batch.Logs;

/// <summary>
/// Keeps an event on one line and control characters out of it: names come from users, and a log is read on a terminal.
/// </summary>
internal sealed class PrintableFormatter(ITextFormatter inner) : ITextFormatter
{
    public void Format(LogEvent logEvent, TextWriter output)
    {
        using var line = new StringWriter(System.Globalization.CultureInfo.InvariantCulture);
        inner.Format(logEvent, line);
        output.Write(Printable.Of(line.ToString().TrimEnd('\r', '\n')));
        output.Write('\n');
    }
}
