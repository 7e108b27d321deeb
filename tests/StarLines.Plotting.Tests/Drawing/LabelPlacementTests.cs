using System;
using System.Collections.Generic;
using System.Linq;
using CsCheck;
using StarLines.Plotting.Drawing;
using Xunit;

namespace StarLines.Plotting.Tests.Drawing;

public sealed class LabelPlacementTests
{
    private const double Tolerance = 1e-9;

    private static readonly Gen<(double[] Wanted, double[] Strengths, double Spacing, double Farthest)> Cases =
        from count in Gen.Int[0, 400]
        from crowd in Gen.Double[1, 700]
        from wanted in Gen.Double[-20, 20 + crowd].Array[count]
        from strengths in Gen.OneOf(Gen.Double[0, 1], Gen.Const(1.0)).Array[count]
        from spacing in Gen.Double[1, 40]
        from farthest in Gen.Double[0, 100]
        select (wanted.Order().ToArray(), strengths, spacing, farthest);

    [Fact]
    public void Labels_never_overlap_nor_leave_the_frame_nor_stray()
    {
        Cases.Sample(
            c =>
            {
                double[] places = LabelPlacement.Place(c.Wanted, c.Strengths, c.Spacing, 10, 650, c.Farthest);
                double previous = double.NegativeInfinity;
                for (int i = 0; i < places.Length; i++)
                {
                    if (double.IsNaN(places[i]))
                    {
                        continue;
                    }

                    Assert.True(places[i] - previous >= c.Spacing - Tolerance, "two labels overlap");
                    Assert.InRange(places[i], 10 - Tolerance, 650 + Tolerance);
                    Assert.True(Math.Abs(places[i] - c.Wanted[i]) <= c.Farthest + Tolerance, "a label strayed");
                    previous = places[i];
                }
            },
            seed: "0000000000001", iter: 400);
    }

    [Fact]
    public void The_strongest_label_is_always_shown()
    {
        Cases.Sample(
            c =>
            {
                List<int> inside = [.. Enumerable.Range(0, c.Wanted.Length).Where(i => c.Wanted[i] is >= 10 and <= 650)];
                if (inside.Count == 0)
                {
                    return;
                }

                int strongest = inside.OrderByDescending(i => c.Strengths[i]).ThenBy(i => i).First();
                double[] places = LabelPlacement.Place(c.Wanted, c.Strengths, c.Spacing, 10, 650, c.Farthest);
                Assert.False(double.IsNaN(places[strongest]));
            },
            seed: "0000000000001", iter: 200);
    }

    [Fact]
    public void Labels_with_room_stand_over_their_lines() =>
        Assert.Equal([20, 60, 100], LabelPlacement.Place([20, 60, 100], [1, 2, 3], 30, 0, 200, 50));

    [Fact]
    public void Two_labels_on_one_place_move_apart_evenly() =>
        Assert.Equal([90, 110], LabelPlacement.Place([100, 100], [1, 2], 20, 0, 200, 50));

    [Fact]
    public void The_weaker_of_two_gives_way_where_there_is_no_room() =>
        Assert.Equal([double.NaN, 100], LabelPlacement.Place([100, 100], [1, 2], 20, 0, 200, 5));

    [Fact]
    public void There_are_no_labels_where_the_frame_is_too_narrow() =>
        Assert.Equal([double.NaN], LabelPlacement.Place([5], [1], 20, 10, 8, 50));
}
