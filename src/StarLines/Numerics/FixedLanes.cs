using System;
using System.Diagnostics;
using System.Runtime.InteropServices;
using System.Runtime.Intrinsics;

namespace StarLines.Numerics;

/// <summary>Sums with a fixed number of lanes, so that the last digits do not depend on the machine.</summary>
internal static class FixedLanes
{
    /// <summary>The sum of a[i] b[i]; the lengths are equal. A NaN gives NaN.</summary>
    internal static double Dot(ReadOnlySpan<double> a, ReadOnlySpan<double> b)
    {
        Debug.Assert(a.Length == b.Length, "The lengths differ.");
        ref double startA = ref MemoryMarshal.GetReference(a);
        ref double startB = ref MemoryMarshal.GetReference(b);
        Vector256<double> sum = Vector256<double>.Zero;
        int i = 0;
        for (; i <= a.Length - Vector256<double>.Count; i += Vector256<double>.Count)
        {
            sum += Vector256.LoadUnsafe(ref startA, (nuint)i) * Vector256.LoadUnsafe(ref startB, (nuint)i);
        }

        double total = Vector256.Sum(sum);
        for (; i < a.Length; i++)
        {
            total += a[i] * b[i];
        }

        return total;
    }
}
