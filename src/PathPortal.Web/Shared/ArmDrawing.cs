using PathPortal.Engine.Arms;
using PathPortal.Engine.Geometry;

namespace PathPortal.Web.Shared;

/// <summary>An arm, and where it stands, in the form the drawing script reads: metres, and poses as nine rotation numbers by rows then three of translation.</summary>
public sealed record ArmDrawing(IReadOnlyList<ArmDrawing.Link> Joints, double[] Flange, double[] Base, double[]? Tool, double[]? Work)
{
    public static ArmDrawing Of(ArmModel arm, CellGeometry? cell = null) => new(
        [.. arm.Joints.Select(j => new Link(
            j.Name, j.Kind == JointKind.Prismatic, Numbers(j.PoseInPrevious), j.Sign, j.Zero, j.Limits.Low?.Value, j.Limits.High?.Value))],
        Numbers(arm.FlangeInLastJoint),
        Numbers(cell?.BaseInCell ?? RigidTransform.Identity),
        cell is null ? null : Numbers(cell.ToolInFlange),
        cell is null ? null : Numbers(cell.WorkInCell));

    private static double[] Numbers(RigidTransform pose)
    {
        var (r, t) = (pose.Rotation, pose.Translation);
        return [r.R11, r.R12, r.R13, r.R21, r.R22, r.R23, r.R31, r.R32, r.R33, t.X, t.Y, t.Z];
    }

    /// <summary>One joint: its pose in the frame before, and motion about or along its z axis by sign times value plus zero.</summary>
    public sealed record Link(string Name, bool Slides, double[] Pose, int Sign, double Zero, double? Low, double? High);
}
