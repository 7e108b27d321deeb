using System;

namespace StarLines.Noise;

/// <summary>Finds gaps: runs of pixels that hold exactly zero, as pipelines write where no light was recorded.</summary>
public static class GapFinder
{
    // Noise never gives so many zeros in a row, and counting detectors seldom do.
    private const int LeastRun = 8;

    /// <summary>Marks gaps.</summary>
    /// <param name="flux">N fluxes; finite.</param>
    /// <returns>N faults: <see cref="PixelFaults.Missing"/> or none.</returns>
    public static PixelFaults[] Find(ReadOnlySpan<double> flux)
    {
        var found = new PixelFaults[flux.Length];
        int start = 0;
        for (int i = 0; i <= flux.Length; i++)
        {
            if (i < flux.Length && flux[i] == 0.0)
            {
                continue;
            }

            if (i - start >= LeastRun)
            {
                found.AsSpan(start, i - start).Fill(PixelFaults.Missing);
            }

            start = i + 1;
        }

        return found;
    }
}
