using System;
using System.IO;
using BenchmarkDotNet.Attributes;
using StarLines.Fits;
using StarLines.Fits.Numerics;

namespace StarLines.Benchmarks;

/// <summary>Reading a spectrum of 20,000 pixels from the page cache: a float32 primary image and a float32 error extension, to doubles.</summary>
[MemoryDiagnoser]
public class FitsBenchmarks
{
    private const int Pixels = 20_000;

    private readonly string path = Path.Combine(Path.GetTempPath(), Path.GetRandomFileName() + ".fits");
    private readonly byte[] stored = new byte[Pixels * sizeof(float)];
    private readonly double[] values = new double[Pixels];

    /// <summary>Writes the file.</summary>
    [GlobalSetup]
    public void Write()
    {
        Random random = new(1);
        for (int i = 0; i < Pixels; i++)
        {
            values[i] = 1000.0 + random.NextDouble();
        }

        FitsHeaderBuilder header = new FitsHeaderBuilder()
            .Add("CTYPE1", "WAVE").Add("CUNIT1", "Angstrom").Add("CRVAL1", 4000.0).Add("CRPIX1", 1.0).Add("CDELT1", 0.05).Add("OBJECT", "benchmark");
        using FileStream stream = File.Create(path);
        FitsWriter writer = new(stream);
        writer.WriteImage(values, [Pixels], -32, header);
        writer.WriteImage(values, [Pixels], -32, name: "ERROR");
    }

    /// <summary>Removes the file.</summary>
    [GlobalCleanup]
    public void Delete() => File.Delete(path);

    /// <summary>Opens the file, reads three keywords and both images; checksums are compared.</summary>
    [Benchmark]
    public double OpenAndReadImages() => ReadImages(new FitsOptions());

    /// <summary>The same without comparing checksums.</summary>
    [Benchmark]
    public double OpenAndReadImagesUnchecked() => ReadImages(new FitsOptions { VerifyChecksums = false });

    /// <summary>The bytes of the file alone.</summary>
    [Benchmark(Baseline = true)]
    public int ReadBytes() => File.ReadAllBytes(path).Length;

    /// <summary>The vectorized conversion of 20,000 float32.</summary>
    [Benchmark]
    public void ConvertFast() => BigEndian.SingleToDouble(stored, values);

    /// <summary>The clear loop of the same.</summary>
    [Benchmark]
    public void ConvertPlainly() => BigEndian.SingleToDoublePlainly(stored, values);

    private double ReadImages(FitsOptions options)
    {
        using FitsFile file = FitsFile.Open(path, options);
        FitsHeader header = file.Hdus[0].Header;
        _ = header.TryGetDouble("CRVAL1", out double start);
        _ = header.TryGetDouble("CDELT1", out double step);
        _ = header.TryGetDouble("CRPIX1", out double reference);
        double sum = start + step + reference;
        foreach (FitsHdu hdu in file.Hdus)
        {
            sum += hdu.Image!.ReadDoubles()[Pixels / 2];
        }

        return sum;
    }
}
