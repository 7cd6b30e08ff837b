using PathPortal.Engine.Geometry;

namespace PathPortal.Engine.Tests;

/// <summary>Comparisons of vectors, matrices and poses, element by element, that say which element differs.</summary>
public static class Approximately
{
    public static void Equal(double expected, double actual, double tolerance, string what)
    {
        if (!(Math.Abs(expected - actual) <= tolerance))
        {
            Assert.Fail($"{what}: expected {expected:R}, got {actual:R}, difference {Math.Abs(expected - actual):G3}, tolerance {tolerance:G3}");
        }
    }

    public static void Equal(IReadOnlyList<double> expected, IReadOnlyList<double> actual, double tolerance, string what)
    {
        Assert.Equal(expected.Count, actual.Count);
        for (var i = 0; i < expected.Count; i++)
        {
            Equal(expected[i], actual[i], tolerance, $"{what} [{i}]");
        }
    }

    public static void Equal(Vector3D expected, Vector3D actual, double tolerance, string what) =>
        Equal([expected.X, expected.Y, expected.Z], [actual.X, actual.Y, actual.Z], tolerance, what);

    public static void Equal(RotationMatrix expected, RotationMatrix actual, double tolerance, string what)
    {
        for (var row = 0; row < 3; row++)
        {
            for (var column = 0; column < 3; column++)
            {
                Equal(expected[row, column], actual[row, column], tolerance, $"{what} R[{row},{column}]");
            }
        }
    }

    public static void Equal(RigidTransform expected, RigidTransform actual, double tolerance, string what)
    {
        Equal(expected.Rotation, actual.Rotation, tolerance, what);
        Equal(expected.Translation, actual.Translation, tolerance, what + " t");
    }
}
