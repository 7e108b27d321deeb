using System;

namespace StarLines.Examples.MakeNight;

/// <summary>Normally distributed numbers that are the same on every machine: a 64-bit generator of Marsaglia and the Box–Muller formula.</summary>
internal sealed class NormalNumbers(int seed)
{
    private ulong _state = 0x9E3779B97F4A7C15UL * (ulong)(seed + 1);

    /// <summary>The next number; mean 0, standard deviation 1.</summary>
    public double Next() => Math.Sqrt(-2.0 * Math.Log(1.0 - Uniform())) * Math.Cos(2.0 * Math.PI * Uniform());

    // xorshift64* (Vigna 2016, ACM TOMS 42, 30): the upper 53 bits.
    private double Uniform()
    {
        _state ^= _state >> 12;
        _state ^= _state << 25;
        _state ^= _state >> 27;
        return ((_state * 0x2545F4914F6CDD1DUL) >> 11) * (1.0 / (1UL << 53));
    }
}
