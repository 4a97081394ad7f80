using System.Xml.Linq;
using BladeLoads.Commands;
using BladeLoads.Results.Publishing;
using BladeLoads.Rotor.Operation;
using BladeLoads.Studies;

namespace BladeLoads.EndToEnd.Documentation;

public sealed class Picture_in_the_documents
{
    private const string Document = "docs/pictures/fell-21.svg";

    // By its texts: the last digits of a place may differ from processor to processor.
    [Fact]
    public void Is_what_polar_draw_makes_of_the_example()
    {
        using var studies = new ExtractedStudies();
        using var nowhere = new StringWriter();
        var surroundings = new Surroundings(nowhere, nowhere, false, false, StudyReader.Read, CaseSolver.Solve, new Disk(), TimeProvider.System, _ => { });
        CommandLine.Run(["polar", "draw", studies.PathOf("example"), "--only", "fell-21", "--out", studies.PathOf("pages")], surroundings);
        Assert.Equal(Texts(Path.Combine(Repository.Root, Document)), Texts(studies.PathOf("pages/clean/fell-21.svg")));
    }

    private static IEnumerable<string> Texts(string file)
        => XElement.Load(file).Descendants().Where(e => e.Name.LocalName is "text" or "title" or "desc").Select(e => e.Value);
}
