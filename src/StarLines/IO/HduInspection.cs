namespace StarLines.IO;

/// <summary>One HDU of a FITS file.</summary>
/// <param name="Number">The number, 0 for the primary.</param>
/// <param name="Name">The EXTNAME; empty where there is none.</param>
/// <param name="Kind">What it is: <c>header</c>, <c>image</c>, <c>compressed image</c>, <c>table</c>, <c>ASCII table</c>, <c>random groups</c>, <c>other</c> or <c>damaged</c>.</param>
/// <param name="Size">Its size in words, such as <c>4096 × 3 float32</c> or <c>4771 rows, 2 columns: WAVELENGTH (Angstrom), FLUX</c>.</param>
/// <param name="Use">What it was taken for: <c>spectrum</c>, <c>errors</c>, <c>mask</c>, <c>wavelengths</c>, or empty.</param>
/// <param name="Problem">Why it cannot be read as a spectrum; empty where it can, or holds something else.</param>
public sealed record HduInspection(int Number, string Name, string Kind, string Size, string Use, string Problem);
