namespace BladeLoads.Results;
internal static class Placeholder;
