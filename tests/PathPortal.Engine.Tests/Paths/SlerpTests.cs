using System.Globalization;
using PathPortal.Engine.Geometry;
using PathPortal.Engine.Paths;
using PathPortal.Engine.Tests.Published;

namespace PathPortal.Engine.Tests.Paths;

public sealed class SlerpTests
{
    [Fact]
    public void At_PublishedShares_TurnsAboutOneAxis()
    {
        var published = PublishedCase.Get("TRJ-09");
        var slerp = Slerp.Between(Quaternion(published, "q0_wxyz"), Quaternion(published, "q1_wxyz"));

        foreach (var share in published.Expected.GetProperty("q").EnumerateObject())
        {
            var q = slerp.At(double.Parse(share.Name, CultureInfo.InvariantCulture));
            Approximately.Equal(PublishedCase.Numbers(share.Value), [q.W, q.X, q.Y, q.Z], published.Tolerance, published.Source);
        }

        Approximately.Equal(published.ExpectedNumber("total_angle"), slerp.Angle, published.Tolerance, published.Source);
        Approximately.Equal(
            PublishedArm.Vector(published.Expected.GetProperty("axis_fixed_base")), slerp.Turn.Normalised(), published.Tolerance, published.Source);
    }

    [Fact]
    public void At_QuarterPointsOfALargeTurn_IsSteady()
    {
        var published = PublishedCase.Get("TRJ-10");
        var turn = published.InputNumber("angle_deg") * Math.PI / 180;
        var slerp = Slerp.Between(UnitQuaternion.Identity, RotationVector.ToQuaternion(turn * Vector3D.UnitY));
        var expected = PublishedCase.Numbers(published.Expected.GetProperty("slerp"));
        for (var quarter = 1; quarter <= 3; quarter++)
        {
            var angle = RotationVector.AngleBetween(UnitQuaternion.Identity, slerp.At(quarter / 4.0)) * 180 / Math.PI;
            Approximately.Equal(expected[quarter - 1], angle, published.Tolerance, published.Source);
        }
    }

    [Fact]
    public void Between_OtherSignOfAQuaternion_IsTheSameTurn()
    {
        var published = PublishedCase.Get("TRJ-11");
        var slerp = Slerp.Between(Quaternion(published, "q0"), Quaternion(published, "minus_q1"));

        Approximately.Equal(
            PublishedCase.Rotation(published.ExpectedMatrix("R")),
            RotationMatrix.FromQuaternion(slerp.At(published.InputNumber("u"))),
            published.Tolerance,
            published.Source);
    }

    [Fact]
    public void StraightMove_WithQuinticLaw_PassesPublishedPoses()
    {
        var published = PublishedCase.Get("TRJ-04");
        var start = PublishedCase.Pose(published.Inputs.GetProperty("X_start"));
        var end = PublishedCase.Pose(published.Inputs.GetProperty("X_end"));
        var slerp = Slerp.Between(UnitQuaternion.FromMatrix(start.Rotation), UnitQuaternion.FromMatrix(end.Rotation));
        foreach (var (i, pose) in published.Expected.GetProperty("poses").EnumerateArray().Index())
        {
            var s = QuinticLaw.At(i / 3.0).Value;
            var reached = new RigidTransform(
                RotationMatrix.FromQuaternion(slerp.At(s)), start.Translation + s * (end.Translation - start.Translation));
            Approximately.Equal(PublishedCase.Pose(pose), reached, published.Tolerance, published.Source);
        }
    }

    private static UnitQuaternion Quaternion(PublishedCase published, string name) =>
        published.Input(name) is [var w, var x, var y, var z] ? UnitQuaternion.FromComponents(w, x, y, z) : throw new ArgumentException(name);
}
