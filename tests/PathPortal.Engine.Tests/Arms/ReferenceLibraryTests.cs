using System.Text.Json;
using PathPortal.Engine.Arms;
using PathPortal.Engine.Geometry;
using PathPortal.Engine.Paths;
using PathPortal.Engine.Tests.Published;

namespace PathPortal.Engine.Tests.Arms;

/// <summary>Five arms as computed by Orocos KDL 1.5.1 and numpy (Published/kdl.json), L = 1 m.</summary>
public sealed class ReferenceLibraryTests
{
    private const double PoseTolerance = 1e-12; // m and 1
    private const double SigmaTolerance = 1e-12;

    public static TheoryData<int, int> Cases
    {
        get
        {
            var data = new TheoryData<int, int>();
            foreach (var (index, arm) in PublishedCase.File("kdl").EnumerateArray().Index())
            {
                for (var i = 0; i < arm.GetProperty("cases").GetArrayLength(); i++)
                {
                    data.Add(index, i);
                }
            }

            return data;
        }
    }

    [Theory]
    [MemberData(nameof(Cases))]
    public void PoseJacobianAndSingularValues_AgreeWithTheLibrary(int armIndex, int caseIndex)
    {
        var entry = PublishedCase.File("kdl")[armIndex];
        var json = entry.GetProperty("arm");
        var arm = PublishedArm.Read(json);
        var X_CB = PoseOr(json, "base");
        var X_FT = PoseOr(json, "tool");
        var item = entry.GetProperty("cases")[caseIndex];
        var q = PublishedCase.Numbers(item.GetProperty("inputs").GetProperty("q"));
        var expected = item.GetProperty("expected");
        var name = entry.GetProperty("name").GetString()!;

        Approximately.Equal(PublishedCase.Pose(expected.GetProperty("T")), X_CB * ArmPose.Compute(arm, q).Tool(X_FT), PoseTolerance, name);

        var J = GeometricJacobian.Compute(arm, q, X_FT);
        var expectedJ = PublishedCase.Matrix(expected.GetProperty("J"));
        for (var i = 0; i < q.Length; i++)
        {
            var column = new Twist(new(J[0, i], J[1, i], J[2, i]), new(J[3, i], J[4, i], J[5, i])).InAxesOf(X_CB.Rotation);
            Approximately.Equal(
                [.. expectedJ.Select(row => row[i])],
                [column.Linear.X, column.Linear.Y, column.Linear.Z, column.Angular.X, column.Angular.Y, column.Angular.Z],
                PoseTolerance,
                $"{name}, joint {i + 1}");
        }

        var sigma = PublishedCase.Numbers(expected.GetProperty("sigma"));
        var scaled = ScaledJacobian.Compute(arm, q, X_FT, TaskKind.Pose);
        Approximately.Equal(sigma, [.. scaled.SingularValues.Take(sigma.Length)], SigmaTolerance, name);
    }

    private static RigidTransform PoseOr(JsonElement arm, string name) =>
        arm.TryGetProperty(name, out var pose) ? PublishedCase.Pose(pose) : RigidTransform.Identity;
}
