namespace BladeLoads.Commands;

/// <summary>Something was asked for that is not there, or cannot be meant so. The message says what was found and what would do.</summary>
internal sealed class WrongUseException(string message) : Exception(message);
