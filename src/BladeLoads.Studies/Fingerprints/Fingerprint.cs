using System.Security.Cryptography;
using System.Text;

namespace BladeLoads.Studies.Fingerprints;

/// <summary>SHA-256 over values, never over bytes of files: comments, spacing and order cost no rerun.</summary>
internal static class Fingerprint
{
    /// <param name="values">Key and canonical text, in ordinal order of the keys.</param>
    /// <returns>64 lower-case hexadecimal digits.</returns>
    public static string Of(IEnumerable<KeyValuePair<string, string>> values)
        => OfLines(values.Select(value => $"{value.Key} = {value.Value}"));

    /// <summary>A table by its rows, which are asked for again whenever its text is.</summary>
    public static CanonicalTable OfTable(string key, string file, Func<IEnumerable<string>> lines) => new(key, OfLines(lines()), file, lines);

    public static string OfLines(IEnumerable<string> lines)
    {
        using var hash = IncrementalHash.CreateHash(HashAlgorithmName.SHA256);
        foreach (var line in lines)
            hash.AppendData(Encoding.UTF8.GetBytes(line + "\n"));
        return Convert.ToHexStringLower(hash.GetHashAndReset());
    }
}
