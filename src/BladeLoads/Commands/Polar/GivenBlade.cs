using BladeLoads.Rotor.Blades;
using BladeLoads.Screen;
using BladeLoads.Studies.Files;
using BladeLoads.Studies.Tables;

namespace BladeLoads.Commands.Polar;

/// <summary>A blade table as a user names it.</summary>
internal static class GivenBlade
{
    /// <summary>Null, and told, where it cannot be read. What is doubtful about the blade is told too.</summary>
    public static Blade? Read(string path, Surroundings surroundings)
    {
        var blade = StoredBlade.Read(path, new DiskFiles(), out var errors, out var doubts);
        if (blade is null)
            NewSet.Refuse(errors, surroundings);
        else
            FindingLines.Write([], doubts, "", surroundings.Error, surroundings.ErrorIsTerminal);
        return blade;
    }
}
