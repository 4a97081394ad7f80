using System.Collections.Concurrent;
using System.Globalization;
using CsCheck;

namespace BladeLoads.Rotor.Tests.Properties;

/// <summary>
/// The same sample every time: case i is drawn with its own stream of one fixed seed, so neither threads nor order change it. A failure
/// names the case and its seed; <c>gen.Sample(check, seed: "...")</c> then shrinks it.
/// </summary>
internal static class FixedSample
{
    private const ulong Seed = 0x5EED_0F_B1ADE;

    public static void ForEach<T>(Gen<T> gen, int count, Action<T> check)
    {
        var failures = new ConcurrentDictionary<int, string>();
        Parallel.For(0, count, i =>
        {
            var (value, seed) = Draw(gen, i);
            try
            {
                check(value);
            }
            catch (Exception e)
            {
                failures[i] = string.Create(CultureInfo.InvariantCulture, $"case {i}, seed \"{seed}\": {value}\n{e.Message}");
            }
        });
        Assert.True(failures.IsEmpty,
            $"{failures.Count} of {count} fail; the first are\n{string.Join("\n", failures.OrderBy(f => f.Key).Take(3).Select(f => f.Value))}");
    }

    public static (T Value, string Seed) Draw<T>(Gen<T> gen, int i)
    {
        var random = new PCG((uint)i, Seed);
        var seed = random.ToString();
        return (gen.Generate(random, null, out _), seed);
    }
}
