using System;
using System.IO;
using System.Linq;
using StarLines.IO;
using StarLines.Runs.Inputs;
using Xunit;

namespace StarLines.Runs.Tests.Inputs;

public class InputExpansionTests
{
    [Fact]
    public void Folders_are_searched_in_order_and_other_files_left()
    {
        using var folder = new TemporaryFolder();
        foreach (string name in new[] { "b.fits", "a.csv", "sub/c.fit.gz", "readme.md", ".hidden.fits" })
        {
            folder.WriteText(name, "x,y\n");
        }

        Assert.Equal(
            [folder["a.csv"], folder["b.fits"], folder["sub", "c.fit.gz"]],
            InputExpansion.Expand([folder.Path], SpectrumReadOptions.Default).Select(static i => i.Name));
    }

    [Fact]
    public void Patterns_are_resolved_and_equal_names_are_told_apart()
    {
        using var folder = new TemporaryFolder();
        folder.WriteText("one/star.fits", "");
        folder.WriteText("two/star.fits", "");
        RunInput[] inputs =
            [.. InputExpansion.Expand([folder["one", "*.fits"], folder["two", "star.fits"], folder["one", "star.fits"]], SpectrumReadOptions.Default)];
        Assert.Equal(["star", "star~2"], inputs.Select(static i => i.Stem));
    }

    [Fact]
    public void What_matches_nothing_is_refused()
    {
        using var folder = new TemporaryFolder();
        Assert.Contains("No file matches", Refused(folder["*.fits"]), StringComparison.Ordinal);
        Assert.Contains("holds no file", Refused(folder.Path), StringComparison.Ordinal);

        static string Refused(string name) =>
            Assert.Throws<RunPlanException>(() => InputExpansion.Expand([name], SpectrumReadOptions.Default)).Message;
    }

    [Fact]
    public void A_manifest_names_files_beside_it_and_what_is_known_of_each()
    {
        using var folder = new TemporaryFolder();
        string manifest = folder.WriteText(
            "list.csv", "file,target,ra,dec,site,time,medium\nx.fits,Umbra,12.5,-3,Paranal,2024-05-01T21:30:00,vacuum\nsub/y.fits#2,,,,,,\n");
        RunInput[] inputs = [.. InputExpansion.Expand([manifest], SpectrumReadOptions.Default with { Medium = Medium.Air })];
        Assert.Equal([folder["x.fits"], Path.Combine(folder.Path, "sub/y.fits#2")], inputs.Select(static i => i.Name));
        Assert.Equal(("Umbra", 12.5, "Paranal", Medium.Vacuum),
            (inputs[0].Reading.Target, inputs[0].Reading.RightAscensionDegrees, inputs[0].Reading.Site?.Name, inputs[0].Reading.Medium));
        Assert.Equal(Medium.Air, inputs[1].Reading.Medium);
        Assert.Equal("y_2", inputs[1].Stem);
    }

    [Fact]
    public void A_wrong_cell_of_a_manifest_is_named()
    {
        using var folder = new TemporaryFolder();
        string manifest = folder.WriteText("list.csv", "file,time\nx.fits,noon\n");
        string message = Assert.Throws<RunPlanException>(() => InputExpansion.Expand([manifest], SpectrumReadOptions.Default)).Message;
        Assert.Contains("row 1, column time", message, StringComparison.Ordinal);
    }

    [Fact]
    public void A_spectrum_in_CSV_is_no_manifest()
    {
        using var folder = new TemporaryFolder();
        string spectrum = folder.WriteSpectrum("star.csv", 1);
        Assert.Equal(spectrum, Assert.Single(InputExpansion.Expand([spectrum], SpectrumReadOptions.Default)).Name);
    }
}
