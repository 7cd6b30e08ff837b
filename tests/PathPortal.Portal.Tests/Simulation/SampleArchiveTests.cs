using System.Security.Cryptography;
using PathPortal.Engine;
using PathPortal.Portal.Simulation;

namespace PathPortal.Portal.Tests.Simulation;

/// <summary>What a decision keeps comes back bit for bit.</summary>
public sealed class SampleArchiveTests(ITestOutputHelper output)
{
    [Theory]
    [InlineData(1, 1)]
    [InlineData(1000, 6)]
    [InlineData(257, 8)]
    public void Unpack_OfPacked_GivesEveryBitBack(int count, int joints)
    {
        var samples = InventedSamples.Of(count, joints);

        var back = SampleArchive.Unpack(SampleArchive.Pack(samples));

        Assert.Equal((samples.Count, samples.JointCount, samples.Period), (back.Count, back.JointCount, back.Period));
        Assert.Equal(Bits(samples), Bits(back));
        Assert.Equal(samples.Waypoint, back.Waypoint);
        Assert.Equal(samples.Process, back.Process);
        Assert.Equal(samples.Use.Keys.Order(), back.Use.Keys.Order());
    }

    [Fact]
    public void Unpack_OfPacked_ChecksEveryColumnThereIs()
    {
        // A column added to the engine's samples must be added to the archive: it would silently be lost.
        var columns = typeof(RunSamples).GetProperties().Count(p => p.PropertyType.IsArray) + 1;

        Assert.Equal(25, columns);
    }

    [Fact]
    public void Pack_SameSamples_GivesSameBytes() =>
        Assert.Equal(SHA256.HashData(SampleArchive.Pack(InventedSamples.Of(500))), SHA256.HashData(SampleArchive.Pack(InventedSamples.Of(500))));

    [Fact]
    public void Pack_AMinuteOfSamples_IsSmallerThanMemory()
    {
        var samples = InventedSamples.Of(15_000);

        var packed = SampleArchive.Pack(samples);

        output.WriteLine($"{SampleColumns.Size(samples)} bytes in memory, {packed.Length} packed.");
        Assert.True(packed.Length < SampleColumns.Size(samples), $"{packed.Length} bytes");
    }

    [Fact]
    public void Unpack_Damaged_SaysSo()
    {
        var packed = SampleArchive.Pack(InventedSamples.Of(300));

        Assert.Throws<InvalidDataException>(() => SampleArchive.Unpack([]));
        Assert.Throws<InvalidDataException>(() => SampleArchive.Unpack([1, .. packed[1..]]));
        Assert.Throws<InvalidDataException>(() => SampleArchive.Unpack(packed[..^20]));
        Assert.Throws<InvalidDataException>(() => SampleArchive.Unpack(packed[..8]));
    }

    private static List<long> Bits(RunSamples samples) =>
    [
        .. SampleColumns.Numbers(samples).Concat(samples.Use.OrderBy(u => u.Key).Select(u => u.Value))
            .SelectMany(column => column.Select(BitConverter.DoubleToInt64Bits)),
    ];
}
