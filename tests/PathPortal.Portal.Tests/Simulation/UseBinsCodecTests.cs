using PathPortal.Engine.Verdicts;
using PathPortal.Portal.Domain.Runs;
using PathPortal.Portal.Simulation;

namespace PathPortal.Portal.Tests.Simulation;

public sealed class UseBinsCodecTests
{
    [Fact]
    public void Unpack_OfPacked_GivesEveryBitBack()
    {
        var bins = Bins([Criterion.AcrossPath, Criterion.JointSpeed, Criterion.Singularity], 5);

        var back = UseBinsCodec.Unpack(UseBinsCodec.Pack(bins));

        Assert.Equal(bins.Criteria, back.Criteria);
        Assert.Equal(bins.Edges, back.Edges);
        Assert.Equal(bins.WorstUse.Select(BitConverter.SingleToInt32Bits), back.WorstUse.Select(BitConverter.SingleToInt32Bits));
        Assert.Equal(bins.WorstSample, back.WorstSample);
    }

    [Fact]
    public void Pack_EveryCriterionAndBin_FitsIntoARow() =>
        Assert.InRange(UseBinsCodec.Pack(Bins([.. Enum.GetValues<Criterion>().Where(c => c < Criterion.Finished)], UseBins.MaxBins)).Length, 1, Run.MaxBinBytes);

    [Fact]
    public void Unpack_Damaged_SaysSo()
    {
        var packed = UseBinsCodec.Pack(Bins([Criterion.JointSpeed], 3));

        Assert.Throws<InvalidDataException>(() => UseBinsCodec.Unpack([]));
        Assert.Throws<InvalidDataException>(() => UseBinsCodec.Unpack(packed.AsSpan()[..^1]));
        Assert.Throws<InvalidDataException>(() => UseBinsCodec.Unpack([9, .. packed[1..]]));
    }

    private static UseBins Bins(Criterion[] criteria, int bins)
    {
        float[] awkward = [0.25f, float.NaN, float.PositiveInfinity, 1.0000001f];
        return new()
        {
            Criteria = [.. criteria],
            Edges = [.. Enumerable.Range(0, bins + 1).Select(i => i * 29)],
            WorstUse = [.. Enumerable.Range(0, criteria.Length * bins).Select(i => awkward[i % awkward.Length])],
            WorstSample = [.. Enumerable.Range(0, criteria.Length * bins).Select(i => i % 4 == 1 ? -1 : i)],
        };
    }
}
