using System;
using System.Buffers.Binary;
using System.Runtime.InteropServices;
using StarLines.Fits.Numerics;
using Xunit;

namespace StarLines.Fits.Tests;

/// <summary>The fast kernels against their clear loops.</summary>
public sealed class KernelTests
{
    public static TheoryData<int> Lengths => [0, 1, 3, 4, 7, 8, 9, 15, 16, 17, 31, 33, 1000, 20001];

    [Theory]
    [MemberData(nameof(Lengths))]
    public void Fast_float32_agrees_with_the_clear_loop(int length)
    {
        byte[] source = RandomBytes(length * sizeof(float));
        double[] fast = new double[length];
        double[] plain = new double[length];
        BigEndian.SingleToDouble(source, fast);
        BigEndian.SingleToDoublePlainly(source, plain);
        Assert.Equal(plain, fast);
    }

    [Theory]
    [MemberData(nameof(Lengths))]
    public void Fast_float64_agrees_with_the_clear_loop(int length)
    {
        byte[] source = RandomBytes(length * sizeof(double));
        double[] fast = new double[length];
        double[] plain = new double[length];
        BigEndian.DoubleToDouble(source, fast);
        BigEndian.DoubleToDoublePlainly(source, plain);
        Assert.Equal(MemoryMarshal.Cast<double, long>(plain).ToArray(), MemoryMarshal.Cast<double, long>(fast).ToArray());
    }

    [Theory]
    [MemberData(nameof(Lengths))]
    public void Fast_checksum_agrees_with_the_clear_loop(int length)
    {
        ReadOnlySpan<uint> words = MemoryMarshal.Cast<byte, uint>(RandomBytes(length * sizeof(uint)));
        Assert.Equal(Checksum.SumWordsPlainly(words), Checksum.SumWords(words));
    }

    /// <summary>The definition: adding the words of the sixteen characters, as they lie in a header, to the sum of the rest gives all ones.</summary>
    [Theory]
    [InlineData(0u)]
    [InlineData(868229149u)]
    [InlineData(4294967295u)]
    [InlineData(123456789u)]
    public void Encoded_checksum_makes_the_sum_all_ones(uint sum)
    {
        string zeros = " '0000000000000000' ";
        string encoded = Checksum.Encode(sum);
        Assert.All(encoded, letter => Assert.True(char.IsAsciiLetterOrDigit(letter)));

        // In a card the first character stands in column 12, the fourth byte of a word.
        uint rest = Checksum.Fold(sum + (ulong)~Sum(" " + zeros));
        Assert.Equal(uint.MaxValue, Checksum.Fold((ulong)rest + Sum($"  '{encoded}' ")));
    }

    /// <summary>The worked example of the FITS Standard 4.0, appendix J.3: the sum 868229149.</summary>
    [Fact]
    public void Encoded_checksum_is_as_in_the_example_of_the_standard() => Assert.Equal("hcHjjc9ghcEghc9g", Checksum.Encode(868229149u));

    [Fact]
    public void Unsigned_64_bit_integers_become_the_nearest_doubles()
    {
        byte[] source = new byte[16];
        BinaryPrimitives.WriteInt64BigEndian(source, long.MinValue);
        BinaryPrimitives.WriteInt64BigEndian(source.AsSpan(8), long.MaxValue);
        double[] values = new double[2];
        BigEndian.Unsigned64ToDouble(source, null, values);
        Assert.Equal([0.0, ulong.MaxValue], values);
    }

    private static uint Sum(string text) => Checksum.Add(System.Text.Encoding.ASCII.GetBytes(text), 0);

    private static byte[] RandomBytes(int length)
    {
        byte[] bytes = new byte[length];
        new Random(length).NextBytes(bytes);
        return bytes;
    }
}
