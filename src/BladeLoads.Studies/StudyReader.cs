using BladeLoads.Studies.Cases;
using BladeLoads.Studies.Files;

namespace BladeLoads.Studies;

/// <summary>Reads a study folder or one case file.</summary>
public static class StudyReader
{
    internal const string StartingValuesFile = "study.toml";
    public const string CasesFolder = "cases";
    public const string CaseEnding = CaseName.Ending;

    /// <summary>
    /// Reads everything and reports every error and doubt at once; a case with an error is rejected, the others are kept.
    /// </summary>
    /// <param name="path">A study folder, or one case file: then only that case and its variants are read.</param>
    /// <exception cref="StudyNotFoundException">There is nothing at the path that could be a study.</exception>
    public static Study Read(string path) => Read(path, TimeProvider.System);

    /// <inheritdoc cref="Read(string)"/>
    /// <param name="time">Tells how long ago a file was changed: see <see cref="FileStamp"/>.</param>
    public static Study Read(string path, TimeProvider time)
    {
        var files = new SeenFiles(new DiskFiles(), time);
        var study = Read(path, files);
        return study with { Sight = files.Sight(study.Folder) };
    }

    /// <inheritdoc cref="Read(string)"/>
    /// <param name="files">Where the study lies.</param>
    public static Study Read(string path, IStudyFiles files)
    {
        var place = StudyPlace.Find(path, files);
        return new StudyReading(place, files).Read();
    }
}

/// <summary>The message says what was looked for and what was there, in the user's words.</summary>
public sealed class StudyNotFoundException(string message) : Exception(message);
