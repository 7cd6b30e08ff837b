using System.Text.Json;
using PathPortal.Engine.Arms;
using PathPortal.Engine.Geometry;

namespace PathPortal.Engine.Tests.Published;

/// <summary>Arms as the cases write them: DH, MDH or URDF-like rows in metres and radians.</summary>
public static class PublishedArm
{
    /// <summary>The arm of a case's input, with L = 1 m as in every case.</summary>
    public static ArmModel Of(PublishedCase published, string name = "arm")
    {
        var arm = published.Inputs.GetProperty(name);
        return arm.ValueKind == JsonValueKind.String ? Of(PublishedCase.Get(arm.GetString()!)) : Read(arm);
    }

    public static ArmModel Read(JsonElement arm, double characteristicLength = 1)
    {
        var rows = arm.GetProperty("joints").EnumerateArray().ToArray();
        return arm.GetProperty("convention").GetString() switch
        {
            "DH" => new StandardDhTable([.. rows.Select(DhRow)], RigidTransform.Identity).ToArm("published", characteristicLength),
            "MDH" => new ModifiedDhTable([.. rows.Select(DhRow)], RigidTransform.Identity).ToArm("published", characteristicLength),
            "URDF" => Urdf(rows, characteristicLength),
            var other => throw new ArgumentException($"Unknown convention {other}."),
        };
    }

    private static DhRow DhRow(JsonElement row, int index) => new(
        $"j{index + 1}",
        row.GetProperty("type").GetString() == "P" ? JointKind.Prismatic : JointKind.Revolute,
        row.GetProperty("a").GetDouble(),
        Angle.FromRadians(row.GetProperty("alpha").GetDouble()),
        row.GetProperty("d").GetDouble(),
        Angle.FromRadians(row.GetProperty("theta").GetDouble()),
        row.TryGetProperty("sign", out var sign) ? sign.GetInt32() : 1,
        row.TryGetProperty("offset", out var offset) ? offset.GetDouble() : 0,
        new());

    private static ArmModel Urdf(JsonElement[] rows, double characteristicLength)
    {
        var links = new List<ChainLink>();
        var rest = RigidTransform.Identity;
        foreach (var row in rows)
        {
            var origin = rest * new RigidTransform(Rpy(row.GetProperty("rpy")), Vector(row.GetProperty("xyz")));
            var type = row.GetProperty("type").GetString();
            if (type == "fixed")
            {
                rest = origin;
                continue;
            }

            var kind = type == "prismatic" ? JointKind.Prismatic : JointKind.Revolute;
            links.Add(ChainLink.AboutAxis($"j{links.Count + 1}", kind, origin, Axis(row), 1, 0, new()));
            rest = RigidTransform.Identity;
        }

        return ChainLink.ToArm("published", links, rest, characteristicLength);
    }

    /// <summary>An arm of turning joints given by space screws (ω, v) and the flange M at zero; the point on an axis nearest to the origin is ω × v.</summary>
    public static ArmModel FromScrews(JsonElement screws, JsonElement flangeAtZero)
    {
        var links = new List<ChainLink>();
        var previous = RigidTransform.Identity;
        foreach (var screw in PublishedCase.Matrix(screws))
        {
            Vector3D omega = new(screw[0], screw[1], screw[2]), v = new(screw[3], screw[4], screw[5]);
            var origin = new RigidTransform(RotationMatrix.Identity, omega.Cross(v));
            links.Add(ChainLink.AboutAxis(
                $"j{links.Count + 1}", JointKind.Revolute, previous.Inverse() * origin, omega, 1, 0, new()));
            previous = origin;
        }

        return ChainLink.ToArm("screws", links, previous.Inverse() * PublishedCase.Pose(flangeAtZero), 1);
    }

    // A missing axis means x (URDF specification).
    private static Vector3D Axis(JsonElement row) => row.TryGetProperty("axis", out var axis) ? Vector(axis) : Vector3D.UnitX;

    public static Vector3D Vector(JsonElement array) =>
        PublishedCase.Numbers(array) is [var x, var y, var z] ? new(x, y, z) : throw new ArgumentException("Not three numbers.");

    public static RotationMatrix Rpy(JsonElement array) => Vector(array) is var (roll, pitch, yaw)
        ? new EulerAngles(EulerConvention.FixedXyz, roll, pitch, yaw).ToMatrix()
        : throw new ArgumentException("Not three numbers.");
}
