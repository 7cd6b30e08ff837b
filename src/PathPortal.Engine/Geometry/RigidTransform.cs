namespace PathPortal.Engine.Geometry;

/// <summary>
/// The pose X_AB of frame B in frame A: a point with coordinates p_B has p_A = R_AB p_B + t, t in metres and axes of A.
/// Products read by adjacent letters: X_AC = X_AB * X_BC. Immutable.
/// </summary>
public readonly record struct RigidTransform(RotationMatrix Rotation, Vector3D Translation)
{
    public static RigidTransform Identity => new(RotationMatrix.Identity, Vector3D.Zero);

    public static RigidTransform FromTranslation(double x, double y, double z) =>
        new(RotationMatrix.Identity, new(x, y, z));

    public static RigidTransform operator *(RigidTransform a, RigidTransform b) =>
        new(a.Rotation * b.Rotation, a.Rotation * b.Translation + a.Translation);

    public static Vector3D operator *(RigidTransform x, Vector3D p) => x.Rotation * p + x.Translation;

    /// <summary>The pose of A in B.</summary>
    public RigidTransform Inverse()
    {
        var inverse = Rotation.Transposed();
        return new(inverse, -(inverse * Translation));
    }
}
