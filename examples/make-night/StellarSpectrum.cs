using System;
using StarLines.LineLists;
using StarLines.Velocities;

namespace StarLines.Examples.MakeNight;

/// <summary>The normalized spectrum of one star at rest, seen by a spectrograph, on steps equal in velocity.</summary>
internal sealed class StellarSpectrum
{
    /// <summary>Step of the grid, km/s: a fiftieth of the resolution.</summary>
    private const double StepKmPerS = 0.5;

    /// <summary>Deepest a saturated metal line goes: light of the highest layers is left in its core.</summary>
    private const double DeepestMetal = 0.85;

    /// <summary>Damping over Doppler width of every metal line.</summary>
    private const double Damping = 0.03;

    /// <summary>Farthest wing that is added, km/s.</summary>
    private const double WingKmPerS = 300.0;

    /// <summary>Heads of bands of titanium oxide, Å in air; degraded to the red. From memory.</summary>
    private static readonly double[] BandHeadsAngstrom = [4954.0, 5167.0, 5448.0, 5847.0, 6159.0];

    private readonly double _firstLog;
    private readonly double[] _flux;

    private StellarSpectrum(double firstLog, double[] flux)
    {
        _firstLog = firstLog;
        _flux = flux;
    }

    private static double LogStep => StepKmPerS / PhysicalConstants.SpeedOfLightKmPerS;

    /// <summary>Draws the lines of a star and blurs them by its rotation and by the instrument.</summary>
    /// <param name="star">The star.</param>
    /// <param name="metals">Lines of metals, in air.</param>
    /// <param name="balmer">Lines of hydrogen, in air.</param>
    /// <param name="range">What is needed, Å in vacuum, at rest.</param>
    /// <param name="resolvingPower">λ/FWHM of the instrument.</param>
    public static StellarSpectrum Draw(
        StarLight star, LineList metals, LineList balmer, WavelengthRange range, double resolvingPower)
    {
        double firstLog = Math.Log(range.MinimumAngstrom);
        int count = (int)((Math.Log(range.MaximumAngstrom) - firstLog) / LogStep) + 2;
        var spectrum = new StellarSpectrum(firstLog, new double[count]);
        spectrum.AddMetals(star, metals);
        for (int i = 0; i < count; i++)
        {
            spectrum._flux[i] = 1.0 - (DeepestMetal * (1.0 - Math.Exp(-spectrum._flux[i])));
        }

        spectrum.MultiplyHydrogen(star, balmer);
        spectrum.MultiplyBands(star);
        double[] blurred = Blur(spectrum._flux, RotationKernel(star.RotationKmPerS));
        double sigma = PhysicalConstants.SpeedOfLightKmPerS / resolvingPower / PhysicalConstants.FwhmPerSigma;
        return new StellarSpectrum(firstLog, Blur(blurred, GaussianKernel(sigma)));
    }

    /// <summary>Equivalent width of one metal line alone, mÅ: the integral of its profile, untouched by any blur.</summary>
    public static double EquivalentWidthMilliangstrom(StarLight star, RestLine line)
    {
        var atmosphere = new Atmosphere(star.TemperatureKelvin, star.SurfaceGravityLog);
        double depth = atmosphere.CentralOpticalDepth(line);
        double doppler = atmosphere.DopplerKmPerS(line.Species);
        double sum = 0.0;
        for (double v = -WingKmPerS; v <= WingKmPerS; v += StepKmPerS / 4.0)
        {
            sum += DeepestMetal * (1.0 - Math.Exp(-depth * Profile(v / doppler)));
        }

        return sum * StepKmPerS / 4.0 / PhysicalConstants.SpeedOfLightKmPerS * line.WavelengthAngstrom * 1000.0;
    }

    /// <summary>The normalized flux at a wavelength, Å in vacuum, at rest.</summary>
    public double FluxAt(double vacuumAngstrom)
    {
        double index = (Math.Log(vacuumAngstrom) - _firstLog) / LogStep;
        int i = Math.Clamp((int)index, 0, _flux.Length - 2);
        return _flux[i] + ((index - i) * (_flux[i + 1] - _flux[i]));
    }

    // Voigt profile to first order in the damping: core and wing.
    private static double Profile(double x)
    {
        double square = x * x;
        double core = Math.Exp(-square);
        double wing = square < 1e-6 ? 1.0 : (1.0 - core) / square;
        return core + (Damping / Math.Sqrt(Math.PI) * wing);
    }

    private void AddMetals(StarLight star, LineList metals)
    {
        var atmosphere = new Atmosphere(star.TemperatureKelvin, star.SurfaceGravityLog);
        foreach (RestLine line in metals.Lines)
        {
            double depth = atmosphere.CentralOpticalDepth(line);
            double doppler = atmosphere.DopplerKmPerS(line.Species);
            double centre = (Math.Log(AirVacuum.ToVacuumAngstrom(line.WavelengthAngstrom)) - _firstLog) / LogStep;
            int reach = (int)(WingKmPerS / StepKmPerS);
            int from = Math.Max(0, (int)centre - reach);
            for (int i = from; i <= Math.Min(_flux.Length - 1, (int)centre + reach); i++)
            {
                _flux[i] += depth * Profile((i - centre) * StepKmPerS / doppler);
            }
        }
    }

    private void MultiplyHydrogen(StarLight star, LineList balmer)
    {
        foreach (RestLine line in balmer.Lines)
        {
            bool isAlpha = Math.Abs(line.WavelengthAngstrom - 6562.8) < 1.0;
            double centreAngstrom = AirVacuum.ToVacuumAngstrom(line.WavelengthAngstrom);
            for (int i = 0; i < _flux.Length; i++)
            {
                double angstrom = Math.Abs(Math.Exp(_firstLog + (i * LogStep)) - centreAngstrom);

                // Stark wings fall as |Δλ|^(−5/2) (Holtsmark); the core is rounded off within 0.6 Å.
                double depth = star.BalmerWing / Math.Pow((angstrom * angstrom) + 0.36, 1.25);
                double velocity = angstrom / centreAngstrom * PhysicalConstants.SpeedOfLightKmPerS;
                double emission = star.Emission * (isAlpha ? 1.0 : 0.6) * Math.Exp(-0.5 * Math.Pow(velocity / 35.0, 2));
                _flux[i] = (_flux[i] * (1.0 - (0.8 * (1.0 - Math.Exp(-depth))))) + emission;
            }
        }
    }

    private void MultiplyBands(StarLight star)
    {
        for (int i = 0; star.Bands > 0.0 && i < _flux.Length; i++)
        {
            double angstrom = AirVacuum.ToAirAngstrom(Math.Exp(_firstLog + (i * LogStep)));
            double depth = 0.0;
            foreach (double head in BandHeadsAngstrom)
            {
                double past = angstrom - head;
                depth += star.Bands * Math.Exp(-Math.Abs(past) / 60.0) / (1.0 + Math.Exp(-past / 2.0));
            }

            _flux[i] *= Math.Exp(-depth);
        }
    }

    private static double[] RotationKernel(double rotationKmPerS)
    {
        // Gray, The Observation and Analysis of Stellar Photospheres: limb darkening 0.6.
        const double limb = 0.6;
        int reach = (int)(rotationKmPerS / StepKmPerS);
        var kernel = new double[(2 * reach) + 1];
        for (int i = 0; i < kernel.Length; i++)
        {
            double x = reach == 0 ? 0.0 : (i - reach) * StepKmPerS / rotationKmPerS;
            double inside = Math.Max(0.0, 1.0 - (x * x));
            kernel[i] = (2.0 * (1.0 - limb) * Math.Sqrt(inside)) + (0.5 * Math.PI * limb * inside);
        }

        return kernel;
    }

    private static double[] GaussianKernel(double sigmaKmPerS)
    {
        int reach = (int)(5.0 * sigmaKmPerS / StepKmPerS);
        var kernel = new double[(2 * reach) + 1];
        for (int i = 0; i < kernel.Length; i++)
        {
            double x = (i - reach) * StepKmPerS / sigmaKmPerS;
            kernel[i] = Math.Exp(-0.5 * x * x);
        }

        return kernel;
    }

    private static double[] Blur(double[] values, double[] kernel)
    {
        double total = 0.0;
        foreach (double weight in kernel)
        {
            total += weight;
        }

        var result = new double[values.Length];
        for (int i = 0; i < values.Length; i++)
        {
            double sum = 0.0;
            for (int k = 0; k < kernel.Length; k++)
            {
                int j = Math.Clamp(i + k - (kernel.Length / 2), 0, values.Length - 1);
                sum += kernel[k] * values[j];
            }

            result[i] = sum / total;
        }

        return result;
    }
}
