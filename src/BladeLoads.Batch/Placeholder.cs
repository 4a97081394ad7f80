namespace BladeLoads.Batch;
internal static class Placeholder;
