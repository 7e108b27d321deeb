using System;
using System.Globalization;
using Xunit;

namespace StarLines.Tests.Velocities.Reference;

/// <summary>The largest and the root mean square of many differences.</summary>
internal sealed class Worst
{
    private double _largest;
    private double _squares;
    private int _row = -1;
    private int _count;

    public void Add(int row, double difference)
    {
        // A difference that is no number is the worst of all.
        if (!(Math.Abs(difference) <= _largest))
        {
            _largest = double.IsFinite(difference) ? Math.Abs(difference) : double.PositiveInfinity;
            _row = row;
        }

        _squares += difference * difference;
        _count++;
    }

    public void AssertBelow(double largest, double rms, string unit)
    {
        TestContext.Current.SendDiagnosticMessage("{0} {1}", this, unit);
        Assert.True(_count > 0 && _largest <= largest && Rms <= rms, $"{this} {unit}; allowed {largest} and {rms}");
    }

    public override string ToString() => string.Create(
        CultureInfo.InvariantCulture, $"largest {_largest:g3} in row {_row}, rms {Rms:g3}, {_count} rows");

    private double Rms => Math.Sqrt(_squares / _count);
}
