namespace BladeLoads.Studies.Laboratory;

/// <summary>Why a column that names a moment is not taken for the one about the quarter chord, nose up.</summary>
internal static class MomentDoubt
{
    public static string Of(ColumnName name) => name switch
    {
        { IsTurned: true } => "its sign is turned",
        { IsMultiple: true } => "it is a multiple of the moment coefficient",
        _ when Names(name, "le", "cmle", "leading") => "it is about the leading edge",
        _ when Names(name, "te", "cmte", "trailing") => "it is about the trailing edge",
        _ when Names(name, "ac", "cmac", "aerodynamic") => "it is about the aerodynamic centre",
        { IsVersion: true } => "it is one version of several",
        _ => "it is not plainly about the quarter chord",
    };

    private static bool Names(ColumnName name, params ReadOnlySpan<string> words)
    {
        foreach (var token in ColumnName.Tokens(name.Shown))
            if (words.Contains(token))
                return true;
        return false;
    }
}
