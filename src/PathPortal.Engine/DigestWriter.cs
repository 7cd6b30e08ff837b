using System.Buffers.Binary;
using System.Collections.Immutable;
using System.Security.Cryptography;
using PathPortal.Engine.Geometry;

namespace PathPortal.Engine;

/// <summary>Feeds values to a hash in one fixed byte form, through a buffer. Call <see cref="Flush"/> at the end.</summary>
internal sealed class DigestWriter(IncrementalHash hash)
{
    private readonly byte[] buffer = new byte[8192];
    private int used;

    public void Add(int value) => BinaryPrimitives.WriteInt32LittleEndian(Next(sizeof(int)), value);

    public void Add(double value) => BinaryPrimitives.WriteInt64LittleEndian(Next(sizeof(long)), BitConverter.DoubleToInt64Bits(value));

    public void Add(bool value) => Add(value ? 1 : 0);

    public void Add(double? value)
    {
        Add(value.HasValue);
        if (value is { } number)
        {
            Add(number);
        }
    }

    public void Add(ImmutableArray<double>? values)
    {
        Add(values.HasValue);
        if (values is { } numbers)
        {
            Add(numbers.Length);
            foreach (var number in numbers)
            {
                Add(number);
            }
        }
    }

    public void Add(Vector3D v)
    {
        Add(v.X);
        Add(v.Y);
        Add(v.Z);
    }

    public void Add(RigidTransform pose)
    {
        Add(pose.Rotation.AxisX);
        Add(pose.Rotation.AxisY);
        Add(pose.Rotation.AxisZ);
        Add(pose.Translation);
    }

    public void Flush()
    {
        hash.AppendData(buffer, 0, used);
        used = 0;
    }

    private Span<byte> Next(int size)
    {
        if (used + size > buffer.Length)
        {
            Flush();
        }

        used += size;
        return buffer.AsSpan(used - size, size);
    }
}
