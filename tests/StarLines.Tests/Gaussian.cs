using System;

namespace StarLines.Tests;

/// <summary>Seeded normal deviates (Box and Muller 1958).</summary>
internal static class Gaussian
{
    internal static double Next(Random random) =>
        Math.Sqrt(-2.0 * Math.Log(1.0 - random.NextDouble())) * Math.Cos(2.0 * Math.PI * random.NextDouble());
}
