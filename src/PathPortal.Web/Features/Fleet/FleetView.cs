using PathPortal.Engine.Verdicts;
using PathPortal.Portal.Data.Queries;
using PathPortal.Portal.Domain.Runs;
using PathPortal.Web.Shared;

namespace PathPortal.Web.Features.Fleet;

/// <summary>One page of the matrix as chosen.</summary>
public sealed record FleetView(
    IReadOnlyList<FleetOverview.Program> Rows, IReadOnlyList<FleetOverview.Cell> Columns, int Page, int Pages, int RunsUnderWay)
{
    public const int RowsPerPage = 40;

    public static FleetView Of(FleetOverview overview, FleetFilter filter)
    {
        var columns = overview.Cells.Where(c => filter.Plant is null || c.PlantId == filter.Plant).ToList();
        var shown = columns.Select(c => c.Id).ToHashSet();
        var rows = overview.Programs
            .Where(p => (filter.Part is null || p.PartId == filter.Part)
                && (string.IsNullOrEmpty(filter.Process) || string.Equals(p.Process, filter.Process, StringComparison.OrdinalIgnoreCase)))
            .Select(p => p with { Figures = p.Figures.Where(f => shown.Contains(f.Key)).ToDictionary() })
            .Where(p => filter.Plant is null || p.Figures.Count > 0 || p.PlantId == filter.Plant)
            .Where(p => string.IsNullOrEmpty(filter.Show) || p.Figures.Values.Any(f => IsShown(f, filter.Show)));
        var sorted = (filter.Sort == FleetFilter.SortByName
            ? rows.OrderBy(p => p.Name, StringComparer.OrdinalIgnoreCase)
            : rows.OrderByDescending(p => p.Weight).ThenBy(p => p.Name, StringComparer.OrdinalIgnoreCase)).ToList();

        var pages = Math.Max(1, (sorted.Count + RowsPerPage - 1) / RowsPerPage);
        var page = Math.Clamp(filter.Page, 1, pages);
        var onPage = sorted.Skip((page - 1) * RowsPerPage).Take(RowsPerPage).ToList();
        var used = onPage.SelectMany(p => p.Figures.Keys).ToHashSet();
        var plantOrder = overview.Plants.Select((p, i) => (p.Id, i)).ToDictionary(p => p.Id, p => p.i);
        return new FleetView(
            onPage, [.. columns.Where(c => used.Contains(c.Id)).OrderBy(c => plantOrder.GetValueOrDefault(c.PlantId))], page, pages,
            overview.Programs.SelectMany(p => p.Figures.Values).Count(f => f.RunState is RunState.Queued or RunState.Running));
    }

    private static bool IsShown(FleetFigure figure, string show) => show switch
    {
        FleetFilter.ShowFailing => figure.Verdict == Verdict.Fail || figure.Problem is not null || figure.RunState == RunState.Failed,
        FleetFilter.ShowNear => figure.Verdict == Verdict.Pass && LimitUse.Of(figure.WorstUse).Band == LimitUseBand.Near,
        FleetFilter.ShowPassing => figure.Verdict == Verdict.Pass,
        FleetFilter.ShowUnknown => figure.Verdict is null or Verdict.NotAssessable,
        _ => true,
    };
}
