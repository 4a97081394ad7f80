using System.Collections.Concurrent;
using System.Security.Cryptography;
using System.Text;
using BladeLoads.Studies.Fingerprints;

namespace BladeLoads.Results.Publishing;

/// <summary>
/// The tables that results were made from: <c>tables/(SHA-256).csv</c>, each written once, and each the SHA-256 of its own bytes. Only
/// telling which rows of a table changed needs them.
/// </summary>
public static class TableArchive
{
    /// <summary>The rows of a table; null where it is not there with the bytes that its name promises.</summary>
    /// <param name="hash">64 lower-case hexadecimal digits.</param>
    public static string? Read(ResultsFolder results, string hash)
    {
        try
        {
            var bytes = File.ReadAllBytes(results.Table(hash));
            return Convert.ToHexStringLower(SHA256.HashData(bytes)) == hash ? Encoding.UTF8.GetString(bytes) : null;
        }
        catch (Exception e) when (e is IOException or UnauthorizedAccessException)
        {
            return null;
        }
    }

    /// <summary>Puts tables there before the receipt that names them is written.</summary>
    /// <param name="sure">The hashes that were looked for before: one look a table and run is enough.</param>
    /// <exception cref="IOException">The system refused.</exception>
    /// <exception cref="UnauthorizedAccessException">As above.</exception>
    public static void Keep(
        IEnumerable<CanonicalTable> tables, ResultsFolder results, Publisher publisher, ConcurrentDictionary<string, bool> sure)
    {
        foreach (var table in tables)
        {
            if (sure.ContainsKey(table.Hash))
                continue;
            if (Read(results, table.Hash) is null)
                publisher.PublishFile(results.Table(table.Hash), Encoding.UTF8.GetBytes(table.Text));
            sure.TryAdd(table.Hash, true);
        }
    }
}
