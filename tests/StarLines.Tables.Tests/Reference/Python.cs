using System.Diagnostics;
using System.IO;
using System.Text;
using Xunit;

namespace StarLines.Tables.Tests.Reference;

/// <summary>Runs a Python script with Astropy as the judge of a file.</summary>
internal static class Python
{
    private const string Program = "/usr/bin/python3";

    /// <summary>Runs a script and gives what it prints; the calling test is skipped where Astropy is not installed.</summary>
    public static string Run(string script, params string[] arguments)
    {
        Assert.SkipUnless(File.Exists(Program), $"{Program} is not on this machine.");
        (int code, _, _) = Start("import astropy.table, yaml", []);
        Assert.SkipUnless(code == 0, "Astropy with its YAML library is not on this machine.");
        (code, string output, string errors) = Start(script, arguments);
        Assert.True(code == 0, errors);
        return output;
    }

    private static (int Code, string Output, string Errors) Start(string script, string[] arguments)
    {
        var start = new ProcessStartInfo(Program)
        {
            RedirectStandardOutput = true,
            RedirectStandardError = true,
            StandardOutputEncoding = Encoding.UTF8,
            StandardErrorEncoding = Encoding.UTF8,
        };
        start.Environment["PYTHONUTF8"] = "1";
        start.ArgumentList.Add("-c");
        start.ArgumentList.Add(script);
        foreach (string argument in arguments)
        {
            start.ArgumentList.Add(argument);
        }

        using Process process = Process.Start(start)!;
        System.Threading.Tasks.Task<string> errors = process.StandardError.ReadToEndAsync();
        string output = process.StandardOutput.ReadToEnd();
        process.WaitForExit();
        return (process.ExitCode, output, errors.Result);
    }
}
