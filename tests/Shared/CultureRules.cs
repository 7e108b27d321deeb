using System;
using System.Globalization;
using Xunit;

namespace StarLines.TestSupport;

/// <summary>The second run of the tests means what it says.</summary>
public sealed class CultureRules
{
    [Fact]
    public void A_German_locale_writes_a_decimal_comma()
    {
        string locale = Environment.GetEnvironmentVariable("LC_ALL") ?? "";
        Assert.SkipUnless(locale.StartsWith("de_DE", StringComparison.Ordinal), "Runs where LC_ALL is de_DE.UTF-8.");
        Assert.Equal("1,5", 1.5.ToString(CultureInfo.CurrentCulture));
    }
}
