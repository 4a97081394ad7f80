namespace BladeLoads.Studies.Tests.Laboratory;

internal static partial class TablesThatAreRefused
{
    public static IEnumerable<ForeignCase> All => [.. Columns, .. Units, .. Numbers, .. Order, .. ReynoldsNumbers, .. Whole];
}
