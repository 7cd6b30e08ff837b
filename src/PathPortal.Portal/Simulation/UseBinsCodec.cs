using System.Buffers.Binary;
using System.Collections.Immutable;
using System.Runtime.InteropServices;
using PathPortal.Engine.Verdicts;

namespace PathPortal.Portal.Simulation;

/// <summary>
/// Limit use along a run as it is stored: little-endian; version byte 1, number of criteria (byte), number of bins (uint16), then criteria
/// (byte each), edges (int32, bins + 1), worst use (float32, criteria × bins), worst sample (int32, criteria × bins).
/// </summary>
public static class UseBinsCodec
{
    private const byte Version = 1;
    private const int HeaderBytes = 4;

    public static byte[] Pack(UseBins bins)
    {
        var (rows, cells) = (bins.Criteria.Length, bins.Criteria.Length * bins.BinCount);
        var packed = new byte[Size(rows, bins.BinCount)];
        packed[0] = Version;
        packed[1] = checked((byte)rows);
        BinaryPrimitives.WriteUInt16LittleEndian(packed.AsSpan(2), checked((ushort)bins.BinCount));
        var rest = packed.AsSpan(HeaderBytes);
        for (var i = 0; i < rows; i++)
            rest[i] = checked((byte)bins.Criteria[i]);
        rest = rest[rows..];
        MemoryMarshal.AsBytes(bins.Edges.AsSpan()).CopyTo(rest);
        rest = rest[((bins.BinCount + 1) * sizeof(int))..];
        MemoryMarshal.AsBytes(bins.WorstUse.AsSpan()).CopyTo(rest);
        MemoryMarshal.AsBytes(bins.WorstSample.AsSpan()).CopyTo(rest[(cells * sizeof(float))..]);
        return packed;
    }

    /// <exception cref="InvalidDataException">The bytes were not written by <see cref="Pack"/>.</exception>
    public static UseBins Unpack(ReadOnlySpan<byte> packed)
    {
        if (packed.Length < HeaderBytes || packed[0] != Version)
            throw new InvalidDataException("These are no packed bins of a version this build knows.");
        var (rows, bins) = (packed[1], BinaryPrimitives.ReadUInt16LittleEndian(packed[2..]));
        if (packed.Length != Size(rows, bins))
            throw new InvalidDataException($"Packed bins of {rows} criteria × {bins} take {Size(rows, bins)} bytes, not {packed.Length}.");
        var rest = packed[HeaderBytes..];
        var criteria = ImmutableArray.CreateBuilder<Criterion>(rows);
        for (var i = 0; i < rows; i++)
            criteria.Add((Criterion)rest[i]);
        rest = rest[rows..];
        var edges = Take<int>(ref rest, bins + 1);
        var use = Take<float>(ref rest, rows * bins);
        var samples = Take<int>(ref rest, rows * bins);
        return new() { Criteria = criteria.MoveToImmutable(), Edges = edges, WorstUse = use, WorstSample = samples };
    }

    private static int Size(int rows, int bins) => HeaderBytes + rows + ((bins + 1) * sizeof(int)) + (rows * bins * (sizeof(float) + sizeof(int)));

    private static ImmutableArray<T> Take<T>(ref ReadOnlySpan<byte> rest, int count)
        where T : unmanaged
    {
        var values = new T[count];
        var bytes = MemoryMarshal.AsBytes(values.AsSpan());
        rest[..bytes.Length].CopyTo(bytes);
        rest = rest[bytes.Length..];
        return ImmutableCollectionsMarshal.AsImmutableArray(values);
    }
}
