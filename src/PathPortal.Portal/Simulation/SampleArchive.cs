using System.Buffers.Binary;
using System.IO.Compression;
using PathPortal.Engine;
using PathPortal.Engine.Verdicts;

namespace PathPortal.Portal.Simulation;

/// <summary>
/// A run's samples as a decision keeps them, bit for bit and readable without this program. The eight ASCII characters PPSAMPL1, then a
/// Brotli stream (RFC 7932) of, all little-endian: number of samples N (int32), number of joints J (int32), period in seconds (float64),
/// number of limit-use columns U (int32), U criterion numbers (int32), then the columns. Each column is stored in byte planes: the lowest
/// byte of all N values, then the next, up to the highest. Columns, float64 in SI units unless said otherwise: reference time; path
/// fraction; J joint values; J joint speeds; J joint speed demands; J joint acceleration demands; reference position x, y, z; reference
/// orientation w, x, y, z; tool position x, y, z; tool orientation w, x, y, z; tracking error; turn error; across path; stand-off; tool axis
/// angle; tool speed; reference speed; σ_min; σ_max; λ²; speed scale; path scale; U columns of limit use; waypoint (int32); process (one
/// byte, 0 or 1).
/// </summary>
public static class SampleArchive
{
    private const int HeaderBytes = 20;
    private const int MostSamples = ScenarioCheck.MostSamples + 1;

    private static ReadOnlySpan<byte> Magic => "PPSAMPL1"u8;

    public static byte[] Pack(RunSamples samples)
    {
        using var packed = new MemoryStream();
        packed.Write(Magic);
        // Quality 5 takes a tenth of the time of the best and gives up a few percent of size.
        using (var stream = new BrotliStream(packed, new BrotliCompressionOptions { Quality = 5 }, leaveOpen: true))
        {
            var criteria = samples.Use.Keys.Order().ToArray();
            var header = new byte[HeaderBytes + (criteria.Length * sizeof(int))];
            BinaryPrimitives.WriteInt32LittleEndian(header, samples.Count);
            BinaryPrimitives.WriteInt32LittleEndian(header.AsSpan(4), samples.JointCount);
            BinaryPrimitives.WriteDoubleLittleEndian(header.AsSpan(8), samples.Period);
            BinaryPrimitives.WriteInt32LittleEndian(header.AsSpan(16), criteria.Length);
            for (var i = 0; i < criteria.Length; i++)
                BinaryPrimitives.WriteInt32LittleEndian(header.AsSpan(HeaderBytes + (i * sizeof(int))), (int)criteria[i]);
            stream.Write(header);
            foreach (var column in SampleColumns.Numbers(samples).Concat(criteria.Select(c => samples.Use[c])))
                BytePlanes.Write(stream, column);
            BytePlanes.Write(stream, samples.Waypoint);
            stream.Write([.. samples.Process.Select(on => on ? (byte)1 : (byte)0)]);
        }
        return packed.ToArray();
    }

    /// <exception cref="InvalidDataException">The bytes were not written by <see cref="Pack"/>, or are damaged.</exception>
    public static RunSamples Unpack(byte[] packed)
    {
        if (!packed.AsSpan().StartsWith(Magic))
            throw new InvalidDataException("These are no packed samples of a version this build knows.");
        try
        {
            using var stream = new BrotliStream(new MemoryStream(packed, Magic.Length, packed.Length - Magic.Length), CompressionMode.Decompress);
            return Read(stream);
        }
        catch (Exception e) when (e is EndOfStreamException or InvalidOperationException)
        {
            throw new InvalidDataException("The packed samples are damaged.", e);
        }
    }

    private static RunSamples Read(Stream stream)
    {
        var header = new byte[HeaderBytes];
        stream.ReadExactly(header);
        var count = BinaryPrimitives.ReadInt32LittleEndian(header);
        var joints = BinaryPrimitives.ReadInt32LittleEndian(header.AsSpan(4));
        var uses = BinaryPrimitives.ReadInt32LittleEndian(header.AsSpan(16));
        if (count is < 0 or > MostSamples || joints is < 1 or > Engine.Arms.ArmModel.MaxJoints || uses is < 0 or > 64)
            throw new InvalidDataException("The packed samples are damaged.");
        var criteria = new Criterion[uses];
        var number = new byte[sizeof(int)];
        for (var i = 0; i < uses; i++)
        {
            stream.ReadExactly(number);
            criteria[i] = (Criterion)BinaryPrimitives.ReadInt32LittleEndian(number);
        }

        double[] One() => BytePlanes.Read<double>(stream, count);
        double[][] Some(int columns) => [.. Enumerable.Range(0, columns).Select(_ => One())];
        // An initialiser assigns in the order it is written, which is the order of the columns.
        return new()
        {
            Count = count,
            JointCount = joints,
            Period = BinaryPrimitives.ReadDoubleLittleEndian(header.AsSpan(8)),
            ReferenceTime = One(),
            PathFraction = One(),
            Joints = Some(joints),
            JointSpeeds = Some(joints),
            JointSpeedDemands = Some(joints),
            JointAccelerationDemands = Some(joints),
            ReferencePosition = Some(3),
            ReferenceOrientation = Some(4),
            ToolPosition = Some(3),
            ToolOrientation = Some(4),
            TrackingError = One(),
            TurnError = One(),
            AcrossPath = One(),
            StandOff = One(),
            ToolAxisAngle = One(),
            ToolSpeed = One(),
            ReferenceSpeed = One(),
            SigmaMin = One(),
            SigmaMax = One(),
            DampingSquared = One(),
            SpeedScale = One(),
            PathScale = One(),
            Use = criteria.ToDictionary(c => c, _ => One()),
            Waypoint = BytePlanes.Read<int>(stream, count),
            Process = Flags(stream, count),
        };
    }

    private static bool[] Flags(Stream stream, int count)
    {
        var bytes = new byte[count];
        stream.ReadExactly(bytes);
        return [.. bytes.Select(b => b != 0)];
    }
}
