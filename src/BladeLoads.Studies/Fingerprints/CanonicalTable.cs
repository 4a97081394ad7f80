using System.Text;

namespace BladeLoads.Studies.Fingerprints;

/// <summary>
/// A table as it counts in a fingerprint: its parsed values, a row a line, without a header. One object a table, however many cases
/// share it.
/// </summary>
/// <param name="key">What the table is in a case's values: <c>blade</c>, <c>section.NAME</c>, <c>control.schedule</c>, <c>site.histogram</c>.</param>
/// <param name="hash">Of the text as UTF-8, 64 lower-case hexadecimal digits: what stands for the table in a case's values.</param>
/// <param name="file">The file it was read from, relative to the study folder.</param>
/// <param name="lines">Gives the rows again; asked for only when the text is.</param>
public sealed class CanonicalTable(string key, string hash, string file, Func<IEnumerable<string>> lines)
{
    public string Key { get; } = key;

    public string Hash { get; } = hash;

    public string File { get; } = file;

    /// <summary>
    /// The rows, each ended by a line feed: of a polar <c>reynolds,alpha_deg,cl,cd</c> (<c>-</c> for no Reynolds number), of a blade
    /// <c>radius_m,chord_m,twist_deg,section</c> (by thickness an empty section and the ratio), of a schedule <c>wind_speed_m_s,rotor_speed_rpm,pitch_deg</c>.
    /// </summary>
    public string Text
    {
        get
        {
            var text = new StringBuilder();
            foreach (var line in lines())
                text.Append(line).Append('\n');
            return text.ToString();
        }
    }
}
