using System;

namespace StarLines.IO;

/// <summary>Which columns of a table hold a spectrum, by name (case does not matter) or by number counted from 1; an empty name leaves the choice to the file.</summary>
public sealed record ColumnSelection
{
    /// <summary>Wavelength, or its logarithm, or another spectral coordinate.</summary>
    public string Wavelength { get; init; } = "";

    /// <summary>Flux.</summary>
    public string Flux { get; init; } = "";

    /// <summary>Standard deviation of the flux.</summary>
    public string Error { get; init; } = "";

    /// <summary>Inverse variance of the flux.</summary>
    public string InverseVariance { get; init; } = "";

    /// <summary>Variance of the flux.</summary>
    public string Variance { get; init; } = "";

    /// <summary>Mask or quality; 0 is good.</summary>
    public string Mask { get; init; } = "";

    /// <summary>Reads a list such as <c>wave=LAMBDA,flux=F,error=SIGMA</c>; the keys are <c>wave</c>, <c>flux</c>, <c>error</c>, <c>ivar</c>, <c>var</c> and <c>mask</c>.</summary>
    /// <param name="text">The list.</param>
    /// <returns>The selection.</returns>
    /// <exception cref="FormatException">A part is no <c>key=column</c>, or the key is none of these.</exception>
    public static ColumnSelection Parse(string text)
    {
        ArgumentNullException.ThrowIfNull(text);
        var selection = new ColumnSelection();
        foreach (string part in text.Split(',', StringSplitOptions.TrimEntries | StringSplitOptions.RemoveEmptyEntries))
        {
            int equals = part.IndexOf('=', StringComparison.Ordinal);
            if (equals <= 0 || equals == part.Length - 1)
            {
                throw new FormatException($"'{part}' is no choice of a column; write key=column, such as wave=LAMBDA,flux=F.");
            }

            selection = selection.With(part[..equals].Trim(), part[(equals + 1)..].Trim());
        }

        return selection;
    }

    private ColumnSelection With(string key, string column) => key.ToLowerInvariant() switch
    {
        "wave" or "wavelength" => this with { Wavelength = column },
        "flux" => this with { Flux = column },
        "error" or "err" or "sigma" or "uncertainty" => this with { Error = column },
        "ivar" => this with { InverseVariance = column },
        "var" or "variance" => this with { Variance = column },
        "mask" or "quality" => this with { Mask = column },
        _ => throw new FormatException($"'{key}' is none of the columns of a spectrum: wave, flux, error, ivar, var, mask."),
    };
}
