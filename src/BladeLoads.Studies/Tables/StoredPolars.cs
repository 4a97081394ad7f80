using System.Collections.Immutable;
using BladeLoads.Rotor.Sections;
using BladeLoads.Studies.Files;

namespace BladeLoads.Studies.Tables;

/// <summary>A polar table of ours by itself, outside any study: what makes a new table from one reads it so.</summary>
/// <param name="SectionName">The name of the file without its ending.</param>
/// <param name="Head">The comment lines above the column names, without their marks.</param>
/// <param name="Polars">The rows as they stand in the file, by Reynolds number.</param>
/// <param name="Section">The same, prepared for the rotor.</param>
/// <param name="Bytes">The file as it is.</param>
/// <param name="Sha256">Of the bytes, 64 lower-case hexadecimal digits.</param>
public sealed record StoredPolars(
    string SectionName, ImmutableArray<string> Head, ImmutableArray<PolarRows> Polars, Section Section, ReadOnlyMemory<byte> Bytes,
    string Sha256)
{
    /// <summary>The name of the note in the head that says that rows are augmented for rotation: <c># augmented: ...</c>.</summary>
    public const string AugmentedNote = "augmented";

    /// <summary>The lines in the file on which the rows of <see cref="Polars"/> stand, from 1.</summary>
    public ImmutableArray<ImmutableArray<int>> RowLines { get; init; } = [];

    /// <summary>What reading alone finds doubtful: what <c>check</c> tells of the table too, but for its <see cref="Reach"/>.</summary>
    public ImmutableArray<InputFinding> Doubts { get; init; } = [];

    /// <summary>That it does not go round; none or one.</summary>
    public ImmutableArray<InputFinding> Reach { get; init; } = [];

    /// <summary>The line of the head that says that the rows are augmented for rotation, and what it says; null where none does.</summary>
    public (int Line, string Text)? Augmented { get; init; }

    /// <summary>Reads a table; null, with what is wrong, where it is none.</summary>
    /// <param name="path">As the user wrote it; findings name the file so.</param>
    public static StoredPolars? Read(string path, IStudyFiles files, out ImmutableArray<InputFinding> errors)
        => Read(Path.GetFullPath(path), path, files, out errors);

    /// <summary>The same of a file that findings name in another way than by its path.</summary>
    /// <param name="fullPath">Absolute.</param>
    /// <param name="shown">As findings name the file.</param>
    public static StoredPolars? Read(string fullPath, string shown, IStudyFiles files, out ImmutableArray<InputFinding> errors)
    {
        var findings = new Findings();
        var bytes = NamedFile.Read(files, fullPath, shown, StudyFolder.LargestTable, findings.Error);
        var table = bytes is null ? null : FromBytes(shown, bytes, findings);
        errors = findings.Errors;
        return table;
    }

    /// <summary>The table in the bytes of a file; null, with what is wrong, where there is none.</summary>
    public static StoredPolars? FromBytes(string path, byte[] bytes, out ImmutableArray<InputFinding> errors)
    {
        var findings = new Findings();
        var table = FromBytes(path, bytes, findings);
        errors = findings.Errors;
        return table;
    }

    private static StoredPolars? FromBytes(string path, byte[] bytes, Findings findings)
    {
        if (InputText.FromBytes(path, bytes, findings.Error) is not { } input)
            return null;
        var name = Path.GetFileNameWithoutExtension(path);
        var table = PolarTable.Parse(name, input, findings);
        return table.Section is null
            ? null
            : new StoredPolars(name, HeadOf(input.Text), table.Rows(), table.Section, bytes, input.Sha256)
            {
                RowLines = table.RowLines(),
                Doubts = table.Doubts,
                Reach = table.Reach,
                Augmented = table.Augmented is { } note ? (note.Line, note.Text) : null,
            };
    }

    private static ImmutableArray<string> HeadOf(string text)
    {
        var head = ImmutableArray.CreateBuilder<string>();
        foreach (var line in TextLines.Of(text))
        {
            var trimmed = line.Trim();
            if (trimmed.Length == 0)
                continue;
            if (trimmed[0] != '#')
                break;
            head.Add(trimmed[1..].Trim());
        }
        return head.ToImmutable();
    }
}
