using System;
using System.IO;
using StarLines.Fits.Tests.Reference;
using Xunit;

namespace StarLines.Fits.Tests;

/// <summary>Files that are too large to be read whole are read piece by piece; here small files are opened in that way.</summary>
public sealed class LargeFileTests
{
    [Theory]
    [InlineData("wave_log.fits")]
    [InlineData("int16_bscale_blank.fits")]
    [InlineData("table_scalar_rows.fits")]
    [InlineData("table_multi_order.fits")]
    [InlineData("table_varlen_q.fits")]
    [InlineData("table_ascii.fits")]
    [InlineData("tile_rice1_float32_dither1.fits")]
    public void Piecewise_reading_agrees_with_reading_whole(string name)
    {
        string path = GoldenTable.PathOf("fits", name);
        using FitsFile whole = FitsFile.Open(path);
        using FitsFile pieces = FitsFile.Open(new ByteSource.Handle(File.OpenHandle(path), new FileInfo(path).Length), name, new FitsOptions());
        Assert.Equal(whole.Hdus.Count, pieces.Hdus.Count);
        for (int i = 0; i < whole.Hdus.Count; i++)
        {
            Assert.Equal(whole.Hdus[i].Image?.ReadDoubles(), pieces.Hdus[i].Image?.ReadDoubles());
            for (int j = 0; j < (whole.Hdus[i].Table?.Columns.Count ?? 0); j++)
            {
                Assert.Equal(whole.Hdus[i].Table!.Columns[j].ReadDoubles(), pieces.Hdus[i].Table!.Columns[j].ReadDoubles());
            }
        }
    }

    [Theory]
    [InlineData("wave_log.fits")]
    [InlineData("tile_rice1_int16.fits")]
    public void Part_of_an_image_is_that_part_of_the_whole(string name)
    {
        using FitsFile file = FitsFile.Open(GoldenTable.PathOf("fits", name));
        FitsImage image = file.Hdus[^1].Image!;
        double[] part = new double[150];
        image.ReadDoubles(90, part);
        Assert.Equal(image.ReadDoubles().AsSpan(90, 150).ToArray(), part);
    }
}
