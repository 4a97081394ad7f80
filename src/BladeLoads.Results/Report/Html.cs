using System.Xml.Linq;
using BladeLoads.Results.Wording;

namespace BladeLoads.Results.Report;

/// <summary>Pieces of a page. Whatever stands in a text is shown as text: elements are never made of strings.</summary>
internal static class Html
{
    // An empty element would be written as <td />, which a browser takes for an element that is not closed.
    public static XElement Element(string name, params object?[] content)
    {
        var element = new XElement(name, content);
        if (element.IsEmpty)
            element.Value = "";
        return element;
    }

    public static XElement Text(string name, string text) => Element(name, Printable.Of(text));

    public static XElement Class(this XElement element, string names)
    {
        element.SetAttributeValue("class", names);
        return element;
    }

    /// <summary>A table with a heading row; cells that are numbers stand to the right.</summary>
    /// <param name="numbers">The columns that hold numbers.</param>
    public static XElement Table(Range numbers, IReadOnlyList<string> headings, IEnumerable<IReadOnlyList<string>> rows)
    {
        var (from, count) = numbers.GetOffsetAndLength(headings.Count);
        XElement Cell(string name, string text, int column)
            => column >= from && column < from + count ? Text(name, text).Class("n") : Text(name, text);
        return Element(
            "table",
            Element("thead", Element("tr", headings.Select((text, i) =>
            {
                var cell = Cell("th", text, i);
                cell.SetAttributeValue("scope", "col");
                return cell;
            }))),
            Element("tbody", rows.Select(row => Element("tr", row.Select((text, i) => Cell("td", text, i))))));
    }
}
