namespace PathPortal.Formats.Documents;

/// <summary>An orientation as people write it: three angles of a named convention, or a quaternion.</summary>
public sealed record OrientationDocument
{
    /// <summary>A word of <see cref="OrientationConvention.Words"/>; decides which of the numbers count.</summary>
    public string Convention { get; set; } = OrientationConvention.Default;

    /// <summary>Turn about the first axis the convention names (degrees).</summary>
    public double FirstDeg { get; set; }

    /// <summary>Turn about the second axis the convention names (degrees).</summary>
    public double SecondDeg { get; set; }

    /// <summary>Turn about the third axis the convention names (degrees).</summary>
    public double ThirdDeg { get; set; }

    /// <summary>Quaternion, scalar part. Need not have norm 1, but must not be zero.</summary>
    public double W { get; set; } = 1;

    public double X { get; set; }

    public double Y { get; set; }

    public double Z { get; set; }

    public bool IsQuaternion => Convention == OrientationConvention.Quaternion;

    public static OrientationDocument FromQuaternion(Engine.Geometry.UnitQuaternion q) =>
        new() { Convention = OrientationConvention.Quaternion, W = q.W, X = q.X, Y = q.Y, Z = q.Z };
}
