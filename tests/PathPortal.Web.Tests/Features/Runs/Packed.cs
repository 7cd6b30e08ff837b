using System.Buffers.Binary;
using System.Text.Json;

namespace PathPortal.Web.Tests.Features.Runs;

/// <summary>Reads packed samples as a browser does, written from the description of the format.</summary>
internal sealed class Packed
{
    private readonly byte[] _bytes;
    private readonly int _body;
    private readonly JsonElement _header;

    public Packed(byte[] bytes)
    {
        _bytes = bytes;
        var header = (int)BinaryPrimitives.ReadUInt32LittleEndian(bytes);
        _body = 4 + header;
        _header = JsonSerializer.Deserialize<JsonElement>(bytes.AsSpan(4, header));
        Assert.Equal(0, _body % 4);
    }

    public JsonElement About => _header.GetProperty("about");

    public IEnumerable<string> Names => _header.GetProperty("columns").EnumerateArray().Select(c => c.GetProperty("name").GetString()!);

    public (int[] Samples, float[] Values) Thinned(string name)
    {
        var (at, count, column) = Find(name);
        Assert.True(column.GetProperty("thinned").GetBoolean());
        return (Whole(at, count), Real(at + 4 * count, count));
    }

    public float[] Values(string name)
    {
        var (at, count, _) = Find(name);
        return Real(at, count);
    }

    public int[] Samples(string name)
    {
        var (at, count, column) = Find(name);
        Assert.True(column.GetProperty("whole").GetBoolean());
        return Whole(at, count);
    }

    private (int At, int Count, JsonElement Column) Find(string name)
    {
        var column = _header.GetProperty("columns").EnumerateArray().Single(c => c.GetProperty("name").GetString() == name);
        return (_body + column.GetProperty("at").GetInt32(), column.GetProperty("count").GetInt32(), column);
    }

    private int[] Whole(int at, int count) => [.. Enumerable.Range(0, count).Select(i => BinaryPrimitives.ReadInt32LittleEndian(_bytes.AsSpan(at + 4 * i)))];

    private float[] Real(int at, int count) => [.. Enumerable.Range(0, count).Select(i => BinaryPrimitives.ReadSingleLittleEndian(_bytes.AsSpan(at + 4 * i)))];
}
