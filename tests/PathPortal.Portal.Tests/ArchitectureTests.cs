using System.Reflection;
using System.Text.RegularExpressions;
using System.Xml.Linq;
using PathPortal.Portal.Data;
using PathPortal.TestSupport;

namespace PathPortal.Portal.Tests;

/// <summary>The rules of the house that the compiler does not hold, read from the sources and the built assemblies.</summary>
public sealed partial class ArchitectureTests
{
    private static readonly string Root = TestPaths.RepositoryRoot;

    private static readonly Dictionary<string, string[]> MayUse = new()
    {
        ["PathPortal.Engine"] = [],
        ["PathPortal.Formats"] = ["PathPortal.Engine"],
        ["PathPortal.Portal"] = ["PathPortal.Engine", "PathPortal.Formats"],
        ["PathPortal.Web"] = ["PathPortal.Engine", "PathPortal.Formats", "PathPortal.Portal"],
        ["PathPortal.Worker"] = ["PathPortal.Engine", "PathPortal.Formats", "PathPortal.Portal"],
        ["PathPortal.Cli"] = ["PathPortal.Engine", "PathPortal.Formats", "PathPortal.Portal", "PathPortal.Migrations"],
    };

    [Fact]
    public void Projects_ReferToEachOther_OnlyInTheAgreedDirections()
    {
        foreach (var (project, allowed) in MayUse)
        {
            var file = XDocument.Load(Path.Combine(Root, "src", project, project + ".csproj"));
            var used = file.Descendants("ProjectReference").Select(r => Path.GetFileNameWithoutExtension(((string)r.Attribute("Include")!).Replace('\\', '/')));
            Assert.All(used, name => Assert.True(allowed.Contains(name), $"{project} must not use {name}."));
        }
        Assert.Equal(MayUse.Keys.Order(), Directory.GetDirectories(Path.Combine(Root, "src")).Select(d => Path.GetFileName(d)!).Order());
    }

    [Fact]
    public void Engine_UsesOnlyNumericsPackages()
    {
        var file = XDocument.Load(Path.Combine(Root, "src", "PathPortal.Engine", "PathPortal.Engine.csproj"));
        Assert.All(file.Descendants("PackageReference"), p => Assert.Equal("MathNet.Numerics", (string?)p.Attribute("Include")));
    }

    [Theory]
    [InlineData("src/PathPortal.Engine", @"using System\.(IO|Net|Data)\b|Microsoft\.|ILogger|TimeProvider|Stopwatch|Console\.", "numerics know nothing of the world around them")]
    [InlineData("src/PathPortal.Portal/Domain", @"Microsoft\.EntityFrameworkCore|Npgsql|Quartz", "the domain knows nothing of how it is stored")]
    [InlineData("src/PathPortal.Web", @"FromSql|ExecuteSql|SqlQuery|NpgsqlCommand|NpgsqlConnection\b|using Microsoft\.EntityFrameworkCore;", "the web writes no SQL")]
    [InlineData("src", @"DateTime\.(Utc)?Now|DateTimeOffset\.(Utc)?Now|DateTime\.Today", "time comes from TimeProvider")]
    [InlineData("src", @"new Random\(\)|Random\.Shared", "chance has a seed")]
    [InlineData("src", @"Thread\.Sleep", "nothing sleeps")]
    [InlineData("tests", @"Thread\.Sleep|Task\.Delay\(", "tests look, they do not wait")]
    [InlineData("src/PathPortal.Portal/Domain", @"\bHttpContext\b|\bIServiceProvider\b", "the domain knows nothing of its host")]
    public void Sources_DoNotUse(string folder, string pattern, string rule)
    {
        var offenders = Sources(folder).Where(f => Path.GetFileName(f) != "ArchitectureTests.cs")
            .SelectMany(f => File.ReadLines(f).Select((line, i) => (f, line, i)))
            .Where(l => Regex.IsMatch(l.line, pattern))
            .Select(l => $"{Path.GetRelativePath(Root, l.f)}:{l.i + 1}: {l.line.Trim()}");
        Assert.True(!offenders.Any(), $"{rule}:\n{string.Join('\n', offenders)}");
    }

    [Fact]
    public void Features_OfTheWeb_DoNotUseEachOther()
    {
        var features = Path.Combine(Root, "src", "PathPortal.Web", "Features");
        var names = Directory.GetDirectories(features).Select(d => Path.GetFileName(d)!).ToList();
        Assert.NotEmpty(names);
        foreach (var feature in names)
        {
            foreach (var file in Sources(Path.Combine("src", "PathPortal.Web", "Features", feature)))
            {
                var text = File.ReadAllText(file);
                var others = names.Where(n => n != feature && Regex.IsMatch(text, $@"\bFeatures\.{n}\b"));
                Assert.True(!others.Any(), $"{Path.GetRelativePath(Root, file)} uses the feature {string.Join(", ", others)}.");
            }
        }
    }

    [Fact]
    public void Domain_Types_CarryNothingOfTheDatabase()
    {
        var members = typeof(PortalDb).Assembly.GetTypes().Where(t => t.Namespace?.StartsWith("PathPortal.Portal.Domain", StringComparison.Ordinal) == true)
            .SelectMany(t => t.GetMembers(BindingFlags.Public | BindingFlags.NonPublic | BindingFlags.Instance | BindingFlags.Static | BindingFlags.DeclaredOnly))
            .ToList();
        Assert.NotEmpty(members);
        var touching = members.SelectMany(m => TypesOf(m).Select(t => (m, t)))
            .Where(p => p.t.Namespace is { } name && (name.StartsWith("Microsoft.EntityFrameworkCore", StringComparison.Ordinal) || name.StartsWith("Npgsql", StringComparison.Ordinal)));
        Assert.Empty(touching);
    }

    [Fact]
    public void Types_ThatArePublic_HaveAFileOfTheirName()
    {
        var strays = new[] { "PathPortal.Engine", "PathPortal.Formats", "PathPortal.Portal", "PathPortal.Worker", "PathPortal.Cli" }
            .SelectMany(p => Sources(Path.Combine("src", p)))
            .Where(f => f.EndsWith(".cs", StringComparison.Ordinal))
            .SelectMany(f => PublicType().Matches(File.ReadAllText(f)).Select(m => (File: f, Type: m.Groups["name"].Value)))
            .Where(t => Path.GetFileName(t.File).Split('.')[0] != t.Type)
            .Select(t => $"{Path.GetRelativePath(Root, t.File)}: {t.Type}");
        Assert.True(!strays.Any(), string.Join('\n', strays));
    }

    [Fact]
    public void Sources_StayWithinFourHundredLines()
    {
        var long_ = Sources("src").Concat(Sources("tests")).Select(f => (File: f, Lines: File.ReadLines(f).Count())).Where(f => f.Lines > 400)
            .Select(f => $"{Path.GetRelativePath(Root, f.File)}: {f.Lines}");
        Assert.True(!long_.Any(), string.Join('\n', long_));
    }

    [GeneratedRegex(@"^public (?:static |sealed |abstract |readonly |partial |ref )*(?:class|record struct|record class|record|struct|enum|interface) (?<name>\w+)", RegexOptions.Multiline)]
    private static partial Regex PublicType();

    private static IEnumerable<Type> TypesOf(MemberInfo member) => member switch
    {
        FieldInfo field => [field.FieldType],
        PropertyInfo property => [property.PropertyType],
        MethodBase method => [.. method.GetParameters().Select(p => p.ParameterType), .. method is MethodInfo info ? new[] { info.ReturnType } : []],
        _ => [],
    };

    private static IEnumerable<string> Sources(string folder) =>
        Directory.EnumerateFiles(Path.Combine(Root, folder), "*.*", SearchOption.AllDirectories)
            .Where(f => Path.GetExtension(f) is ".cs" or ".razor")
            .Where(f => !Path.GetRelativePath(Root, f).Split(Path.DirectorySeparatorChar).Any(part => part is "bin" or "obj"));
}
