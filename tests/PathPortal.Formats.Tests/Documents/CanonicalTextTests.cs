using System.Globalization;
using System.Security.Cryptography;
using System.Text;
using System.Text.Json.Nodes;
using PathPortal.Formats.Documents;

namespace PathPortal.Formats.Tests.Documents;

public sealed class CanonicalTextTests
{
    [Fact]
    public void ToJson_OfTheSameContentInAnotherOrderAndLayout_HasTheSameDigest()
    {
        var text = InventedDocuments.Setup().ToJson();
        var shuffled = Reversed(JsonNode.Parse(text)!).ToJsonString();

        Assert.NotEqual(text, shuffled);
        Assert.Equal(Digest(text), Digest(CellSetupDocument.Read(shuffled).Value!.ToJson()));
    }

    [Fact]
    public void ToJson_OfMinusZeroAndZero_IsTheSame()
    {
        var (plus, minus) = (InventedDocuments.Setup(), InventedDocuments.Setup());
        minus.Base.Pose.YMm = -0.0;

        Assert.Equal(plus.ToJson(), minus.ToJson());
    }

    [Theory]
    [InlineData("de-DE")]
    [InlineData("fr-FR")]
    [InlineData("tr-TR")]
    [InlineData("ar-SA")]
    public void ReadAndToJson_UnderAnyCulture_GiveTheSame(string culture)
    {
        var text = InventedDocuments.FramesArm().ToJson();
        var faulty = text.Replace("\"characteristic_length_mm\": 500", "\"characteristic_length_mm\": -1.5", StringComparison.Ordinal);
        var problem = ArmDocument.Read(faulty).Problems[0].ToString();
        var before = CultureInfo.CurrentCulture;
        try
        {
            CultureInfo.CurrentCulture = new(culture);

            Assert.Equal(text, ArmDocument.Read(text).Value!.ToJson());
            Assert.Equal(problem, ArmDocument.Read(faulty).Problems[0].ToString());
        }
        finally
        {
            CultureInfo.CurrentCulture = before;
        }
    }

    private static string Digest(string text) => Convert.ToHexString(SHA256.HashData(Encoding.UTF8.GetBytes(text)));

    private static JsonNode Reversed(JsonNode node)
    {
        if (node is JsonArray list)
        {
            return new JsonArray([.. list.Select(i => Reversed(i!))]);
        }

        return node is JsonObject properties
            ? new JsonObject(properties.Reverse().Select(p => KeyValuePair.Create(p.Key, (JsonNode?)Reversed(p.Value!))))
            : node.DeepClone();
    }
}
