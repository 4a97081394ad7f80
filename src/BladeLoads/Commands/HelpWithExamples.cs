using System.CommandLine;
using System.CommandLine.Help;
using System.CommandLine.Invocation;

namespace BladeLoads.Commands;

/// <summary>The usual help, with examples of the command below it.</summary>
internal sealed class HelpWithExamples(HelpAction usual) : SynchronousCommandLineAction
{
    private static readonly Dictionary<string, (string Line, string What)[]> Examples = new(StringComparer.Ordinal)
    {
        ["check"] =
        [
            ("bladeloads check inputs/tarn-valley", "every error and doubt of a study, by file, line and column"),
            ("bladeloads check inputs/tarn-valley/cases/baseline.toml", "those of one case alone"),
        ],
        ["plan"] =
        [
            ("bladeloads plan inputs/tarn-valley", "what a run would solve, and why"),
            ("bladeloads plan inputs/tarn-valley --only 'soiling*'", "the same for some of the cases"),
            ("bladeloads plan inputs/tarn-valley --json", "the same for scripts; docs/formats.md has its keys"),
        ],
        ["run"] =
        [
            ("bladeloads run inputs/tarn-valley", "solve what is not current; results go to ./results/tarn-valley"),
            ("bladeloads run inputs/tarn-valley/cases/baseline.toml", "one case file and its variants"),
            ("bladeloads run inputs/tarn-valley --only soiling --only 'stall-10m*'", "some of the cases"),
            ("bladeloads run inputs/tarn-valley --all --results /data/results", "solve all again, results elsewhere"),
            ("bladeloads run inputs/tarn-valley --workers 1 --quiet", "one case at a time, errors and warnings alone"),
        ],
        ["compare"] =
        [
            ("bladeloads compare signed-off inputs/tarn-valley", "what moved since a set was kept, case by case"),
            ("bladeloads compare soiling~polars-clean soiling~polars-soiled", "two cases"),
            ("bladeloads compare /old/results/tarn-valley results/tarn-valley --more-than 0.5 --csv moved.csv", "two folders of results"),
        ],
        ["keep"] =
        [
            ("bladeloads keep inputs/tarn-valley signed-off-2026-11", "set the results aside as they were signed"),
            ("bladeloads keep inputs/tarn-valley last-week --replace", "in the place of the set of that name"),
        ],
        ["verify"] =
        [
            ("bladeloads verify inputs/tarn-valley", "all results of a study: current, kept and replaced ones"),
            ("bladeloads verify signed-off-2026-11", "a kept set"),
            ("bladeloads verify inputs/tarn-valley --set-aside", "and have the damaged ones solved again by the next run"),
        ],
        ["tidy"] =
        [
            ("bladeloads tidy inputs/tarn-valley", "tell what can go: replaced more than 30 days ago, but for the last 3 of each case"),
            ("bladeloads tidy inputs/tarn-valley --keep-last 1 --yes", "remove all replaced results but the last of each case"),
            ("bladeloads tidy inputs/tarn-valley --older-than 90d", "only what was replaced more than 90 days ago"),
        ],
        ["polar check"] =
        [
            ("bladeloads polar check inputs/tarn-valley", "every doubt, and where the blades of all cases work in the tables"),
            ("bladeloads polar check inputs/tarn-valley --only 'stall-10m*'", "where those of some cases do"),
            ("bladeloads polar check polars/clean --out report", "a set by itself, with the report as files"),
            ("bladeloads polar check polars/clean/t18.csv", "one table, all its Reynolds numbers"),
        ],
        ["polar read"] =
        [
            ("bladeloads polar read t18.txt --preview", "what would be made of it; writes nothing"),
            ("bladeloads polar read t18.txt --out polars/lab/t18.csv", "a table whose header says what its columns are"),
            ("bladeloads polar read t18.txt --out polars/lab/t18.csv --columns alpha=1,cl=2,cd=3,cm=5 --angles radians --reynolds 1.5e6", "one without a header"),
            ("bladeloads polar read t18.txt --out polars/lab/t18.csv --sweep rising --leave-out incomplete --lines 12-", "one with more than is wanted"),
        ],
        ["polar extend"] =
        [
            ("bladeloads polar extend polars/lab --out polars/whole --blade blades/fell.csv", "every table of a set, by the aspect ratio of the blade"),
            ("bladeloads polar extend polars/lab/t18.csv --out polars/whole --aspect-ratio 15.5 --join stall", "one table, into the folder of a set; what it has beyond stall is left out"),
        ],
        ["polar augment"] =
        [
            ("bladeloads polar augment polars/whole/t30.csv --out polars/root --method snel-1993 --chord-ratio 0.25 --radius-ratio 0.3", "one table, as it serves at 0.3 of the radius"),
            ("bladeloads polar augment polars/whole --out polars/root --method du-selig-1998 --blade blades/fell.csv --radius 12.5 --tip-speed-ratio 7.5 --only t30",
                "the same by another relation, with the chord of a blade; the other sections of the set are copied"),
        ],
        ["polar scale"] =
        [
            ("bladeloads polar scale polars/clean --out polars/soiled --lift-slope 0.95 --largest-lift 0.9 --drag-floor 1.4", "a soiled set beside the clean one"),
            ("bladeloads polar scale polars/clean --out polars/worn --drag-floor 2 --only 'tip-*'", "some of its sections; the others are copied"),
            ("bladeloads polar scale polars/clean/t18.csv --out polars/soiled --largest-lift 0.85", "one table, into the folder of a set"),
        ],
        ["polar draw"] =
        [
            ("bladeloads polar draw inputs/tarn-valley", "a page for each table that its cases use, into results/tarn-valley/pictures"),
            ("bladeloads polar draw polars/clean --format both --out pages", "every table of a set, as SVG and PNG"),
            ("bladeloads polar draw polars/new/t18.csv --before polars/old/t18.csv", "what an update of a table changed"),
            ("bladeloads polar draw inputs/tarn-valley --before /old/tarn-valley --only 'tarn-*'", "the same for tables of a study, beside an earlier copy"),
        ],
        ["polar"] =
        [
            ("bladeloads polar check inputs/tarn-valley", "can the tables be trusted where the blades work?"),
            ("bladeloads polar read t18.txt --out polars/lab/t18.csv", "a polar table from one that a laboratory sent"),
            ("bladeloads polar draw inputs/tarn-valley", "every table of a study on a page of its own"),
            ("bladeloads polar scale polars/clean --out polars/soiled --largest-lift 0.9 --drag-floor 1.5", "soiled blades from clean ones"),
            ("bladeloads polar extend polars/lab --out polars/whole --blade blades/fell.csv", "tables from -180 to 180 degrees"),
            ("bladeloads polar read --help", "the options of a command"),
        ],
        [""] =
        [
            ("bladeloads check inputs/tarn-valley", "is the input right?"),
            ("bladeloads plan inputs/tarn-valley", "what would be solved, and why?"),
            ("bladeloads run inputs/tarn-valley", "solve it, and tell what moved"),
            ("bladeloads keep inputs/tarn-valley signed-off", "set the results aside under a name"),
            ("bladeloads compare signed-off inputs/tarn-valley", "what moved since then?"),
            ("bladeloads run --help", "the options of a command"),
        ],
    };

    public override bool ClearsParseErrors => true;

    public override int Invoke(ParseResult parseResult)
    {
        usual.Invoke(parseResult);
        var output = parseResult.InvocationConfiguration.Output;
        output.WriteLine("Examples:");
        foreach (var (line, what) in Examples[CommandWords.Of(parseResult.CommandResult.Command)])
        {
            output.WriteLine($"  {line}");
            output.WriteLine($"      {what}");
        }
        output.WriteLine();
        return ExitCode.Good;
    }
}
