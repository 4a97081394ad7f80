namespace BladeLoads.Results.Publishing;

/// <summary>Brings a replaced result back into its place, when its values are those of the case again.</summary>
public static class ReturnedResult
{
    /// <summary>
    /// Exchanges it, in one step, with what stands in its place, which goes to the replaced results instead. False where the file system
    /// cannot exchange; nothing has changed then.
    /// </summary>
    /// <exception cref="IOException">The system refused. One of the two is in its place, the other is among the replaced ones, both whole.</exception>
    /// <exception cref="UnauthorizedAccessException">As above.</exception>
    public static bool Exchange(ReplacedResult replaced, ResultsFolder results, IDisk disk)
    {
        var place = results.Case(replaced.Case);
        if (disk.TryRename(replaced.Folder, place))
        {
            disk.Sync(results.Study);
            return true;
        }
        if (!disk.TryExchange(replaced.Folder, place))
            return false;
        disk.Sync(results.Study);
        try
        {
            // It lies under the name of the one that has left; killed before this, it is found by its receipt all the same.
            ReplacedResult.SetAside(replaced.Folder, replaced.Case, results, disk);
            disk.Sync(results.ReplacedOf(replaced.Case));
        }
        catch (Exception e) when (e is IOException or UnauthorizedAccessException)
        {
            // The exchange stands.
        }
        return true;
    }
}
