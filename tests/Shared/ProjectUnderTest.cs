using System.IO;
using System.Linq;
using System.Reflection;
using System.Xml.Linq;

namespace StarLines.TestSupport;

/// <summary>The source project that the running test project tests.</summary>
internal static class ProjectUnderTest
{
    /// <summary>The project's name, such as <c>StarLines.Fits</c>.</summary>
    public static string Name { get; } = FindName();

    /// <summary>The project's folder.</summary>
    public static string Folder { get; } = Path.Combine(ReferenceData.RepositoryRoot, "src", Name);

    /// <summary>The assembly that the project builds.</summary>
    public static Assembly Assembly { get; } = Assembly.Load(FindAssemblyName());

    private static string FindName()
    {
        string tests = Assembly.GetExecutingAssembly().GetName().Name!;
        return tests[..^".Tests".Length];
    }

    private static string FindAssemblyName()
    {
        var project = XDocument.Load(Path.Combine(Folder, Name + ".csproj"));
        return project.Descendants("AssemblyName").Select(static e => e.Value).FirstOrDefault() ?? Name;
    }
}
