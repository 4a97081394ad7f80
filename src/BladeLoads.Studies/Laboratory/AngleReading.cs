using System.Globalization;
using BladeLoads.Studies.Fingerprints;
using BladeLoads.Studies.Tables;

namespace BladeLoads.Studies.Laboratory;

/// <summary>Angles of a foreign table in degrees, once their unit is said or cannot be another.</summary>
internal sealed class AngleReading
{
    private const double AngleSlack = 1e-9;   // deg
    private const int FewestDecimals = 3;     // of radians that are taken as pi or 2 pi

    private readonly ReadingRequest _request;
    private readonly AngleUnit _unit;
    private int _wrapped;
    private int _halfTurns;
    private int _turns;

    // What would do where angles go beyond those of their unit, which may be another; empty where it cannot.
    private readonly string _advice;

    private AngleReading(ReadingRequest request, AngleUnit unit, string why, string advice = "")
        => (_request, _unit, Why, _advice) = (request, unit, why, advice);

    /// <summary>The unit and from where it is known, for the record.</summary>
    public string Why { get; }

    /// <summary>What was done to the angles, for the record.</summary>
    public IEnumerable<string> Done()
    {
        if (_unit == AngleUnit.Radians)
            yield return "angles from radians to degrees, 12 significant digits";
        if (_halfTurns > 0)
            yield return "the last digit of pi rounded up taken as 180 degrees";
        if (_turns > 0)
            yield return "the last digit of 2 pi rounded up taken as 360 degrees";
        if (_wrapped > 0)
            yield return string.Create(CultureInfo.InvariantCulture, $"{_wrapped} angle{(_wrapped == 1 ? "" : "s")} beyond 180 degrees by a turn");
    }

    /// <summary>Null, with the reason reported, where the unit is not known, or said twice and not the same.</summary>
    public static AngleReading? Of(TableScan scan, ReadingRequest request, string file, Findings findings)
    {
        var named = scan.Unit;
        var (lowest, highest) = (scan.Rows.Min(row => row.Angle), scan.Rows.Max(row => row.Angle));
        var areDegrees = !CanBeRadians(lowest, highest);
        if (request.Angles is { } said && named is { } other && other != said)
        {
            if (said == AngleUnit.Degrees && areDegrees)
                return new AngleReading(request, said, string.Create(CultureInfo.InvariantCulture,
                    $"angles in degrees, as --angles says and as they go beyond all radians, though line {scan.UnitLine} names radians"));
            findings.Error(new Place(file, scan.UnitLine, 1), $"names {InWords(other)} for the angle of attack and --angles says {InWords(said)}; "
                + "if the line is wrong, leave it out with --lines and say --columns by number");
            return null;
        }
        if (request.Angles is { } asked)
            return new AngleReading(
                request, asked, $"angles in {InWords(asked)}, as --angles says", areDegrees ? "; is --angles radians right?" : "");
        if (named is { } unit)
            return new AngleReading(
                request, unit, string.Create(CultureInfo.InvariantCulture, $"angles in {InWords(unit)}, as line {scan.UnitLine} says"),
                !areDegrees ? "" : string.Create(
                    CultureInfo.InvariantCulture, $"; if line {scan.UnitLine} is wrong to name radians, say --angles degrees"));
        if (scan.Columns!.NameOf(ColumnRole.Angle) is { HasUnknownUnit: true })
        {
            findings.Error(new Place(file, scan.Header.Line, 1),
                $"{scan.Columns.Shown(ColumnRole.Angle)} names a unit that is not known; say --angles degrees or --angles radians, "
                + "and give other units as one of these");
            return null;
        }
        // Nobody counts radians from 0 to -2 pi without saying so.
        if (!areDegrees && (lowest >= 0 || lowest >= -PolarTable.LargestRadian))
        {
            findings.Error(new Place(file, scan.Rows[0].Line, scan.Rows[0].At.Angle),
                $"alpha runs from {CanonicalText.Of(lowest)} to {CanonicalText.Of(highest)} "
                + "only, and nothing says whether in degrees or radians; say --angles degrees or --angles radians");
            return null;
        }
        return new AngleReading(request, AngleUnit.Degrees, "angles in degrees, as they go beyond all radians");
    }

    // Radians go from -pi to pi, or from 0 to 2 pi on either side.
    private static bool CanBeRadians(double lowest, double highest)
        => Math.Abs(lowest) <= PolarTable.LargestRadian && Math.Abs(highest) <= PolarTable.LargestRadian
            || lowest >= 0 && highest <= 2 * PolarTable.LargestRadian || highest <= 0 && lowest >= -2 * PolarTable.LargestRadian;

    /// <summary>Degrees, -180 to 180; null, with what is wrong, for an angle beyond.</summary>
    public double? ToDegrees(double angle, out string problem)
    {
        problem = "";
        var degrees = _unit == AngleUnit.Radians ? TwelveDigits.Of(double.RadiansToDegrees(angle)) : angle;
        if (Math.Abs(degrees) <= 180)
            return degrees;
        if (Math.Abs(degrees) <= 180 + AngleSlack)
            return Math.CopySign(180, degrees);
        if (IsRoundedUp(angle, Math.PI))
        {
            _halfTurns++;
            return Math.CopySign(180, degrees);
        }
        var isTurn = IsRoundedUp(angle, Math.Tau);
        var goesRound = isTurn || Math.Abs(degrees) <= 360 + AngleSlack;
        if (_request.Wrap && goesRound)
        {
            _turns += isTurn ? 1 : 0;
            _wrapped++;
            var turn = Math.CopySign(360, degrees);
            return isTurn ? 0 : TwelveDigits.Of(Math.Clamp(degrees - turn, -180, 180));
        }
        var advice = _unit == AngleUnit.Radians ? _advice : "";
        problem = $"alpha is {CanonicalText.Of(angle)}{(_unit == AngleUnit.Radians ? $" rad, {CanonicalText.Of(degrees)} deg" : "")}; "
            + "angles go from -180 to 180 degrees"
            + (advice.Length > 0 ? advice
                : goesRound ? $"; where they go round from 0 to {(degrees < 0 ? "-360" : "360")}, say --wrap"
                : "");
        return null;
    }

    // Beyond by half a digit of its last place at most.
    private bool IsRoundedUp(double angle, double round)
        => _unit == AngleUnit.Radians && Math.Abs(angle) > round && Math.Abs(angle) - round <= HalfOfLastDigit(angle);

    // 0 where a step of the table may be as short as the digit: 6.3 after 6.2 is no 2 pi.
    private static double HalfOfLastDigit(double angle)
    {
        var text = angle.ToString("R", CultureInfo.InvariantCulture);
        var point = text.IndexOf('.', StringComparison.Ordinal);
        var decimals = point < 0 ? 0 : text.Length - point - 1;
        return decimals < FewestDecimals ? 0 : 0.5 * Math.Pow(10, -decimals);
    }

    private static string InWords(AngleUnit unit) => unit == AngleUnit.Degrees ? "degrees" : "radians";
}
