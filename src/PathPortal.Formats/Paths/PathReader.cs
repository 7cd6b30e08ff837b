using System.Collections.Immutable;
using PathPortal.Engine.Paths;
using PathPortal.Formats.Problems;

namespace PathPortal.Formats.Paths;

/// <summary>Reads a path file: header, rows, then what only the whole path shows.</summary>
internal static class PathReader
{
    public static ReadResult<PathFile> Read(byte[] utf8, ProblemList problems)
    {
        var rows = new CsvRows(utf8);
        if (!rows.Next())
        {
            problems.Add(1, 1, "", "", "a header line with column names, then one row per point", "The file holds no lines.");
            return ReadResult<PathFile>.Refused(problems);
        }

        if (new PathHeader(rows, problems).Read() is not { } layout)
        {
            return ReadResult<PathFile>.Refused(problems);
        }

        var points = new PathRows(utf8, rows, layout, problems);
        points.ReadAll();
        if (problems.Any)
        {
            return ReadResult<PathFile>.Refused(problems);
        }

        var checks = new PathChecks(points, layout, problems);
        checks.Run();
        if (problems.Any)
        {
            return ReadResult<PathFile>.Refused(problems);
        }

        PathPlausibility.Remark(points, layout, problems);
        var path = new ToolPath(points.Waypoints.ToImmutable()) { PostureKinds = layout.PostureKinds };
        return ReadResult<PathFile>.Of(new(path, PathFigures.Of(path, layout.PostureKinds)), problems);
    }
}
