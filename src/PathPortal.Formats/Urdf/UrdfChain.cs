using System.Collections.Immutable;
using System.Globalization;
using PathPortal.Engine.Arms;
using PathPortal.Engine.Geometry;
using PathPortal.Formats.Documents;
using PathPortal.Formats.Problems;

namespace PathPortal.Formats.Urdf;

/// <summary>Makes an arm document of the joints between two links; fixed joints are folded into their neighbours.</summary>
internal sealed class UrdfChain(UrdfTree tree, string robotName, ImmutableArray<FormatRemark> read, bool freeMimicJoints)
{
    private const string Source = "URDF file";

    private readonly ProblemList _problems = new();
    private readonly List<UrdfJoint> _moving = [];

    public ReadResult<ArmDocument> ToArm(string baseLink, string tipLink)
    {
        if (Between(baseLink, tipLink) is not { } joints)
        {
            return ReadResult<ArmDocument>.Refused(_problems);
        }

        foreach (var remark in read.Where(r => joints.Exists(j => r.Field.StartsWith(VisibleText.Of(j.Field, 100), StringComparison.Ordinal))))
        {
            _problems.Remark(remark.Line, remark.Column, remark.Field, remark.Message);
        }

        var arm = new ArmDocument
        {
            Name = robotName.Length == 0 ? "Arm from URDF" : robotName,
            Note = $"From a URDF file, link “{VisibleText.Of(baseLink)}” to “{VisibleText.Of(tipLink)}”.",
            Kinematics = ArmKinematics.JointFrames,
        };

        // Fixed joints wait here for the next moving one, or for the flange.
        var folded = new List<UrdfJoint>();
        foreach (var joint in joints)
        {
            folded.Add(joint);
            if (joint.Moves)
            {
                arm.Joints.Add(Moving(joint, Pose(folded)));
                _moving.Add(joint);
                folded.Clear();
            }
        }

        arm.Flange = Pose(folded);
        Check(arm, tipLink);
        return ReadResult<ArmDocument>.Of(arm, _problems);
    }

    private List<UrdfJoint>? Between(string baseLink, string tipLink)
    {
        foreach (var link in (string[])[baseLink, tipLink])
        {
            if (!tree.HasLink(link))
            {
                _problems.Add(
                    0, 0, "link", link,
                    NearestName.Of(link, tree.Order) is { } near ? $"a link of the file; nearest is “{VisibleText.Of(near)}”" : "a link of the file",
                    "There is no such link.");
                return null;
            }
        }

        var joints = new List<UrdfJoint>();
        for (var link = tipLink; link != baseLink;)
        {
            if (tree.JointAbove(link) is not { } joint)
            {
                _problems.Add(
                    0, 0, "link", baseLink, $"a link between the root and “{VisibleText.Of(tipLink)}”",
                    "The base link does not carry the tip link.");
                return null;
            }

            joints.Add(joint);
            link = joint.Parent;
        }

        joints.Reverse();
        return joints;
    }

    private JointDocument Moving(UrdfJoint joint, PoseDocument pose)
    {
        if (joint.Type is UrdfJointType.Floating or UrdfJointType.Planar)
        {
            Wrong(
                joint, joint.Type.ToString().ToLowerInvariant(), "base and tip links with no such joint between",
                "A floating or planar joint cannot be part of a serial arm.");
        }

        if (tree.Resolve(joint.Name) is { } mimic)
        {
            var law = string.Create(CultureInfo.InvariantCulture, $"{mimic.Multiplier:R} × {VisibleText.Of(mimic.Follows)} + {mimic.Offset:R}");
            if (freeMimicJoints)
            {
                Remark(joint, $"In the file this joint follows another: {law}. Here it is free; the coupling is lost.");
            }
            else
            {
                Wrong(
                    joint, law, "base and tip links with no such joint between",
                    "The joint follows another (mimic); a chain with coupled joints cannot be simulated.");
            }
        }

        var axis = joint.Axis.Norm > 1e-9 ? joint.Axis.Normalised() : joint.Axis;
        if (Math.Abs(joint.Axis.Norm - 1) > 1e-6)
        {
            Remark(joint, "The axis has not length 1; it was scaled.");
        }

        var slides = joint.Type == UrdfJointType.Prismatic;
        return new()
        {
            Name = joint.Name,
            Kind = slides ? JointKind.Prismatic : JointKind.Revolute,
            Pose = pose,
            AxisX = axis.X,
            AxisY = axis.Y,
            AxisZ = axis.Z,
            Limits = Limits(joint, slides ? 1000 : 180 / Math.PI),
        };
    }

    private JointLimitsDocument Limits(UrdfJoint joint, double scale)
    {
        var limits = new JointLimitsDocument { Continuous = joint.Type == UrdfJointType.Continuous };
        if (limits.Continuous)
        {
            if (joint.Lower is not null || joint.Upper is not null)
            {
                Remark(joint, "The joint turns without end: its lower and upper limits are ignored.");
            }
        }
        else if ((joint.Lower ?? 0) == 0 && (joint.Upper ?? 0) == 0)
        {
            Remark(
                joint,
                "Lower and upper limit are missing or both 0, which means not given: joint positions cannot be judged until they are.");
        }
        else
        {
            if (joint.Lower is null || joint.Upper is null)
            {
                Remark(joint, "One of the position limits is missing; the specification makes it 0.");
            }

            (limits.Low, limits.High) = (Limit(joint.Lower ?? 0, scale), Limit(joint.Upper ?? 0, scale));
        }

        if (joint.Velocity is > 0)
        {
            limits.Speed = Limit(joint.Velocity.Value, scale);
        }
        else
        {
            Remark(joint, "The speed limit is missing or 0, which means not given: joint speed cannot be judged until it is.");
        }

        if (joint.SoftLower != joint.SoftUpper)
        {
            Remark(joint, string.Create(
                CultureInfo.InvariantCulture,
                $"Soft limits {joint.SoftLower:R} to {joint.SoftUpper:R} of the safety controller are not used; enter them as limits if they bind."));
        }

        return limits;
    }

    private static LimitDocument Limit(double si, double scale) => new() { Value = si * scale, Source = Source };

    // One origin keeps its angles, so that people find their numbers again; a product is kept as a quaternion, which has no poles.
    private static PoseDocument Pose(List<UrdfJoint> joints)
    {
        if (joints.Count == 1)
        {
            var (xyz, rpy) = (joints[0].Xyz, joints[0].Rpy);
            return new()
            {
                XMm = xyz.X * 1000,
                YMm = xyz.Y * 1000,
                ZMm = xyz.Z * 1000,
                Orientation = new() { FirstDeg = Degrees(rpy.X), SecondDeg = Degrees(rpy.Y), ThirdDeg = Degrees(rpy.Z) },
            };
        }

        var pose = RigidTransform.Identity;
        foreach (var joint in joints)
        {
            pose *= new RigidTransform(new EulerAngles(EulerConvention.FixedXyz, joint.Rpy.X, joint.Rpy.Y, joint.Rpy.Z).ToMatrix(), joint.Xyz);
        }

        var p = pose.Translation;
        return new()
        {
            XMm = p.X * 1000,
            YMm = p.Y * 1000,
            ZMm = p.Z * 1000,
            Orientation = joints.Count == 0 ? new() : OrientationDocument.FromQuaternion(UnitQuaternion.FromMatrix(pose.Rotation)),
        };
    }

    private static double Degrees(double rad) => rad * (180 / Math.PI);

    private void Check(ArmDocument arm, string tipLink)
    {
        if (arm.Joints.Count is 0 or > ArmModel.MaxJoints)
        {
            _problems.Add(
                0, 0, "link", tipLink, $"1 to {ArmModel.MaxJoints} moving joints between base and tip",
                string.Create(CultureInfo.InvariantCulture, $"The chain has {arm.Joints.Count} moving joints."));
            return;
        }

        if (_problems.Any)
        {
            return;
        }

        foreach (var problem in arm.Validate())
        {
            var index = _moving.FindIndex(j => problem.Field.StartsWith($"joints[{_moving.IndexOf(j)}]", StringComparison.Ordinal));
            _problems.Add(index < 0 ? problem : problem with { Line = _moving[index].Line, Column = _moving[index].Column });
        }

        _problems.Remark(
            0, 0, "characteristic_length_mm",
            "A URDF file has no characteristic length: 1000 mm was entered. It decides how singular values read.");
        _problems.Remark(
            0, 0, "limits.acceleration",
            "A URDF file has no acceleration limits: joint acceleration cannot be judged until they are entered.");
    }

    private void Wrong(UrdfJoint joint, string value, string expected, string message) =>
        _problems.Add(joint.Line, joint.Column, joint.Field, value, expected, message);

    private void Remark(UrdfJoint joint, string message) => _problems.Remark(joint.Line, joint.Column, joint.Field, message);
}
