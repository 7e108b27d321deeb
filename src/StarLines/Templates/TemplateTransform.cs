using System;

namespace StarLines.Templates;

/// <summary>A template sampled on a grid, at rest, with what correlating needs of it: its transform and its squares.</summary>
internal sealed class TemplateTransform
{
    /// <summary>Blocks of squares: about this many over the grid.</summary>
    private const int BlockCount = 1024;

    private readonly double[] _lobes;

    /// <summary>Samples a template on a grid that reaches MaximumLag pixels beyond both ends.</summary>
    internal TemplateTransform(TemplateProfile profile, CorrelationGrid grid)
    {
        Profile = profile;
        Grid = grid;
        int n = grid.Count + (2 * grid.MaximumLag);
        var wavelengths = new double[n];
        for (int j = 0; j < n; j++)
        {
            wavelengths[j] = Math.Exp((grid.First + j - grid.MaximumLag) * grid.LogStep);
        }

        var absorption = new double[grid.Fft.Size];
        profile.Evaluate(
            wavelengths, logShift: 0.0, broadening: 0.0, absorption.AsSpan(0, n), new double[n], new double[n], new double[n]);
        Re = new double[grid.Fft.Bins];
        Im = new double[grid.Fft.Bins];
        grid.Fft.Forward(absorption, Re, Im, new double[2 * grid.Fft.Size]);
        BlockLength = Math.Max(1, grid.Count / BlockCount);
        Blocks = (n + BlockLength - 1) / BlockLength;
        BlockSums = new double[Blocks];
        BlockSquares = new double[Blocks];
        for (int j = 0; j < n; j++)
        {
            BlockSums[j / BlockLength] += absorption[j];
            BlockSquares[j / BlockLength] += absorption[j] * absorption[j];
        }

        HasAbsorption = Array.Exists(BlockSquares, static square => square > 0.0);
        double[] lobes = HasAbsorption ? Autocorrelation(grid.Fft.Size / 2, static _ => 1.0) : [];
        FwhmKmPerS = HasAbsorption ? AutocorrelationFwhm(lobes) / Math.Sqrt(2.0) : double.NaN;
        _lobes = lobes.AsSpan(0, Math.Min(lobes.Length, (2 * grid.MaximumLag) + 4)).ToArray();
    }

    /// <summary>What was sampled.</summary>
    internal TemplateProfile Profile { get; }

    /// <summary>The grid.</summary>
    internal CorrelationGrid Grid { get; }

    /// <summary>Whether any line lies within reach of the grid.</summary>
    internal bool HasAbsorption { get; }

    /// <summary>Real parts of the transform of the absorption.</summary>
    internal double[] Re { get; }

    /// <summary>Imaginary parts.</summary>
    internal double[] Im { get; }

    /// <summary>Pixels a block.</summary>
    internal int BlockLength { get; }

    /// <summary>Number of blocks over the grid and what lies beyond its ends.</summary>
    internal int Blocks { get; }

    /// <summary>Sum of the absorption in each block.</summary>
    internal double[] BlockSums { get; }

    /// <summary>Sum of the squared absorption in each block.</summary>
    internal double[] BlockSquares { get; }

    /// <summary>Mean full width at half maximum of the template's lines, km/s: that of its autocorrelation over √2.</summary>
    internal double FwhmKmPerS { get; }

    /// <summary>
    /// The correlation of the template, widened or not, with a star of the same lines at lag 0: lags from 0 up to the longest
    /// that a search meets, 1 at lag 0.
    /// </summary>
    internal ReadOnlySpan<double> Autocorrelation(double broadening)
    {
        if (broadening <= 0.0)
        {
            return _lobes;
        }

        double sigma = Math.Sqrt(broadening) / (PhysicalConstants.SpeedOfLightKmPerS * Grid.LogStep);
        double exponent = 2.0 * Math.PI * sigma / Grid.Fft.Size;
        return Autocorrelation(_lobes.Length, k => Math.Exp(-exponent * exponent * k * k));
    }

    /// <summary>The correlation of the template with itself, its power changed bin by bin; without mean, 1 at lag 0.</summary>
    private double[] Autocorrelation(int count, Func<double, double> power)
    {
        var re = new double[Grid.Fft.Bins];
        var c = new double[Grid.Fft.Size];
        for (int k = 1; k < re.Length; k++)
        {
            re[k] = power(k) * ((Re[k] * Re[k]) + (Im[k] * Im[k]));
        }

        Grid.Fft.Inverse(re, new double[re.Length], c, new double[2 * Grid.Fft.Size]);
        var result = new double[Math.Min(count, Grid.Fft.Size / 2)];
        for (int n = 0; n < result.Length; n++)
        {
            result[n] = c[n] / c[0];
        }

        return result;
    }

    private double AutocorrelationFwhm(double[] c)
    {
        int right = 1;
        while (right < c.Length - 1 && c[right] > 0.5)
        {
            right++;
        }

        double half = right - 1 + ((c[right - 1] - 0.5) / (c[right - 1] - c[right]));
        return 2.0 * half * Grid.LogStep * PhysicalConstants.SpeedOfLightKmPerS;
    }
}
