using PathPortal.Engine.Geometry;

namespace PathPortal.Formats.Urdf;

/// <summary>One joint as the file gives it, SI. Missing elements keep the values the specification gives them.</summary>
internal sealed class UrdfJoint
{
    public required string Name { get; init; }

    public required UrdfJointType Type { get; init; }

    public required int Line { get; init; }

    public required int Column { get; init; }

    public string Parent { get; set; } = "";

    public string Child { get; set; } = "";

    public Vector3D Xyz { get; set; }

    /// <summary>Roll, pitch, yaw about fixed axes (rad).</summary>
    public Vector3D Rpy { get; set; }

    public Vector3D Axis { get; set; } = Vector3D.UnitX;

    public bool HasLimit { get; set; }

    public double? Lower { get; set; }

    public double? Upper { get; set; }

    public double? Velocity { get; set; }

    public double? SoftLower { get; set; }

    public double? SoftUpper { get; set; }

    public UrdfMimic? Mimic { get; set; }

    public bool Moves => Type is not UrdfJointType.Fixed;

    /// <summary>How messages call it.</summary>
    public string Field => $"joint {Name}";
}
