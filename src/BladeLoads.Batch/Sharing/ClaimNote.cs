using System.Globalization;
using System.Text;

namespace BladeLoads.Batch.Sharing;

/// <summary>What stands in the file of a claim: a line with the fingerprint, the attempts begun, and the process that began the last.</summary>
/// <param name="Fingerprint">Empty where the file is new, or damaged.</param>
/// <param name="Process">Its number on the machine that it runs on; null where none solves the case.</param>
internal sealed record ClaimNote(string Fingerprint, int Attempts, int? Process)
{
    private static readonly ClaimNote Nothing = new("", 0, null);

    public byte[] ToBytes() => Encoding.UTF8.GetBytes(string.Create(
        CultureInfo.InvariantCulture, $"{Fingerprint} attempts {Attempts} process {(Process is { } p ? p.ToString(CultureInfo.InvariantCulture) : "none")}\n"));

    /// <summary>What cannot be read says nothing: no attempt is counted twice for it, and none is kept from being made.</summary>
    public static ClaimNote Parse(ReadOnlySpan<byte> bytes)
    {
        var text = Encoding.UTF8.GetString(bytes);
        if (!text.EndsWith('\n'))
            return Nothing;
        return text[..^1].Split(' ') is [{ Length: > 0 } fingerprint, "attempts", var count, "process", var process]
            && int.TryParse(count, NumberStyles.None, CultureInfo.InvariantCulture, out var attempts)
            ? new ClaimNote(
                fingerprint, attempts,
                int.TryParse(process, NumberStyles.None, CultureInfo.InvariantCulture, out var number) ? number : null)
            : Nothing;
    }
}
