using System.Text.Json;
using PathPortal.Engine.Geometry;

namespace PathPortal.Engine.Tests.Published;

/// <summary>
/// One set of numbers from outside the project: inputs, expected values, their source and tolerance, from the JSON files beside this class. SI; poses
/// are 4×4 row by row; Jacobians have linear rows first.
/// </summary>
public sealed class PublishedCase
{
    private readonly JsonElement json;

    private PublishedCase(JsonElement json) => this.json = json;

    public string Id => json.GetProperty("id").GetString()!;

    /// <summary>Where the numbers come from, for failure messages.</summary>
    public string Source => $"{Id}: {json.GetProperty("source").GetString()} ({json.GetProperty("status").GetString()})";

    /// <summary>In the unit of the compared number.</summary>
    public double Tolerance => json.GetProperty("tolerance").GetDouble();

    public JsonElement Inputs => json.GetProperty("inputs");

    public JsonElement Expected => json.GetProperty("expected");

    /// <summary>A case by its id, such as "FK-01".</summary>
    public static PublishedCase Get(string id)
    {
        foreach (var item in File(id[..id.IndexOf('-', StringComparison.Ordinal)]).EnumerateArray())
        {
            if (item.GetProperty("id").GetString() == id)
            {
                return new(item);
            }
        }

        throw new ArgumentException($"There is no case {id}.");
    }

    /// <summary>The whole content of a JSON file beside this class, by its name without extension.</summary>
    public static JsonElement File(string name)
    {
        using var stream = typeof(PublishedCase).Assembly.GetManifestResourceStream(name.ToLowerInvariant())
            ?? throw new ArgumentException($"There is no file {name}.");
        return JsonDocument.Parse(stream).RootElement.Clone();
    }

    public double[] Input(string name) => Numbers(Inputs.GetProperty(name));

    public double InputNumber(string name) => Inputs.GetProperty(name).GetDouble();

    public double ExpectedNumber(string name) => Expected.GetProperty(name).GetDouble();

    public RigidTransform ExpectedPose(string name) => Pose(Expected.GetProperty(name));

    public double[][] ExpectedMatrix(string name) => Matrix(Expected.GetProperty(name));

    public static double[] Numbers(JsonElement array) => [.. array.EnumerateArray().Select(e => e.GetDouble())];

    public static double[][] Matrix(JsonElement rows) => [.. rows.EnumerateArray().Select(Numbers)];

    public static RigidTransform Pose(JsonElement matrix)
    {
        var m = Matrix(matrix);
        return new(Rotation(m), new(m[0][3], m[1][3], m[2][3]));
    }

    public static RotationMatrix Rotation(double[][] m) =>
        new(m[0][0], m[0][1], m[0][2], m[1][0], m[1][1], m[1][2], m[2][0], m[2][1], m[2][2]);
}
