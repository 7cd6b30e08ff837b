using System.Collections.Immutable;
using CsCheck;
using PathPortal.Engine.Arms;
using PathPortal.Engine.Geometry;
using PathPortal.Engine.Paths;
using PathPortal.Formats.Paths;

namespace PathPortal.Formats.Tests.Paths;

public sealed class PathCsvRoundTripTests
{
    // Scaling a quaternion that has norm 1 to rounding to norm 1 again moves a component by at most a few units in the last place.
    private const double QuaternionTolerance = 4e-16;

    private static readonly JointKind[] Kinds = [JointKind.Prismatic, JointKind.Revolute];

    private static readonly Gen<double> Coordinate = Gen.OneOf(Gen.Double[-100, 100], Gen.Double[-1e-6, 1e-6], Gen.Const(0.0), Gen.Const(1.0 / 3));

    private static readonly string[] AwkwardLabels =
        ["", "=1+1", "+x", "-y", "@z", "'=q", "''-", "'plain", "a,b", "say \"it\"", " padded ", "# seam", "шов", "焊缝 2"];

    private static readonly Gen<string> Label = Gen.OneOf(
        Gen.Int[0, AwkwardLabels.Length - 1].Select(i => AwkwardLabels[i]), Gen.String[Gen.Char[' ', '~'], 0, 30]);

    private static readonly Gen<Waypoint> Point =
        from x in Coordinate
        from y in Coordinate
        from z in Coordinate
        from q in Gen.Select(Gen.Double[0.1, 1], Gen.Double[-1, 1], Gen.Double[-1, 1], Gen.Double[-1, 1], UnitQuaternion.FromComponents)
        from joint in Gen.Bool
        from task in Gen.Enum<TaskKind>()
        from speed in Gen.Double[0.001, 2]
        from share in Gen.Double[0.01, 1]
        from posture in Gen.Bool
        from j1 in Gen.Double[-3, 3]
        from j2 in Gen.Double[-6.5, 6.5]
        from dwell in Gen.OneOf(Gen.Const(0.0), Gen.Double[0, 10])
        from process in Gen.Bool
        from label in Label
        select new Waypoint
        {
            Position = new(x, y, z),
            Orientation = q,
            Motion = joint ? MotionKind.Joint : MotionKind.Straight,
            Task = task,
            Speed = speed,
            JointSpeedShare = share,
            Joints = joint && posture ? [j1, j2] : null,
            Dwell = dwell,
            ProcessOn = process && !joint,
            Label = label,
        };

    [Fact]
    public void Read_OfWhatWasWritten_IsTheSamePath()
    {
        Point.Array[2, 12].Sample(
            points =>
            {
                points[0] = points[0] with { Joints = null };
                for (var i = 1; i < points.Length; i++)
                {
                    // Points that don't move are refused; their place is changed, their digits are kept.
                    var still = (points[i].Position - points[i - 1].Position).Norm < 1e-6;
                    points[i] = still ? points[i] with { Position = points[i].Position with { X = 0.1 * i } } : points[i];
                }

                var path = new ToolPath([.. points]);
                var read = PathCsv.Read(PathCsv.Write(path, Kinds));

                Assert.Empty(read.Problems);
                for (var i = 0; i < points.Length; i++)
                {
                    AssertSame(points[i], read.Value!.Path.Waypoints[i]);
                }
            },
            iter: 2000, seed: "0000KFq3tTh1", threads: 1);
    }

    [Fact]
    public void Read_OfWhatWasWritten_KeepsCornersAndLeadIns()
    {
        var path = PathCsv.Read(PathExample.Text).Value!.Path;

        var read = PathCsv.Read(PathCsv.Write(path)).Value!.Path;

        for (var i = 0; i < path.Waypoints.Length; i++)
        {
            AssertSame(path.Waypoints[i], read.Waypoints[i]);
        }
    }

    [Fact]
    public void Write_OfLabelsASpreadsheetWouldRun_PutsAnApostropheInFront()
    {
        var path = PathCsv.Read(PathExample.Text).Value!.Path.Waypoints;
        var text = PathCsv.Write(new([.. path.Take(2).Select(p => p with { Label = "=HYPERLINK(1)" })]));

        Assert.Contains(",'=HYPERLINK(1)\r\n", text, StringComparison.Ordinal);
    }

    [Fact]
    public void Text_OfAnyFiniteNumber_ReadsBackAsTheSameBits()
    {
        Gen.Select(Gen.Double, Gen.Int[0, 3]).Where(c => double.IsFinite(c.Item1)).Sample(
            c =>
            {
                var text = System.Text.Encoding.ASCII.GetBytes(CellNumber.Text(c.Item1, c.Item2));
                Assert.True(CellNumber.TryParse(text, -c.Item2, out var read));
                Assert.Equal(BitConverter.DoubleToInt64Bits(c.Item1 + 0.0), BitConverter.DoubleToInt64Bits(read));
            },
            iter: 20_000, seed: "0000KFq3tTh2", threads: 1);
    }

    private static void AssertSame(Waypoint expected, Waypoint actual)
    {
        Assert.Equal(expected.Orientation.W, actual.Orientation.W, QuaternionTolerance);
        Assert.Equal(expected.Orientation.X, actual.Orientation.X, QuaternionTolerance);
        Assert.Equal(expected.Orientation.Y, actual.Orientation.Y, QuaternionTolerance);
        Assert.Equal(expected.Orientation.Z, actual.Orientation.Z, QuaternionTolerance);
        Assert.Equal(expected.Joints ?? ImmutableArray<double>.Empty, actual.Joints ?? ImmutableArray<double>.Empty);
        Assert.Equal(
            expected with { SourceLine = 0, Joints = null, Orientation = UnitQuaternion.Identity },
            actual with { SourceLine = 0, Joints = null, Orientation = UnitQuaternion.Identity });
    }
}
