namespace StarLines;

/// <summary>The frame of rest in which the wavelengths of a scale were observed or to which they were reduced.</summary>
public enum VelocityFrame
{
    /// <summary>The source does not say.</summary>
    Unknown,

    /// <summary>As the telescope saw them.</summary>
    Topocentric,

    /// <summary>Reduced to the centre of the Earth.</summary>
    Geocentric,

    /// <summary>Reduced to the centre of the Sun.</summary>
    Heliocentric,

    /// <summary>Reduced to the barycentre of the solar system.</summary>
    Barycentric,

    /// <summary>Reduced to the rest frame of the star.</summary>
    Rest,
}
