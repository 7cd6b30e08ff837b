namespace PathPortal.Engine.Stepping;

/// <summary>Where an arm is, in base axes: places in a workspace.</summary>
internal readonly unsafe struct ArmFrames<T>(T* axis, T* origin, T* rotation, T* point)
    where T : unmanaged
{
    /// <summary>Unit axis of each joint in the sense of its joint value, joint × (x, y, z).</summary>
    public T* Axis { get; } = axis;

    /// <summary>A point on each axis (m), joint × (x, y, z).</summary>
    public T* Origin { get; } = origin;

    /// <summary>R_BT by rows.</summary>
    public T* Rotation { get; } = rotation;

    /// <summary>Tool centre point (m).</summary>
    public T* Point { get; } = point;
}
