using System;
using System.Collections.Generic;
using System.Diagnostics;
using System.IO;
using System.Linq;
using StarLines.Fits.Tests.Reference;
using Xunit;

namespace StarLines.Fits.Tests;

/// <summary>Golden files with random damage: they are read, or refused with a <see cref="FitsFormatException"/>, in bounded time and memory.</summary>
public sealed class MutationTests
{
    private const int Mutations = 4000;

    /// <summary>The golden files hold at most 32 kB; what they decode to, with damage, stays far under this.</summary>
    private const long MostBytesEach = 200L << 20;

    /// <summary>A read takes about a millisecond; a loop that damage can drive would take minutes.</summary>
    private static readonly TimeSpan MostTimeEach = TimeSpan.FromSeconds(10);

    private static readonly string[] Words =
    [
        "-1", "0", "1", "999", "2147483647", "9223372036854775807", "-9223372036854775808", "1E400", "NaN", "'", "T", "1PD(9)", "1QE", "0X", "99999A", "(", "END",
    ];

    [Fact]
    public void Damaged_files_are_read_or_refused()
    {
        List<byte[]> originals = [.. Directory.GetFiles(GoldenTable.PathOf("fits")).Order(StringComparer.Ordinal).Select(File.ReadAllBytes)];
        Random random = new(4);
        int refused = 0;
        for (int i = 0; i < Mutations; i++)
        {
            byte[] damaged = Damage((byte[])originals[i % originals.Count].Clone(), random);
            Stopwatch watch = Stopwatch.StartNew();
            long before = GC.GetAllocatedBytesForCurrentThread();
            refused += Reading.Of(new MemoryStream(damaged), $"mutation {i}").Error is null ? 0 : 1;
            Assert.True(watch.Elapsed < MostTimeEach, $"mutation {i} took {watch.Elapsed}");
            Assert.True(GC.GetAllocatedBytesForCurrentThread() - before < MostBytesEach, $"mutation {i} allocated too much");
        }

        Assert.InRange(refused, Mutations / 20, Mutations - 1);
    }

    private static byte[] Damage(byte[] bytes, Random random)
    {
        switch (random.Next(4))
        {
            case 0:
                return bytes[..random.Next(bytes.Length)];
            case 1:
                for (int i = random.Next(1, 30); i > 0; i--)
                {
                    bytes[random.Next(bytes.Length)] = (byte)random.Next(256);
                }

                return bytes;
            case 2:
                // A value field of some card becomes something else.
                int card = random.Next(Math.Max(1, bytes.Length / 80)) * 80;
                string word = Words[random.Next(Words.Length)].PadLeft(20);
                for (int i = 0; i < word.Length && card + 10 + i < bytes.Length; i++)
                {
                    bytes[card + 10 + i] = (byte)word[i];
                }

                return bytes;
            default:
                // Descriptors and packed tiles lie in the last blocks.
                int start = Math.Max(0, bytes.Length - 2880);
                for (int i = random.Next(1, 8); i > 0; i--)
                {
                    bytes[start + random.Next(Math.Min(64, bytes.Length - start))] = (byte)random.Next(256);
                }

                return bytes;
        }
    }
}
