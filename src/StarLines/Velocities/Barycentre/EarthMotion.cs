using System;
using System.Collections.Generic;
using System.Globalization;
using System.IO;
using System.Text;

namespace StarLines.Velocities.Barycentre;

/// <summary>
/// The motion of the Earth as Chebyshev series: its place and the Sun's (JPL DE405), the celestial intermediate pole and
/// origin (IAU 2006/2000A), and TDB − TT (Fairhead and Bretagnon 1990). Made by <c>Data/make/earth_motion.py</c>,
/// which names the sources and describes the file.
/// </summary>
internal sealed class EarthMotion
{
    private const string ResourceName = "StarLines.Velocities.Barycentre.Data.earth-motion.bin";
    private const string Format = "StarLines Chebyshev series, format 1";

    private static readonly Lazy<EarthMotion> Lazily = new(Load);

    private EarthMotion(Dictionary<string, ChebyshevSeries> series)
    {
        Earth = series["earth"];
        Sun = series["sun"];
        Pole = series["pole"];
        Locator = series["locator"];
        Clock = series["clock"];
    }

    internal static EarthMotion Instance => Lazily.Value;

    /// <summary>Barycentric place of the Earth's centre, ICRS axes, m, by TDB.</summary>
    internal ChebyshevSeries Earth { get; }

    /// <summary>Barycentric place of the Sun's centre, ICRS axes, m, by TDB.</summary>
    internal ChebyshevSeries Sun { get; }

    /// <summary>Celestial intermediate pole X, Y in the GCRS, rad, by TT.</summary>
    internal ChebyshevSeries Pole { get; }

    /// <summary>Locator of the celestial intermediate origin, s + XY/2, rad, by TT.</summary>
    internal ChebyshevSeries Locator { get; }

    /// <summary>TDB − TT at the Earth's centre, s, by TT.</summary>
    internal ChebyshevSeries Clock { get; }

    private static EarthMotion Load()
    {
        using Stream stream = typeof(EarthMotion).Assembly.GetManifestResourceStream(ResourceName)
            ?? throw new InvalidOperationException($"The resource {ResourceName} is missing from the program.");
        var bytes = new byte[stream.Length];
        stream.ReadExactly(bytes);
        return new EarthMotion(Parse(bytes));
    }

    private static Dictionary<string, ChebyshevSeries> Parse(byte[] bytes)
    {
        int headerLength = bytes.AsSpan().IndexOf("\n\n"u8);
        string[] lines = Encoding.ASCII.GetString(bytes, 0, headerLength).Split('\n');
        if (lines[0] != Format)
        {
            throw new InvalidDataException($"The Earth's motion is in the format '{lines[0]}', not '{Format}'.");
        }

        var result = new Dictionary<string, ChebyshevSeries>(StringComparer.Ordinal);
        int position = headerLength + 2;
        foreach (string line in lines)
        {
            if (!line.StartsWith("series ", StringComparison.Ordinal))
            {
                continue;
            }

            // series NAME UNIT QUANTUM START STEP SEGMENTS COMPONENTS COEFFICIENTS
            string[] words = line.Split(' ');
            int segments = int.Parse(words[6], CultureInfo.InvariantCulture);
            int components = int.Parse(words[7], CultureInfo.InvariantCulture);
            int order = int.Parse(words[8], CultureInfo.InvariantCulture);
            var coefficients = new double[segments * components * order];
            position = Unpack(bytes, position, Number(words[3]), coefficients);
            result.Add(words[1], new ChebyshevSeries(Number(words[4]), Number(words[5]), segments, components, order, coefficients));
        }

        return result;
    }

    private static int Unpack(byte[] bytes, int position, double quantum, Span<double> coefficients)
    {
        for (int i = 0; i < coefficients.Length; i++)
        {
            ulong packed = 0;
            int shift = 0;
            byte group;
            do
            {
                group = bytes[position++];
                packed |= (ulong)(group & 127) << shift;
                shift += 7;
            }
            while (group >= 128);

            coefficients[i] = quantum * ((long)(packed >> 1) ^ -(long)(packed & 1));
        }

        return position;
    }

    private static double Number(string text) => double.Parse(text, CultureInfo.InvariantCulture);
}
