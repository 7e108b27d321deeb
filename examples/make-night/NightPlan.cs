using System.Collections.Generic;

namespace StarLines.Examples.MakeNight;

/// <summary>The six exposures of the night; stars, observatory and people are invented.</summary>
internal static class NightPlan
{
    /// <summary>The exposures in order of time.</summary>
    public static IReadOnlyList<Exposure> Exposures { get; } =
    [
        new Exposure
        {
            Name = "wren-12", Target = "Wren 12", SpectralType = "A2 V", Seed = 1201,
            RightAscensionDegrees = 96.2245, DeclinationDegrees = 31.5871,
            StartMinutes = 12.5, ExposureSeconds = 600, SignalToNoise = 140,
            Stars = [Dwarf(-14.62, 8900, 18.0, 28.0)],
        },
        new Exposure
        {
            Name = "wren-31", Target = "Wren 31", SpectralType = "F6 V + G1 V", Seed = 3107,
            RightAscensionDegrees = 118.9103, DeclinationDegrees = 18.0426,
            StartMinutes = 55.0, ExposureSeconds = 1200, SignalToNoise = 150,
            Stars =
            [
                Dwarf(62.35, 6250, 7.0, 5.0) with { Share = 0.56 },
                Dwarf(-51.80, 5900, 5.0, 3.0) with { Share = 0.44 },
            ],
        },
        new Exposure
        {
            Name = "wren-47", Target = "Wren 47", SpectralType = "G2 V", Seed = 4713,
            RightAscensionDegrees = 141.0718, DeclinationDegrees = 44.2369,
            StartMinutes = 130.0, ExposureSeconds = 1500, SignalToNoise = 130,
            Stars = [Dwarf(27.44, 5770, 2.5, 2.4)],
        },
        new Exposure
        {
            Name = "wren-58", Target = "Wren 58", SpectralType = "G8 V", Seed = 5821,
            RightAscensionDegrees = 163.5542, DeclinationDegrees = 7.8815,
            StartMinutes = 205.0, ExposureSeconds = 300, SignalToNoise = 12,
            Stars = [Dwarf(-38.17, 5450, 2.0, 1.5)],
        },
        new Exposure
        {
            Name = "wren-76", Target = "Wren 76", SpectralType = "K2 III", Seed = 7629,
            RightAscensionDegrees = 187.3390, DeclinationDegrees = 52.9034,
            StartMinutes = 260.0, ExposureSeconds = 900, SignalToNoise = 110,
            Stars = [Dwarf(5.91, 4500, 3.5, 0.4) with { SurfaceGravityLog = 2.5 }],
        },
        new Exposure
        {
            Name = "wren-90", Target = "Wren 90", SpectralType = "M1 Ve", Seed = 9033,
            RightAscensionDegrees = 210.6127, DeclinationDegrees = 23.4158,
            StartMinutes = 355.0, ExposureSeconds = 2400, SignalToNoise = 60,
            Stars = [Dwarf(-71.26, 3750, 8.0, 0.05) with { SurfaceGravityLog = 4.8, Emission = 1.4, Bands = 0.12 }],
        },
    ];

    private static StarLight Dwarf(double velocity, double temperature, double rotation, double balmerWing) => new()
    {
        VelocityKmPerS = velocity,
        TemperatureKelvin = temperature,
        SurfaceGravityLog = 4.3,
        RotationKmPerS = rotation,
        BalmerWing = balmerWing,
    };
}
