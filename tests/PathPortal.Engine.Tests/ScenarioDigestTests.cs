using System.Collections.Immutable;
using System.Reflection;
using System.Runtime.CompilerServices;
using PathPortal.Engine.Arms;
using PathPortal.Engine.Geometry;
using PathPortal.Engine.Paths;
using PathPortal.Engine.Verdicts;

namespace PathPortal.Engine.Tests;

public sealed class ScenarioDigestTests
{
    // Members that change no number of a result, and are therefore left out.
    private static readonly string[] Unnumbered =
    [
        $"{nameof(ArmModel)}.{nameof(ArmModel.Name)}",
        $"{nameof(Joint)}.{nameof(Joint.Name)}",
        $"{nameof(Limit)}.{nameof(Limit.Source)}",
        $"{nameof(Waypoint)}.{nameof(Waypoint.Label)}",
        $"{nameof(Waypoint)}.{nameof(Waypoint.SourceLine)}",
        $"{nameof(ToolPath)}.{nameof(ToolPath.PostureKinds)}",
    ];

    [Fact]
    public void Compute_Twice_GivesTheSame32Bytes()
    {
        var digest = ScenarioDigest.Compute(TestScenario.Complete);

        Assert.Equal(32, digest.Length);
        Assert.Equal(digest, ScenarioDigest.Compute(TestScenario.Complete));
    }

    [Fact]
    public void Compute_AnyMemberChanged_ChangesExactlyForNumbers()
    {
        // Walks every property of every input type by reflection, so that a member added later and forgotten in the digest fails here.
        var before = Convert.ToHexString(ScenarioDigest.Compute(TestScenario.Complete));
        var seen = new Dictionary<string, string>();
        var walked = 0;
        foreach (var (name, changed) in Variants(TestScenario.Complete, nameof(Scenario)))
        {
            var after = Convert.ToHexString(ScenarioDigest.Compute((Scenario)changed));
            walked++;
            if (Unnumbered.Any(u => name.EndsWith(u, StringComparison.Ordinal)))
            {
                Assert.True(before == after, $"{name} changes the digest but no number of a result.");
            }
            else
            {
                Assert.True(before != after, $"{name} is not in the digest.");
                Assert.True(seen.TryAdd(after, name), $"{name} changes the digest just as {seen.GetValueOrDefault(after)} does.");
            }
        }

        Assert.InRange(walked, 250, 2000);
    }

    [Fact]
    public void Compute_ZeroAndMinusZero_Differ() => Assert.NotEqual(
        ScenarioDigest.Compute(TestScenario.Complete with { FreeTurn = 0.0 }),
        ScenarioDigest.Compute(TestScenario.Complete with { FreeTurn = -0.0 }));

    [Fact]
    public void Compute_OptionalValuesAbsent_DifferFromZero() => Assert.NotEqual(
        ScenarioDigest.Compute(TestScenario.Complete with { FreeTurn = null }),
        ScenarioDigest.Compute(TestScenario.Complete with { FreeTurn = 0 }));

    [Fact]
    public void Compute_NearThresholdWrittenOutAsItsDefault_IsTheSame() => Assert.Equal(
        ScenarioDigest.Compute(With(new Dictionary<Criterion, double>())),
        ScenarioDigest.Compute(With(new Dictionary<Criterion, double> { [Criterion.ToolAxis] = CriteriaSheet.DefaultNear })));

    private static Scenario With(Dictionary<Criterion, double> near) =>
        TestScenario.Complete with { Criteria = TestScenario.Criteria with { Near = near } };

    // Every copy of a value in which one member, however deep, is another.
    private static IEnumerable<(string Name, object Changed)> Variants(object value, string name)
    {
        switch (value)
        {
            case double number:
                yield return (name, number + 0.125);
                yield break;
            case int number:
                yield return (name, number + 1);
                yield break;
            case bool flag:
                yield return (name, !flag);
                yield break;
            case string text:
                yield return (name, text + "x");
                yield break;
            case Enum choice:
                yield return (name, Enum.ToObject(choice.GetType(), Convert.ToInt32(choice, System.Globalization.CultureInfo.InvariantCulture) + 1));
                yield break;
            case UnitQuaternion q:
                yield return (name, UnitQuaternion.FromComponents(q.W, q.X, q.Y, q.Z + 0.1));
                yield return (name + " sign", q.Negated());
                yield break;
            case IReadOnlyDictionary<Criterion, double> near:
                foreach (var criterion in Enum.GetValues<Criterion>())
                {
                    yield return ($"{name}[{criterion}]", new Dictionary<Criterion, double>(near) { [criterion] = 0.55 });
                }

                yield break;
            case ImmutableArray<double> numbers:
                yield return (name + " length", numbers.Add(1));
                for (var i = 0; i < numbers.Length; i++)
                {
                    yield return ($"{name}[{i}]", numbers.SetItem(i, numbers[i] + 0.125));
                }

                yield break;
            case ImmutableArray<JointKind> kinds:
                yield return (name, kinds.Add(JointKind.Prismatic));
                yield break;
            case ImmutableArray<Joint> joints:
                yield return (name + " length", joints.Add(joints[0]));
                for (var i = 0; i < joints.Length; i++)
                {
                    foreach (var (inner, changed) in Variants(joints[i], $"{name}[{i}] Joint"))
                    {
                        yield return (inner, joints.SetItem(i, (Joint)changed));
                    }
                }

                yield break;
            case ImmutableArray<Waypoint> waypoints:
                yield return (name + " length", waypoints.Add(waypoints[0]));
                for (var i = 0; i < waypoints.Length; i++)
                {
                    foreach (var (inner, changed) in Variants(waypoints[i], $"{name}[{i}] Waypoint"))
                    {
                        yield return (inner, waypoints.SetItem(i, (Waypoint)changed));
                    }
                }

                yield break;
        }

        foreach (var property in Settable(value.GetType()))
        {
            var path = $"{name} {value.GetType().Name}.{property.Name}";
            if (property.GetValue(value) is not { } inner)
            {
                continue;
            }

            foreach (var (innerName, changed) in Variants(inner, path))
            {
                yield return (innerName, CopyWith(value, property, changed));
            }

            if (Nullable.GetUnderlyingType(property.PropertyType) is not null)
            {
                yield return (path + " absent", CopyWith(value, property, null));
            }
        }
    }

    private static PropertyInfo[] Settable(Type type)
    {
        PropertyInfo[] found =
        [
            .. type.GetProperties(BindingFlags.Public | BindingFlags.Instance).Where(p => p.SetMethod is not null && p.GetIndexParameters().Length == 0),
        ];
        return found.Length > 0 ? found : throw new InvalidOperationException($"{type} has no member to change; teach the walk about it.");
    }

    private static object CopyWith(object value, PropertyInfo property, object? changed)
    {
        // A fresh box or a clone, so that the original stays as it is.
        var copy = value.GetType().IsValueType
            ? RuntimeHelpers.GetObjectValue(value)!
            : value.GetType().GetMethod("<Clone>$")!.Invoke(value, null)!;
        property.SetValue(copy, changed);
        return copy;
    }
}
