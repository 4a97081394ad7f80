using BladeLoads.Rotor.Momentum;
using BladeLoads.Studies.Toml;

namespace BladeLoads.Studies.Cases;

/// <summary>Reads [model].</summary>
internal static class ModelReader
{
    private const int MostElements = 2000;

    public static BalanceModel Read(CaseValues values)
    {
        var elements = values.WholeNumber("model.elements", CaseDefaults.Elements, 1, MostElements);
        UsualRanges.Check(values, "model.elements", elements);
        var spacing = values.Choice("model.spacing", CaseDefaults.Spacing, "cosine", "uniform");
        var losses = ReadLosses(values);
        var heavyLoading = values.Choice("model.heavy_loading", CaseDefaults.HeavyLoading, "glauert-1935", "buhl-2005");
        var balanceWith = values.Choice("model.balance_with", CaseDefaults.BalanceWith, "lift and drag", "lift");
        return new BalanceModel(
            elements,
            spacing == "uniform" ? ElementSpacing.Uniform : ElementSpacing.Cosine,
            losses.Contains("tip"), losses.Contains("hub"),
            heavyLoading == "buhl-2005" ? HeavyLoading.Buhl2005 : HeavyLoading.Glauert1935,
            balanceWith == "lift" ? BalanceWith.Lift : BalanceWith.LiftAndDrag);
    }

    private static List<string> ReadLosses(CaseValues values)
    {
        const string path = "model.losses";
        List<string> losses = [.. CaseDefaults.Losses];
        if (values.Find(path) is { } entry)
        {
            losses.Clear();
            if (entry.Value is not TomlValue.List list)
                values.RefuseValue(path, $"is {entry.Value.Found}; give a list of \"tip\" and \"hub\", or an empty one: []");
            else
                foreach (var item in list.Items)
                    if (item is not TomlValue.Text { Value: "tip" or "hub" } loss)
                        values.Refuse(item.At, $"losses holds {item.Found}; known are \"tip\" and \"hub\"");
                    else if (losses.Contains(loss.Value))
                        values.Refuse(item.At, $"losses holds {item.Found} twice; keep one");
                    else
                        losses.Add(loss.Value);
        }
        // In one order, whatever the case's: both orders are the same losses.
        values.Note(path, string.Join(',', losses.OrderDescending(StringComparer.Ordinal)));
        return losses;
    }
}
