namespace StarLines.Fits.Tables;

/// <summary>Where a column lies in the row and how it is stored.</summary>
/// <param name="Form">The TFORM as it is written.</param>
/// <param name="Offset">Bytes before it in the row.</param>
/// <param name="Width">Bytes of its cell in the row.</param>
/// <param name="Format">Its type; for an ASCII column the type that its text stands for.</param>
/// <param name="Ascii">The format of an ASCII column, else null.</param>
internal sealed record ColumnStorage(string Form, long Offset, long Width, ColumnFormat Format, AsciiFormat? Ascii);
