using BladeLoads.Results.Wording;

namespace BladeLoads.Results.Pictures;

/// <summary>Names of sections and sets as names of files.</summary>
public static class PictureName
{
    /// <summary>What a terminal could not show becomes its number, and no name becomes a way to another folder.</summary>
    public static string Of(string name)
        => Printable.Of(name).Replace('\\', '_').Replace('/', '_') is var safe && safe is "." or ".." ? "_" : safe;
}
