using System;
using System.Globalization;
using System.IO;
using System.Text;

namespace StarLines.Runs.Tests;

/// <summary>A folder for one test, removed at its end, and invented spectra in it.</summary>
internal sealed class TemporaryFolder : IDisposable
{
    public string Path { get; } = Directory.CreateTempSubdirectory("starlines-run-").FullName;

    public string this[params string[] parts] => System.IO.Path.Combine([Path, .. parts]);

    public void Dispose() => Directory.Delete(Path, recursive: true);

    public string WriteText(string name, string text)
    {
        string path = this[name];
        Directory.CreateDirectory(System.IO.Path.GetDirectoryName(path)!);
        File.WriteAllText(path, text);
        return path;
    }

    /// <summary>A spectrum around H-alpha and H-beta, seeded noise, lines of the given depth shifted by a velocity.</summary>
    public string WriteSpectrum(string name, int seed, double velocityKmPerS = 0.0, double depth = 0.5)
    {
        var random = new Random(seed);
        var text = new StringBuilder("# medium: air\nwavelength,flux,error\n");
        double[] lines = [4861.35, 4920.5, 4957.6, 5006.12, 5167.32, 5172.68, 5183.60, 5227.19, 5269.54, 5328.04];
        for (double wavelength = 4800.0; wavelength < 5400.0; wavelength += 0.25)
        {
            double flux = 1000.0 * (1.0 - (1e-4 * (wavelength - 5100.0)));
            foreach (double rest in lines)
            {
                double x = (wavelength - (rest * (1.0 + (velocityKmPerS / 299_792.458)))) / 0.5;
                flux *= 1.0 - (depth * Math.Exp(-0.5 * x * x));
            }

            // Box-Muller, one of the pair.
            double noise = Math.Sqrt(-2.0 * Math.Log(1.0 - random.NextDouble())) * Math.Cos(2.0 * Math.PI * random.NextDouble());
            text.Append(CultureInfo.InvariantCulture, $"{wavelength:F2},{flux + (10.0 * noise):F3},10\n");
        }

        return WriteText(name, text.ToString());
    }
}
