using BladeLoads.Studies.Tables;

namespace BladeLoads.Studies.Laboratory;

/// <summary>A row in our units, with the line it came from.</summary>
internal readonly record struct LaboratoryRow(int Line, int Column, PolarRow Values)
{
    public double Angle => Values.AngleDeg;
}
