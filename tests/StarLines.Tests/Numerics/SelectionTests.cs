using System;
using System.Linq;
using StarLines.Numerics;
using Xunit;

namespace StarLines.Tests.Numerics;

public sealed class SelectionTests
{
    [Fact]
    public void Selection_agrees_with_sorting()
    {
        var random = new Random(3);
        for (int trial = 0; trial < 500; trial++)
        {
            double[] values = [.. Enumerable.Range(0, 1 + random.Next(60)).Select(_ => (double)random.Next(20))];
            double[] sorted = [.. values.Order()];
            int index = random.Next(values.Length);
            Assert.Equal(sorted[index], Selection.Smallest(values, index));
            Assert.True(index == 0 || values.Take(index).Max() <= values[index]);
        }
    }
}
