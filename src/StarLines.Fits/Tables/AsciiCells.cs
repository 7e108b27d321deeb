using System;
using System.Globalization;
using StarLines.Fits.Numerics;

namespace StarLines.Fits.Tables;

/// <summary>The cells of an ASCII table. Source: FITS Standard 4.0, section 7.2.</summary>
internal static class AsciiCells
{
    internal static ReadOnlySpan<byte> Cell(TableLayout layout, ColumnStorage column, long row) =>
        layout.Data.Read((row * layout.RowBytes) + column.Offset, (int)column.Width).Span;

    /// <summary>A number, scaled; NaN where the cell holds the text of TNULL. A blank cell is zero, as the standard says.</summary>
    internal static double ToDouble(ReadOnlySpan<byte> cell, ColumnStorage column, in Scaling scaling, string? nullText, HduContext context, string keyword)
    {
        ReadOnlySpan<byte> text = CardText.Trim(cell);
        if (nullText is not null && CardText.Decode(text) == nullText)
        {
            return double.NaN;
        }

        double value = 0.0;
        if (!text.IsEmpty && !FitsNumber.TryParse(text, out value))
        {
            throw Wrong(cell, context, keyword, "a number");
        }

        return scaling.Zero + (scaling.Scale * WithImpliedPoint(value, text, column.Ascii!));
    }

    /// <summary>A whole number as it is written; null where the cell holds the text of TNULL.</summary>
    internal static long? ToInteger(ReadOnlySpan<byte> cell, string? nullText, HduContext context, string keyword)
    {
        ReadOnlySpan<byte> text = CardText.Trim(cell);
        if (nullText is not null && CardText.Decode(text) == nullText)
        {
            return null;
        }

        long value = 0;
        return text.IsEmpty || FitsNumber.TryParseInteger(text, out value) ? value : throw Wrong(cell, context, keyword, "a whole number");
    }

    /// <summary>A real number written without its decimal point has one before its last d digits.</summary>
    private static double WithImpliedPoint(double value, ReadOnlySpan<byte> text, AsciiFormat format)
    {
        bool implied = format.Letter is 'F' or 'E' or 'D' && format.Decimals > 0 && text.IndexOf((byte)'.') < 0;
        return implied ? value / Math.Pow(10.0, format.Decimals) : value;
    }

    private static FitsFormatException Wrong(ReadOnlySpan<byte> cell, HduContext context, string keyword, string expected) =>
        context.Error(keyword, string.Create(CultureInfo.InvariantCulture, $"a cell holds \"{CardText.Decode(cell)}\", expected {expected}."));
}
