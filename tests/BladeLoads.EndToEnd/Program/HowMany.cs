using System.Globalization;

namespace BladeLoads.EndToEnd.Program;

/// <summary>How often long tests do what they do: a little in every test run, in full when told by the environment (DEVELOPERS.md).</summary>
internal static class HowMany
{
    public static int Kills => Of("BLADELOADS_KILLS", 6);

    public static int PowerCuts => Of("BLADELOADS_POWER_CUTS", 4);

    /// <summary>Cases that several processes share.</summary>
    public static int SharedCases => Of("BLADELOADS_SHARED_CASES", 120);

    private static int Of(string variable, int otherwise)
        => Environment.GetEnvironmentVariable(variable) is { Length: > 0 } text ? int.Parse(text, CultureInfo.InvariantCulture) : otherwise;
}
