using System.Globalization;
using System.Text;
using PathPortal.Engine.Arms;
using PathPortal.Formats.Documents;
using PathPortal.Formats.Paths;
using PathPortal.Formats.Problems;
using PathPortal.Formats.Tests.Documents;
using PathPortal.Formats.Tests.Urdf;
using PathPortal.Formats.Urdf;

namespace PathPortal.Formats.Tests;

/// <summary>
/// Every reader on changed and random input: a value that can be used, or problems that can be shown; never an exception. 100,000 cases over all
/// readers, 1,000,000 where PATHPORTAL_LONG is 1. A failure names its seed; the case is a function of it alone.
/// </summary>
public sealed class MutatedInputTests
{
    private static readonly int CasesPerReader = Environment.GetEnvironmentVariable("PATHPORTAL_LONG") == "1" ? 200_000 : 20_000;

    private static readonly string[] Tokens =
    [
        "", ",", "\"", "\n", "\r\n", ";", "NaN", "1e400", "-", "1e", ".", "0", "-0", "1,5", "{", "}", "[", "]", ":", "null", "true", "\\u202E", "\u202E", "\u0000",
        "<", ">", "/>", "&amp;", "&x;", "<!DOCTYPE r>", "<![CDATA[x]]>", "${x}", "\uFEFF", "9999999999", "quaternion", "prismatic", "joint", "#", "'", "=1", "\uD83D\uDE00",
    ];

    [Fact]
    public void PathCsvRead_OfMutatedFiles_GivesAPathOrProblems() => Run(
        [PathExample.Text, PathCsv.Write(PathCsv.Read(PathExample.Text).Value!.Path)],
        source =>
        {
            var read = PathCsv.Read(source);
            CheckShown(read);
            if (read.Ok)
            {
                Assert.True(PathCsv.Read(PathCsv.Write(read.Value.Path, read.Value.Report.PostureKinds)).Ok);
            }
        });

    [Fact]
    public void ArmDocumentRead_OfMutatedFiles_GivesAnArmOrProblems() => Run(
        [InventedDocuments.Arm().ToJson(), InventedDocuments.FramesArm().ToJson()],
        source =>
        {
            var read = ArmDocument.Read(source);
            CheckShown(read);
            if (read.Ok)
            {
                var text = read.Value.ToJson();
                Assert.Equal(text, ArmDocument.Read(text).Value!.ToJson());
                CheckFinite(read.Value.ToArmModel());
            }
        });

    [Fact]
    public void CellSetupDocumentRead_OfMutatedFiles_GivesASetupOrProblems() => Run(
        [InventedDocuments.Setup().ToJson()],
        source =>
        {
            var read = CellSetupDocument.Read(source);
            CheckShown(read);
            if (read.Ok)
            {
                Assert.Equal(read.Value.ToJson(), CellSetupDocument.Read(read.Value.ToJson()).Value!.ToJson());
                Assert.True(read.Value.ToControllerSettings().Period > 0);
                Assert.True(read.Value.ToCellGeometry(read.Value.Tools[0].Name, read.Value.Frames[0].Name).WorkInCell.Translation.IsFinite);
            }
        });

    [Fact]
    public void CriteriaDocumentRead_OfMutatedFiles_GivesASheetOrProblems() => Run(
        [InventedDocuments.Criteria().ToJson()],
        source =>
        {
            var read = CriteriaDocument.Read(source);
            CheckShown(read);
            if (read.Ok)
            {
                Assert.Equal(read.Value.ToJson(), CriteriaDocument.Read(read.Value.ToJson()).Value!.ToJson());
                Assert.True(read.Value.ToCriteriaSheet().SpeedShare > 0);
            }
        });

    [Fact]
    public void UrdfModelRead_OfMutatedFiles_GivesAModelOrProblems() => Run(
        [QuirkyUrdf.Text],
        source =>
        {
            var read = UrdfModel.Read(source);
            CheckShown(read);
            if (read.Ok)
            {
                var arm = read.Value.ToArm(freeMimicJoints: true);
                CheckShown(arm);
                if (arm.Ok)
                {
                    Assert.True(ArmDocument.Read(arm.Value.ToJson()).Ok);
                    CheckFinite(arm.Value.ToArmModel());
                }
            }
        });

    private static void Run(string[] sources, Action<byte[]> check)
    {
        for (var seed = 0; seed < CasesPerReader; seed++)
        {
            var input = Case(sources, new Random(seed));
            try
            {
                check(input);
            }
            catch (Exception error)
            {
                Assert.Fail($"Seed {seed.ToString(CultureInfo.InvariantCulture)}: {error}\n{Encoding.UTF8.GetString(input)}");
            }
        }
    }

    private static byte[] Case(string[] sources, Random random)
    {
        if (random.Next(20) == 0)
        {
            var noise = new byte[random.Next(200)];
            random.NextBytes(noise);
            return noise;
        }

        var bytes = Encoding.UTF8.GetBytes(sources[random.Next(sources.Length)]).ToList();
        for (var changes = random.Next(1, 5); changes > 0 && bytes.Count > 0; changes--)
        {
            var at = random.Next(bytes.Count);
            var length = Math.Min(random.Next(1, 12), bytes.Count - at);
            switch (random.Next(6))
            {
                case 0:
                    bytes[at] = (byte)random.Next(256);
                    break;
                case 1:
                    bytes.RemoveRange(at, length);
                    break;
                case 2:
                    bytes.InsertRange(at, Encoding.UTF8.GetBytes(Tokens[random.Next(Tokens.Length)]));
                    break;
                case 3:
                    bytes.InsertRange(at, bytes.GetRange(at, Math.Min(random.Next(1, 300), bytes.Count - at)));
                    break;
                case 4:
                    bytes.RemoveRange(at, length);
                    bytes.InsertRange(at, Encoding.UTF8.GetBytes(Tokens[random.Next(Tokens.Length)]));
                    break;
                default:
                    bytes.RemoveRange(at, Math.Min(random.Next(1, bytes.Count), bytes.Count - at));
                    break;
            }
        }

        return [.. bytes];
    }

    private static void CheckShown<T>(ReadResult<T> read)
        where T : class
    {
        Assert.Equal(read.Ok, read.Problems.IsEmpty);
        foreach (var problem in read.Problems)
        {
            Assert.NotEmpty(problem.Message);
            Assert.Equal(-1, VisibleText.FirstHidden(problem.ToString()));
            Assert.True(problem.Line >= 0 && problem.Column >= 0);
        }

        foreach (var remark in read.Remarks)
        {
            Assert.Equal(-1, VisibleText.FirstHidden(remark.ToString()));
        }
    }

    private static void CheckFinite(ArmModel arm)
    {
        var flange = ArmPose.Compute(arm, new double[arm.Joints.Length]).Flange;
        Assert.True(flange.Translation.IsFinite && flange.Rotation.AxisX.IsFinite);
    }
}
