using System.Collections.Immutable;
using System.Globalization;
using System.Text;
using System.Text.RegularExpressions;

namespace BladeLoads.Studies.Laboratory;

/// <summary>What the name of a column says about it.</summary>
/// <param name="Shown">As it stands in the header.</param>
/// <param name="MayBe">The roles that it may have; none for a name that is not known.</param>
/// <param name="IsPlain">It names its one role and nothing more: <c>cd</c>, not <c>cd_wake</c>.</param>
/// <param name="IsVersion">It names one version of a quantity of which there are several: <c>alpha_corrected</c>.</param>
/// <param name="Unit">Of an angle; null where none is named.</param>
/// <param name="Power">Of ten, beside a Reynolds number.</param>
internal sealed partial record ColumnName(
    string Shown, ImmutableArray<ColumnRole> MayBe, bool IsPlain, bool IsVersion, AngleUnit? Unit, int Power)
{
    /// <summary>Characters; what is longer names no column.</summary>
    public const int LongestName = 80;

    private static readonly Dictionary<string, ColumnRole> Plain = Words(
        (ColumnRole.Angle, "alpha alfa aoa angleofattack attackangle angle incidence angleofincidence incidenceangle anstellwinkel angledattaque"),
        (ColumnRole.Lift, "cl lift liftcoefficient liftcoeff liftcoef coefficientoflift clift auftriebsbeiwert"),
        (ColumnRole.Drag, "cd drag dragcoefficient dragcoeff dragcoef coefficientofdrag cdrag totaldrag totaldragcoefficient cdtotal "
            + "widerstandsbeiwert"),
        (ColumnRole.Moment, "cm moment momentcoefficient momentcoeff pitchingmoment pitchingmomentcoefficient cmc4 cm14 cm14c cm25 cm025 cm025c "
            + "cmquarterchord cmnoseuppositive cmpositivenoseup cmoment momentenbeiwert"),
        (ColumnRole.Reynolds, "re reynolds reynoldsnumber reynoldsno rey renumber reynoldszahl rn"),
        (ColumnRole.Normal, "cn normal normalforce normalforcecoefficient cnormal"),
        (ColumnRole.Tangential, "ct tangential tangentialforce tangentialforcecoefficient ctangential"),
        (ColumnRole.Axial, "cc chordforce chordforcecoefficient chordwiseforce axial axialforce axialforcecoefficient"),
        (ColumnRole.Section, "section airfoil aerofoil profile foil"));

    // One letter in one country, another in the next.
    private static readonly Dictionary<string, ImmutableArray<ColumnRole>> Unclear = new(StringComparer.Ordinal)
    {
        ["ca"] = [ColumnRole.Lift, ColumnRole.Axial],
        ["cz"] = [ColumnRole.Lift, ColumnRole.Normal],
        ["cy"] = [ColumnRole.Lift],
        ["cw"] = [ColumnRole.Drag],
        ["cx"] = [ColumnRole.Drag, ColumnRole.Axial],
        ["a"] = [ColumnRole.Angle],
    };

    private static readonly HashSet<string> Versions = new(
        ("corr corrected correction uncorr uncorrected unc raw eff effective geo geom geometric geometrical true real nominal nom measured meas "
            + "set actual target fit fitted smooth smoothed interpolated calc calculated computed theory theoretical exp experimental "
            + "2d 3d").Split(' '),
        StringComparer.Ordinal);

    /// <summary>Its numbers are no ratios as they stand: <c>cd [%]</c>, <c>cl x 10^3</c>, <c>-cm</c>.</summary>
    public bool IsMultiple => !Is(ColumnRole.Reynolds) && (IsTurned || Multiple().IsMatch(Shown));

    /// <summary><c>-cm</c>, <c>cm (nose down positive)</c>.</summary>
    public bool IsTurned => Shown.TrimStart() is ['-' or '\u2212' or '\u2013', ..]
        || Is(ColumnRole.Moment) && Shown.Contains("nose", StringComparison.OrdinalIgnoreCase)
            && Shown.Contains("down", StringComparison.OrdinalIgnoreCase);

    /// <summary>Of an angle: a unit stands beside it, and is not known.</summary>
    public bool HasUnknownUnit => Unit is null && !IsPlain && Shown.AsSpan().IndexOfAny("[({/") >= 0;

    public bool Is(ColumnRole role) => MayBe is [var only] && only == role;

    public static ColumnName Of(string text)
    {
        if (text.Length is 0 or > LongestName)
            return new ColumnName(text, [], false, false, null, 0);
        var (name, unit, power) = Apart(text);
        var tokens = Tokens(name);
        var whole = string.Concat(tokens);
        var angle = unit switch { UnitMeaning.Degrees => AngleUnit.Degrees, UnitMeaning.Radians => AngleUnit.Radians, _ => (AngleUnit?)null };
        if (Plain.TryGetValue(whole, out var role))
            return new ColumnName(
                text, [role], !HasTellingSign(name) && (power == 0 || role == ColumnRole.Reynolds) && (angle is null || role == ColumnRole.Angle),
                false, angle, power);
        if (Unclear.TryGetValue(whole, out var several))
            return new ColumnName(text, several, false, false, angle, power);
        return Qualified(tokens, whole) is var (stem, qualifier)
            ? new ColumnName(text, [Plain[stem]], false, Versions.Contains(qualifier), angle, power)
            : new ColumnName(text, [], false, false, angle, power);
    }

    // -cl, cd %, cl*: no letter more, and another quantity.
    private static bool HasTellingSign(string name) => name.TrimStart().StartsWith('-')
        || name.Normalize(NormalizationForm.FormKC).Any(c => !char.IsLetterOrDigit(c) && !char.IsWhiteSpace(c) && !"_.,{}$\\^()[]:\"/-".Contains(c)
            && CharUnicodeInfo.GetUnicodeCategory(c) != UnicodeCategory.NonSpacingMark);

    /// <summary>Whether two names are one, but for case, blanks and signs.</summary>
    public static bool AreAlike(string one, string other) => string.Concat(Tokens(one)) == string.Concat(Tokens(other));

    // A known name with more before or after it.
    private static (string Stem, string Qualifier)? Qualified(List<string> tokens, string whole)
    {
        for (var k = tokens.Count - 1; k > 0; k--)
        {
            if (string.Concat(tokens.Take(k)) is var first && Plain.ContainsKey(first))
                return (first, string.Concat(tokens.Skip(k)));
            if (string.Concat(tokens.TakeLast(k)) is var last && Plain.ContainsKey(last))
                return (last, string.Concat(tokens.SkipLast(k)));
        }
        foreach (var stem in new[] { "alpha", "aoa", "cl", "cd", "cm" })
            if (whole.StartsWith(stem, StringComparison.Ordinal) && Versions.Contains(whole[stem.Length..]))
                return (stem, whole[stem.Length..]);
        return whole is "cdp" or "cdf" or "cdwake" or "cdpressure" or "cmle" or "cmte" or "cmac" or "cm0" ? (whole[..2], whole[2..]) : null;
    }

    // The name, and the unit or the power of ten that stands beside it.
    private static (string Name, UnitMeaning Unit, int Power) Apart(string text)
    {
        var name = text.Trim();
        // Patterns are asked only where they can match: prose is looked at word by word.
        if (name.Length == 0)
            return (name, UnitMeaning.Unknown, 0);
        if (name.AsSpan().IndexOfAny("[({<") > 0 && InBrackets().Match(name) is { Success: true } bracketed)
        {
            var inner = bracketed.Groups["inner"].Value;
            var unit = UnitWords.Meaning(inner);
            if (unit != UnitMeaning.Unknown)
                return (bracketed.Groups["name"].Value, unit, 0);
            if (ReynoldsLine.PowerIn(inner) is > 0 and var power)
                return (bracketed.Groups["name"].Value, UnitMeaning.Unknown, power);
        }
        else if ("gsdn.°º".Contains(char.ToLowerInvariant(name[^1])) && AfterTheName().Match(name) is { Success: true } after)
            return (after.Groups["name"].Value, UnitWords.Meaning(after.Groups["unit"].Value), 0);
        else if (name[0] is 'r' or 'R' && PowerAfterTheName().Match(name) is { Success: true } raised)
            return (raised.Groups["name"].Value, UnitMeaning.Unknown, ReynoldsLine.PowerIn(raised.Groups["power"].Value));
        return (name, UnitMeaning.Unknown, 0);
    }

    /// <summary>Words and numbers in a name, in small letters.</summary>
    public static List<string> Tokens(string name)
    {
        var tokens = new List<string>();
        var token = new StringBuilder();
        foreach (var c in name.Normalize(NormalizationForm.FormKC).ToLowerInvariant())
            if (char.IsLetterOrDigit(c))
                token.Append(c == '\u03B1' ? "alpha" : c.ToString());
            else if (CharUnicodeInfo.GetUnicodeCategory(c) != UnicodeCategory.NonSpacingMark && token.Length > 0)
            {
                tokens.Add(token.ToString());
                token.Clear();
            }
        if (token.Length > 0)
            tokens.Add(token.ToString());
        return tokens;
    }

    private static Dictionary<string, ColumnRole> Words(params (ColumnRole Role, string Words)[] all) => all
        .SelectMany(role => role.Words.Split(' ').Select(word => (word, role.Role)))
        .ToDictionary(word => word.word, word => word.Role, StringComparer.Ordinal);

    [GeneratedRegex(@"^(?<name>.*?)\s*[\[({<](?<inner>[^\])}>]*)[\])}>]\s*$")]
    private static partial Regex InBrackets();

    [GeneratedRegex(
        @"^(?<name>.*?[^\s/,_])(?:\s*[/,_]\s*|\s+in\s+|\s+|(?<=alpha|aoa))(?<unit>deg|degrees?|°|º|rad|radians?)\.?$",
        RegexOptions.IgnoreCase)]
    private static partial Regex AfterTheName();

    // By a power up to the fourth: one above is a Reynolds number, which tables with several side by side put beside a name.
    [GeneratedRegex(
        @"[%‰]|percent|\bcounts?\b|\b10\s*(?:\^|\*\*)\s*[-−]?\s*[1-4](?![0-9])|[x×*·]\s*10{1,4}\b|10⁻?[¹²³⁴](?![⁰¹²³⁴⁵⁶⁷⁸⁹])"
            + @"|\b1e[-+]?0?[1-4]\b|\b10{2,4}\b",
        RegexOptions.IgnoreCase | RegexOptions.CultureInvariant)]
    private static partial Regex Multiple();

    [GeneratedRegex(@"^(?<name>re\w*(?:\s+number)?)\s*[x×*·/]\s*(?<power>(?:10|1e).*)$", RegexOptions.IgnoreCase)]
    private static partial Regex PowerAfterTheName();
}
