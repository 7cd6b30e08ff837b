using PathPortal.Engine.Geometry;

namespace PathPortal.Engine.Tests;

/// <summary>Random cases that are the same every time; a failing one names its seed.</summary>
public static class Seeded
{
    public static void Cases(int count, Action<Random> check)
    {
        for (var seed = 1; seed <= count; seed++)
        {
            try
            {
                check(new Random(seed));
            }
            catch (Exception failure)
            {
                throw new InvalidOperationException($"Seed {seed} of {count}: {failure.Message}", failure);
            }
        }
    }

    public static double Between(this Random random, double low, double high) => low + (high - low) * random.NextDouble();

    public static Vector3D Vector(this Random random, double size) =>
        new(random.Between(-size, size), random.Between(-size, size), random.Between(-size, size));

    /// <summary>Evenly spread over all directions.</summary>
    public static Vector3D Direction(this Random random)
    {
        while (true)
        {
            var v = random.Vector(1);
            if (v.Norm is > 0.1 and <= 1)
            {
                return v.Normalised();
            }
        }
    }

    public static RotationMatrix Rotation(this Random random) =>
        RotationVector.ToMatrix(random.Between(0, Math.PI) * random.Direction());

    public static RigidTransform Pose(this Random random, double size) => new(random.Rotation(), random.Vector(size));
}
