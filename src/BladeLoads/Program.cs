using System.Globalization;
using BladeLoads.Commands;

// Numbers are written and read the same on every machine, and messages are in one language.
CultureInfo.DefaultThreadCurrentCulture = CultureInfo.CurrentCulture = CultureInfo.InvariantCulture;
CultureInfo.DefaultThreadCurrentUICulture = CultureInfo.CurrentUICulture = CultureInfo.InvariantCulture;

return CommandLine.Run(args, Surroundings.OfThisProcess());
