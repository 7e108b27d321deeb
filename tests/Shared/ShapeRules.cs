using System;
using System.Collections.Generic;
using System.IO;
using System.Linq;
using System.Reflection;
using System.Runtime.CompilerServices;
using Xunit;

namespace StarLines.TestSupport;

/// <summary>The shape of public types and of source files.</summary>
public sealed class ShapeRules
{
    /// <summary>A source file is looked at twice at 300 lines and split by 400; tables of coefficients are excepted.</summary>
    private const int LongestFileLines = 400;

    [Fact]
    public void Public_classes_are_sealed_or_static()
    {
        IEnumerable<string> open = ProjectUnderTest.Assembly.GetExportedTypes()
            .Where(static type => type.IsClass && !type.IsSealed)
            .Select(static type => type.FullName!);
        Assert.Empty(open);
    }

    [Fact]
    public void There_is_no_mutable_static_state()
    {
        const BindingFlags statics =
            BindingFlags.Static | BindingFlags.Public | BindingFlags.NonPublic | BindingFlags.DeclaredOnly;
        IEnumerable<string> mutable = ProjectUnderTest.Assembly.GetTypes()
            .Where(static type => !IsGenerated(type))
            .SelectMany(static type => type.GetFields(statics))
            .Where(static field => field is { IsInitOnly: false, IsLiteral: false } && !IsGenerated(field))
            .Select(static field => $"{field.DeclaringType}.{field.Name}");
        Assert.Empty(mutable);
    }

    [Fact]
    public void Numerics_uses_no_LINQ()
    {
        IEnumerable<string> offenders = SourceFiles()
            .Where(static file => file.Contains($"{Path.DirectorySeparatorChar}Numerics{Path.DirectorySeparatorChar}", StringComparison.Ordinal))
            .Where(static file => File.ReadAllText(file).Contains("System.Linq", StringComparison.Ordinal))
            .Select(Path.GetFileName)!;
        Assert.Empty(offenders);
    }

    [Fact]
    public void Source_files_stay_short()
    {
        IEnumerable<string> tooLong = SourceFiles()
            .Where(static file => File.ReadLines(file).Count() > LongestFileLines)
            .Where(static file => !file.EndsWith("Coefficients.cs", StringComparison.Ordinal))
            .Select(Path.GetFileName)!;
        Assert.Empty(tooLong);
    }

    private static IEnumerable<string> SourceFiles() =>
        Directory.EnumerateFiles(ProjectUnderTest.Folder, "*.cs", SearchOption.AllDirectories)
            .Where(static file => !file.Contains($"{Path.DirectorySeparatorChar}obj{Path.DirectorySeparatorChar}", StringComparison.Ordinal));

    private static bool IsGenerated(MemberInfo member) =>
        member.Name.Contains('<', StringComparison.Ordinal)
        || member.IsDefined(typeof(CompilerGeneratedAttribute), inherit: false)
        || (member.DeclaringType is { } outer && IsGenerated(outer));
}
