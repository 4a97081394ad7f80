using System.Globalization;
using System.Text;
using BladeLoads.Results.Tables;
using BladeLoads.Rotor.Operation;
using BladeLoads.Studies;

namespace BladeLoads.EndToEnd.Documentation;

public sealed class Excerpt_in_the_readme
{
    [Fact]
    public void Shows_what_the_demo_study_gives_to_the_digits_printed()
    {
        var block = CodeBlock.AllOf("README.md").Single(b => b.Attributes.ContainsKey("excerpt-of"));
        var excerpt = Rows(block.Text);
        var rotorCase = StudyReader.Read(Path.Combine(Repository.Root, "inputs", "tarn-valley")).Cases
            .Single(c => c.Name == block.Attributes["excerpt-of"]);

        var written = Rows(Encoding.UTF8.GetString(CurveTable.Write(CaseSolver.Solve(rotorCase.Rotor, CancellationToken.None))));

        Assert.True(excerpt.Count > 3, "the excerpt has no rows");
        foreach (var row in excerpt)
        {
            var found = Assert.Single(written, r => Number(r["wind_speed_m_s"]) == Number(row["wind_speed_m_s"]));
            foreach (var (column, shown) in row)
                if (Decimals(shown) is { } decimals)
                    // Half of the last digit printed, and a little for the binary form of a half.
                    Assert.InRange(Number(found[column]) - Number(shown), -0.501 * Math.Pow(10, -decimals), 0.501 * Math.Pow(10, -decimals));
                else
                    Assert.Equal(found[column], shown);
        }
    }

    private static List<Dictionary<string, string>> Rows(string table)
    {
        var lines = table.Split('\n', StringSplitOptions.RemoveEmptyEntries).Select(line => line.Split(',')).ToList();
        return [.. lines.Skip(1).Select(cells => lines[0].Zip(cells).ToDictionary(pair => pair.First, pair => pair.Second))];
    }

    private static double Number(string text) => double.Parse(text, CultureInfo.InvariantCulture);

    /// <summary>Digits after the point; null for what is no number.</summary>
    private static int? Decimals(string text)
    {
        if (!double.TryParse(text, CultureInfo.InvariantCulture, out _))
            return null;
        var point = text.IndexOf('.', StringComparison.Ordinal);
        return point < 0 ? 0 : text.Length - point - 1;
    }
}
