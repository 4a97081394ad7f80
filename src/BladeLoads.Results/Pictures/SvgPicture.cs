using System.Globalization;
using System.Text;
using System.Xml;
using System.Xml.Linq;

namespace BladeLoads.Results.Pictures;

/// <summary>Makes of what the drawing library writes an SVG that looks the same in every browser.</summary>
internal static class SvgPicture
{
    /// <summary>Stands at the beginning of the file: it was made here.</summary>
    public const string Mark = "made with BladeLoads";

    // Verdana has the proportions of the shipped font and is on most machines that lack it.
    private const string Families = $"'{PictureFont.Family}', Verdana, sans-serif";

    private static readonly XNamespace Svg = "http://www.w3.org/2000/svg";

    /// <param name="svg">As drawn, with solid lines.</param>
    /// <param name="height">px</param>
    /// <param name="looks">Of all lines.</param>
    /// <param name="title">For screen readers and the browser's tab.</param>
    public static byte[] Finish(byte[] svg, float height, IEnumerable<LineLook> looks, string title, IEnumerable<string> notes)
    {
        using var drawn = new MemoryStream(svg);
        var root = XElement.Load(drawn);
        root.SetAttributeValue("viewBox", string.Create(CultureInfo.InvariantCulture, $"0 0 {PolarPage.Width} {height}"));
        foreach (var text in root.Descendants(Svg + "text"))
            SetText(text);
        Break(root, looks);
        Renumber(root);
        root.AddFirst(
            new XElement(Svg + "title", title),
            new XElement(Svg + "desc", string.Join("; ", notes.Append(Mark))));

        using var finished = new MemoryStream();
        var settings = new XmlWriterSettings
        {
            Encoding = new UTF8Encoding(encoderShouldEmitUTF8Identifier: false),
            Indent = true,
            IndentChars = "",
            NewLineChars = "\n",
        };
        using (var writer = XmlWriter.Create(finished, settings))
            root.Save(writer);
        finished.WriteByte((byte)'\n');
        return finished.ToArray();
    }

    // The library gives each letter a place of its own, which tears a text apart where another font serves. Told the length of the whole,
    // a browser fits any font into the room that the layout gave it.
    private static void SetText(XElement text)
    {
        text.Value = text.Value.Trim();
        var size = float.Parse(text.Attribute("font-size")!.Value, CultureInfo.InvariantCulture);
        var bold = text.Attribute("font-weight") is not null;
        foreach (var place in (string[])["x", "y"])
            text.SetAttributeValue(place, text.Attribute(place)!.Value.Split(',')[0].Trim());
        text.SetAttributeValue("font-family", Families);
        text.SetAttributeValue("textLength", PictureFont.Width(text.Value, size, bold).ToString("0.###", CultureInfo.InvariantCulture));
        text.SetAttributeValue("lengthAdjust", "spacingAndGlyphs");
    }

    // Drawn with dashes, each would be an outline of its own, and the file three times as large. A colour belongs to one look alone; marks
    // have it too, with a thinner line.
    private static void Break(XElement root, IEnumerable<LineLook> looks)
    {
        var dashes = looks.Where(look => !look.Dashes.IsEmpty).DistinctBy(look => look.Colour)
            .ToDictionary(look => ($"#{look.Colour:X6}", Text(look.Width)), look => string.Join(' ', look.Dashes.Select(Text)));
        foreach (var path in root.Descendants(Svg + "path"))
            if (path.Attribute("stroke") is { } stroke && path.Attribute("stroke-width") is { } width
                && dashes.TryGetValue((stroke.Value, width.Value), out var pattern))
                path.SetAttributeValue("stroke-dasharray", pattern);
    }

    // The library counts its clips through the life of the process: the second picture would differ from the first.
    private static void Renumber(XElement root)
    {
        var names = root.Descendants(Svg + "clipPath").Select(clip => clip.Attribute("id")!.Value).Distinct()
            .Select((name, i) => (name, New: string.Create(CultureInfo.InvariantCulture, $"c{i + 1}")))
            .ToDictionary(pair => pair.name, pair => pair.New, StringComparer.Ordinal);
        foreach (var clip in root.Descendants(Svg + "clipPath"))
            clip.SetAttributeValue("id", names[clip.Attribute("id")!.Value]);
        foreach (var clipped in root.Descendants().Attributes("clip-path"))
            clipped.Value = $"url(#{names[clipped.Value["url(#".Length..^1]]})";
    }

    private static string Text(float value) => value.ToString("0.###", CultureInfo.InvariantCulture);
}
