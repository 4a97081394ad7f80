using System.Collections.Immutable;
using System.CommandLine;
using System.Globalization;
using BladeLoads.Results.Publishing;
using BladeLoads.Results.Tables;
using BladeLoads.Results.Wording;
using BladeLoads.Rotor.Sections;
using BladeLoads.Screen;
using BladeLoads.Studies;
using BladeLoads.Studies.Tables;

namespace BladeLoads.Commands.Polar;

/// <param name="Source">A table, or the folder of a set.</param>
/// <param name="Folder">The set that is made.</param>
/// <param name="LeastLiftIsAsked">The least lift has a factor of its own.</param>
internal sealed record ScaleAsked(
    string Source, string Folder, PolarFactors Factors, bool LeastLiftIsAsked, ImmutableArray<string> Only, bool Replace);

/// <summary><c>bladeloads polar scale</c>: soiled or aged sections from clean ones, by stated factors, as a set of their own.</summary>
internal static class PolarScaleCommand
{
    public static Command Define(Surroundings surroundings)
    {
        var source = new Argument<string>("table or set") { Description = "a polar table, or the folder of a set of them" };
        var folder = new Option<string>("--out") { Description = "the folder of the set that is made", HelpName = "folder", Required = true };
        var slope = FactorOption.Define("--lift-slope", "on the slope of lift about no lift", 0.5, 1.5);
        var largest = FactorOption.Define("--largest-lift", "on the largest lift", 0.5, 1.5);
        var least = FactorOption.Define("--least-lift", "on the least (most negative) lift; left out, that of --largest-lift", 0.5, 1.5);
        var drag = FactorOption.Define("--drag-floor", "on the least drag", 0.5, 10);
        var only = new Option<string[]>("--only")
        {
            Description = "scale only sections whose name matches, and copy the others; * is any text, ? one character; may be given several times",
            HelpName = "pattern",
        };
        var replace = new Option<bool>("--replace") { Description = "put it in the place of what is there" };
        var command = new Command(
            "scale",
            "Makes a set of soiled or aged sections from a clean one, by factors where the flow is attached; deep in stall everything is as it was.")
        {
            source, folder, slope, largest, least, drag, only, replace,
        };
        command.SetAction(parsed =>
        {
            if (parsed.GetValue(slope) is null && parsed.GetValue(largest) is null && parsed.GetValue(least) is null && parsed.GetValue(drag) is null)
                throw new WrongUseException("nothing to scale by; give one or more of --lift-slope, --largest-lift, --least-lift, --drag-floor");
            var factors = new PolarFactors(
                parsed.GetValue(slope) ?? 1, parsed.GetValue(largest) ?? 1, parsed.GetValue(least) ?? parsed.GetValue(largest) ?? 1,
                parsed.GetValue(drag) ?? 1);
            if (Math.Min(factors.LargestLift, factors.LeastLift) < factors.LiftSlope / 2)
                throw new WrongUseException("the factors on largest and least lift must be at least half of that on the lift slope");
            return Run(
                new ScaleAsked(
                    parsed.GetRequiredValue(source), parsed.GetRequiredValue(folder), factors, parsed.GetValue(least) is not null,
                    [.. parsed.GetValue(only) ?? []], parsed.GetValue(replace)),
                surroundings);
        });
        return command;
    }

    private static int Run(ScaleAsked asked, Surroundings surroundings)
    {
        var isSet = Directory.Exists(asked.Source);
        if (GivenTables.Read(asked.Source, isSet, out var errors) is not { } set)
            return Refuse(errors, surroundings);
        var choice = new NameChoice(asked.Only);
        if (!set.Tables.Any(table => choice.Includes(table.SectionName)))
            throw new WrongUseException(
                $"no section matches {string.Join(", ", asked.Only.Select(p => $"'{p}'"))}; there are "
                + string.Join(", ", set.Tables.Select(table => table.SectionName)));
        var place = new SetPlace(asked.Folder, asked.Source, isSet, asked.Replace);
        place.Check([.. set.Tables.Select(table => table.SectionName + ".csv"), .. set.SetFile is null ? [] : (string[])[StoredSet.SetFileName]]);

        var wrong = new List<InputFinding>();
        var files = ImmutableArray.CreateBuilder<ResultContent>();
        var lines = new List<string>();
        foreach (var table in set.Tables)
        {
            var name = table.SectionName + ".csv";
            var shown = isSet ? Path.Join(asked.Source, name) : asked.Source;
            if (!choice.Includes(table.SectionName))
            {
                files.Add(new ResultContent(name, table.Bytes));
                lines.Add($"{name}: copied");
            }
            else if (ScaledTable.Of(table, shown, asked.Factors, asked.LeastLiftIsAsked, wrong) is { } scaled)
            {
                files.Add(new ResultContent(name, PolarTableWriter.Write(Head(table, scaled, asked), scaled.Polars)));
                lines.AddRange(scaled.Record.Select(line => $"{name}: {line}"));
            }
        }
        if (wrong.Count > 0)
            return Refuse([.. wrong], surroundings);
        if (set.SetFile is { } setFile)
            files.Add(new ResultContent(StoredSet.SetFileName, setFile));
        if (!place.Write(files.ToImmutable(), surroundings))
            return ExitCode.NoRoom;
        foreach (var line in lines)
            surroundings.Out.WriteLine(Printable.Of(line));
        foreach (var other in set.Others)
            surroundings.Out.WriteLine(Printable.Of($"{other}: no table, not copied"));
        surroundings.Out.WriteLine(Printable.Of($"set: {asked.Folder}"));
        return ExitCode.Good;
    }

    private static IEnumerable<string> Head(StoredPolars table, ScaledTable scaled, ScaleAsked asked)
    {
        var factors = asked.Factors;
        yield return $"scaled by bladeloads {CommandLine.ToolVersion} from {table.SectionName}.csv (SHA-256 {table.Sha256})";
        yield return string.Create(
            CultureInfo.InvariantCulture,
            $"factors: lift slope {factors.LiftSlope}, largest lift {factors.LargestLift}, least lift {factors.LeastLift}, drag floor {factors.DragFloor}; "
            + $"common practice, no measurement; moments as they were");
        foreach (var line in scaled.Record)
            yield return line;
        if (!table.Head.IsEmpty)
            yield return "the head of that table:";
        foreach (var line in table.Head)
            yield return line;
    }

    private static int Refuse(ImmutableArray<InputFinding> errors, Surroundings surroundings)
    {
        FindingLines.Write(errors, [], "", surroundings.Error, surroundings.ErrorIsTerminal);
        surroundings.Error.WriteLine($"{Count.Of(errors.Length, "error")}; nothing written");
        return ExitCode.NothingCouldRun;
    }
}
