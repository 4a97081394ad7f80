using BladeLoads.Rotor.Sections;
using BladeLoads.Studies.Tables;
using static BladeLoads.Studies.PolarCheck.CheckedPolar;

namespace BladeLoads.Studies.PolarCheck;

/// <summary>Drag below that of a laminar plate: no section has so little.</summary>
internal static class DragFloor
{
    private const double LargestReynolds = 1e8;   // beyond that of any blade: the floor of a table that names no Reynolds number
    private const double Rounding = 0.99;         // drag in few digits

    public static IEnumerable<PolarDoubt> Doubts(CheckedPolar polar)
    {
        var isOpen = double.IsNaN(polar.Reynolds);
        var reynolds = isOpen ? LargestReynolds : polar.Reynolds;
        var floor = PlateFriction.Laminar(reynolds);
        for (var i = 0; i < polar.Rows.Length; i++)
        {
            var (before, after) = (Math.Max(0, i - 1), Math.Min(i + 1, polar.Rows.Length - 1));
            if (polar.Rows[i].Drag < floor * Rounding)
                yield return polar.Doubt(DoubtKinds.DragBelowPlate, "cd", [i], polar.Rows[before].AngleDeg, polar.Rows[after].AngleDeg,
                    $"cd is {Given(polar.Rows[i].Drag)}, and a laminar plate has {Found(floor)} {(isOpen ? "even " : "")}at Reynolds number "
                    + ReynoldsNumber.Text(reynolds),
                    "; drag of pressure alone, or a slip?");
        }
    }
}
