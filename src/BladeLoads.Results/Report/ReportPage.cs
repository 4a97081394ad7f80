using System.Globalization;
using System.Security.Cryptography;
using System.Text;
using System.Xml;
using System.Xml.Linq;
using BladeLoads.Results.Receipts;
using BladeLoads.Results.Wording;
using static BladeLoads.Results.Report.Html;

namespace BladeLoads.Results.Report;

/// <summary><c>report.html</c>: a page that needs no other file, for reading, printing and signing.</summary>
public static class ReportPage
{
    private const int MostReceipts = 300;

    /// <summary>The page as UTF-8; the same bytes for the same report.</summary>
    /// <param name="stamp">Stands at its beginning, in a comment: what the page was made of. Letters, digits and blanks.</param>
    public static byte[] Write(StudyReport report, string stamp)
    {
        var page = PageOf(report);
        return [.. Encoding.UTF8.GetBytes($"{Beginning(stamp)}{Convert.ToHexStringLower(SHA256.HashData(page))} -->\n"), .. page];
    }

    /// <summary>Whether these are the bytes of a page that was made of this, and of which nothing was changed since.</summary>
    public static bool IsOf(ReadOnlySpan<byte> file, string stamp)
    {
        var beginning = Encoding.UTF8.GetBytes(Beginning(stamp));
        var hash = SHA256.HashSizeInBytes * 2;
        var head = beginning.Length + hash + " -->\n".Length;
        return file.Length > head && file.StartsWith(beginning)
            && Encoding.UTF8.GetString(file.Slice(beginning.Length, hash)) == Convert.ToHexStringLower(SHA256.HashData(file[head..]));
    }

    private static string Beginning(string stamp) => $"<!DOCTYPE html>\n<!-- {stamp}; page ";

    private static byte[] PageOf(StudyReport report)
    {
        var page = Element(
            "html", new XAttribute("lang", "en"),
            Element(
                "head", Meta("charset", "utf-8"), Meta("name", "viewport", "width=device-width, initial-scale=1"),
                Policy(), Text("title", $"{report.Study}: rotor aerodynamics"), Element("style", ReportStyle.Text)),
            Element(
                "body", Text("h1", $"{report.Study}: rotor aerodynamics"), Text("p", Origin(report)).Class("origin"), Cautions(), SignOff(),
                SummarySection.Of(report), MovedSection.Of(report), CasesSection.Of(report), CurveSection.Of(report), Receipts(report),
                Text("footer", Foot(report))));
        using var bytes = new MemoryStream();
        var settings = new XmlWriterSettings
        {
            Encoding = new UTF8Encoding(encoderShouldEmitUTF8Identifier: false),
            OmitXmlDeclaration = true,
            Indent = true,
            IndentChars = "",
            NewLineChars = "\n",
        };
        using (var writer = XmlWriter.Create(bytes, settings))
            page.Save(writer);
        bytes.WriteByte((byte)'\n');
        return bytes.ToArray();
    }

    private static XElement Meta(string name, string value, string? content = null)
    {
        var meta = new XElement("meta", new XAttribute(name, value));
        if (content is not null)
            meta.SetAttributeValue("content", content);
        return meta;
    }

    // Nothing is loaded from anywhere, whatever a title may hold.
    private static XElement Policy() => new(
        "meta", new XAttribute("http-equiv", "Content-Security-Policy"),
        new XAttribute("content", "default-src 'none'; style-src 'unsafe-inline'; img-src data:"));

    private static string Origin(StudyReport report)
    {
        var current = report.Cases.Count(c => c.Row.State == "current");
        var receipts = report.Cases.Select(c => c.Receipt).OfType<Receipt>().ToList();
        var count = string.Create(CultureInfo.InvariantCulture, $"{current} of {report.Cases.Length} cases with current results");
        if (receipts.Count == 0)
            return count + ".";
        var versions = receipts.Select(r => string.Create(CultureInfo.InvariantCulture, $"{r.ToolVersion} (solver {r.SolverVersion})")).Distinct()
            .Order(StringComparer.Ordinal);
        return $"{count}, solved from {Time(receipts.Min(r => r.SolvedAt))} to {Time(receipts.Max(r => r.SolvedAt))} by bladeloads {string.Join(", ", versions)}.";
    }

    private static string Time(DateTimeOffset at) => at.UtcDateTime.ToString("yyyy-MM-dd HH:mm 'UTC'", CultureInfo.InvariantCulture);

    private static XElement Cautions() => Element(
        "section", Text("h2", "Cautions"), Text("p", Caution.Text),
        Text("p", "Marks in the summary name operating points whose figures need a look before they are used; what each means stands below it.")).Class("caution");

    private static XElement SignOff() => Element(
        "section", Text("h2", "Signatures"),
        Table(^0.., ["", "name", "date", "signature"], [["made by", "", "", ""], ["checked by", "", "", ""], ["approved by", "", "", ""]])).Class("sign");

    private static XElement Receipts(StudyReport report)
    {
        var told = report.Cases.Where(c => c.Receipt is not null).ToList();
        return Element(
            "section", Text("h2", "What the results were made from"),
            Text("p", "Each result has these figures and more in its receipt.json, with the SHA-256 of every file written."),
            told.Take(MostReceipts).Select(c => Of(c.Receipt!)),
            told.Count > MostReceipts
                ? Text("p", string.Create(CultureInfo.InvariantCulture, $"The receipts of {told.Count - MostReceipts} more cases are in their folders."))
                : null);
    }

    private static XElement Of(Receipt receipt) => Element(
        "section", Text("h3", receipt.Title == receipt.Case ? receipt.Case : $"{receipt.Case}: {receipt.Title}"),
        Text("p", $"Solved {Time(receipt.SolvedAt)}; fingerprint {receipt.Fingerprint}."),
        Table(^0.., ["file", "contents", "SHA-256"], receipt.Inputs.Select(i => (string[])[i.File, i.Contents, i.Sha256]))).Class("receipt");

    private static string Foot(StudyReport report)
        => $"Written by bladeloads {report.ToolVersion}. Columns, signs and marks: docs/formats.md; equations and their sources: docs/theory.md.";
}
