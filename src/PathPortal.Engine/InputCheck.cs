using System.Collections.Immutable;
using PathPortal.Engine.Geometry;

namespace PathPortal.Engine;

/// <summary>Collects problems; every comparison is written so that NaN fails it. Stops collecting at <see cref="Most"/>.</summary>
internal sealed class InputCheck
{
    /// <summary>More problems than this help nobody.</summary>
    public const int Most = 50;

    // Entries of an orthonormal matrix or unit quaternion come with rounding of a few ulp; documents round to 9 digits at worst.
    private const double OrthonormalTolerance = 1e-6;

    /// <summary>Far beyond any cell (m); a length in millimetres read as metres ends up out there.</summary>
    public const double FurthestPoint = 1000;

    private readonly List<InputProblem> problems = [];

    public bool IsFull => problems.Count >= Most;

    public ImmutableArray<InputProblem> Problems => [.. problems];

    public void Add(string place, string quantity, double? value, string unit, string expected)
    {
        if (!IsFull)
        {
            problems.Add(new(place, quantity, value, unit, expected));
        }
    }

    public void Finite(string place, string quantity, double value, string unit)
    {
        if (!double.IsFinite(value))
        {
            Add(place, quantity, value, unit, "must be a finite number");
        }
    }

    /// <summary>At most a size either way of zero.</summary>
    public void Within(string place, string quantity, double value, double size, string unit)
    {
        if (!(Math.Abs(value) <= size))
        {
            Add(place, quantity, value, unit, $"must be between {InputText.Of(-size)} and {InputText.Of(size)}");
        }
    }

    public void Above(string place, string quantity, double value, double bound, string unit)
    {
        if (!(value > bound) || !double.IsFinite(value))
        {
            Add(place, quantity, value, unit, bound == 0 ? "must be above zero" : $"must be above {bound}");
        }
    }

    public void NotNegative(string place, string quantity, double value, string unit)
    {
        if (!(value >= 0) || !double.IsFinite(value))
        {
            Add(place, quantity, value, unit, "must be zero or more");
        }
    }

    /// <summary>In (0, 1].</summary>
    public void Share(string place, string quantity, double value)
    {
        if (!(value > 0 && value <= 1))
        {
            Add(place, quantity, value, "1", "must be above 0 and at most 1");
        }
    }

    public void Between(string place, string quantity, int value, int from, int to)
    {
        if (value < from || value > to)
        {
            Add(place, quantity, value, "1", $"must be between {from} and {to}");
        }
    }

    public void Known<T>(string place, string quantity, T value)
        where T : struct, Enum
    {
        if (!Enum.IsDefined(value))
        {
            Add(place, quantity, Convert.ToInt32(value, System.Globalization.CultureInfo.InvariantCulture), "1", "is not a known choice");
        }
    }

    public void Point(string place, string quantity, Vector3D point)
    {
        if (!point.IsFinite)
        {
            var worst = !double.IsFinite(point.X) ? point.X : !double.IsFinite(point.Y) ? point.Y : point.Z;
            Add(place, quantity, worst, "m", "must be three finite numbers");
        }
    }

    public void Pose(string place, string quantity, RigidTransform pose)
    {
        Point(place, quantity + ", translation", pose.Translation);
        if (pose.Translation.Norm > FurthestPoint)
        {
            Add(place, quantity + ", distance", pose.Translation.Norm, "m", $"must be at most {FurthestPoint} m");
        }

        var (x, y, z) = (pose.Rotation.AxisX, pose.Rotation.AxisY, pose.Rotation.AxisZ);
        var worst = Math.Max((x.Cross(y) - z).Norm, Math.Max(Math.Abs(x.Norm - 1), Math.Max(Math.Abs(y.Norm - 1), Math.Abs(x.Dot(y)))));
        if (!(worst <= OrthonormalTolerance))
        {
            Add(place, quantity + ", rotation", worst, "1", "must be a rotation; this is how far the matrix is from one");
        }
    }

    public void Orientation(string place, UnitQuaternion q)
    {
        var norm = Math.Sqrt(q.Dot(q));
        if (!(Math.Abs(norm - 1) <= OrthonormalTolerance))
        {
            Add(place, "orientation", norm, "1", "must be a quaternion of norm 1; this is its norm");
        }
    }
}
