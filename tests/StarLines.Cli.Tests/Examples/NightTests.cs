using System;
using System.Collections.Generic;
using System.IO;
using System.Text;
using StarLines.Tables;
using StarLines.TestSupport;
using Xunit;

namespace StarLines.Cli.Tests.Examples;

/// <summary>The invented night against the truth it was drawn from (<c>examples/night-truth</c>, written by its generator, not by the program).</summary>
public sealed class NightTests
{
    private static readonly string Night = Path.Combine(ReferenceData.RepositoryRoot, "examples", "night");

    // Of seven velocities one in 5000 draws lies beyond 4σ by chance.
    private const double MostSigmas = 4.0;

    [Fact]
    public void Velocities_agree_with_the_truth_within_their_errors()
    {
        Table measured = Run("velocity", Night + "/*.fits", "--template", "metal", "--template", "balmer");
        Table truth = Read("stars.ecsv");
        for (int i = 0; i < truth.RowCount; i++)
        {
            // Hydrogen gives the velocity of the A star, metals that of the others.
            bool isHot = truth["teff"].ToDoubles()[i] > 8000.0;
            int row = Find(measured, truth, i, isHot ? "balmer" : "metal");
            double error = measured["rv"].ToDoubles()[row] - truth["rv"].ToDoubles()[i];
            double sigma = measured["rv_err"].ToDoubles()[row];
            Assert.True(Math.Abs(error) < MostSigmas * sigma, FormattableString.Invariant(
                $"{truth["target"].Texts[i]}: {error} ± {sigma} km/s"));
        }
    }

    [Fact]
    public void Equivalent_widths_agree_with_the_truth_within_their_errors()
    {
        Table measured = Run("measure", Night + "/*.fits", "--lines", "metals-fgk", "--lines", "balmer");
        Table truth = Read("lines.ecsv");
        var deviations = new List<double>();
        for (int i = 0; i < truth.RowCount; i++)
        {
            int row = FindLine(measured, truth, i);
            if (measured["status"].Texts[row] == "measured" && measured["snr"].ToDoubles()[row] > 50.0)
            {
                deviations.Add((measured["ew"].ToDoubles()[row] - truth["ew"].ToDoubles()[i]) / measured["ew_err"].ToDoubles()[row]);
            }
        }

        deviations.Sort();
        Assert.True(deviations.Count > 80, $"Only {deviations.Count} lines were measured.");

        // The median of 100 normal deviates scatters by 0.13; profiles that are not quite Gaussian add to it.
        Assert.InRange(deviations[deviations.Count / 2], -0.6, 0.6);
        double halfRange = 0.5 * (deviations[(int)(0.84 * deviations.Count)] - deviations[(int)(0.16 * deviations.Count)]);
        Assert.InRange(halfRange, 0.7, 1.5);
    }

    private static Table Run(params string[] words)
    {
        CommandResult result = CommandLine.Run(words);
        Assert.True(result.Code == 0, result.Error);
        using var stream = new MemoryStream(Encoding.UTF8.GetBytes(result.Out));
        return TableReader.Read(stream);
    }

    private static Table Read(string name)
    {
        using FileStream stream = File.OpenRead(Path.Combine(Night + "-truth", name));
        return TableReader.Read(stream);
    }

    private static int Find(Table measured, Table truth, int star, string template)
    {
        for (int i = 0; i < measured.RowCount; i++)
        {
            if (measured["target"].Texts[i] == truth["target"].Texts[star]
                && measured["template"].Texts[i] == template
                && measured["component"].Longs[i] == truth["component"].Longs[star])
            {
                return i;
            }
        }

        Assert.Fail($"{truth["target"].Texts[star]}, star {truth["component"].Longs[star]}, has no row of template {template}.");
        return -1;
    }

    private static int FindLine(Table measured, Table truth, int line)
    {
        for (int i = 0; i < measured.RowCount; i++)
        {
            if (Path.GetFileName(measured["file"].Texts[i]) == truth["file"].Texts[line]
                && measured["line"].Texts[i] == truth["line"].Texts[line])
            {
                return i;
            }
        }

        Assert.Fail($"{truth["file"].Texts[line]} has no row of {truth["line"].Texts[line]}.");
        return -1;
    }
}
