using PathPortal.Formats.Paths;

namespace PathPortal.Formats.Tests;

/// <summary>What README says about path files is what the reader does.</summary>
public sealed class ReadmeTests
{
    private static string Readme
    {
        get
        {
            var folder = new DirectoryInfo(AppContext.BaseDirectory);
            while (folder is not null && !File.Exists(Path.Combine(folder.FullName, "PathPortal.sln")))
            {
                folder = folder.Parent;
            }

            return File.ReadAllText(Path.Combine(folder!.FullName, "README.md"));
        }
    }

    [Fact]
    public void Readme_DescribesEveryColumnAsTheReaderDoes() =>
        Assert.All(PathColumnHelp.All, h => Assert.Contains($"| `{h.Columns}` | {h.Meaning} | {h.Blank} |", Readme, StringComparison.Ordinal));

    [Fact]
    public void Readme_ShowsTheExampleThatCanBeDownloaded() =>
        Assert.Contains(string.Concat(PathExample.Text.TrimEnd().Split('\n').Select(l => "    " + l.TrimEnd('\r') + "\n")), Readme, StringComparison.Ordinal);
}
