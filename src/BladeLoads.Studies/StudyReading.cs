using System.Collections.Immutable;
using System.Globalization;
using BladeLoads.Studies.Cases;
using BladeLoads.Studies.Files;
using BladeLoads.Studies.Tables;
using BladeLoads.Studies.Toml;

namespace BladeLoads.Studies;

/// <summary>One reading of a study, from its files to its cases.</summary>
internal sealed class StudyReading
{
    // Some file systems take capitals for small letters.
    private readonly Dictionary<string, string> _fileNames = new(StringComparer.OrdinalIgnoreCase);
    private readonly StudyPlace _place;
    private readonly StudyFolder _folder;
    private readonly Findings _findings = new();
    private readonly CaseBuilder _builder;
    private readonly List<StudyCase> _cases = [];
    private readonly SortedSet<string> _rejected = new(StringComparer.Ordinal);
    private readonly Dictionary<string, IReadOnlyList<string>> _usedByRejected = new(StringComparer.Ordinal);
    private readonly Dictionary<string, ImmutableArray<string>> _variantNames = new(StringComparer.Ordinal);

    public StudyReading(StudyPlace place, IStudyFiles files)
    {
        _place = place;
        _folder = new StudyFolder(files, place.Folder);
        _builder = new CaseBuilder(_folder, new StudyTables(_folder, _findings), _findings);
    }

    public Study Read()
    {
        var start = ReadStartingValues();
        foreach (var caseFile in _place.CaseFiles)
            ReadCase(caseFile, start);
        if (_place.IsWhole)
            PassedOver.Doubt(_folder, _findings);
        var baseline = ReadBaseline(start);
        return new Study(
            Path.GetFileName(_place.Folder) is { Length: > 0 } name ? name : "study", _place.Folder, baseline,
            [.. _cases.OrderBy(c => c.Name, StringComparer.Ordinal)], [.. _rejected], _findings.Errors, _findings.Doubts)
        {
            Blocking = Blocking(_findings.Errors),
        };
    }

    // The case's own file first, then its tables in the order in which it names them, then the starting values.
    private ImmutableDictionary<string, InputFinding> Blocking(ImmutableArray<InputFinding> errors)
    {
        if (_rejected.Count == 0)
            return ImmutableDictionary<string, InputFinding>.Empty;
        var firstOfFile = errors.GroupBy(e => e.File, StringComparer.Ordinal).ToDictionary(g => g.Key, g => g.First(), StringComparer.Ordinal);
        var blocking = ImmutableDictionary.CreateBuilder<string, InputFinding>(StringComparer.Ordinal);
        foreach (var name in _rejected)
        {
            var used = _usedByRejected.GetValueOrDefault(name) ?? [name];
            var files = used.Append(StudyReader.StartingValuesFile).Select(VisibleText.Escape);
            if (files.Select(file => firstOfFile.GetValueOrDefault(file)).FirstOrDefault(f => f is not null) is { } finding)
                blocking.Add(name, finding);
        }
        return blocking.ToImmutable();
    }

    private void Reject(string name, IReadOnlyList<string> used)
    {
        _rejected.Add(name);
        _usedByRejected[name] = used;
    }

    private CaseFile ReadStartingValues()
    {
        var fullPath = _folder.FullPath(StudyReader.StartingValuesFile);
        return _folder.Exists(fullPath)
            ? CaseFile.Read(_folder, fullPath, _findings)
            : CaseFile.Empty(StudyReader.StartingValuesFile, isSound: true);
    }

    private void ReadCase(string fullPath, CaseFile start)
    {
        var name = CaseName.Of(fullPath);
        var file = _folder.RelativePath(fullPath);
        if (CaseName.Problem(name) is { } problem)
        {
            _findings.Error(new InputFinding(file, 0, 0, problem));
            Reject(VisibleText.Escape(file), [file]);
            return;
        }
        var fileName = Path.GetFileName(fullPath);
        if (!_fileNames.TryAdd(fileName, fileName))
        {
            _findings.Error(new InputFinding(file, 0, 0,
                $"the name differs from {_fileNames[fileName]} in letter case only, "
                + "and some systems take both for one; rename one"));
            Reject(name, [file]);
            return;
        }
        var own = CaseFile.Read(_folder, fullPath, _findings);
        var complete = own.StartingFrom(start);
        if (own.Input is null || Sweep.Variants(name, complete, _findings) is not { } variants)
        {
            Reject(name, [file]);
            return;
        }
        _variantNames.Add(name, [.. variants.Select(variant => variant.Name)]);
        var ownInput = complete.Sweep.IsEmpty ? own.Input
            : own.Input with { Contents = string.Create(CultureInfo.InvariantCulture, $"case file, {variants.Length} variants") };
        ImmutableArray<InputFile> inputs = [ownInput];
        if (start.Input is not null)
            inputs = inputs.Add(start.Input with { Contents = "starting values" });
        foreach (var variant in variants)
            if (_builder.Build(variant.Name, variant.Title, complete, variant.Entries, inputs, out var used) is { } studyCase
                && own.IsSound && start.IsSound)
                _cases.Add(studyCase);
            else
                Reject(variant.Name, used);
    }

    private string? ReadBaseline(CaseFile start)
    {
        if (start.Baseline is not { } entry)
            return null;
        if (entry.Value is not TomlValue.Text { Value: var baseline })
            return Refuse($"baseline is {entry.Value.Found}; give the name of a case in quotes");
        var names = _cases.Select(c => c.Name).Concat(_rejected).ToHashSet(StringComparer.Ordinal);
        if (names.Contains(baseline) || !_place.IsWhole && IsOtherCase(baseline))
            return baseline;
        if (_variantNames.TryGetValue(baseline, out var variants))
            return Refuse($"baseline '{baseline}' is a sweep; name one of its variants, such as '{variants[0]}'");
        if (!_place.IsWhole)
            names.UnionWith(_folder.Names(_folder.FullPath(StudyReader.CasesFolder))
                .Where(file => file.EndsWith(CaseName.Ending, StringComparison.Ordinal)).Select(CaseName.Of));
        return Refuse(Nearest.Of(baseline, names) is { } near
            ? $"baseline {VisibleText.Quote(baseline)} names no case; did you mean '{near}'?"
            : $"baseline {VisibleText.Quote(baseline)} names no case; cases are {VisibleText.Enumerate(names, "none")}");

        string? Refuse(string text)
        {
            _findings.Error(entry.Value.At, text);
            return null;
        }
    }

    // One case is read alone; the baseline may be another, of which only the file is looked for.
    private bool IsOtherCase(string name)
        => _folder.Names(_folder.FullPath(StudyReader.CasesFolder)).Contains(name.Split('~')[0] + CaseName.Ending)
            && !_variantNames.ContainsKey(name.Split('~')[0]);
}
