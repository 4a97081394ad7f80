using BladeLoads.Rotor.Operation;
using BladeLoads.Studies;

namespace BladeLoads.Benchmarks;

/// <summary>Cases of the demo study, found from wherever the benchmark runs.</summary>
internal static class DemoStudy
{
    public static RotorCase Case(string name)
    {
        var folder = new DirectoryInfo(AppContext.BaseDirectory);
        while (folder is not null && !File.Exists(Path.Combine(folder.FullName, "BladeLoads.sln")))
            folder = folder.Parent;
        if (folder is null)
            throw new InvalidOperationException("run the benchmarks from within a clone: they solve inputs/tarn-valley");
        return StudyReader.Read(Path.Combine(folder.FullName, "inputs", "tarn-valley")).Cases.Single(c => c.Name == name).Rotor;
    }
}
