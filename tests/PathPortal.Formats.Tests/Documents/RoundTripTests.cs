using PathPortal.Formats.Documents;

namespace PathPortal.Formats.Tests.Documents;

public sealed class RoundTripTests
{
    public static TheoryData<string> Arms => new(InventedDocuments.Arm().ToJson(), InventedDocuments.FramesArm().ToJson());

    [Theory]
    [MemberData(nameof(Arms))]
    public void ToJson_OfWhatWasRead_IsTheSameText(string text)
    {
        var read = ArmDocument.Read(text);

        Assert.Empty(read.Problems);
        Assert.Equal(text, read.Value!.ToJson());
        Assert.Equal(text, read.Value.Copy().ToJson());
    }

    [Fact]
    public void ToJson_OfSetupAndCriteria_ReadsBackAsTheSameText()
    {
        var setup = InventedDocuments.Setup().ToJson();
        var criteria = InventedDocuments.Criteria().ToJson();

        Assert.Equal(setup, CellSetupDocument.Read(setup).Value!.Copy().ToJson());
        Assert.Equal(criteria, CriteriaDocument.Read(criteria).Value!.Copy().ToJson());
    }

    [Fact]
    public void ToJson_EndsLinesWithLineFeedsOnly()
    {
        var text = InventedDocuments.Setup().ToJson();

        Assert.DoesNotContain('\r', text);
        Assert.EndsWith("}\n", text, StringComparison.Ordinal);
    }
}
