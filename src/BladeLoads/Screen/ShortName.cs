namespace BladeLoads.Screen;

/// <summary>A case's name in a column that it does not fit.</summary>
internal static class ShortName
{
    private const int ShortestKey = 2;

    /// <summary>
    /// A variant keeps its values and gives up letters of its keys, <c>air~dens..-1.05~fine..--1</c>, since only the values tell it from
    /// its neighbours; other names lose their middle.
    /// </summary>
    public static string Of(string name, int width)
    {
        if (name.Length <= width)
            return name;
        var parts = name.Split('~');
        for (var letters = width; letters >= ShortestKey; letters--)
        {
            var shorter = string.Join('~', parts.Select((part, i) => i == 0 ? part : WithShortKey(part, letters)));
            if (shorter.Length <= width)
                return shorter;
        }
        var half = width / 2 - 1;
        return $"{name[..half]}..{name[^half..]}";
    }

    private static string WithShortKey(string part, int letters)
    {
        var keyEnd = part.IndexOf('-', StringComparison.Ordinal);
        return keyEnd > letters + 2 ? $"{part[..letters]}..{part[keyEnd..]}" : part;
    }
}
