using System;
using System.Collections.Generic;
using System.Globalization;
using System.Numerics;
using Xunit;

namespace StarLines.Fits.Tests.Reference;

/// <summary>Header values against tests/Data/golden/header_expect.csv (what astropy 5.2.1 was told to write).</summary>
public sealed class GoldenHeaderTests
{
    /// <summary>
    /// The golden value of LONGSTR lost what stands between two ampersands of its second card. By the FITS Standard 4.0, section 4.2.1.2, only the last
    /// ampersand of a string is dropped; CFITSIO 4.2.0 reads the same (and keeps the ampersand before the empty last string).
    /// </summary>
    private const string LongString = "This is a long string value that needs more than one card because it is longer than sixty-eight characters, with a quote ' inside & an ampersand";

    public static TheoryData<string, string, string, string> Values()
    {
        TheoryData<string, string, string, string> values = [];
        foreach (Dictionary<string, string> row in GoldenTable.Read("header_expect.csv"))
        {
            values.Add(row["file"], row["keyword"], row["type"], row["value"]);
        }

        return values;
    }

    [Theory]
    [MemberData(nameof(Values))]
    public void Header_value_is_as_the_golden_table_says(string name, string keyword, string type, string value)
    {
        using FitsFile file = FitsFile.Open(GoldenTable.PathOf("fits", name));
        FitsHeader header = file.Hdus[0].Header;
        Assert.True(header.TryGetCard(keyword, out FitsCard? card));
        switch (type)
        {
            case "str":
                Assert.True(header.TryGetString(keyword, out string? text));
                Assert.Equal(keyword == "LONGSTR" ? LongString : value, text);
                break;
            case "int":
                Assert.Equal(value, card.Text);
                Assert.Equal(FitsValueKind.WholeNumber, card.Kind);
                break;
            case "float":
                Assert.True(header.TryGetDouble(keyword, out double number));
                Assert.Equal(double.Parse(value, CultureInfo.InvariantCulture), number);
                break;
            case "bool":
                Assert.True(header.TryGetLogical(keyword, out bool flag));
                Assert.Equal(value == "True", flag);
                break;
            case "complex":
                Assert.True(header.TryGetComplex(keyword, out Complex complex));
                Assert.Equal(new Complex(1.5, -2.5), complex);
                break;
            case "undefined":
                Assert.Equal(FitsValueKind.Undefined, card.Kind);
                Assert.False(header.TryGetString(keyword, out _));
                break;
            default:
                throw new InvalidOperationException(type);
        }
    }
}
