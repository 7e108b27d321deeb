using System;
using StarLines.IO;
using StarLines.Profiles;
using StarLines.Runs.Plans;
using StarLines.Velocities.Time;
using Xunit;

namespace StarLines.Runs.Tests.Plans;

public class PlanFileTests
{
    [Fact]
    public void Every_setting_is_written_and_read_back()
    {
        RunPlan plan = new()
        {
            Inputs = ["night/*.fits", "a \"quoted\" \\ name.csv"],
            Steps = RunSteps.Velocity | RunSteps.Figures,
            Format = RunTableFormat.VoTable,
            TimesInTable = true,
            Reading = new SpectrumReadOptions
            {
                Medium = Medium.Vacuum,
                Frame = VelocityFrame.Topocentric,
                AxisUnit = "nm",
                Columns = ColumnSelection.Parse("wave=L,flux=F,var=V"),
                Ranges = [new WavelengthRange(5000.25, 6000.0)],
                Target = "Umbra 7",
                RightAscensionDegrees = 12.5,
                DeclinationDegrees = -0.125,
                Site = new ObservingSite("", 46.2083, 12.3417, 1180.0),
                MidExposureUtc = UtcTime.Parse("2024-05-01T21:30:00.25"),
                ResolvingPower = 48000.0,
            },
            Exclude = [new WavelengthRange(6860.0, 6960.0)],
            FindOutliers = false,
            StiffnessAngstrom = 1e-7,
            Templates = ["metal", "my.ecsv"],
            SearchHalfRangeKmPerS = 500.0,
            LineLists = ["nebular"],
            LineVelocityKmPerS = -12.0,
            Profile = ProfileShape.Lorentzian,
            Sampling = PixelSampling.Point,
            FigureFormat = Plotting.FigureFormat.Svg,
            LinePanels = 0,
        };
        string text = PlanFile.Write(plan);
        RunPlan back = PlanFile.Parse(text);
        Assert.Equal(text, PlanFile.Write(back));
        Assert.DoesNotContain("\n# ", text[text.IndexOf('\n', StringComparison.Ordinal)..], StringComparison.Ordinal);
        Assert.Equal(plan.Inputs, back.Inputs);
        Assert.Equal(plan.Exclude, back.Exclude);
        Assert.Equal(plan.Templates, back.Templates);
        Assert.Equal(plan.Reading.Columns, back.Reading.Columns);
        Assert.Equal(plan.Reading.Site, back.Reading.Site);
        Assert.Equal(plan.Reading.MidExposureUtc!.Value.Value, back.Reading.MidExposureUtc!.Value.Value);
        Assert.Equal(
            (plan.Steps, plan.Format, plan.StiffnessAngstrom, plan.Profile, plan.Sampling, plan.FigureFormat),
            (back.Steps, back.Format, back.StiffnessAngstrom, back.Profile, back.Sampling, back.FigureFormat));
    }

    [Fact]
    public void The_defaults_are_written_as_comments_where_nothing_is_set()
    {
        string text = PlanFile.Write(new RunPlan());
        Assert.Contains("# stiffness =", text, StringComparison.Ordinal);
        Assert.Equal(text, PlanFile.Write(PlanFile.Parse(text)));
    }

    [Theory]
    [InlineData("[lines]\nlist = ['balmer']", "line 2", "no setting 'list' in [lines]")]
    [InlineData("speed = 3", "line 1", "no setting 'speed'")]
    [InlineData("[line]\nlists = ['balmer']", "line 2", "no section [line]")]
    [InlineData("steps = ['lines', 'dinner']", "line 1", "'dinner'")]
    [InlineData("inputs = ['a'\n", "line", "plan.toml")]
    [InlineData("[continuum]\nstiffness = 'much'", "line 2", "stiffness must be a number")]
    [InlineData("[continuum]\nexclude = ['5100:5000']", "line 2", "5100:5000")]
    [InlineData("[reading]\nsite = 'Parannal'", "line 2", "Paranal")]
    [InlineData("[reading]\ntime = '2024-05-01'", "line 2", "no time of day")]
    [InlineData("[figures]\nline_panels = -1", "line 2", "whole number")]
    public void Mistakes_are_named_with_line_and_cure(string toml, string where, string what)
    {
        string message = Assert.Throws<RunPlanException>(() => PlanFile.Parse(toml, "plan.toml")).Message;
        Assert.Contains(where, message, StringComparison.Ordinal);
        Assert.Contains(what, message, StringComparison.Ordinal);
    }
}
