using System.Collections.Immutable;
using BladeLoads.Rotor.Blades;
using BladeLoads.Studies.Files;

namespace BladeLoads.Studies.Tables;

/// <summary>A blade table by itself, outside any study.</summary>
public static class StoredBlade
{
    /// <summary>Reads the blade; null, with what is wrong, where there is none.</summary>
    /// <param name="path">As the user wrote it; findings name the file so.</param>
    public static Blade? Read(string path, IStudyFiles files, out ImmutableArray<InputFinding> errors, out ImmutableArray<InputFinding> doubts)
    {
        var findings = new Findings();
        var input = NamedFile.Read(files, Path.GetFullPath(path), path, StudyFolder.LargestTable, findings.Error) is { } bytes
            ? InputText.FromBytes(path, bytes, findings.Error)
            : null;
        var blade = input is null ? null : BladeTable.Parse(input, findings).Blade;
        (errors, doubts) = (findings.Errors, findings.Doubts);
        return blade;
    }
}
