using System.Globalization;
using System.Text.RegularExpressions;
using System.Xml.Linq;

namespace BladeLoads.Batch.Tests.Pictures;

/// <summary>A picture as a browser reads it: its texts and shapes with their places, px from the upper left corner of the page.</summary>
internal sealed partial class DrawnPage
{
    private static readonly XNamespace Svg = "http://www.w3.org/2000/svg";

    private readonly XElement _root;

    public DrawnPage(byte[] svg)
    {
        _root = XElement.Parse(System.Text.Encoding.UTF8.GetString(svg));
        Texts = [.. _root.Descendants(Svg + "text").Select(PlacedText.Of)];
        Circles = [.. _root.Descendants(Svg + "ellipse").Select(e => (Number(e, "cx"), Number(e, "cy")))];
        Ticks = [.. Paths("stroke").SelectMany(p => Stroke().Matches(p))
            .Select(m => (X0: Value(m, 1), Y0: Value(m, 2), X1: Value(m, 3), Y1: Value(m, 4)))];
    }

    public IReadOnlyList<PlacedText> Texts { get; }

    public IReadOnlyList<(double X, double Y)> Circles { get; }

    /// <summary>Straight strokes: the ticks of the axes among them.</summary>
    public IReadOnlyList<(double X0, double Y0, double X1, double Y1)> Ticks { get; }

    public string Title => _root.Element(Svg + "title")!.Value;

    public IEnumerable<string> Words => Texts.Select(t => t.Text);

    public IEnumerable<string> Elements => _root.DescendantsAndSelf().Select(e => e.Name.LocalName).Distinct();

    /// <summary>The distinct dashes of strokes.</summary>
    public IEnumerable<string> Dashes => _root.Descendants(Svg + "path").Select(p => p.Attribute("stroke-dasharray")?.Value).OfType<string>().Distinct();

    private IEnumerable<string> Paths(string with)
        => _root.Descendants(Svg + "path").Where(p => p.Attribute(with) is not null).Select(p => p.Attribute("d")!.Value);

    private static double Number(XElement element, string name) => double.Parse(element.Attribute(name)!.Value, CultureInfo.InvariantCulture);

    private static double Value(Match match, int group) => double.Parse(match.Groups[group].Value, CultureInfo.InvariantCulture);

    [GeneratedRegex(@"^M(-?[\d.]+) (-?[\d.]+)L(-?[\d.]+) (-?[\d.]+)$")]
    private static partial Regex Stroke();
}

/// <summary>A text and the corners of its base line.</summary>
/// <param name="Size">px</param>
/// <param name="IsUpright">Read from left to right; else from below upwards.</param>
internal sealed partial record PlacedText(string Text, double X, double Y, double Width, double Size, bool IsUpright)
{
    /// <summary>Where its letters are: from its base line a digit's height up.</summary>
    public (double Left, double Top, double Right, double Bottom) Box => IsUpright
        ? (X, Y - (0.73 * Size), X + Width, Y)
        : (X - (0.73 * Size), Y - Width, X, Y);

    public double MiddleX => (Box.Left + Box.Right) / 2;

    public double MiddleY => (Box.Top + Box.Bottom) / 2;

    public static PlacedText Of(XElement text)
    {
        double Number(string name) => double.Parse(text.Attribute(name)!.Value, CultureInfo.InvariantCulture);
        var (x, y, width, size) = (Number("x"), Number("y"), Number("textLength"), Number("font-size"));
        var transform = text.Attribute("transform")?.Value ?? "translate(0 0)";
        var numbers = Numbers().Matches(transform).Select(m => double.Parse(m.Value, CultureInfo.InvariantCulture)).ToArray();
        return numbers is [var dx, var dy]
            ? new PlacedText(text.Value, dx + x, dy + y, width, size, true)
            : numbers is [0, -1, 1, 0, var ax, var ay]
                ? new PlacedText(text.Value, ax + y, ay - x, width, size, false)
                : throw new FormatException($"no such transform was expected: {transform}");
    }

    [GeneratedRegex(@"-?\d+(\.\d+)?(e-?\d+)?")]
    private static partial Regex Numbers();
}
