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
            var (widest, where) = Widest(from, to);
            if (to - from > widest)
                yield return polar.DoubtBetween(DoubtKinds.Gap, "alpha_deg", i - 1, i,
                    $"no row between {Given(from)} and {Given(to)} deg, and the curve there is a guess",
                    $"; {where} give one every {Given(widest)} deg or closer");
        }
    }

    // By the narrowest range that the gap reaches into.
    private static (double Widest, string Where) Widest(double fromDeg, double toDeg)
        => fromDeg < 20 && toDeg > -10 ? (2.5, "from -10 to 20 deg")
            : fromDeg < 30 && toDeg > -20 ? (5, "from -20 to 30 deg")
            : (15, "far from the working range");
}
