using System;
using System.Collections.Generic;
using System.Globalization;

namespace StarLines.Velocities;

/// <summary>Joins the velocities of one spectrum by several templates into one.</summary>
/// <remarks>
/// The templates hold different lines, so their errors are independent, and each error already holds the scatter of its lines:
/// the mean with weights 1/σ² has the least variance. One fit with the lines of both would weigh the few broad hydrogen lines
/// by the scatter of the many narrow ones. Where the velocities differ by more than chance the error grows by √χ²
/// (Birge 1932, Physical Review 40, 207).
/// </remarks>
public static class VelocityCombiner
{
    /// <summary>Velocities that differ by more standard deviations than this are said to disagree.</summary>
    private const double Disagreement = 3.0;

    /// <summary>The weighted mean of the results that hold a velocity.</summary>
    /// <param name="name">Name of the combined row, such as <c>both</c>.</param>
    /// <param name="results">Results of one spectrum, not reduced; at least one.</param>
    /// <returns>The result with the mean; that of the only template where one alone measured; without velocity where none did.</returns>
    public static VelocityResult Combine(string name, IReadOnlyList<VelocityResult> results)
    {
        ArgumentNullException.ThrowIfNull(name);
        ArgumentNullException.ThrowIfNull(results);
        ArgumentOutOfRangeException.ThrowIfZero(results.Count, nameof(results));
        VelocityResult best = results[0];
        double total = 0.0;
        double sum = 0.0;
        double photon = 0.0;
        int pixels = 0;
        int lines = 0;
        int leftOut = 0;
        int measured = 0;
        bool fitted = false;
        foreach (VelocityResult result in results)
        {
            fitted |= result.LinesUsed > 0;
        }

        foreach (VelocityResult result in results)
        {
            if (Counts(result, fitted) && (!Counts(best, fitted) || Weight(result) > Weight(best)))
            {
                best = result;
            }

            if (Counts(result, fitted))
            {
                double weight = Weight(result);
                total += weight;
                sum += weight * result.ObservedKmPerS.Value;
                double limit = result.Measurement.PhotonLimitKmPerS;
                photon += limit > 0.0 ? 1.0 / (limit * limit) : 0.0;
                pixels += result.Measurement.Pixels;
                lines += result.LinesUsed;
                leftOut += result.LinesLeftOut;
                measured++;
            }
        }

        var warnings = Warnings(results);
        if (measured < 2)
        {
            return best.With(best.Measurement with { Template = name, Warnings = warnings });
        }

        double mean = sum / total;
        double chi = 0.0;
        foreach (VelocityResult result in results)
        {
            chi += Counts(result, fitted) ? Weight(result) * Square(result.ObservedKmPerS.Value - mean) : 0.0;
        }

        double inflation = Math.Sqrt(Math.Max(1.0, chi / (measured - 1)));
        if (chi > Disagreement * Disagreement)
        {
            warnings.Add(Disagree(results));
        }

        bool reduced = best.Measurement.Status == VelocityStatus.Measured;
        var observed = new Measured(mean, inflation / Math.Sqrt(total));
        VelocityMeasurement measurement = best.Measurement with
        {
            Template = name,
            VelocityKmPerS = reduced ? observed : Measured.None,
            TopocentricKmPerS = reduced ? double.NaN : mean,
            TopocentricUncertaintyKmPerS = reduced ? double.NaN : observed.Uncertainty,
            PhotonLimitKmPerS = photon > 0.0 ? 1.0 / Math.Sqrt(photon) : double.NaN,
            Pixels = pixels,
            Warnings = warnings,
        };
        return best.Combined(measurement, observed, lines, leftOut);
    }

    /// <summary>Whether a result counts: a velocity of the peak alone only where no template could be fitted.</summary>
    private static bool Counts(VelocityResult result, bool fitted) => result.ObservedKmPerS.HasValue && (!fitted || result.LinesUsed > 0);

    private static double Weight(VelocityResult result) =>
        result.ObservedKmPerS.Uncertainty > 0.0 ? 1.0 / Square(result.ObservedKmPerS.Uncertainty) : 0.0;

    private static double Square(double x) => x * x;

    private static List<Remark> Warnings(IReadOnlyList<VelocityResult> results)
    {
        var joined = new List<Remark>();
        foreach (VelocityResult result in results)
        {
            foreach (Remark remark in result.Measurement.Warnings)
            {
                if (!joined.Contains(remark))
                {
                    joined.Add(remark);
                }
            }
        }

        return joined;
    }

    private static Remark Disagree(IReadOnlyList<VelocityResult> results)
    {
        var parts = new List<string>();
        foreach (VelocityResult result in results)
        {
            if (result.ObservedKmPerS.HasValue)
            {
                parts.Add(string.Create(
                    CultureInfo.InvariantCulture,
                    $"{result.TemplateName} {result.ObservedKmPerS.Value:F2} ± {result.ObservedKmPerS.Uncertainty:F2} km/s"));
            }
        }

        return new Remark("templates-disagree", $"The templates give different velocities: {string.Join(", ", parts)}.");
    }
}
