using System;
using System.IO;
using Xunit;

namespace StarLines.Tables.Tests;

/// <summary>Damaged bytes give a table or the one documented exception, in bounded time.</summary>
public class MutationTests
{
    private const int Seed = 20261201;

    [Theory]
    [InlineData(TableFormat.Ecsv, 1500)]
    [InlineData(TableFormat.Csv, 1500)]
    [InlineData(TableFormat.Json, 1500)]
    [InlineData(TableFormat.VoTable, 1500)]
    [InlineData(TableFormat.Parquet, 300)]
    public void Damaged_bytes_give_a_table_or_a_format_exception(TableFormat format, int count)
    {
        byte[] good = TableAssert.Write(TableSamples.Full(), format);
        var random = new Random(Seed);
        int refused = 0;
        for (int i = 0; i < count; i++)
        {
            byte[] bad = Damage(good, random);
            try
            {
                _ = TableReader.Read(new MemoryStream(bad), format, "damaged");
            }
            catch (TableFormatException exception)
            {
                Assert.NotEmpty(exception.Message);
                refused++;
            }
        }

        Assert.InRange(refused, 1, count);
    }

    private static byte[] Damage(byte[] good, Random random)
    {
        byte[] bytes = (byte[])good.Clone();
        int kind = random.Next(4);
        if (kind == 0)
        {
            return bytes[..random.Next(bytes.Length)];
        }

        int changes = 1 + random.Next(8);
        for (int i = 0; i < changes; i++)
        {
            ReadOnlySpan<byte> marks = "\"#{}[]:,\n\r\t <>&'!*|\\-"u8;
            int at = random.Next(bytes.Length);
            bytes[at] = kind == 1 ? (byte)random.Next(256) : marks[random.Next(marks.Length)];
        }

        if (kind != 3)
        {
            return bytes;
        }

        int start = random.Next(bytes.Length);
        int length = Math.Min(random.Next(40), bytes.Length - start);
        return [.. bytes[..start], .. bytes[(start + length)..]];
    }
}
