using Deque.AxeCore.Commons;
using Deque.AxeCore.Playwright;
using Microsoft.Playwright;

namespace PathPortal.Browser.Tests.Support;

/// <summary>Holds a page to WCAG 2.2 AA as far as a machine can tell.</summary>
public static class Accessibility
{
    private static readonly AxeRunOptions Options = new()
    {
        RunOnly = new() { Type = "tag", Values = ["wcag2a", "wcag2aa", "wcag21a", "wcag21aa", "wcag22aa", "best-practice"] },
    };

    public static async Task AssertNoFindingsAsync(IPage page)
    {
        var result = await page.RunAxe(Options);
        var findings = result.Violations.SelectMany(v => v.Nodes.Select(n => $"{v.Id}: {n.Html} — {v.Help}")).ToList();
        Assert.True(findings.Count == 0, $"{page.Url}: {findings.Count} findings\n{string.Join('\n', findings.Take(20))}");
    }

    /// <summary>No page scrolls sideways; wide tables scroll in their own box.</summary>
    public static async Task AssertNoSidewaysScrollAsync(IPage page)
    {
        var over = await page.EvaluateAsync<int>("() => document.documentElement.scrollWidth - document.documentElement.clientWidth");
        Assert.True(over <= 0, $"{page.Url}: {over} px wider than the window");
    }
}
