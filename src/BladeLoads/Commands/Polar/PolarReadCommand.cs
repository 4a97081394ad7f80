using System.Collections.Immutable;
using System.CommandLine;
using System.CommandLine.Parsing;
using System.Globalization;
using System.Text;
using BladeLoads.Results.Tables;
using BladeLoads.Results.Wording;
using BladeLoads.Screen;
using BladeLoads.Studies.Files;
using BladeLoads.Studies.Laboratory;
using BladeLoads.Studies.Tables;

namespace BladeLoads.Commands.Polar;

/// <summary><c>bladeloads polar read</c>: a table as a laboratory or a solver sends it becomes one of ours.</summary>
internal static class PolarReadCommand
{
    private const string Incomplete = "incomplete";
    private const string NegativeDrag = "negative-drag";
    private const string Millions = "millions";
    private const string Thousands = "thousands";
    private const int RowsShown = 3;

    private readonly record struct ReynoldsSaid(double? Number, ReynoldsUnit? Unit);

    public static Command Define(Surroundings surroundings)
    {
        var file = new Argument<string>("file")
        {
            Description = "the table: text with a header or with column numbers, however its columns are separated",
        };
        var path = new Option<string?>("--out") { Description = "the table that is made, <section>.csv", HelpName = "table.csv" };
        var columns = ColumnsOption.Define();
        var angles = WordOption.Define<AngleUnit>("--angles", "unit of the angle of attack, where the table does not say");
        var sign = WordOption.Define<DecimalSign>("--decimal", "decimal sign, where it can be read in two ways");
        var separator = WordOption.Define<CellSeparator>("--separator", "what stands between columns, where it can be read in two ways");
        var reynolds = new Option<ReynoldsSaid?>("--reynolds")
        {
            Description = "Reynolds number of a table that names none; or the unit of those in the table, where it does not say",
            HelpName = $"number|{Millions}|{Thousands}",
            CustomParser = ParseReynolds,
        };
        var comment = new Option<string?>("--comment")
        {
            Description = "how lines begin that are no part of the table, besides # % ! and //",
            HelpName = "sign",
        };
        var lines = new Option<LineRange?>("--lines")
        {
            Description = "the lines that hold the table, 12-48 or 12-; the others are not looked at",
            HelpName = "from-to",
            CustomParser = ParseLines,
        };
        var section = new Option<string?>("--section") { Description = "rows of this section only, where a column names several", HelpName = "name" };
        var sweep = WordOption.Define<SweepChoice>("--sweep", "which rows count where angles go up and down over the same range");
        var leaveOut = new Option<string[]>("--leave-out")
        {
            Description = "rows to leave out: those without a value, those with a drag below 0; may be given several times",
            HelpName = $"{Incomplete}|{NegativeDrag}",
        };
        leaveOut.Validators.Add(CheckLeaveOut);
        var wrap = new Option<bool>("--wrap")
        {
            Description = "angles go round from 0 to 360 degrees, or to -360: those beyond 180 stand for 360 less, beyond -180 for 360 more",
        };
        var replace = new Option<bool>("--replace") { Description = "put the table in the place of a file that is there" };
        var preview = new Option<bool>("--preview") { Description = "tell what would be done and show some rows; write nothing" };
        var command = new Command(
            "read",
            "Makes a polar table from one as a laboratory or a solver sends it, with a record of what was done in its head. What can be read in "
            + "two ways is refused, with the option that says which is meant.")
        {
            file, path, columns, angles, sign, separator, reynolds, comment, lines, section, sweep, leaveOut, wrap, replace, preview,
        };
        command.SetAction(parsed => Run(
            parsed.GetRequiredValue(file),
            new ReadingRequest
            {
                Columns = ColumnsOption.Parse(parsed.GetValue(columns) ?? []),
                Angles = parsed.GetValue(angles),
                DecimalSign = parsed.GetValue(sign),
                Separator = parsed.GetValue(separator),
                Reynolds = parsed.GetValue(reynolds)?.Number,
                ReynoldsUnit = parsed.GetValue(reynolds)?.Unit,
                Comment = CommentSign(parsed.GetValue(comment)),
                Lines = parsed.GetValue(lines),
                Section = parsed.GetValue(section),
                Sweep = parsed.GetValue(sweep),
                LeaveOutIncomplete = parsed.GetValue(leaveOut)?.Contains(Incomplete) ?? false,
                LeaveOutNegativeDrag = parsed.GetValue(leaveOut)?.Contains(NegativeDrag) ?? false,
                Wrap = parsed.GetValue(wrap),
            },
            parsed.GetValue(path), parsed.GetValue(replace), parsed.GetValue(preview), surroundings));
        return command;
    }

    private static int Run(string file, ReadingRequest request, string? path, bool replace, bool preview, Surroundings surroundings)
    {
        if (string.IsNullOrWhiteSpace(file) || file.Contains('\0'))
            throw new WrongUseException("no table named; name a file");
        var place = path is null ? null : new TableOut(path, file, replace);
        if (place is null && !preview)
            throw new WrongUseException("where does the table go? Give --out <section>.csv, or --preview to see what would be done");
        if (!preview)
            place!.Check();
        var table = LaboratoryTable.Read(file, new DiskFiles(), request);
        FindingLines.Write(table.Errors, table.Doubts, "", surroundings.Error, surroundings.ErrorIsTerminal);
        if (!table.Errors.IsEmpty)
        {
            surroundings.Error.WriteLine($"{Count.Of(table.Errors, "error")}; nothing written");
            return ExitCode.NothingCouldRun;
        }
        ImmutableArray<string> record =
        [
            $"read by bladeloads {CommandLine.ToolVersion} from {Path.GetFileName(file)} (SHA-256 {table.Sha256})", .. table.Record,
        ];
        var bytes = PolarTableWriter.Write(record, table.Polars);
        CheckThatItReadsBack(path ?? "preview.csv", bytes, table.Polars);
        if (!preview && !place!.Write(bytes, surroundings))
            return ExitCode.NoRoom;
        foreach (var line in record)
            surroundings.Out.WriteLine(Printable.Of(line));
        foreach (var polar in table.Polars)
            surroundings.Out.WriteLine(InWords(polar));
        if (preview)
            WriteRows(bytes, surroundings.Out);
        surroundings.Out.WriteLine(preview ? "preview: nothing written" : Printable.Of($"table: {path}"));
        return ExitCode.Good;
    }

    // What a case would read is what was read here, or nothing is written.
    private static void CheckThatItReadsBack(string path, byte[] bytes, ImmutableArray<PolarRows> polars)
    {
        if (StoredPolars.FromBytes(path, bytes, out var errors) is not { } stored)
            throw new InvalidOperationException($"a table that was read cannot be read again: {errors[0].Text}");
        if (stored.Polars.Length != polars.Length
            || !stored.Polars.Zip(polars).All(pair
                => pair.First.Reynolds.Equals(pair.Second.Reynolds) && pair.First.Rows.SequenceEqual(pair.Second.Rows)))
            throw new InvalidOperationException("a table that was read has other values when it is read again");
    }

    private static string InWords(PolarRows polar)
    {
        var reynolds = double.IsNaN(polar.Reynolds)
            ? ""
            : $" at Reynolds number {polar.Reynolds.ToString("0.######e0", CultureInfo.InvariantCulture)}";
        return string.Create(
            CultureInfo.InvariantCulture,
            $"{Count.Of(polar.Rows.Length, "row")}{reynolds}, {polar.Rows[0].AngleDeg} to {polar.Rows[^1].AngleDeg} deg");
    }

    private static void WriteRows(byte[] bytes, TextWriter output)
    {
        var rows = Encoding.UTF8.GetString(bytes).Split('\n', StringSplitOptions.RemoveEmptyEntries).Where(line => line[0] != '#').ToList();
        for (var i = 0; i < rows.Count; i++)
            if (i <= RowsShown || i >= rows.Count - RowsShown)
                output.WriteLine(rows[i]);
            else if (i == RowsShown + 1)
                output.WriteLine("...");
    }

    private static string? CommentSign(string? text)
    {
        var sign = text?.Trim();
        return sign is null || sign.Length > 0 && !char.IsAsciiDigit(sign[0]) && sign is not ("-" or "+" or "." or ",")
            ? sign
            : throw new WrongUseException(
                $"--comment is '{text}'; give the sign or the word that such lines begin with, no number and no sign of one");
    }

    private static void CheckLeaveOut(OptionResult result)
    {
        foreach (var token in result.Tokens.Where(token => token.Value is not (Incomplete or NegativeDrag)))
            result.AddError($"--leave-out is '{Printable.Of(token.Value)}'; give {Incomplete} or {NegativeDrag}");
    }

    private static ReynoldsSaid? ParseReynolds(ArgumentResult argument)
    {
        var text = argument.Tokens.Count == 1 ? argument.Tokens[0].Value : "";
        if (text is Millions or Thousands)
            return new ReynoldsSaid(null, text == Millions ? ReynoldsUnit.Millions : ReynoldsUnit.Thousands);
        const NumberStyles style = NumberStyles.AllowDecimalPoint | NumberStyles.AllowExponent;
        if (double.TryParse(text, style, CultureInfo.InvariantCulture, out var number) && PolarLimits.IsReynoldsOfABlade(number))
            return new ReynoldsSaid(number, null);
        argument.AddError(
            $"--reynolds is '{Printable.Of(text)}'; give a number from {PolarLimits.ReynoldsInWords}: 1.5e6; or {Millions} or {Thousands}, "
            + "the unit of those in the table");
        return null;
    }

    private static LineRange? ParseLines(ArgumentResult argument)
    {
        var text = argument.Tokens.Count == 1 ? argument.Tokens[0].Value : "";
        var parts = text.Split('-');
        if (parts.Length == 2 && int.TryParse(parts[0], NumberStyles.None, CultureInfo.InvariantCulture, out var first) && first >= 1)
        {
            if (parts[1].Length == 0)
                return new LineRange(first, int.MaxValue);
            if (int.TryParse(parts[1], NumberStyles.None, CultureInfo.InvariantCulture, out var last) && last >= first)
                return new LineRange(first, last);
        }
        argument.AddError($"--lines is '{Printable.Of(text)}'; give the first and the last line of the table, 12-48, or the first alone, 12-");
        return null;
    }
}
