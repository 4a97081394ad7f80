using System.Collections.Immutable;
using System.Globalization;
using BladeLoads.Studies.Files;

namespace BladeLoads.Studies.Laboratory;

/// <summary>Which column of a foreign table has which role: as the user says, else as the header names them plainly.</summary>
internal sealed class ColumnChoice
{
    private readonly Header _header;
    private readonly int _count;
    private readonly ReadingRequest _request;
    private readonly List<string> _problems = [];
    private readonly Dictionary<ColumnRole, int> _places = [];

    /// <param name="header"><see cref="Header.None"/> where no line names columns.</param>
    /// <param name="count">Columns of the table.</param>
    public ColumnChoice(Header header, int count, ReadingRequest request)
    {
        (_header, _count, _request) = (header, count, request);
        ImmutableArray<ColumnRole> wanted = [.. request.Needed, ColumnRole.Moment, ColumnRole.Reynolds, ColumnRole.Section];
        foreach (var role in wanted)
            if (request.LeavesOut(role))
                continue;
            else if (request.Columns.TryGetValue(role, out var asked))
                Take(role, PlaceOf(role, asked));
            else
                Take(role, PlainPlaceOf(role, request.Needed.Contains(role)));
        foreach (var both in _places.GroupBy(place => place.Value).Where(group => group.Count() > 1))
            _problems.Add($"column {Number(both.Key)} is taken for "
                + $"{string.Join(" and ", both.Select(place => ColumnRoleWords.Of(place.Key)))}; give each its own");
    }

    /// <summary>What is wrong with the choice; empty where nothing is.</summary>
    public IReadOnlyList<string> Problems => _problems;

    /// <summary>The column of a role, counted from 0; null where none has it.</summary>
    public int? this[ColumnRole role] => _places.TryGetValue(role, out var place) ? place : null;

    public ColumnName? NameOf(ColumnRole role) => this[role] is { } place && place < _header.Names.Length ? _header.Names[place] : null;

    /// <summary>For people: <c>'CL' (column 2)</c>.</summary>
    public string Shown(ColumnRole role) => Shown(this[role]!.Value);

    /// <summary>Names of columns that no role has, but for <see cref="MomentsNotTaken"/>.</summary>
    public IEnumerable<string> NotTaken
        => Enumerable.Range(0, _count).Where(
            i => !_places.ContainsValue(i) && !MayBeTheMoment(i) && (i >= _header.Cells.Length || _header.Cells[i].Text.Length > 0)).Select(Shown);

    /// <summary>Where no column is taken for the moment: those that may be it, each with the reason and what takes it.</summary>
    public IEnumerable<string> MomentsNotTaken
        => Enumerable.Range(0, _count).Where(MayBeTheMoment).Select(i => $"{Shown(i)} is not taken, as {MomentDoubt.Of(_header.Names[i])}"
            + (_header.Names[i].IsMultiple ? "" : $"; --columns cm={Number(i)} takes it as it stands"));

    private bool MayBeTheMoment(int place)
        => this[ColumnRole.Moment] is null && !_request.LeavesOut(ColumnRole.Moment) && !_places.ContainsValue(place)
            && place < _header.Names.Length && _header.Names[place].Is(ColumnRole.Moment);

    private void Take(ColumnRole role, int? place)
    {
        if (place is not { } known)
            return;
        _places[role] = known;
        if (role is not (ColumnRole.Angle or ColumnRole.Reynolds or ColumnRole.Section)
            && known < _header.Names.Length && _header.Names[known].IsMultiple)
            _problems.Add(OnMultiple(role, known));
    }

    private string OnMultiple(ColumnRole role, int place)
        => $"{Shown(place)} is a multiple of the {ColumnRoleWords.InWords(role)}, and only the ratio itself is read; "
            + "where its numbers are ratios all the same, leave the line of names out with --lines and say --columns by number";

    private int? PlaceOf(ColumnRole role, string asked)
    {
        var said = $"--columns {ColumnRoleWords.Of(role)}={asked}";
        if (asked.All(char.IsAsciiDigit))
        {
            if (int.TryParse(asked, NumberStyles.None, CultureInfo.InvariantCulture, out var number) && number >= 1 && number <= _count)
                return number - 1;
            _problems.Add($"{said}: the table has columns 1 to {Number(_count - 1)}");
            return null;
        }
        var exact = Places(cell => cell.Text == asked);
        var found = exact.Length > 0 ? exact : Places(cell => ColumnName.AreAlike(cell.Text, asked));
        if (found is [var only])
            return only;
        _problems.Add(found.Length > 1
            ? $"{said}: {InWords(found)} have that name; give the number of the one that is meant"
            : $"{said}: no column has that name; {(_header.Line == 0 ? "no line names columns" : $"there are {Names()}")}");
        return null;
    }

    private int? PlainPlaceOf(ColumnRole role, bool isNeeded)
    {
        var word = ColumnRoleWords.Of(role);
        var plain = Places((_, name) => name.IsPlain && name.Is(role));
        var versions = Places((_, name) => name.IsVersion && name.Is(role));
        var choices = plain.Length > 1 ? plain : [.. plain.Concat(versions).Order()];
        if (plain.Length == 1 && versions.Length == 0)
            return plain[0];
        if (plain.Length > 0)
        {
            _problems.Add($"{InWords(choices)} can both be the {ColumnRoleWords.InWords(role)}; say which: {Offers(word, choices)}"
                + (isNeeded ? "" : $", or {word}=none"));
            return null;
        }
        var perhaps = Places((_, name) => name.MayBe.Contains(role));
        if (!isNeeded && role == ColumnRole.Reynolds && perhaps.Length > 0 && _request.Reynolds is null)
            _problems.Add($"{InWords(perhaps)} may be the Reynolds number or something else; say which: {Offers(word, perhaps)}, or {word}=none");
        if (!isNeeded)
            return null;
        if (perhaps is [var only] && _header.Names[only].IsMultiple)
        {
            _problems.Add(OnMultiple(role, only));
            return null;
        }
        var problem = _header.Line == 0
            ? "no line names the columns; say which are which by number: --columns alpha=1,cl=2,cd=3"
            : perhaps.Length > 0
                ? $"no column is plainly the {ColumnRoleWords.InWords(role)}; {InWords(perhaps)} may be it or something else: "
                    + $"{Offers(word, perhaps)} takes it"
                : WithoutColumn(role, word);
        if (!_problems.Contains(problem))
            _problems.Add(problem);
        return null;
    }

    private string WithoutColumn(ColumnRole role, string word)
    {
        var normal = Places((_, name) => name.MayBe.Contains(ColumnRole.Normal));
        var along = Places((_, name) => name.MayBe.Contains(ColumnRole.Tangential) || name.MayBe.Contains(ColumnRole.Axial));
        var hasLift = Places((_, name) => name.MayBe.Contains(ColumnRole.Lift)).Length > 0;
        return role is ColumnRole.Lift or ColumnRole.Drag && !hasLift && normal.Length > 0 && along.Length > 0
            ? $"no columns for lift and drag; {InWords([normal[0], along[0]])} are forces square to the chord and along it, which are "
                + $"turned by --columns normal={Number(normal[0])},tangential={Number(along[0])} where the second is positive towards "
                + $"the leading edge, or axial={Number(along[0])} where it is positive towards the trailing edge"
            : $"no column for the {ColumnRoleWords.InWords(role)}; there are {Names()}: --columns {word}=<number> takes one";
    }

    private ImmutableArray<int> Places(Func<Cell, bool> isMeant) => Places((cell, _) => isMeant(cell));

    private ImmutableArray<int> Places(Func<Cell, ColumnName, bool> isMeant)
        => [.. Enumerable.Range(0, _header.Cells.Length).Where(i => isMeant(_header.Cells[i], _header.Names[i]))];

    private string InWords(ImmutableArray<int> places) => string.Join(" and ", places.Select(Shown));

    private static string Offers(string word, ImmutableArray<int> places)
        => $"--columns {string.Join(" or ", places.Select(place => $"{word}={Number(place)}"))}";

    private string Shown(int place) => place < _header.Cells.Length
        ? $"{VisibleText.Quote(_header.Cells[place].Text)} (column {Number(place)})"
        : $"column {Number(place)}";

    private string Names() => VisibleText.Enumerate(_header.Cells.Select(cell => cell.Text).Where(name => name.Length > 0), "none");

    private static string Number(int place) => (place + 1).ToString(CultureInfo.InvariantCulture);
}
