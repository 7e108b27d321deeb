using System;
using System.Buffers.Binary;

namespace StarLines.Fits.Writing;

/// <summary>The stored integer type that holds a set of values.</summary>
/// <param name="Letter">Its TFORM letter.</param>
/// <param name="Bytes">Its size.</param>
/// <param name="Least">Its least value, kept free for undefined values.</param>
/// <param name="HasMissing">Whether there are undefined values.</param>
internal sealed record IntegerWidth(char Letter, int Bytes, long Least, bool HasMissing)
{
    internal long? Missing => HasMissing ? Least : null;

    internal static IntegerWidth For(ReadOnlySpan<long> values)
    {
        long least = 0;
        long most = 0;
        bool hasMissing = false;
        foreach (long value in values)
        {
            hasMissing |= value == IntegerScaling.Missing;
            least = value == IntegerScaling.Missing ? least : Math.Min(least, value);
            most = Math.Max(most, value);
        }

        return least > short.MinValue && most <= short.MaxValue ? new IntegerWidth('I', sizeof(short), short.MinValue, hasMissing)
            : least > int.MinValue && most <= int.MaxValue ? new IntegerWidth('J', sizeof(int), int.MinValue, hasMissing)
            : new IntegerWidth('K', sizeof(long), long.MinValue, hasMissing);
    }

    internal void Write(Span<byte> cell, long value) => Write(cell, value, Bytes);

    internal static void Write(Span<byte> cell, long value, int bytes)
    {
        switch (bytes)
        {
            case sizeof(byte):
                cell[0] = (byte)value;
                break;
            case sizeof(short):
                BinaryPrimitives.WriteInt16BigEndian(cell, (short)value);
                break;
            case sizeof(int):
                BinaryPrimitives.WriteInt32BigEndian(cell, (int)value);
                break;
            default:
                BinaryPrimitives.WriteInt64BigEndian(cell, value);
                break;
        }
    }
}
