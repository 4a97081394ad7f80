namespace BladeLoads.Studies.Tests.Laboratory;

internal static partial class TablesThatAreRead
{
    public static IEnumerable<ForeignCase> All => [.. Layouts, .. Surroundings, .. ReynoldsNumbers, .. Quantities, .. Order];
}
