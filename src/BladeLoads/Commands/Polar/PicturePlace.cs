using BladeLoads.Results.Pictures;
using BladeLoads.Results.Publishing;
using BladeLoads.Studies.Files;

namespace BladeLoads.Commands.Polar;

internal enum PictureFormat { Svg, Png }

/// <summary>A page to be drawn.</summary>
/// <param name="Folder">The name of the folder of the set's pictures; no other set has it.</param>
/// <param name="Set">The name of the set.</param>
/// <param name="FileName">Without its ending.</param>
/// <param name="File">The table, relative to its study; null outside one.</param>
internal sealed record PolarPageAsked(
    string Folder, string Set, string Section, string FileName, string? File, PolarPicture Picture);

/// <summary>Where pictures go: a folder a set, a file a section. A picture of ours gives way to a new one, anything else only when told to.</summary>
internal sealed record PicturePlace(string Folder, bool Replace, IDisk Disk)
{
    public string PathOf(PolarPageAsked page, PictureFormat format)
        => Path.Join(Folder, PictureName.Of(page.Folder), PictureName.Of(page.FileName) + (format == PictureFormat.Svg ? ".svg" : ".png"));

    /// <summary>Whole or not at all; null when written, else why not.</summary>
    /// <param name="draw">Makes the bytes; asked only where they can go somewhere.</param>
    /// <exception cref="IOException">The disk refuses.</exception>
    /// <exception cref="UnauthorizedAccessException">The disk refuses.</exception>
    public string? Write(string path, Func<byte[]> draw)
    {
        var files = new DiskFiles();
        var full = Path.GetFullPath(path);
        switch (files.Kind(full))
        {
            case EntryKind.Folder:
                return "is a folder; give another with --out";
            case EntryKind.Other:
                return "is no regular file; give another folder with --out";
            case EntryKind.File when !Replace && !PictureFile.IsOwn(files.Read(full, PictureFile.BytesToKnow)):
                return "is there and is no picture of ours; give another folder with --out, or put the picture in its place with --replace";
            case EntryKind.File:
                return WholeFile.Write(full, draw(), replace: true, Disk) ? null : "cannot give way";
            default:
                Disk.CreateFolder(Path.GetDirectoryName(full)!);
                return WholeFile.Write(full, draw(), replace: false, Disk) ? null : "came there just now; draw again";
        }
    }
}
