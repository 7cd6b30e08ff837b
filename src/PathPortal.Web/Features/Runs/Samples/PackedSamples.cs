using System.Buffers;
using System.Buffers.Binary;
using System.Text.Json;

namespace PathPortal.Web.Features.Runs.Samples;

/// <summary>
/// Columns of numbers as bytes a browser reads without parsing: length of the header (uint32), header (JSON, padded with blanks to a multiple
/// of four), then the blocks one after another, all little-endian. A block of values is float32; a thinned column is its samples as int32
/// followed by their values as float32.
/// </summary>
public sealed class PackedSamples
{
    public const string ContentType = "application/vnd.pathportal.samples";

    private readonly List<object> _columns = [];
    private readonly ArrayBufferWriter<byte> _body = new();

    /// <summary>One value per sample from <paramref name="from"/> up to but not including <paramref name="to"/>.</summary>
    public void AddValues(SampleColumn column, int from, int to)
    {
        _columns.Add(new { name = column.Name, at = _body.WrittenCount, count = to - from });
        for (var k = from; k < to; k++)
            Write((float)column.At(k));
    }

    /// <summary>The values at chosen samples, the largest use of each stretch and the like: computed by the caller.</summary>
    public void AddValues(string name, ReadOnlySpan<float> values)
    {
        _columns.Add(new { name, at = _body.WrittenCount, count = values.Length });
        foreach (var value in values)
            Write(value);
    }

    public void AddSamples(string name, IReadOnlyCollection<int> samples)
    {
        _columns.Add(new { name, at = _body.WrittenCount, count = samples.Count, whole = true });
        foreach (var sample in samples)
            Write(sample);
    }

    /// <summary>A column thinned to the samples that must be drawn.</summary>
    public void AddPoints(SampleColumn column, IReadOnlyCollection<int> samples)
    {
        _columns.Add(new { name = column.Name, at = _body.WrittenCount, count = samples.Count, thinned = true });
        foreach (var sample in samples)
            Write(sample);
        foreach (var sample in samples)
            Write((float)column.At(sample));
    }

    public byte[] ToBytes(object about)
    {
        var header = JsonSerializer.SerializeToUtf8Bytes(new { about, columns = _columns }, JsonSerializerOptions.Web);
        var padded = (header.Length + 3) / 4 * 4;
        var bytes = new byte[4 + padded + _body.WrittenCount];
        BinaryPrimitives.WriteUInt32LittleEndian(bytes, (uint)padded);
        header.CopyTo(bytes, 4);
        bytes.AsSpan(4 + header.Length, padded - header.Length).Fill((byte)' ');
        _body.WrittenSpan.CopyTo(bytes.AsSpan(4 + padded));
        return bytes;
    }

    private void Write(float value)
    {
        BinaryPrimitives.WriteSingleLittleEndian(_body.GetSpan(4), value);
        _body.Advance(4);
    }

    private void Write(int value)
    {
        BinaryPrimitives.WriteInt32LittleEndian(_body.GetSpan(4), value);
        _body.Advance(4);
    }
}
