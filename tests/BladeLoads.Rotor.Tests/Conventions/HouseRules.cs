using System.Reflection;
using System.Reflection.Metadata;
using System.Reflection.PortableExecutable;
using BladeLoads.Rotor.Operation;

namespace BladeLoads.Rotor.Tests.Conventions;

public sealed class HouseRules
{
    private static readonly Assembly Rotor = typeof(RotorCase).Assembly;

    [Fact]
    public void No_name_in_the_rotor_library_carries_a_unit()
    {
        string[] units = ["Deg", "Rpm", "Kilo"];
        const BindingFlags All = BindingFlags.Public | BindingFlags.NonPublic | BindingFlags.Instance | BindingFlags.Static | BindingFlags.DeclaredOnly;
        var names = Rotor.GetTypes()
            .SelectMany(t => t.GetMembers(All).Select(m => $"{t.Name}.{m.Name}")
                .Concat(t.GetMethods(All).SelectMany(m => m.GetParameters().Select(p => $"{t.Name}.{m.Name}({p.Name})"))));
        Assert.DoesNotContain(
            names, n => units.Any(u => n.Contains(u, StringComparison.Ordinal) && !n.Contains("Degree", StringComparison.Ordinal)));
    }

    [Fact]
    public void The_rotor_library_references_no_other_of_ours()
        => Assert.DoesNotContain(
            Rotor.GetReferencedAssemblies(), a => a.Name!.StartsWith("BladeLoads", StringComparison.OrdinalIgnoreCase));

    [Fact]
    public void The_rotor_library_touches_no_file_clock_or_log()
    {
        using var file = File.OpenRead(Rotor.Location);
        using var image = new PEReader(file);
        var metadata = image.GetMetadataReader();
        var touched = metadata.TypeReferences
            .Select(metadata.GetTypeReference)
            .Select(t => $"{metadata.GetString(t.Namespace)}.{metadata.GetString(t.Name)}")
            .Where(t => t.StartsWith("System.IO.", StringComparison.Ordinal)
                || t is "System.DateTime" or "System.DateTimeOffset" or "System.TimeProvider" or "System.Diagnostics.Stopwatch"
                    or "System.Environment" or "System.Console" or "System.Random");
        Assert.Empty(touched);
    }
}
