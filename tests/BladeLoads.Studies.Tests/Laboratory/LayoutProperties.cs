using System.Collections.Immutable;
using BladeLoads.Rotor.Tests.Properties;
using BladeLoads.Studies.Laboratory;
using BladeLoads.Studies.Tables;
using CsCheck;

namespace BladeLoads.Studies.Tests.Laboratory;

/// <summary>
/// Whatever is sent comes to the values that were sent, or to a refusal with its line: never to other values, never to an exception.
/// </summary>
public class LayoutProperties
{
    private const int Trials = 4000;

    // What may stand in a damaged cell. No digit alone: another number in its place is another table.
    private static readonly string[] Rubbish =
    [
        "", "-", "NaN", "inf", "1e400", "=1+1", "x", "0.5.5", "0,5,5", "--1", "1 2", "\u0661\u0662", "0x10", "1e", "#N/A", "\u200F0.5", "0.5\u00B0",
        "1'5", "5%", "\"", "O.5", "+-1", ".",
    ];

    private const string Junk = "xZ?$&@;:|_~()[]{}<>^ \t\u200F\u200B\u00A0\u2028";

    [Fact]
    public void A_table_in_any_layout_gives_the_values_that_were_sent() => FixedSample.ForEach(InventedTables.All, Trials, sent =>
    {
        var table = LaboratoryTable.Of("lab.txt", SentTable.Of(sent.Polars, sent.Layout).Bytes(), new ReadingRequest());

        Assert.Equal("", string.Join('\n', table.Errors.Select(FindingText.Format)));
        Assert.True(InventedTables.AreEqual(sent.Polars, table.Polars), Foreign.Outcome(table));
    });

    [Fact]
    public void A_sign_put_into_a_row_is_refused_or_harmless() => ForEachDamaged(
        Gen.Select(Gen.Int[0, 9999], Gen.Int[0, 9999], Gen.Int[0, Junk.Length - 1]),
        (sent, lines, where) =>
        {
            var row = RowAt(sent, where.Item1);
            var at = where.Item2 % (lines[row].Length + 1);
            lines[row] = lines[row].Insert(at, Junk[where.Item3].ToString());
        });

    [Fact]
    public void A_sign_lost_from_a_row_is_refused_or_harmless() => ForEachDamaged(
        Gen.Select(Gen.Int[0, 9999], Gen.Int[0, 9999]),
        (sent, lines, where) =>
        {
            var row = RowAt(sent, where.Item1);
            var signs = Enumerable.Range(0, lines[row].Length)
                .Where(i => lines[row][i] is ';' or '\t' or '|' or '"' or ' ' || IsSeparatingComma(sent, lines[row], i)).ToList();
            if (signs.Count > 0)
                lines[row] = lines[row].Remove(signs[where.Item2 % signs.Count], 1);
        });

    [Fact]
    public void Rubbish_in_the_place_of_a_cell_is_refused_or_harmless() => ForEachDamaged(
        Gen.Select(Gen.Int[0, 9999], Gen.Int[0, 9999], Gen.Int[0, Rubbish.Length - 1]),
        (sent, lines, where) =>
        {
            var row = RowAt(sent, where.Item1);
            var cells = sent.CellsOf(row);
            var (start, length) = cells[where.Item2 % cells.Length];
            lines[row] = lines[row].Remove(start, length).Insert(start, Rubbish[where.Item3]);
        });

    [Fact]
    public void The_other_decimal_sign_in_one_cell_that_is_taken_is_refused() => ForEachDamaged(
        Gen.Select(Gen.Int[0, 9999], Gen.Int[0, 9999]),
        (sent, lines, where) =>
        {
            var row = RowAt(sent, where.Item1);
            var (from, to) = sent.Layout.Sign == DecimalSign.Point ? ('.', ',') : (',', '.');
            var signs = sent.CellsTaken(row).SelectMany(cell => Enumerable.Range(cell.Start, cell.Length)).Where(i => lines[row][i] == from).ToList();
            var line = lines[row].ToCharArray();
            line[signs[where.Item2 % signs.Count]] = to;
            lines[row] = new string(line);
            return Outcome.Refused;
        });

    [Fact]
    public void Two_lines_run_together_are_refused_or_harmless() => ForEachDamaged(
        Gen.Int[0, 9999],
        (_, lines, where) =>
        {
            var at = where % (lines.Count - 1);
            lines[at] += lines[at + 1];
            lines.RemoveAt(at + 1);
        });

    [Fact]
    public void Two_rows_exchanged_are_refused_or_sorted() => ForEachDamaged(
        Gen.Int[0, 9999],
        (sent, lines, where) =>
        {
            var row = RowAt(sent, where);
            if (row + 1 < lines.Count && sent.IsRow[row + 1])
                (lines[row], lines[row + 1]) = (lines[row + 1], lines[row]);
        });

    [Fact]
    public void A_row_twice_is_left_out_and_with_another_lift_refused() => ForEachDamaged(
        Gen.Select(Gen.Int[0, 9999], Gen.Bool),
        (sent, lines, where) =>
        {
            var row = RowAt(sent, where.Item1);
            var (isTheSame, hasReynoldsFirst) = (where.Item2, sent.Lines.Any(line => line.Contains("Re", StringComparison.Ordinal)
                && line.Contains("CL", StringComparison.Ordinal)));
            var (start, length) = sent.CellsOf(row)[hasReynoldsFirst ? 2 : 1];
            var other = lines[row].Remove(start, length).Insert(start, sent.Layout.Sign == DecimalSign.Point ? "7.5" : "7,5");
            lines.Insert(row, isTheSame ? lines[row] : other);
            return isTheSame ? Outcome.Read : Outcome.Refused;
        });

    [Fact]
    public void A_header_that_is_gone_or_names_something_else_is_refused_or_harmless() => ForEachDamaged(
        Gen.Select(Gen.Int[0, 9999], Gen.Int[0, 3]),
        (sent, lines, where) =>
        {
            var headers = Enumerable.Range(0, lines.Count).Where(i => lines[i].Contains("CL", StringComparison.Ordinal)).ToList();
            var at = headers[where.Item1 % headers.Count];
            if (where.Item2 == 0)
                lines.RemoveAt(at);
            else
                lines[at] = lines[at].Replace("CL", new[] { "CN", "CX", "CL_corr" }[where.Item2 - 1], StringComparison.Ordinal);
        });

    [Fact]
    public void A_byte_of_a_row_with_another_bit_is_refused_or_harmless()
        => FixedSample.ForEach(Gen.Select(InventedTables.All, Gen.Int[0, 99999]), Trials, trial =>
        {
            var (sent, where) = trial;
            var table = SentTable.Of(sent.Polars, sent.Layout with { Encoding = where % 2 == 0 ? "utf-8" : "iso-8859-1" });
            var bytes = table.Bytes();
            var rows = Enumerable.Range(0, table.Lines.Length).Where(i => table.IsRow[i]).ToList();
            var row = rows[where % rows.Count];
            var start = (where % 2 == 0 ? 3 : 0) + table.Lines.Take(row).Sum(line => line.Length + sent.Layout.LineEnd.Length);
            bytes[start + (where / 7 % table.Lines[row].Length)] |= 0x80;
            Check(sent.Polars, bytes, Outcome.Either);
        });

    // What must come of a damaged table: the values that were sent, a refusal, or either.
    private enum Outcome
    {
        Either,
        Read,
        Refused,
    }

    private static void ForEachDamaged<T>(Gen<T> where, Action<SentTable, List<string>, T> damage) => ForEachDamaged(where, (sent, lines, at) =>
    {
        damage(sent, lines, at);
        return Outcome.Either;
    });

    private static void ForEachDamaged<T>(Gen<T> where, Func<SentTable, List<string>, T, Outcome> damage)
        => FixedSample.ForEach(Gen.Select(InventedTables.All, where), Trials, trial =>
        {
            var ((polars, layout), at) = trial;
            var sent = SentTable.Of(polars, layout);
            var lines = sent.Lines.ToList();
            var expected = damage(sent, lines, at);
            Check(polars, sent.BytesOf(string.Concat(lines.Select(line => line + layout.LineEnd))), expected);
        });

    private static void Check(ImmutableArray<PolarRows> polars, byte[] bytes, Outcome expected)
    {
        var table = LaboratoryTable.Of("lab.txt", bytes, new ReadingRequest());
        var isRead = table.Errors.IsEmpty;
        Assert.True(
            expected == Outcome.Either || isRead == (expected == Outcome.Read),
            $"{(isRead ? "read" : "refused")}:\n{Foreign.Outcome(table)}");
        if (isRead)
            Assert.True(
                InventedTables.AreEqual(polars, table.Polars),
                $"other values:\n{Foreign.Outcome(table)}\nsent:\n{Foreign.Outcome(table with { Polars = polars })}");
        else
            Assert.Contains(table.Errors, error => error.Line > 0);
    }

    private static int RowAt(SentTable sent, int which)
    {
        var rows = Enumerable.Range(0, sent.Lines.Length).Where(i => sent.IsRow[i]).ToList();
        return rows[which % rows.Count];
    }

    private static bool IsSeparatingComma(SentTable sent, string line, int at)
        => line[at] == ',' && sent.Layout.Separator == CellSeparator.Comma
            && (at == 0 || at == line.Length - 1 || !char.IsAsciiDigit(line[at - 1]) || sent.Layout.Sign == DecimalSign.Point);
}
