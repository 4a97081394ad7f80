using static BladeLoads.Studies.PolarCheck.CheckedPolar;

namespace BladeLoads.Studies.PolarCheck;

/// <summary>Rows so far apart that what lies between them is a guess.</summary>
internal static class Gaps
{
    public static IEnumerable<PolarDoubt> Doubts(CheckedPolar polar)
    {
        if (polar.Figures.IsBluff)
            yield break;
        for (var i = 1; i < polar.Rows.Length; i++)
        {
            var (from, to) = (polar.Rows[i - 1].AngleDeg, polar.Rows[i].AngleDeg);
            var (widest, where) = Widest((from + to) / 2);
            if (to - from > widest)
                yield return polar.DoubtBetween(DoubtKinds.Gap, "alpha_deg", i - 1, i,
                    $"no row between {Given(from)} and {Given(to)} deg, and the curve there is a guess; {where} give one every {Given(widest)} deg "
                    + "or closer");
        }
    }

    private static (double Widest, string Where) Widest(double angleDeg) => angleDeg switch
    {
        >= -10 and <= 20 => (2.5, "from -10 to 20 deg"),
        >= -20 and <= 30 => (5, "from -20 to 30 deg"),
        _ => (15, "far from the working range"),
    };
}
